import type { WeatherRecord } from "./weather-record.ts";

/** sin 5 deg: closure is looked at with the sun at least this high. */
const LOW_SUN = 0.0872;
/** Samples with less light than this (W/m2, direct cos z + diffuse) are not looked at: Long & Shi 2008 (from memory). */
const DIM = 50;
/** A sample closes within this, W/m2 (physics of the measured days), or share of the sum (Long & Shi's for low sun). */
const WITHIN = 25;
const WITHIN_SHARE = 0.15;
/** A direct beam worth fitting, W/m2. */
const BEAM = 50;

/** How well three horizontal columns close, global = direct cos z + diffuse. */
export interface Closure {
  /** Samples looked at, and the share of them that does not close. */
  samples: number;
  open: number;
  /** Mean of global - (direct cos z + diffuse), W/m2. */
  bias: number;
}

/** The columns of a sample in the order global, direct, diffuse. */
export type ThreeColumns = readonly [Float64Array, Float64Array, Float64Array];

/**
 * How many samples fail to close within 25 W/m2 or 15 % of direct cos z + diffuse (or of global, if more), sun
 * 5 degrees up or more. `flat` takes the direct column as already on the horizontal. NaN samples are left out; none looked at: open and bias 0.
 *
 * The closure test of Long & Shi, Open Atmospheric Science Journal 2 (2008) 23-37 (8 %, at low sun
 * 15 %; from memory), with the wider of its limits throughout: hourly means close less well than minutes.
 */
export function closure(record: WeatherRecord, columns: ThreeColumns, flat = false): Closure {
  const [global, direct, diffuse] = columns;
  let samples = 0;
  let open = 0;
  let bias = 0;
  for (let i = 0; i < global.length; i++) {
    const height = record.sun.up[i];
    if (height < LOW_SUN) continue;
    const sum = direct[i] * (flat ? 1 : height) + diffuse[i];
    const rest = global[i] - sum;
    if (!(Math.max(sum, global[i]) > DIM) || Number.isNaN(rest)) continue;
    samples++;
    bias += rest;
    if (Math.abs(rest) > Math.max(WITHIN, WITHIN_SHARE * Math.max(sum, global[i]))) open++;
  }
  return samples === 0 ? { samples, open: 0, bias: 0 } : { samples, open: open / samples, bias: bias / samples };
}

/** The time shift at which three columns close best. */
export interface ClosureShift {
  /** Minutes, positive: the readings come later than the sun. */
  minutes: number;
  /** Scatter of what stays open at that shift and at none, W/m2, each about its own mean. */
  scatter: number;
  scatterUnshifted: number;
  /** The diurnal part of the beam as a multiple of what it should be. */
  amplitude: number;
}

/** Solves the symmetric 3 x 3 system by elimination; NaN or Infinity where it is singular. */
function solveThree(m: readonly number[], r: readonly number[]): [number, number, number] {
  const [a, b, c, d, e, f] = m; // a b c / b d e / c e f
  const d1 = d - (b * b) / a;
  const e1 = e - (b * c) / a;
  const f1 = f - (c * c) / a - (e1 * e1) / d1;
  const r1 = r[1] - (b * r[0]) / a;
  const z = (r[2] - (c * r[0]) / a - (e1 * r1) / d1) / f1;
  const y = (r1 - e1 * z) / d1;
  return [(r[0] - b * y - c * z) / a, y, z];
}

/**
 * Finds the shift s at which global - diffuse = direct cos z(t - s) + constant fits best; null with too little beam, or
 * with a tenth or less of it on either side of noon.
 *
 * cos z(t - s) = sin phi sin dec + cos phi cos dec (cos H cos ws + sin H sin ws) is linear in cos ws and sin ws, so one pass
 * of least squares finds any shift exactly; the amplitude stays free and tells a shift from something else. Good to some
 * 3 minutes on one measured clear day (radiometers lean and warm up); our own use of the closure relation.
 */
export function closureShift(record: WeatherRecord, columns: ThreeColumns): ClosureShift | null {
  const [global, direct, diffuse] = columns;
  const { sun, place } = record;
  const m = [0, 0, 0, 0, 0, 0];
  const r = [0, 0, 0];
  const side = [0, 0];
  const rest = { sum: 0, squares: 0, own: 0 };
  for (let i = 0; i < global.length; i++) {
    const beam = direct[i];
    const missing = global[i] - diffuse[i];
    if (!(beam > BEAM) || Number.isNaN(missing)) continue;
    const x = place.cosLatitude * sun.up[i] - place.sinLatitude * sun.north[i]; // cos dec cos H
    const pole = place.sinLatitude * sun.up[i] + place.cosLatitude * sun.north[i]; // sin dec
    const p = beam * place.cosLatitude * x;
    const q = -beam * place.cosLatitude * sun.east[i];
    const y = missing - beam * place.sinLatitude * pole;
    m[0] += p * p;
    m[1] += p * q;
    m[2] += p;
    m[3] += q * q;
    m[4] += q;
    m[5] += 1;
    r[0] += p * y;
    r[1] += q * y;
    r[2] += y;
    rest.own += y * y;
    rest.sum += y - p;
    rest.squares += (y - p) * (y - p);
    side[q > 0 ? 1 : 0] += beam;
  }
  const n = m[5];
  if (n < 6 || Math.min(side[0], side[1]) <= 0.1 * (side[0] + side[1])) return null;
  const [c, s, offset] = solveThree(m, r);
  const left = (rest.own - c * r[0] - s * r[1] - offset * r[2]) / n;
  return {
    minutes: (Math.atan2(s, c) * 720) / Math.PI,
    scatter: Math.sqrt(Math.max(0, left)),
    scatterUnshifted: Math.sqrt(Math.max(0, rest.squares / n - (rest.sum / n) * (rest.sum / n))),
    amplitude: Math.hypot(c, s),
  };
}
