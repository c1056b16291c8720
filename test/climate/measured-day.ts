import { existsSync, readFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import type { ClimateSeries, Site } from "../../service/climate/climate-series.ts";

const FOLDER = fileURLToPath(new URL("../../../shared/measured", import.meta.url));

/** The measured days (NOAA SURFRAD, Augustine et al., Bull. Amer. Meteor. Soc. 81 (2000) 2341) are read in place. */
export const measuredDaysArePresent = existsSync(`${FOLDER}/day-a.dat`) && existsSync(`${FOLDER}/day-b.dat`);

/** One measured day of one-minute means. */
export interface MeasuredDay {
  site: Site;
  /** Stamp of the first row, the END of its minute, UTC milliseconds. */
  firstStamp: number;
  zenith: Float64Array;
  global: Float64Array;
  directNormal: Float64Array;
  diffuse: Float64Array;
  air: Float64Array;
  wind: Float64Array;
}

/** Reads day "a" or "b"; missing values (-9999.9) become NaN. */
export function readMeasuredDay(name: "a" | "b"): MeasuredDay {
  const [, place, ...lines] = readFileSync(`${FOLDER}/day-${name}.dat`, "utf8").split("\n");
  const [latitude, longitude, elevation] = place.trim().split(/\s+/).map(Number);
  const rows = lines.filter((line) => line.trim() !== "").map((line) => line.trim().split(/\s+/).map(Number));
  const column = (n: number) => Float64Array.from(rows, (row) => (row[n - 1] < -9000 ? Number.NaN : row[n - 1]));
  const [year, , month, day, hour, minute] = rows[0];
  return {
    site: { latitude, longitude, elevation, tilt: 30, azimuth: 180, albedo: 0.2 },
    firstStamp: Date.UTC(year, month - 1, day, hour, minute),
    zenith: column(8),
    global: column(9),
    directNormal: column(13),
    diffuse: column(15),
    air: column(39),
    wind: column(43),
  };
}

function means(column: Float64Array, minutes: number): Float64Array {
  const count = Math.floor(column.length / minutes);
  return Float64Array.from(
    { length: count },
    (_, i) => column.subarray(i * minutes, (i + 1) * minutes).reduce((a, b) => a + b) / minutes,
  );
}

/** The day as a climate of means over `minutes`, stamped at the start of each. */
export function measuredClimate(day: MeasuredDay, minutes = 1): ClimateSeries {
  const per = (column: Float64Array) => (minutes === 1 ? column : means(column, minutes));
  return {
    start: day.firstStamp - 60_000,
    utcOffset: 0,
    step: 60 * minutes,
    timing: "mean",
    irradiance: {
      kind: "horizontal",
      global: per(day.global),
      directNormal: per(day.directNormal),
      diffuse: per(day.diffuse),
      site: day.site,
    },
    temperature: { kind: "ambient", values: per(day.air), windSpeed: per(day.wind) },
  };
}
