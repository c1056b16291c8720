import type { PowerCurve } from "./power-curve.ts";

/** Incremental conductance after Hussein et al. 1995 (from memory): step in V, tolerances of slope and current. */
export interface IncrementalConductance {
  step: number;
  holdTolerance: number;
  currentTolerance: number;
}

const STARTS = 64;
/** Periods kept after the way down is over; any orbit recurs in far fewer. */
const KEPT = 800;

/** Up 1, stay 0, down -1, from the last two periods. */
function decide(of: IncrementalConductance, v1: number, i1: number, v2: number, i2: number): number {
  if (!(i2 > 0)) return -1;
  const moved = v2 !== v1;
  const measure = moved ? 1 + ((v2 / i2) * (i2 - i1)) / (v2 - v1) : (i2 - i1) / i2;
  const tolerance = moved ? of.holdTolerance : of.currentTolerance;
  if (measure > tolerance) return 1;
  return measure < -tolerance ? -1 : 0;
}

/** Sensor errors: reading = true (1 + gain) + offset, then rounded to the resolution (0: not); V and A. */
export interface SensorErrors {
  voltageGain: number;
  voltageOffset: number;
  voltageResolution: number;
  currentGain: number;
  currentOffset: number;
  currentResolution: number;
}

/** Sensors that read the truth. */
export const NO_ERRORS: SensorErrors = {
  voltageGain: 0,
  voltageOffset: 0,
  voltageResolution: 0,
  currentGain: 0,
  currentOffset: 0,
  currentResolution: 0,
};

const rounded = (value: number, resolution: number): number =>
  resolution > 0 ? resolution * Math.round(value / resolution) : value;

/** A climber's next direction from what it reads of the last two periods, and its last direction. */
type Decision = (v1: number, i1: number, v2: number, i2: number, direction: number, cut: boolean) => number;

/** The voltages of the orbit into which a climber falls from `start`, entered all the way down, once each turn. */
function orbitFrom(curve: PowerCurve, decision: Decision, step: number, errors: SensorErrors, start: number): number[] {
  const descent = Math.ceil(start / step) + 200;
  const known = new Map<number, number>();
  const readCurrent = (voltage: number): number => {
    const current = known.get(voltage) ?? curve.ripplingCurrent(voltage);
    known.set(voltage, current);
    return rounded(current * (1 + errors.currentGain) + errors.currentOffset, errors.currentResolution);
  };
  const readVoltage = (voltage: number): number =>
    rounded(voltage * (1 + errors.voltageGain) + errors.voltageOffset, errors.voltageResolution);
  let voltage = curve.clamp(start);
  let [v2, i2] = [readVoltage(voltage), readCurrent(voltage)];
  let direction = -1;
  const path: number[] = [];
  for (let period = 0; period < descent + KEPT; period++) {
    if (period >= descent) path.push(voltage);
    const wanted = voltage + direction * step;
    voltage = curve.clamp(wanted);
    const [v1, i1] = [v2, i2];
    [v2, i2] = [readVoltage(voltage), readCurrent(voltage)];
    direction = decision(v1, i1, v2, i2, direction, voltage !== wanted);
  }
  return path.slice(0, turnOf(path, step));
}

/** How many periods a path takes to come back to its first voltages and repeat; all of them when it never does. */
function turnOf(path: number[], step: number): number {
  const isSame = (a: number, b: number): boolean => Math.abs(a - b) < 1e-6 * step;
  for (let turn = 1; 2 * turn + 8 < path.length; turn++) {
    let recurs = true;
    for (let k = 0; recurs && k < turn + 8; k++) recurs = isSame(path[k], path[k + turn]);
    if (recurs) return turn;
  }
  return path.length;
}

/** Mean power over the orbits from 64 starts spread over one step below the first voltage. */
function meanOverStarts(curve: PowerCurve, decision: Decision, step: number, errors: SensorErrors): number {
  let sum = 0;
  for (let start = 0; start < STARTS; start++) {
    const orbit = orbitFrom(curve, decision, step, errors, curve.clamp(curve.voc) - (start / STARTS) * step);
    sum += orbit.reduce((total, voltage) => total + curve.ripplingPower(voltage), 0) / orbit.length;
  }
  return sum / STARTS;
}

/** Mean power at rest of incremental conductance, entered from open circuit. */
export function incrementalMeanPower(curve: PowerCurve, of: IncrementalConductance, errors = NO_ERRORS): number {
  return meanOverStarts(curve, (v1, i1, v2, i2) => decide(of, v1, i1, v2, i2), of.step, errors);
}

/**
 * Mean power at rest of perturb and observe, entered from open circuit: turn where the power fell or the window cut the
 * step; without power, down (Femia et al. 2005, from memory). Without ripple.
 */
export function perturbMeanPower(curve: PowerCurve, step: number, errors = NO_ERRORS): number {
  const decision: Decision = (v1, i1, v2, i2, direction, cut) => {
    if (v2 * i2 <= 0 && v2 > 0) return -1;
    return v2 * i2 < v1 * i1 || cut ? -direction : direction;
  };
  return meanOverStarts(curve, decision, step, errors);
}
