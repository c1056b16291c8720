import type { Circuit } from "./circuit.ts";

const MAXIMUM_STEPS = 64;
/** A Halley step this small, in units of a, leaves an error below 1e-13 a (cubic convergence). */
const LAST_STEP = 1e-4;
/** Above this I0/IL the diode's current is taken as I0 (e^{x/a} - 1), lest the difference lose digits. */
const HOT = 1e-3;

/**
 * Current (A) at terminal voltage `voltage` (V): the root x of x - V - Rs I(x) = 0, then I(x).
 *
 * Negative beyond the open-circuit voltage; -Infinity where a circuit without series resistance overflows there.
 * Accuracy: |I - I(V + I Rs)| within 1e-12 IL. At most 64 Halley steps; 2 or 3 are usual.
 */
export function currentAt(circuit: Circuit, voltage: number): number {
  const { logSaturationCurrent, idealityVoltage: a, seriesResistance, shuntConductance } = circuit;
  if (circuit.saturationCurrent > HOT * circuit.photocurrent) return hotCurrentAt(circuit, voltage);
  const source = circuit.photocurrent + circuit.saturationCurrent;
  if (seriesResistance === 0) {
    return source - Math.exp(logSaturationCurrent + voltage / a) - shuntConductance * voltage;
  }
  let x = voltage + seriesResistance * source;
  let diode = Math.exp(logSaturationCurrent + x / a);
  // Far beyond open circuit the diode can carry no more than the light and what the terminals drive in.
  const reach = source + Math.max(0, voltage) / seriesResistance;
  if (diode > reach) {
    x = a * (Math.log(reach) - logSaturationCurrent);
    diode = reach;
  }
  for (let step = 0; step < MAXIMUM_STEPS; step++) {
    const slope = 1 + seriesResistance * (diode / a + shuntConductance);
    const newton = (x - voltage - seriesResistance * (source - diode - shuntConductance * x)) / slope;
    const change = newton / Math.max(0.5, 1 - (0.5 * newton * seriesResistance * diode) / (a * a * slope));
    x -= change;
    const u = change / a;
    if (Math.abs(u) <= LAST_STEP) {
      // The exponential at the new x by its series: the next term is below 5e-18 of it.
      diode *= 1 - u * (1 - u * (0.5 - u / 6));
      break;
    }
    diode = Math.exp(logSaturationCurrent + x / a);
  }
  return source - diode - shuntConductance * x;
}

/** `currentAt` where the saturation current is not small beside the light's: hot cells in the dimmest light. */
function hotCurrentAt(circuit: Circuit, voltage: number): number {
  const { photocurrent, saturationCurrent, idealityVoltage: a, seriesResistance, shuntConductance } = circuit;
  const currentThrough = (x: number): number =>
    photocurrent - saturationCurrent * Math.expm1(x / a) - shuntConductance * x;
  if (seriesResistance === 0) return currentThrough(voltage);
  const reach = photocurrent + saturationCurrent + Math.max(0, voltage) / seriesResistance;
  let x = voltage + seriesResistance * photocurrent;
  if (saturationCurrent * Math.exp(x / a) > reach) x = a * Math.log(reach / saturationCurrent);
  for (let step = 0; step < MAXIMUM_STEPS; step++) {
    const slope = 1 + seriesResistance * ((saturationCurrent * Math.exp(x / a)) / a + shuntConductance);
    const change = (x - voltage - seriesResistance * currentThrough(x)) / slope;
    x -= change;
    if (Math.abs(change) <= 1e-16 * Math.abs(x)) break;
  }
  return currentThrough(x);
}

/**
 * dP/dV (A) at terminal voltage `voltage` (V) of a lit circuit, from the exact derivative of the implicit equation:
 * I + V dI/dV with dI/dV = -g/(1 + Rs g), g = I0 e^{x/a}/a + 1/Rsh. Accuracy as `currentAt`.
 */
export function powerSlopeAt(circuit: Circuit, voltage: number): number {
  const { logSaturationCurrent, idealityVoltage: a, seriesResistance, shuntConductance } = circuit;
  const current = currentAt(circuit, voltage);
  const diode = Math.exp(logSaturationCurrent + (voltage + seriesResistance * current) / a);
  const conductance = diode / a + shuntConductance;
  return current - (voltage * conductance) / (1 + seriesResistance * conductance);
}

/** Short-circuit current, A: the current at 0 V. 0 in the dark. Accuracy as `currentAt`. */
export function shortCircuitCurrent(circuit: Circuit): number {
  return circuit.photocurrent > 0 ? currentAt(circuit, 0) : 0;
}

/** Power (W) at terminal voltage `voltage` (V); 0 in the dark, at 0 V and beyond the open-circuit voltage. */
export function powerAt(circuit: Circuit, voltage: number): number {
  if (circuit.photocurrent <= 0 || voltage <= 0) return 0;
  return Math.max(0, voltage * currentAt(circuit, voltage));
}

/**
 * Currents at many voltages of one circuit.
 * @param voltage terminal voltages, V, shape [n]
 * @param current receives the currents, A, shape [n]
 */
export function currentsAt(circuit: Circuit, voltage: Float64Array, current: Float64Array): void {
  for (let i = 0; i < voltage.length; i++) current[i] = currentAt(circuit, voltage[i]);
}
