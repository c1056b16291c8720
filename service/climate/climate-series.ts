import type { CellTemperatureModel } from "./cell-temperature.ts";
import type { GapPolicy } from "./gaps.ts";
import type { SkyModel } from "./plane-of-array.ts";

/** Where the modules stand and how their plane lies. */
export interface Site {
  /** Degrees, north positive. */
  latitude: number;
  /** Degrees, east positive. */
  longitude: number;
  /** Metres above sea level. */
  elevation: number;
  /** Degrees from the horizontal. */
  tilt: number;
  /** Degrees clockwise from north: 180 faces south. */
  azimuth: number;
  /** Share of the global irradiance that the ground throws back. */
  albedo: number;
}

/** Irradiance on the modules' plane, W/m2. */
export interface PlaneOfArrayIrradiance {
  kind: "plane-of-array";
  values: Float64Array;
}

/**
 * Irradiance as weather stations have it, W/m2: global and diffuse on the horizontal, direct facing the sun; global alone
 * or any two are enough.
 */
export interface HorizontalIrradiance {
  kind: "horizontal";
  global?: Float64Array;
  directNormal?: Float64Array;
  diffuse?: Float64Array;
  site: Site;
  /** Default "perez". */
  skyModel?: SkyModel;
}

/** Cell temperature, degC. */
export interface CellTemperatureColumn {
  kind: "cell";
  values: Float64Array;
}

/** Ambient temperature, degC, with wind speed, m/s, where known, and the model that makes cell temperature of them. */
export interface AmbientTemperature {
  kind: "ambient";
  values: Float64Array;
  windSpeed?: Float64Array | null;
  /** Default Faiman 2008. */
  model?: CellTemperatureModel;
  /** Time constant of the module's heat, seconds; none or 0: at rest in every sample. */
  thermalLag?: number;
}

/** A climate: equally spaced samples, SI units, NaN where a sample is missing. */
export interface ClimateSeries {
  /** Start of the first sample, UTC milliseconds since 1970. */
  start: number;
  /** What the caller's clock was ahead of UTC at the start, milliseconds. */
  utcOffset: number;
  /** Seconds from sample to sample. */
  step: number;
  /** "mean": sample i is the mean over [t_i, t_i + step); "instant": the value at t_i. */
  timing: "mean" | "instant";
  irradiance: PlaneOfArrayIrradiance | HorizontalIrradiance;
  temperature: CellTemperatureColumn | AmbientTemperature;
  /** Default "refuse". */
  gaps?: GapPolicy;
}

/** The instant, UTC milliseconds, at which the sun of sample 0 is taken: the middle of a mean, the instant itself. */
export function firstSunInstant(series: ClimateSeries): number {
  return series.timing === "mean" ? series.start + series.step * 500 : series.start;
}

/** Any column of the irradiance: they are all as long as the series. */
export function irradianceColumn({ irradiance }: ClimateSeries): Float64Array {
  if (irradiance.kind === "plane-of-array") return irradiance.values;
  return irradiance.global ?? irradiance.directNormal ?? irradiance.diffuse ?? new Float64Array(0);
}

/** The number of samples. */
export function sampleCount(series: ClimateSeries): number {
  return irradianceColumn(series).length;
}
