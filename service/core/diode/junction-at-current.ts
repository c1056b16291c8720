import type { Circuit } from "./circuit.ts";

const MAXIMUM_STEPS = 64;
/** A Halley step this small, in units of a, leaves an error below 1e-13 a (cubic convergence). */
const LAST_STEP = 1e-4;

/**
 * Junction voltage x (V) at which the circuit carries `current` (A): the root of I0 e^{x/a} + x/Rsh = IL + I0 - I.
 *
 * The left side is convex and rises, and the start lies right of the root, so the steps approach it from one side.
 * Accuracy: residual current within 1e-14 (IL + |I|) or 1e-15 x/a of the diode current. At most 64 steps; 2 to 4 are
 * usual. A current beyond IL + I0 needs a negative junction voltage, and -Infinity where there is no shunt to carry it.
 */
export function junctionAtCurrent(circuit: Circuit, current: number): number {
  const { logSaturationCurrent, idealityVoltage: a, shuntConductance } = circuit;
  const through = circuit.photocurrent + circuit.saturationCurrent - current;
  if (through <= 0 && shuntConductance === 0) return Number.NEGATIVE_INFINITY;

  let x = Number.POSITIVE_INFINITY;
  if (through > 0) x = a * (Math.log(through) - logSaturationCurrent);
  if (shuntConductance === 0) return x;
  x = Math.min(x, through / shuntConductance);
  let diode = Math.exp(logSaturationCurrent + x / a);
  for (let step = 0; step < MAXIMUM_STEPS; step++) {
    const slope = diode / a + shuntConductance;
    const newton = (diode + shuntConductance * x - through) / slope;
    const change = newton / Math.max(0.5, 1 - (0.5 * newton * diode) / (a * a * slope));
    x -= change;
    if (Math.abs(change) <= LAST_STEP * a) break;
    diode = Math.exp(logSaturationCurrent + x / a);
  }
  return x;
}

/** Open-circuit voltage, V: where the current is 0. 0 in the dark. Accuracy as `junctionAtCurrent`. */
export function openCircuitVoltage(circuit: Circuit): number {
  return circuit.photocurrent > 0 ? junctionAtCurrent(circuit, 0) : 0;
}

/** Terminal voltage (V) at which the circuit carries `current` (A). Accuracy as `junctionAtCurrent`. */
export function voltageAtCurrent(circuit: Circuit, current: number): number {
  return junctionAtCurrent(circuit, current) - circuit.seriesResistance * current;
}
