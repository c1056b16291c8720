import { RADIANS, type SunDirection } from "./sun-position.ts";

/** Below this airless elevation, degrees, the whole disc is under the horizon even when lifted (Reda & Andreas 2004). */
const UNSEEN = -(0.26667 + 0.5667);

/**
 * Air pressure, hPa, at an elevation in metres of the standard atmosphere: 1013.25 (1 - 2.25577e-5 h)^5.25588.
 *
 * U.S. Standard Atmosphere 1976, troposphere, to 11 km (from memory). NaN goes through; above 44 km NaN.
 */
export function standardPressure(elevation: number): number {
  return 1013.25 * Math.exp(5.25588 * Math.log(1 - 2.25577e-5 * elevation));
}

/**
 * How strongly air of `pressure` hPa and `temperature` degC bends light: the factor of eq. 42 of Reda & Andreas, Solar
 * Energy 76(5) (2004) 577-589, before the tangent, P/1010 283/(273 + T) 1.02/60, degrees.
 */
export function airBending(pressure: number, temperature = 10): number {
  return ((pressure / 1010) * (283 / (273 + temperature)) * 1.02) / 60;
}

/**
 * How far the air lifts the sun, degrees, at an airless `elevation` in degrees whose tangent is `slope`, for a `bending`
 * of {@link airBending}; 0 where the whole disc is below the horizon.
 *
 * Reda & Andreas 2004, eq. 42: bending/tan(e + 10.3/(e + 5.11)); the tangent of the sum by the addition theorem, that of
 * the small angle to third order (1e-6 deg of lift). NaN goes through; real air near the horizon differs by some
 * hundredths of a degree.
 */
export function refraction(elevation: number, slope: number, bending: number): number {
  if (elevation < UNSEEN) return 0;
  const small = (10.3 * RADIANS) / (elevation + 5.11);
  const tangent = small + (small * small * small) / 3;
  return (bending * (1 - slope * tangent)) / (slope + tangent);
}

/**
 * Turns an airless direction into the apparent one for a `bending` of {@link airBending}, in place, and returns the
 * apparent zenith in radians. A sun below the horizon stays where it is; NaN goes through. Source: {@link refraction}.
 */
export function liftByRefraction(direction: SunDirection, bending: number): number {
  const { east, north, up } = direction;
  const level = Math.sqrt(east * east + north * north);
  const elevation = Math.asin(Math.min(1, up));
  if (level < 1e-6) return Math.PI / 2 - elevation; // straight above (or below), where air bends nothing
  const slope = up / level;
  const lift = refraction(elevation / RADIANS, slope, bending) * RADIANS;
  const cosLift = 1 - 0.5 * lift * lift; // lift stays under 0.013 rad: to 1e-9
  const sinLift = lift * (1 - (lift * lift) / 6);
  const scale = cosLift - slope * sinLift;
  direction.up = up * cosLift + level * sinLift;
  direction.east = east * scale;
  direction.north = north * scale;
  return Math.PI / 2 - elevation - lift;
}
