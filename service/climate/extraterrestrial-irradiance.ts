/** Nominal total solar irradiance at one astronomical unit, W/m2 (IAU 2015 Resolution B3; from memory). */
export const SOLAR_CONSTANT = 1361;

/**
 * Earth to sun, astronomical units, from sine and cosine of the sun's mean anomaly g.
 *
 * R = 1.00014 - 0.01671 cos g - 0.00014 cos 2g, low-precision formula of the Astronomical Almanac (from memory): within
 * 1e-4 between 1950 and 2050. NaN goes through.
 */
export function sunDistance(sinG: number, cosG: number): number {
  return 1.00014 - 0.01671 * cosG - 0.00014 * (cosG * cosG - sinG * sinG);
}

/**
 * Irradiance outside the atmosphere on a plane facing the sun, W/m2, at a distance in astronomical units: the solar
 * constant over the distance squared. A distance of 0 gives Infinity; NaN goes through.
 */
export function extraterrestrialNormal(distance: number, solarConstant = SOLAR_CONSTANT): number {
  return solarConstant / (distance * distance);
}
