import type { CellTemperatureModel } from "./cell-temperature.ts";
import { cellTemperatures } from "./cell-temperature.ts";

/** Equally spaced samples of irradiance and temperature, as they were given; every column of shape [n], NaN: missing. */
export interface ClimateSeries {
  /** Start of the first sample, ms since 1970-01-01 UTC. */
  start: number;
  /** Offset of the start's clock from UTC, ms; months follow it. */
  utcOffset: number;
  /** s. */
  step: number;
  /** Each sample is the mean over its step, or the value at its start. */
  timing: "mean" | "instant";
  gaps: "refuse" | "skip";
  irradiance: { kind: "plane-of-array"; values: Float64Array };
  temperature:
    | { kind: "cell"; values: Float64Array }
    | { kind: "ambient"; values: Float64Array; windSpeed: Float64Array | null; model: CellTemperatureModel };
}

/** A climate as the array feels it, every column of shape [n]. */
export interface PreparedClimate {
  /** Plane of array, W/m2; night readings below 0 count as 0. */
  irradiance: Float64Array;
  /** degC. */
  cellTemperature: Float64Array;
  /** 1 where a sample is missing and left out of every sum; null when none is. */
  skipped: Uint8Array | null;
  /** Coldest temperature given, night included, degC: ambient where known, else the cell's. */
  coldest: number;
  /** What was assumed, by code. */
  assumptions: Assumption[];
}

/** Something the series did not say. */
export type Assumption = "wind-speed";

/** Wind speed taken where none is given, m/s: that of the NOCT conditions (IEC 61215). */
export const ASSUMED_WIND = 1;

/** The number of samples. */
export function sampleCount(series: ClimateSeries): number {
  return series.irradiance.values.length;
}

/** Irradiance on the modules and their cell temperature from a series; the series is left as it is. */
export function prepareClimate(series: ClimateSeries): PreparedClimate {
  const { temperature } = series;
  const irradiance = series.irradiance.values.map((value) => Math.max(0, value));
  const assumptions: Assumption[] = [];
  let cellTemperature = temperature.values;
  let skipped = missing(irradiance, temperature.values);
  if (temperature.kind === "ambient") {
    if (temperature.windSpeed === null && temperature.model.kind !== "noct") assumptions.push("wind-speed");
    const wind = temperature.windSpeed ?? ASSUMED_WIND;
    cellTemperature = cellTemperatures(temperature.model, irradiance, temperature.values, wind);
    skipped = missing(irradiance, cellTemperature);
  }
  let coldest = Number.POSITIVE_INFINITY;
  for (const value of temperature.values) if (value < coldest) coldest = value;
  return { irradiance, cellTemperature, skipped, coldest, assumptions };
}

function missing(irradiance: Float64Array, temperature: Float64Array): Uint8Array | null {
  let skipped: Uint8Array | null = null;
  for (let i = 0; i < irradiance.length; i++) {
    if (!Number.isNaN(irradiance[i]) && !Number.isNaN(temperature[i])) continue;
    skipped ??= new Uint8Array(irradiance.length);
    skipped[i] = 1;
  }
  return skipped;
}
