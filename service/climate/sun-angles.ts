/**
 * The angles the PSA algorithm is made of: all are linear in time, so a series turns them by a constant step instead of
 * taking sines and cosines anew.
 *
 * Blanco-Muriel et al., Solar Energy 70(5) (2001) 431-441; coefficients of the 2020 update, Blanco et al., Solar Energy
 * 212 (2020) 339-341, fitted to 2020-2050.
 */
const J2000_NOON = 946_728_000_000; // 2000-01-01T12:00Z, UTC milliseconds
const HOUR = 3_600_000;
const DAY = 24 * HOUR;
const HOUR_ANGLE = Math.PI / 12; // radians in an hour

const NODE_RATE = -9.300339267e-4;
const LONGITUDE_RATE = 0.01720279602;
const ANOMALY_RATE = 0.01720200135;
const SIDEREAL_EXCESS = 0.06570984737; // hours in a day, beyond the day's 24

/** Sines and cosines of PSA's angles at one instant, and the days since J2000.0 noon. */
export interface SunAngles {
  days: number;
  sinNode: number;
  cosNode: number;
  sinLongitude: number;
  cosLongitude: number;
  sinAnomaly: number;
  cosAnomaly: number;
  sinSidereal: number;
  cosSidereal: number;
}

/** Angles of no instant yet, to be set by {@link setSunAngles}. */
export function emptySunAngles(): SunAngles {
  return {
    days: 0,
    sinNode: 0,
    cosNode: 1,
    sinLongitude: 0,
    cosLongitude: 1,
    sinAnomaly: 0,
    cosAnomaly: 1,
    sinSidereal: 0,
    cosSidereal: 1,
  };
}

/**
 * Sets `angles` to the instant `utc` (UTC milliseconds since 1970, standing for universal time) at an east-positive
 * `longitude` in radians; the sidereal angle is the local one. NaN or Infinity make every member NaN.
 */
export function setSunAngles(utc: number, longitude: number, angles: SunAngles): void {
  const n = (utc - J2000_NOON) / DAY;
  const hours = (utc % DAY) / HOUR;
  const node = 2.267127827 + NODE_RATE * n;
  const meanLongitude = 4.895036035 + LONGITUDE_RATE * n;
  const anomaly = 6.239468336 + ANOMALY_RATE * n;
  const sidereal = (6.697096103 + SIDEREAL_EXCESS * n + hours) * HOUR_ANGLE + longitude;
  angles.days = n;
  angles.sinNode = Math.sin(node);
  angles.cosNode = Math.cos(node);
  angles.sinLongitude = Math.sin(meanLongitude);
  angles.cosLongitude = Math.cos(meanLongitude);
  angles.sinAnomaly = Math.sin(anomaly);
  angles.cosAnomaly = Math.cos(anomaly);
  angles.sinSidereal = Math.sin(sidereal);
  angles.cosSidereal = Math.cos(sidereal);
}

/** How far each angle turns in `milliseconds`, in the form {@link turnSunAngles} takes; 0 turns nothing. */
export function sunAnglesStep(milliseconds: number): SunAngles {
  const n = milliseconds / DAY;
  const sidereal = (SIDEREAL_EXCESS * n + (n % 1) * 24) * HOUR_ANGLE;
  return {
    days: n,
    sinNode: Math.sin(NODE_RATE * n),
    cosNode: Math.cos(NODE_RATE * n),
    sinLongitude: Math.sin(LONGITUDE_RATE * n),
    cosLongitude: Math.cos(LONGITUDE_RATE * n),
    sinAnomaly: Math.sin(ANOMALY_RATE * n),
    cosAnomaly: Math.cos(ANOMALY_RATE * n),
    sinSidereal: Math.sin(sidereal),
    cosSidereal: Math.cos(sidereal),
  };
}

/** Turns `angles` on by `step`, in place; each turn adds a rounding error of about 2e-16 to every member. */
export function turnSunAngles(angles: SunAngles, step: SunAngles): void {
  const { sinNode, sinLongitude, sinAnomaly, sinSidereal } = angles;
  angles.days += step.days;
  angles.sinNode = sinNode * step.cosNode + angles.cosNode * step.sinNode;
  angles.cosNode = angles.cosNode * step.cosNode - sinNode * step.sinNode;
  angles.sinLongitude = sinLongitude * step.cosLongitude + angles.cosLongitude * step.sinLongitude;
  angles.cosLongitude = angles.cosLongitude * step.cosLongitude - sinLongitude * step.sinLongitude;
  angles.sinAnomaly = sinAnomaly * step.cosAnomaly + angles.cosAnomaly * step.sinAnomaly;
  angles.cosAnomaly = angles.cosAnomaly * step.cosAnomaly - sinAnomaly * step.sinAnomaly;
  angles.sinSidereal = sinSidereal * step.cosSidereal + angles.cosSidereal * step.sinSidereal;
  angles.cosSidereal = angles.cosSidereal * step.cosSidereal - sinSidereal * step.sinSidereal;
}
