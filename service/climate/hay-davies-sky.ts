import { circumsolarSky } from "./circumsolar-sky.ts";
import type { Plane } from "./plane.ts";
import type { Sky } from "./sky.ts";

/**
 * Diffuse irradiance on the plane, W/m2: the share direct/extraterrestrial comes from around the sun, the rest evenly.
 *
 * Hay & Davies 1980 (Proc. First Canadian Solar Radiation Data Workshop, 59-72; from memory). The share is held to
 * [0, 1]; an anisotropy of 0 is the even sky. NaN goes through.
 */
export function hayDaviesSky(sky: Sky, on: Plane): number {
  const share = sky.extraterrestrial > 0 ? Math.min(1, Math.max(0, sky.direct / sky.extraterrestrial)) : 0;
  return circumsolarSky(share, sky, on);
}
