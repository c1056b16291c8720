import { relativeAirMass } from "./air-mass.ts";
import type { Site } from "./climate-series.ts";
import { extraterrestrialNormal } from "./extraterrestrial-irradiance.ts";
import type { Completion, HorizontalSample } from "./horizontal-components.ts";
import { cosIncidence, plane } from "./plane.ts";
import { planeOfArrayIrradiance, SKY_MODELS, type SkyModel } from "./plane-of-array.ts";
import { airBending, liftByRefraction, standardPressure } from "./refraction.ts";
import { darkSky } from "./sky.ts";
import type { SunTrack } from "./sun-track.ts";

/** Horizontal columns of equal length, W/m2; a quantity the completion does not read may be any column. */
export interface HorizontalColumns {
  global: Float64Array;
  direct: Float64Array;
  diffuse: Float64Array;
}

/** Night readings of a few W/m2 below zero count as none; NaN stays. */
function lit(value: number): number {
  return Math.max(value, 0);
}

/**
 * Irradiance on the modules' plane, W/m2, sample by sample, from horizontal columns and the sun's track (same length).
 *
 * The sun is lifted by refraction at the site's standard pressure. Negative readings count as 0; NaN in a column that the
 * completion reads gives NaN; empty in, empty out. Sources: those of the sky model, of the completion and of the track.
 */
export function planeOfArraySeries(
  given: HorizontalColumns,
  complete: Completion,
  track: SunTrack,
  at: { site: Site; skyModel: SkyModel },
): Float64Array {
  const { site } = at;
  const out = new Float64Array(track.up.length);
  const pressure = standardPressure(site.elevation);
  const bending = airBending(pressure);
  const on = plane(site.tilt, site.azimuth);
  const skyDiffuse = SKY_MODELS[at.skyModel];
  const sky = darkSky();
  const sun = { east: 0, north: 0, up: 0, distance: 1 };
  const sample: HorizontalSample = { global: 0, direct: 0, diffuse: 0 };
  for (let i = 0; i < out.length; i++) {
    sample.global = lit(given.global[i]);
    sample.direct = lit(given.direct[i]);
    sample.diffuse = lit(given.diffuse[i]);
    if (sample.global === 0 && sample.direct === 0 && sample.diffuse === 0) continue;
    sun.east = track.east[i];
    sun.north = track.north[i];
    sun.up = track.up[i];
    sky.airMass = relativeAirMass(sun.up);
    sky.zenith = liftByRefraction(sun, bending);
    sky.cosZenith = sun.up;
    sky.extraterrestrial = extraterrestrialNormal(track.distance[i]);
    sky.cosIncidence = cosIncidence(sun, on);
    complete(sample, pressure, sky);
    out[i] = planeOfArrayIrradiance(sky, on, site.albedo, skyDiffuse);
  }
  return out;
}
