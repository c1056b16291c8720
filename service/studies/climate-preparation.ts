import { ClimateError } from "../climate/climate-error.ts";
import type { ClimateSeries } from "../climate/climate-series.ts";
import { sampleCount } from "../climate/climate-series.ts";
import type { Notice } from "../climate/notice.ts";
import { noticedMistakes } from "../climate/plausibility.ts";
import { prepareClimate } from "../climate/prepare-climate.ts";
import { StudyError } from "./study-error.ts";

/** A climate as the studies use it, every column of shape [n]. */
export interface StudyClimate {
  /** Plane of array, W/m2; NaN where skipped. */
  irradiance: Float64Array;
  /** degC; NaN where skipped. */
  cellTemperature: Float64Array;
  /** 1 where a sample is left out of every sum; null where none is. */
  skipped: Uint8Array | null;
  coverage: Coverage;
  /** Coldest temperature given, night included, degC: ambient where known, else the cell's. */
  coldest: number;
  /** kWh/m2 on the plane of array, over the samples that count. */
  insolation: number;
  /** What was assumed or filled in. */
  notes: Notice[];
  /** Mistakes the series seems to hold. */
  mistakes: Notice[];
}

/** How many samples there were, and how many counted. */
export interface Coverage {
  samples: number;
  used: number;
  skipped: number;
}

/** Where a climate's column stands in the request. */
const POINTERS: Record<string, string> = {
  irradiance: "/climate/irradiance/values",
  global: "/climate/irradiance/global",
  directNormal: "/climate/irradiance/directNormal",
  diffuse: "/climate/irradiance/diffuse",
  cellTemperature: "/climate/temperature/values",
  ambientTemperature: "/climate/temperature/values",
  windSpeed: "/climate/temperature/windSpeed",
};

/** What a climate with missing samples may say of them. */
const GAP_CHOICES = 'a number, or gaps "skip" or {"interpolateUpTo": seconds} in the climate';

/** Prepares a series for the studies and looks it over for mistakes. @throws StudyError for what cannot be used */
export function prepareForStudy(series: ClimateSeries): StudyClimate {
  const samples = sampleCount(series);
  const prepared = refusingAsStudy(() => prepareClimate(series));
  const { irradiance, cellTemperature, used } = prepared;
  const skipped = used === null ? null : used.map((one) => 1 - one);
  let sum = 0;
  for (const value of irradiance) if (value > 0) sum += value;
  let coldest = Number.POSITIVE_INFINITY;
  for (const value of series.temperature.values) if (value < coldest) coldest = value;
  return {
    irradiance,
    cellTemperature,
    skipped,
    coverage: { samples, used: samples - prepared.skipped, skipped: prepared.skipped },
    coldest,
    insolation: (sum * series.step) / 3.6e6,
    notes: prepared.notes,
    mistakes: noticedMistakes(series, prepared.sun),
  };
}

function refusingAsStudy<T>(work: () => T): T {
  try {
    return work();
  } catch (error) {
    if (!(error instanceof ClimateError)) throw error;
    const pointer = POINTERS[error.column] ?? "/climate";
    const expected = error.code === "missing-samples" ? GAP_CHOICES : undefined;
    throw new StudyError(error.code, error.index >= 0 ? `${pointer}/${error.index}` : pointer, error.message, expected);
  }
}
