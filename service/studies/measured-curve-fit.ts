import type { Circuit } from "../core/diode/circuit.ts";
import { circuitOf } from "../core/diode/circuit.ts";
import { currentAt } from "../core/diode/current.ts";
import { searchLeastSquares } from "./least-squares.ts";

/** Measured points of one I-V curve, V and A, each of shape [n]. */
export interface MeasuredCurve {
  voltage: Float64Array;
  current: Float64Array;
}

/** A circuit and the root mean square of model current minus measured current, A. */
export interface MeasuredFit {
  circuit: Circuit;
  rootMeanSquareError: number;
}

const ITERATIONS = 25;
const ROUNDS = 12;
/** Start grid: Voc/a, and Rs as a share of Voc/Isc. */
const SHARPNESS = [6, 9, 13, 18, 24, 30];
const RESISTANCE = [0, 0.02, 0.05, 0.1];

/**
 * The single-diode circuit (Rs >= 0, Rsh > 0) nearest to measured I-V points: least squares of the exact current error,
 * model current at the measured voltage minus measured current, by the Levenberg-Marquardt method (Marquardt, J. SIAM
 * 11 (1963) 431-441) with the exact derivatives of the implicit equation.
 *
 * Starts: for given a and Rs the equation with the measured currents is linear in IL, I0 and 1/Rsh; the best of a grid
 * of 24 is taken. Null when no start is usable (fewer than 5 points, no light current, no open circuit in reach) or the
 * points say nothing of some parameter.
 */
export function measuredCurveFit(curve: MeasuredCurve): MeasuredFit | null {
  const scale = scaleOf(curve);
  const start = scale === null ? null : bestStart(curve, scale);
  if (scale === null || start === null) return null;
  const data = { x: Array.from(curve.voltage), y: Array.from(curve.current, (value) => value / scale.current) };
  let scaled = start;
  let error = Number.POSITIVE_INFINITY;
  for (let round = 0; round < ROUNDS; round++) {
    const found = searchLeastSquares(data, (values) => modelOf(circuitFrom(values, scale), scale), {
      initialValues: scaled,
      jacobianFunction: (values) => derivativesOf(circuitFrom(values, scale), scale),
      minValues: [0.1, -40, 0, 0, 0.05],
      maxValues: [3, 40, 1, 2, 20],
      damping: 1e-4,
      maxIterations: ITERATIONS,
      errorTolerance: 1e-30,
    });
    if (found === null) break;
    const gain = error - found.parameterError;
    [scaled, error] = [found.parameterValues, found.parameterError];
    if (gain <= 1e-13 * error) break;
  }
  if (!Number.isFinite(error)) return null;
  const circuit = circuitFrom(scaled, scale);
  return { circuit, rootMeanSquareError: rootMeanSquareError(curve, circuit) };
}

/** Root mean square of model current minus measured current, A. */
export function rootMeanSquareError(curve: MeasuredCurve, circuit: Circuit): number {
  let sum = 0;
  for (let i = 0; i < curve.voltage.length; i++) {
    const error = currentAt(circuit, curve.voltage[i]) - curve.current[i];
    sum += error * error;
  }
  return Math.sqrt(sum / curve.voltage.length);
}

/** Short-circuit current (A) and open-circuit voltage (V) of the points, by which the search is scaled. */
interface Scale {
  current: number;
  voltage: number;
}

function scaleOf({ voltage, current }: MeasuredCurve): Scale | null {
  const scale = { current: Math.max(...current), voltage: Math.max(...voltage) };
  return voltage.length >= 5 && scale.current > 0 && scale.voltage > 0 ? scale : null;
}

/** Scaled values: IL/Isc, the diode's exponent at Voc, Rs, 1/Rsh, and 20 a/Voc. */
function circuitFrom(scaled: readonly number[], scale: Scale): Circuit {
  const idealityVoltage = (scaled[4] * scale.voltage) / 20;
  return circuitOf({
    photocurrent: scaled[0] * scale.current,
    logSaturationCurrent: Math.log(scale.current) + scaled[1] - scale.voltage / idealityVoltage,
    seriesResistance: (scaled[2] * scale.voltage) / scale.current,
    shuntConductance: (scaled[3] * scale.current) / scale.voltage,
    idealityVoltage,
  });
}

function modelOf(circuit: Circuit, scale: Scale): (voltage: number) => number {
  return (voltage) => {
    const current = currentAt(circuit, voltage) / scale.current;
    return Number.isFinite(current) ? Math.max(-1e3, current) : -1e3;
  };
}

/** dI/dp of the implicit equation at a voltage: (dF/dp)/(1 + Rs dI/dx), chained to the scaled values. */
function derivativesOf(circuit: Circuit, scale: Scale): (voltage: number) => number[] {
  const { idealityVoltage: a, seriesResistance, shuntConductance, saturationCurrent } = circuit;
  return (voltage) => {
    const current = currentAt(circuit, voltage);
    const junction = voltage + seriesResistance * current;
    const diode = Math.min(1e3 * scale.current, Math.exp(circuit.logSaturationCurrent + junction / a));
    const conductance = diode / a + shuntConductance;
    const share = 1 / (1 + seriesResistance * conductance);
    // a moves both the junction's exponent and, through the scaling by Voc, the saturation current.
    const byIdeality = (diode * junction - (diode - saturationCurrent) * scale.voltage) / (a * a);
    return [
      share,
      (-(diode - saturationCurrent) * share) / scale.current,
      (-current * conductance * share * scale.voltage) / (scale.current * scale.current),
      (-junction * share) / scale.voltage,
      (byIdeality * share * scale.voltage) / (20 * scale.current),
    ];
  };
}

/** The start of least error over the grid; null when none is physical. */
function bestStart(curve: MeasuredCurve, scale: Scale): number[] | null {
  let best: number[] | null = null;
  let least = Number.POSITIVE_INFINITY;
  for (const sharpness of SHARPNESS) {
    for (const resistance of RESISTANCE) {
      const start = linearStart(curve, scale, sharpness, resistance);
      const error = start === null ? Number.NaN : rootMeanSquareError(curve, circuitFrom(start, scale));
      if (error < least) [best, least] = [start, error];
    }
  }
  return best;
}

/** IL, I0 and 1/Rsh by linear least squares with the measured currents on both sides, in scaled values. */
function linearStart(curve: MeasuredCurve, scale: Scale, sharpness: number, resistance: number): number[] | null {
  const normal = new Float64Array(9);
  const right = new Float64Array(3);
  for (let i = 0; i < curve.voltage.length; i++) {
    const current = curve.current[i] / scale.current;
    const junction = curve.voltage[i] / scale.voltage + resistance * current;
    const row = [1, -Math.exp(sharpness * (junction - 1)), -junction];
    for (let j = 0; j < 3; j++) {
      right[j] += row[j] * current;
      for (let k = 0; k < 3; k++) normal[3 * j + k] += row[j] * row[k];
    }
  }
  const [light, knee, shunt] = solveThree(normal, right);
  if (!(light > 0 && knee > 0)) return null;
  return [light, Math.log(knee), resistance, Math.max(0, shunt), 20 / sharpness];
}

/** Solves a symmetric 3 x 3 system by Cramer's rule; NaN where it is singular. */
function solveThree(m: Float64Array, r: Float64Array): [number, number, number] {
  const minor = (a: number, b: number, c: number, d: number): number => m[a] * m[d] - m[b] * m[c];
  const [c0, c1, c2] = [minor(4, 5, 7, 8), -minor(3, 5, 6, 8), minor(3, 4, 6, 7)];
  const determinant = m[0] * c0 + m[1] * c1 + m[2] * c2;
  const c3 = -minor(1, 2, 7, 8);
  const c4 = minor(0, 2, 6, 8);
  const c5 = -minor(0, 1, 6, 7);
  const [c6, c7, c8] = [minor(1, 2, 4, 5), -minor(0, 2, 3, 5), minor(0, 1, 3, 4)];
  return [
    (c0 * r[0] + c3 * r[1] + c6 * r[2]) / determinant,
    (c1 * r[0] + c4 * r[1] + c7 * r[2]) / determinant,
    (c2 * r[0] + c5 * r[1] + c8 * r[2]) / determinant,
  ];
}
