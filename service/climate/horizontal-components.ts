import { cleanSkyDirect } from "./clean-sky-limit.ts";
import { diffuseFraction } from "./diffuse-fraction.ts";
import { LOWEST_COSINE, type Sky } from "./sky.ts";

/**
 * The three measured quantities of one sample, W/m2: `global` and `diffuse` on the horizontal, `direct` facing the sun.
 */
export interface HorizontalSample {
  global: number;
  direct: number;
  diffuse: number;
}

/** Fills direct and diffuse of a sky (sun already set) from what a sample holds. */
export type Completion = (given: HorizontalSample, pressure: number, sky: Sky) => void;

/**
 * Splits `global` into direct and diffuse so that global = direct cos z + diffuse holds exactly.
 *
 * The direct beam is (global - diffuse)/cos z, a ratio of two small numbers at low sun, where a reading error, a
 * mid-interval sun or an unseen horizon make spikes. Two bounds, and what they cut off stays in the diffuse: cos z is
 * held above cos 85 deg (Perez et al., Solar Energy 44(5) (1990) 271-289, bound their circumsolar ratio so), and the
 * beam below what clean dry air lets through (Kasten 1996). A sun below the horizon makes all of it diffuse.
 */
function split(global: number, diffuse: number, pressure: number, sky: Sky): void {
  const beam = global - diffuse;
  if (sky.cosZenith <= 0 || beam <= 0) {
    sky.direct = 0;
    sky.diffuse = global;
    return;
  }
  const limit = cleanSkyDirect(sky.extraterrestrial, (sky.airMass * pressure) / 1013.25);
  sky.direct = Math.min(beam / Math.max(LOWEST_COSINE, sky.cosZenith), limit);
  sky.diffuse = global - sky.direct * sky.cosZenith;
}

/** From direct and diffuse, taken as they are; a global given besides is the sum of the two and not read. */
export const fromDirectAndDiffuse: Completion = (given, _pressure, sky) => {
  sky.direct = sky.cosZenith > 0 ? given.direct : 0;
  sky.diffuse = given.diffuse;
};

/** From global and diffuse: direct by closure, bounded at low sun; a diffuse above global counts as global. */
export const fromGlobalAndDiffuse: Completion = (given, pressure, sky) => {
  split(given.global, given.diffuse, pressure, sky);
};

/** From global and direct: diffuse by closure; a direct beam that carries more than global is cut to it. */
export const fromGlobalAndDirect: Completion = (given, _pressure, sky) => {
  const { global, direct } = given;
  const carried = sky.cosZenith > 0 ? direct * sky.cosZenith : 0;
  sky.direct = carried > global ? global / sky.cosZenith : carried > 0 ? direct : 0;
  sky.diffuse = Math.max(0, global - carried);
};

/**
 * From global alone: diffuse by Erbs, Klein & Duffie 1982. The clearness index takes cos z above cos 85 deg, as the
 * split does, so that a trace of light at the horizon counts as diffuse and not as a clear sky.
 */
export const fromGlobal: Completion = (given, pressure, sky) => {
  const horizontal = sky.extraterrestrial * Math.max(LOWEST_COSINE, sky.cosZenith);
  split(given.global, given.global * diffuseFraction(given.global / horizontal), pressure, sky);
};
