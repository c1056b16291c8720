import type { OperatingPoint } from "../diode/maximum-power.ts";
import { emptyPoint } from "../diode/maximum-power.ts";
import { GAUSS_8, GAUSS_16 } from "../numeric/gauss-legendre.ts";
import type { Terminals } from "./terminals.ts";

/** Half widths up to this many ideality voltages are smooth enough for 8 points (error below 1e-12 of the power). */
const NARROW = 2;

/** Adds `weight` times the mean operating point over [low, high], where the curve has no corner, to `sum`. */
function addSmooth(
  terminals: Terminals,
  [low, high]: readonly [number, number],
  weight: number,
  sum: OperatingPoint,
): void {
  const point = emptyPoint();
  for (let k = 0; k < GAUSS_8.nodes.length; k++) {
    terminals.operate(0.5 * (low + high) + 0.5 * (high - low) * GAUSS_8.nodes[k], point);
    addPoint(sum, point, weight * GAUSS_8.weights[k]);
  }
}

/**
 * The same between two corners. Where a ripple passes one the power leaves as the distance to the power 3/2, so the
 * points are moved towards both ends, v = low + (high - low) s^2 (3 - 2 s): in s the ends are smooth.
 */
function addPiece(
  terminals: Terminals,
  [low, high]: readonly [number, number],
  weight: number,
  sum: OperatingPoint,
): void {
  const point = emptyPoint();
  for (let k = 0; k < GAUSS_16.nodes.length; k++) {
    const s = 0.5 * (1 + GAUSS_16.nodes[k]);
    terminals.operate(terminals.clamp(low + (high - low) * s * s * (3 - 2 * s)), point);
    addPoint(sum, point, weight * GAUSS_16.weights[k] * 6 * s * (1 - s));
  }
}

/** Adds `weight` times a point to `sum`. */
export function addPoint(sum: OperatingPoint, point: OperatingPoint, weight: number): void {
  sum.voltage += weight * point.voltage;
  sum.current += weight * point.current;
  sum.power += weight * point.power;
}

/** Whether the operating power between two voltages (V) has no corner: no limit, no window edge, no open circuit. */
export function isSmooth(terminals: Terminals, low: number, high: number): boolean {
  const { trackingMinimumVoltage, trackingMaximumVoltage, maximumPower, rippleAmplitude } = terminals.converter;
  return (
    low >= trackingMinimumVoltage &&
    low * (1 - rippleAmplitude) >= terminals.floor &&
    high <= trackingMaximumVoltage &&
    terminals.condition.maximum.power <= maximumPower &&
    terminals.power(high * (1 + rippleAmplitude)) > 0
  );
}

/**
 * Adds `weight` times the mean operating point over voltages equally likely in [low, high] (V), each clamped to the
 * window, ripple and limits included, to `sum`.
 *
 * Accuracy: 1e-9 of the maximum power, 1e-8 with ripple. Smooth and narrow: 8 Gauss points; else 16 on each piece
 * between corners.
 */
export function addMeanOver(
  terminals: Terminals,
  [low, high]: readonly [number, number],
  weight: number,
  sum: OperatingPoint,
): void {
  const narrow = high - low <= 2 * NARROW * terminals.condition.circuit.idealityVoltage;
  if (narrow && isSmooth(terminals, low, high)) {
    addSmooth(terminals, [low, high], weight, sum);
    return;
  }
  const inside = terminals.corners().filter((corner) => corner > low && corner < high);
  const edges = [low, ...inside.sort((a, b) => a - b), high];
  for (let k = 0; k + 1 < edges.length; k++) {
    const share = (weight * (edges[k + 1] - edges[k])) / (high - low);
    addPiece(terminals, [edges[k], edges[k + 1]], share, sum);
  }
}
