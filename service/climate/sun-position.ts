import { sunDistance } from "./extraterrestrial-irradiance.ts";
import { emptySunAngles, type SunAngles, setSunAngles } from "./sun-angles.ts";

/** Radians in a degree. */
export const RADIANS = Math.PI / 180;

const PARALLAX = 6371.01 / 149_597_890; // mean Earth radius over the mean distance, as printed with PSA
const SIN_OBLIQUITY = Math.sin(0.4090904909);
const COS_OBLIQUITY = Math.cos(0.4090904909);

/** Direction to the sun's centre: a unit vector in the observer's east, north and up, and the sun's distance. */
export interface SunDirection {
  east: number;
  north: number;
  up: number;
  /** Earth to sun, astronomical units. */
  distance: number;
}

/** Zenith and azimuth (clockwise from north, 0 to 360) of the sun's centre, degrees. */
export interface SunPosition {
  zenith: number;
  azimuth: number;
}

/** The observer's place, its trigonometry taken once. */
export interface Observer {
  readonly sinLatitude: number;
  readonly cosLatitude: number;
  /** Radians, east positive. */
  readonly longitude: number;
}

/** The observer at `latitude` and `longitude` in degrees, north and east positive; NaN or Infinity yield NaN directions. */
export function observer(latitude: number, longitude: number): Observer {
  const phi = latitude * RADIANS;
  return { sinLatitude: Math.sin(phi), cosLatitude: Math.cos(phi), longitude: longitude * RADIANS };
}

/**
 * Turns a direction as seen from the equator on the observer's meridian (east = -cos dec sin H, north = sin dec,
 * up = cos dec cos H; H the hour angle, west positive) into the one seen from the observer's latitude, in place.
 *
 * Exact; the zenith formula of every textbook, e.g. Duffie & Beckman, 4th ed. 2013, eq. 1.6.5. NaN goes through.
 */
export function turnToLatitude(direction: SunDirection, place: Observer): void {
  const { north, up } = direction;
  direction.north = place.cosLatitude * north - place.sinLatitude * up;
  direction.up = place.sinLatitude * north + place.cosLatitude * up;
}

/**
 * Lowers the direction by the sun's parallax, z + p sin z, in place: from the earth's centre to the observer.
 *
 * PSA's last step (Blanco-Muriel et al. 2001), with sine and cosine of the shift to second order: exact to 1e-13 rad.
 */
function lowerByParallax(direction: SunDirection): void {
  const { east, north, up } = direction;
  const sinSquared = east * east + north * north;
  const cosShift = 1 - 0.5 * PARALLAX * PARALLAX * sinSquared;
  direction.up = up * cosShift - PARALLAX * sinSquared;
  direction.east = east * (cosShift + PARALLAX * up);
  direction.north = north * (cosShift + PARALLAX * up);
}

/**
 * Writes into `out` the direction of the sun for PSA's `angles` as seen from `place`: topocentric (parallax included),
 * airless (no refraction), and the sun's distance.
 *
 * PSA algorithm, Blanco-Muriel et al., Solar Energy 70(5) (2001) 431-441, coefficients of the 2020 update, Blanco et
 * al., Solar Energy 212 (2020) 339-341: within 0.01 deg of the almanac from 2020 to 2050. The two small angles (what
 * the true longitude has over the mean one, what the obliquity has over its constant) go by series, to 1e-12 rad within
 * 50 years of 2000. NaN goes through; no allocation, no loop.
 */
export function directionFromAngles(angles: SunAngles, place: Observer, out: SunDirection): void {
  const { sinAnomaly, cosAnomaly, sinLongitude, cosLongitude, sinSidereal, cosSidereal } = angles;
  const d =
    0.03338320972 * sinAnomaly +
    2 * 3.497596876e-4 * sinAnomaly * cosAnomaly -
    1.544353226e-4 -
    8.68972936e-6 * angles.sinNode;
  const dd = d * d;
  const sinD = d * (1 - (dd / 6) * (1 - dd / 20));
  const cosD = 1 - (dd / 2) * (1 - (dd / 12) * (1 - dd / 30));
  const sinLambda = sinLongitude * cosD + cosLongitude * sinD;
  const cosLambda = cosLongitude * cosD - sinLongitude * sinD;
  const e = 4.418094944e-5 * angles.cosNode - 6.213605399e-9 * angles.days;
  const y = (COS_OBLIQUITY * (1 - 0.5 * e * e) - SIN_OBLIQUITY * e) * sinLambda;
  out.east = y * cosSidereal - cosLambda * sinSidereal;
  out.north = (SIN_OBLIQUITY * (1 - 0.5 * e * e) + COS_OBLIQUITY * e) * sinLambda;
  out.up = cosLambda * cosSidereal + y * sinSidereal;
  out.distance = sunDistance(sinAnomaly, cosAnomaly);
  turnToLatitude(out, place);
  lowerByParallax(out);
}

/** Writes zenith and azimuth of `direction`, degrees, into `out`; straight up has azimuth 0, NaN gives NaN. */
export function positionOf(direction: SunDirection, out: SunPosition): void {
  const { east, north, up } = direction;
  out.zenith = Math.atan2(Math.sqrt(east * east + north * north), up) / RADIANS;
  const azimuth = Math.atan2(east, north) / RADIANS;
  out.azimuth = azimuth < 0 ? azimuth + 360 : azimuth;
}

/**
 * Zenith and azimuth, degrees, of the sun at `utc` (UTC milliseconds since 1970) seen from `latitude`, `longitude`
 * (degrees, north and east positive): topocentric and airless, with the accuracy and source of
 * {@link directionFromAngles}. NaN or Infinity give NaN. Allocates; a series uses `sunTrack`.
 */
export function sunPosition(utc: number, latitude: number, longitude: number): SunPosition {
  const place = observer(latitude, longitude);
  const angles = emptySunAngles();
  const direction = { east: 0, north: 0, up: 0, distance: 1 };
  const position = { zenith: 0, azimuth: 0 };
  setSunAngles(utc, place.longitude, angles);
  directionFromAngles(angles, place, direction);
  positionOf(direction, position);
  return position;
}
