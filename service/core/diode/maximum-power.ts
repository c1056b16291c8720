import type { Circuit } from "./circuit.ts";

/** A voltage (V), a current (A) and their power (W). */
export interface OperatingPoint {
  voltage: number;
  current: number;
  power: number;
}

/** A point to be written into, all 0. Its members begin as fractions, for the reason given at `emptyCircuit`. */
export function emptyPoint(): OperatingPoint {
  const point = { voltage: 0.5, current: 0.5, power: 0.5 };
  point.voltage = point.current = point.power = 0;
  return point;
}

const MAXIMUM_STEPS = 64;
/** A Halley step this small, in units of a, leaves an error below 1e-12 a (cubic convergence). */
const LAST_STEP = 1e-4;
/** Beyond this ln(I0/IL) the power is below 1e-200 W: darkness. */
const DARK = 460;

/** A move, in units of a, over which the exponential is carried on by its series. */
const SMALL_MOVE = 0.1;

/** e^{-u} by its series, within 3e-15 for |u| up to 0.1. */
function shrink(u: number): number {
  return (
    1 -
    u *
      (1 - u * (1 / 2 - u * (1 / 6 - u * (1 / 24 - u * (1 / 120 - u * (1 / 720 - u * (1 / 5040 - u * (1 / 40320))))))))
  );
}

/**
 * Writes the maximum power point of a circuit into `point`; all 0 in the dark.
 *
 * In the reduced junction voltage u = x/a, with currents in units of IL: i(u) = 1 - b (e^u - 1) - h u and
 * v(u) = u - r i(u), where b = I0/IL, r = Rs IL/a, h = a/(Rsh IL). The maximum is the root of (i v)' = 0, which is
 * positive left of it and negative right of it, so a bracket guards every Halley step. The start is the ideal diode's
 * closed form u = W0(e (1 + b)/b) - 1 by its asymptotic series (Corless et al., Adv. Comput. Math. 5 (1996) 329-359,
 * eq. 4.18), where b e^u = (1 + b)/(1 + u) saves the first exponential.
 *
 * Accuracy: power within 1e-14 relative of the true maximum, voltage within 1e-13 relative. At most 64 steps; 2 or 3
 * are usual.
 */
export function maximumPower(circuit: Circuit, point: OperatingPoint): void {
  const { photocurrent, idealityVoltage: a, seriesResistance, shuntConductance } = circuit;
  const logRatio = circuit.logSaturationCurrent - Math.log(photocurrent);
  if (!(photocurrent > 0) || logRatio > DARK) {
    point.voltage = point.current = point.power = 0;
    return;
  }
  const b = circuit.saturationCurrent / photocurrent;
  const r = (seriesResistance * photocurrent) / a;
  const h = (shuntConductance * a) / photocurrent;
  // ln((1 + b)/b) without losing digits where b is large, nor a logarithm where it is small.
  const openCircuit = b < 1e-6 ? b - logRatio : Math.log1p(1 / b);
  const l = 1 + openCircuit;
  const ll = Math.log(l);
  let u = l - ll + ll / l - 1;
  let diode = (1 + b) / (1 + u);
  let low = 0;
  let high = openCircuit;
  let current = 0;
  for (let step = 0; step < MAXIMUM_STEPS; step++) {
    current = 1 + b - diode - h * u;
    const voltage = u - r * current;
    const di = -diode - h;
    const dv = 1 - r * di;
    const slope = di * voltage + current * dv;
    const slope1 = 2 * di * dv - diode * (voltage - r * current);
    const slope2 = -diode * (voltage + 3 * dv - 3 * r * di - r * current);
    // The first exponential is the ideal diode's, not that of this u: it neither brackets nor ends the search.
    if (step > 0 && slope > 0) low = u;
    else if (step > 0) high = u;
    const perSlope = 1 / slope1;
    const newton = slope * perSlope;
    let change = newton / (1 - 0.5 * newton * slope2 * perSlope);
    let next = u - change;
    if (!(next >= low && next <= high)) {
      next = 0.5 * (low + high);
      change = u - next;
    }
    u = next;
    const size = Math.abs(change);
    if (step > 0 && size <= SMALL_MOVE && b <= 1e-3) {
      diode *= shrink(change);
      if (size <= LAST_STEP) break;
    } else {
      diode = b > 1e-3 ? b + b * Math.expm1(u) : Math.exp(u + logRatio);
      if (step > 0 && size <= LAST_STEP) break;
    }
  }
  const junction = b > 1e-3 ? b * Math.expm1(u) : diode - b;
  current = 1 - junction - h * u;
  point.voltage = Math.max(0, (u - r * current) * a);
  point.current = current * photocurrent;
  point.power = point.voltage * point.current;
}
