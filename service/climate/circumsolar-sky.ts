import type { Plane } from "./plane.ts";
import { LOWEST_COSINE, type Sky } from "./sky.ts";

/**
 * Diffuse irradiance on the plane, W/m2, when a `share` of the horizontal diffuse comes from around the sun and the
 * rest from an even sky: D [(1 - share) (1 + cos tilt)/2 + share a/b], a = max(0, cos incidence), b = max(cos 85 deg, cos z).
 *
 * Common to Hay & Davies 1980 (b from Perez) and Perez et al., Solar Energy 44(5) (1990) 271-289, eq. 9 without F2.
 * Below 5 degrees of elevation the bound b takes light from the circumsolar term; it is given to the even sky here
 * (share cos z / b in place of share), so that no light is lost: on the horizontal the result is D at every zenith.
 * A sun below the horizon leaves an even sky. NaN goes through.
 */
export function circumsolarSky(share: number, sky: Sky, on: Plane): number {
  if (sky.cosZenith <= 0) return sky.diffuse * on.skyView;
  const b = Math.max(LOWEST_COSINE, sky.cosZenith);
  const ahead = Math.max(0, sky.cosIncidence);
  return sky.diffuse * ((1 - (share * sky.cosZenith) / b) * on.skyView + (share * ahead) / b);
}
