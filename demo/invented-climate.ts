import type { LandingStage } from "./landing-stages.ts";

const HOURS = 8760;
const RADIAN = Math.PI / 180;

/** An invented hourly year, each column of shape [8760]. */
export interface InventedClimate {
  /** Plane of array, W/m2. */
  irradiance: Float64Array;
  /** degC. */
  airTemperature: Float64Array;
  /** m/s. */
  windSpeed: Float64Array;
}

/**
 * An hourly year for a landing stage, made up from a seed: a sun on a circle, cloud cover that lingers, air that warms
 * with season, hour and sun. Plausible, and nothing more: no measured place is meant.
 */
export function inventedClimate(stage: LandingStage, seed: number): InventedClimate {
  const random = seededRandom(seed);
  const irradiance = new Float64Array(HOURS);
  const airTemperature = new Float64Array(HOURS);
  const windSpeed = new Float64Array(HOURS);
  let cover = stage.cloudiness;
  for (let hour = 0; hour < HOURS; hour++) {
    cover = lingering(cover, stage.cloudiness, random);
    irradiance[hour] = round(planeOfArray(stage, hour, cover), 1);
    const season = -Math.cos((2 * Math.PI * (hour / 24 - 20)) / 365);
    const daytime = -Math.cos((2 * Math.PI * ((hour % 24) - 3)) / 24);
    const weather = 3 * (random() - 0.5);
    const swing = stage.seasonalSwing * season + stage.dailySwing * (1 - 0.6 * cover) * daytime;
    airTemperature[hour] = round(stage.meanTemperature + swing + weather, 1);
    windSpeed[hour] = round(stage.wind * (0.4 + 1.2 * random()), 1);
  }
  return { irradiance, airTemperature, windSpeed };
}

/** Cloud cover an hour later: most of the old, a pull to the mean, and chance. */
function lingering(cover: number, mean: number, random: () => number): number {
  const next = 0.88 * cover + 0.12 * mean + 0.34 * (random() - 0.5);
  return Math.min(1, Math.max(0, next));
}

/** Irradiance on the tilted roof in the middle of an hour of the year, W/m2. */
function planeOfArray(stage: LandingStage, hour: number, cover: number): number {
  const declination = -23.45 * RADIAN * Math.cos((2 * Math.PI * (hour / 24 + 10)) / 365);
  const angle = ((hour % 24) + 0.5 - 12) * 15 * RADIAN;
  const elevationOn = (latitude: number): number =>
    Math.sin(latitude) * Math.sin(declination) + Math.cos(latitude) * Math.cos(declination) * Math.cos(angle);
  const height = elevationOn(stage.latitude * RADIAN);
  if (height <= 0) return 0;
  const incidence = Math.max(0, elevationOn((stage.latitude - stage.tilt) * RADIAN));
  const beam = 1060 * Math.exp(-0.16 / (height + 0.05)) * (1 - cover) ** 2;
  const diffuse = 1000 * height * (0.1 + 0.32 * cover - 0.22 * cover * cover);
  return beam * incidence + diffuse;
}

/** A small generator of equally likely numbers in [0, 1): a 32-bit mixing counter. */
function seededRandom(seed: number): () => number {
  let state = seed | 0;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
}

function round(value: number, decimals: number): number {
  const scale = 10 ** decimals;
  return Math.round(value * scale) / scale;
}
