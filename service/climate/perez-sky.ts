import { circumsolarSky } from "./circumsolar-sky.ts";
import type { Plane } from "./plane.ts";
import type { Sky } from "./sky.ts";

/** Upper ends of the eight classes of sky clearness, the last open. */
const CLEARNESS = [1.065, 1.23, 1.5, 1.95, 2.8, 4.5, 6.2] as const;

/**
 * F11 F12 F13 F21 F22 F23 by class of clearness, flat: Perez et al., Solar Energy 44(5) (1990) 271-289, Table 6, three
 * decimals as printed.
 */
export const BRIGHTNESS_COEFFICIENTS: readonly number[] = [
  ...[-0.008, 0.588, -0.062, -0.06, 0.072, -0.022],
  ...[0.13, 0.683, -0.151, -0.019, 0.066, -0.029],
  ...[0.33, 0.487, -0.221, 0.055, -0.064, -0.026],
  ...[0.568, 0.187, -0.295, 0.109, -0.152, -0.014],
  ...[0.873, -0.392, -0.362, 0.226, -0.462, 0.001],
  ...[1.132, -1.237, -0.412, 0.288, -0.823, 0.056],
  ...[1.06, -1.6, -0.359, 0.264, -1.127, 0.131],
  ...[0.678, -0.327, -0.25, 0.156, -1.377, 0.251],
];

/**
 * Sky clearness: ((D + I)/D + 1.041 z^3)/(1 + 1.041 z^3), z in radians; 1 is overcast. A diffuse of 0 gives Infinity.
 *
 * Perez et al. 1990, eq. 1.
 */
export function skyClearness(sky: Sky): number {
  const cubed = 1.041 * sky.zenith * sky.zenith * sky.zenith;
  return (1 + sky.direct / sky.diffuse + cubed) / (1 + cubed);
}

/** Sky brightness: diffuse times air mass over extraterrestrial, as a fraction. Perez et al. 1990, eq. 2. */
export function skyBrightness(sky: Sky): number {
  return (sky.diffuse * sky.airMass) / sky.extraterrestrial;
}

function clearnessClass(clearness: number): number {
  let k = 0;
  while (k < CLEARNESS.length && clearness >= CLEARNESS[k]) k++;
  return k;
}

/**
 * Diffuse irradiance on the plane, W/m2, for given circumsolar (`f1`) and horizon (`f2`) brightness coefficients; never
 * below 0. With both 0 it is the even sky. Perez et al. 1990, eq. 9; at low sun as {@link circumsolarSky}.
 */
export function perezDiffuse(f1: number, f2: number, sky: Sky, on: Plane): number {
  return Math.max(0, circumsolarSky(f1, sky, on) + sky.diffuse * f2 * on.sinTilt);
}

/**
 * Diffuse irradiance on the plane, W/m2, from a sky with a bright region around the sun and a bright or dark horizon.
 *
 * Perez et al., Solar Energy 44(5) (1990) 271-289, eqs. 1, 2, 6, 7 and 9. No diffuse gives 0; the circumsolar
 * coefficient is never negative, as there. NaN goes through.
 */
export function perezSky(sky: Sky, on: Plane): number {
  if (sky.diffuse <= 0) return 0;
  const at = 6 * clearnessClass(skyClearness(sky));
  const brightness = skyBrightness(sky);
  const f = BRIGHTNESS_COEFFICIENTS;
  const f1 = f[at] + f[at + 1] * brightness + f[at + 2] * sky.zenith;
  const f2 = f[at + 3] + f[at + 4] * brightness + f[at + 5] * sky.zenith;
  return perezDiffuse(Math.max(0, f1), f2, sky, on);
}
