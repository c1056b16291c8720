import { cellTemperatures } from "./cell-temperature.ts";
import { checkedColumns } from "./checked-columns.ts";
import { ClimateError } from "./climate-error.ts";
import {
  type AmbientTemperature,
  type ClimateSeries,
  firstSunInstant,
  type HorizontalIrradiance,
} from "./climate-series.ts";
import { closeGaps } from "./gaps.ts";
import {
  type Completion,
  fromDirectAndDiffuse,
  fromGlobal,
  fromGlobalAndDiffuse,
  fromGlobalAndDirect,
} from "./horizontal-components.ts";
import type { Notice } from "./notice.ts";
import { planeOfArraySeries } from "./plane-of-array-series.ts";
import { type SunTrack, sunTrack } from "./sun-track.ts";
import { laggedTemperatures } from "./thermal-lag.ts";

/** Wind speed where none is given, m/s: the wind of the nominal operating conditions. */
const CALM = 1;

/** A lag is followed only where samples are shorter than this, seconds; longer means have settled. */
const LAG_STEP = 600;

/** A climate as the array feels it; columns of equal length. */
export interface PreparedClimate {
  /** Plane-of-array irradiance, W/m2, never negative; NaN where unusable. */
  irradiance: Float64Array;
  /** Cell temperature, degC; NaN where unusable. */
  cellTemperature: Float64Array;
  /** 1 where the sample is usable, 0 where it is skipped; null where all are. */
  used: Uint8Array | null;
  /** Samples that interpolation made usable, and samples left out. */
  filled: number;
  skipped: number;
  /** What was assumed or left out, for the caller to be told. */
  notes: Notice[];
  /** The sun at each sample, for checks that need it; null for plane-of-array input. */
  sun: SunTrack | null;
}

type Columns = Record<string, Float64Array>;

function completionOf(has: HorizontalIrradiance): Completion {
  if (has.directNormal && has.diffuse) return fromDirectAndDiffuse;
  if (has.global && has.diffuse) return fromGlobalAndDiffuse;
  if (has.global && has.directNormal) return fromGlobalAndDirect;
  if (has.global) return fromGlobal;
  throw new ClimateError(
    "components-missing",
    "Give the global horizontal irradiance, or two of global, direct normal and diffuse.",
    "irradiance",
  );
}

function withoutNegatives(values: Float64Array): Float64Array {
  const out = values.slice();
  for (let i = 0; i < out.length; i++) if (out[i] < 0) out[i] = 0;
  return out;
}

function irradianceOf(series: ClimateSeries, columns: Columns, sun: SunTrack | null): Float64Array {
  const given = series.irradiance;
  if (given.kind === "plane-of-array" || sun === null) return withoutNegatives(columns.irradiance);
  const none = new Float64Array(sun.up.length);
  return planeOfArraySeries(
    { global: columns.global ?? none, direct: columns.directNormal ?? none, diffuse: columns.diffuse ?? none },
    completionOf(given),
    sun,
    { site: given.site, skyModel: given.skyModel ?? "perez" },
  );
}

function lagged(series: ClimateSeries, from: AmbientTemperature, steady: Float64Array, notes: Notice[]): Float64Array {
  const lag = from.thermalLag ?? 0;
  if (lag === 0) return steady;
  if (series.step < LAG_STEP) return laggedTemperatures(steady, series.step, lag, series.timing);
  notes.push({
    code: "thermal-lag-not-followed",
    detail: `Samples ${series.step} s apart are too long for a thermal lag of ${lag} s to matter; it was left out.`,
    values: { step: series.step, thermalLag: lag },
  });
  return steady;
}

function cellOf(series: ClimateSeries, columns: Columns, irradiance: Float64Array, notes: Notice[]): Float64Array {
  const given = series.temperature;
  if (given.kind === "cell") return columns.cellTemperature;
  const model = given.model ?? { kind: "faiman" };
  if (!given.windSpeed && model.kind !== "noct")
    notes.push({
      code: "wind-assumed",
      detail: `No wind speed was given: ${CALM} m/s was taken throughout for the cell temperature.`,
      values: { windSpeed: CALM },
    });
  const steady = cellTemperatures(model, irradiance, columns.ambientTemperature, columns.windSpeed ?? CALM);
  return lagged(series, given, steady, notes);
}

/** The column with NaN where `used` says that the sample is not usable; the column itself where all are. */
function blank(used: Uint8Array | null, column: Float64Array): Float64Array {
  if (used === null) return column;
  const out = column.slice();
  for (let i = 0; i < out.length; i++) if (used[i] === 0) out[i] = Number.NaN;
  return out;
}

/**
 * Turns a climate as given into plane-of-array irradiance (W/m2) and cell temperature (degC) per sample, by
 * `physics.md` section 6: mid-interval sun for means, the chosen sky and temperature models, the gap policy.
 *
 * Throws {@link ClimateError} for columns of unequal length or none, values that are not finite or out of range,
 * a site, step or set of components that cannot be, and under the policy "refuse" for any NaN. Input columns are not
 * written to; those of the answer may be the given ones. Linear in the number of samples.
 */
export function prepareClimate(series: ClimateSeries): PreparedClimate {
  const given = checkedColumns(series);
  if (series.irradiance.kind === "horizontal") completionOf(series.irradiance);
  const closed = closeGaps(given, series.step, series.gaps ?? "refuse");
  const columns: Columns = Object.fromEntries(Object.keys(given).map((name, i) => [name, closed.columns[i]]));
  const count = closed.columns[0].length;
  const { irradiance: light } = series;
  const sun =
    light.kind === "horizontal" ? sunTrack(firstSunInstant(series), series.step * 1000, count, light.site) : null;
  const notes: Notice[] = [];
  const irradiance = blank(closed.used, irradianceOf(series, columns, sun));
  const cellTemperature = blank(closed.used, cellOf(series, columns, irradiance, notes));
  const { used, filled, skipped } = closed;
  if (filled > 0)
    notes.push({ code: "gaps-filled", detail: `${filled} missing samples were interpolated.`, values: { filled } });
  return { irradiance, cellTemperature, used, filled, skipped, notes, sun };
}
