import type { Plane } from "./plane.ts";
import type { Sky } from "./sky.ts";

/**
 * Diffuse irradiance on the plane, W/m2, from an even sky: D (1 + cos tilt)/2. NaN goes through.
 *
 * Liu & Jordan, Solar Energy 7 (1963) 53-74 (from memory).
 */
export function isotropicSky(sky: Sky, on: Plane): number {
  return sky.diffuse * on.skyView;
}
