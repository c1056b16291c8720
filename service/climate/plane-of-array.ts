import { hayDaviesSky } from "./hay-davies-sky.ts";
import { isotropicSky } from "./isotropic-sky.ts";
import { perezSky } from "./perez-sky.ts";
import type { Plane } from "./plane.ts";
import type { Sky } from "./sky.ts";

/** How the diffuse light is spread over the sky. */
export type SkyModel = "perez" | "hay-davies" | "isotropic";

/** Diffuse irradiance on a plane, W/m2, of a sky. */
export type SkyDiffuse = (sky: Sky, on: Plane) => number;

/** Each sky model's function. */
export const SKY_MODELS: Readonly<Record<SkyModel, SkyDiffuse>> = {
  perez: perezSky,
  "hay-davies": hayDaviesSky,
  isotropic: isotropicSky,
};

/**
 * Irradiance on the modules' plane, W/m2: direct times the cosine of incidence, the sky's diffuse, and the global
 * horizontal irradiance thrown back by a ground of `albedo`, evenly in all directions.
 *
 * Liu & Jordan, Solar Energy 7 (1963) 53-74, for the ground (from memory); the sum as in Duffie & Beckman, 4th ed. 2013,
 * eq. 2.15.1. At tilt 0 it is the global horizontal irradiance. A sun behind the plane or below the horizon sends no
 * direct light. NaN goes through.
 */
export function planeOfArrayIrradiance(sky: Sky, on: Plane, albedo: number, skyDiffuse: SkyDiffuse): number {
  const up = sky.cosZenith > 0;
  const beam = up && sky.cosIncidence > 0 ? sky.direct * sky.cosIncidence : 0;
  const global = up ? sky.direct * sky.cosZenith + sky.diffuse : sky.diffuse;
  return beam + skyDiffuse(sky, on) + albedo * global * on.groundView;
}
