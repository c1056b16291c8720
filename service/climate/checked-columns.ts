import { ClimateError } from "./climate-error.ts";
import type { ClimateSeries, Site } from "./climate-series.ts";

/** Readings below this are an error, W/m2; above it and below 0 a radiometer's night offset (physics.md section 6). */
const LOWEST_IRRADIANCE = -10;
/** Readings above this are an error, W/m2 (physics.md section 6). */
const HIGHEST_IRRADIANCE = 2000;
/** Faster winds than this were never measured at a station (113 m/s, Barrow Island 1996, WMO; from memory), m/s. */
const HIGHEST_WIND = 115;

const IRRADIANCES = ["irradiance", "global", "directNormal", "diffuse"];

function columnsOf(series: ClimateSeries): Record<string, Float64Array> {
  const { irradiance, temperature } = series;
  const light =
    irradiance.kind === "plane-of-array"
      ? { irradiance: irradiance.values }
      : { global: irradiance.global, directNormal: irradiance.directNormal, diffuse: irradiance.diffuse };
  const warmth =
    temperature.kind === "cell"
      ? { cellTemperature: temperature.values }
      : { ambientTemperature: temperature.values, windSpeed: temperature.windSpeed };
  const present = Object.entries({ ...light, ...warmth }).filter((entry) => entry[1] != null);
  return Object.fromEntries(present) as Record<string, Float64Array>;
}

function inRange(value: number, lowest: number, highest: number, name: string): void {
  if (value >= lowest && value <= highest) return;
  throw new ClimateError("site-out-of-range", `${name} is ${value}; it lies between ${lowest} and ${highest}.`, name);
}

function checkSite(site: Site): void {
  inRange(site.latitude, -90, 90, "latitude");
  inRange(site.longitude, -180, 180, "longitude");
  inRange(site.elevation, -500, 9000, "elevation");
  inRange(site.tilt, 0, 180, "tilt");
  inRange(site.azimuth, 0, 360, "azimuth");
  inRange(site.albedo, 0, 1, "albedo");
}

/** Index of the first value outside [lowest, highest], -1 where there is none; NaN is a missing sample and passes. */
function firstOutside(column: Float64Array, lowest: number, highest: number): number {
  for (let i = 0; i < column.length; i++) if (column[i] < lowest || column[i] > highest) return i;
  return -1;
}

function checkValues(name: string, column: Float64Array): void {
  if (IRRADIANCES.includes(name)) {
    const at = firstOutside(column, LOWEST_IRRADIANCE, HIGHEST_IRRADIANCE);
    if (at >= 0)
      throw new ClimateError(
        "irradiance-out-of-range",
        `${name} is ${column[at]} W/m2 at sample ${at}; it lies between ${LOWEST_IRRADIANCE} and ${HIGHEST_IRRADIANCE}.`,
        name,
        at,
      );
  } else if (name === "windSpeed") {
    const at = firstOutside(column, 0, HIGHEST_WIND);
    if (at >= 0)
      throw new ClimateError(
        "wind-out-of-range",
        `${name} is ${column[at]} m/s at sample ${at}; it lies between 0 and ${HIGHEST_WIND}.`,
        name,
        at,
      );
  } else {
    const at = firstOutside(column, -Number.MAX_VALUE, Number.MAX_VALUE);
    if (at >= 0) throw new ClimateError("not-finite", `${name} is not finite at sample ${at}.`, name, at);
  }
}

/**
 * The columns of a series by name (`irradiance` | `global`, `directNormal`, `diffuse`; `cellTemperature` |
 * `ambientTemperature`, `windSpeed`), once each is known to be sound.
 *
 * Throws {@link ClimateError} for an empty series, unequal lengths, a step that is not positive, a site outside the
 * globe, irradiance outside -10 to 2000 W/m2, wind outside 0 to 115 m/s and infinite values. NaN passes: a missing sample.
 */
export function checkedColumns(series: ClimateSeries): Record<string, Float64Array> {
  if (!(series.step > 0 && series.step < Number.POSITIVE_INFINITY))
    throw new ClimateError("step-out-of-range", `The step is ${series.step} s; it must be positive.`, "step");
  if (series.irradiance.kind === "horizontal") checkSite(series.irradiance.site);
  const columns = columnsOf(series);
  const [[first, { length }]] = Object.entries(columns);
  if (length === 0) throw new ClimateError("empty-series", "The series has no samples.", first);
  for (const [name, column] of Object.entries(columns)) {
    if (column.length !== length)
      throw new ClimateError(
        "column-length",
        `${name} has ${column.length} samples, ${first} has ${length}; all columns need the same number.`,
        name,
      );
    checkValues(name, column);
  }
  return columns;
}
