import { RADIANS, type SunDirection } from "./sun-position.ts";

/** The modules' plane: its normal in east, north, up, and how much of sky and ground it sees. */
export interface Plane {
  readonly east: number;
  readonly north: number;
  readonly up: number;
  readonly sinTilt: number;
  /** (1 + cos tilt)/2 and (1 - cos tilt)/2: shares of an even sky and of an even ground. */
  readonly skyView: number;
  readonly groundView: number;
}

/** The plane tilted by `tilt` from the horizontal towards `azimuth` (clockwise from north), degrees; NaN goes through. */
export function plane(tilt: number, azimuth: number): Plane {
  const cosTilt = Math.cos(tilt * RADIANS);
  const sinTilt = Math.sin(tilt * RADIANS);
  return {
    east: sinTilt * Math.sin(azimuth * RADIANS),
    north: sinTilt * Math.cos(azimuth * RADIANS),
    up: cosTilt,
    sinTilt,
    skyView: (1 + cosTilt) / 2,
    groundView: (1 - cosTilt) / 2,
  };
}

/**
 * Cosine of the angle between the sun's direction and the plane's normal: their scalar product, negative behind the plane.
 *
 * Exact; e.g. Duffie & Beckman, 4th ed. 2013, eq. 1.6.2. NaN goes through.
 */
export function cosIncidence(sun: SunDirection, on: Plane): number {
  return sun.east * on.east + sun.north * on.north + sun.up * on.up;
}
