import type { OperatingPoint } from "../diode/maximum-power.ts";
import type { Quadrature } from "../numeric/gauss-legendre.ts";
import { GAUSS_8, GAUSS_16 } from "../numeric/gauss-legendre.ts";
import type { Terminals } from "./terminals.ts";

/** Half widths up to this many ideality voltages are smooth enough for 8 points (error below 1e-12 of the power). */
const NARROW = 2;

/** Adds `weight` times the operating point at each quadrature node of [low, high] to `sum`. */
function addPiece(terminals: Terminals, piece: [number, number, number], rule: Quadrature, sum: OperatingPoint): void {
  const [low, high, weight] = piece;
  const point = { voltage: 0, current: 0, power: 0 };
  for (let k = 0; k < rule.nodes.length; k++) {
    terminals.operate(terminals.clamp(0.5 * (low + high) + 0.5 * (high - low) * rule.nodes[k]), point);
    addPoint(sum, point, weight * rule.weights[k]);
  }
}

/** Adds `weight` times a point to `sum`. */
export function addPoint(sum: OperatingPoint, point: OperatingPoint, weight: number): void {
  sum.voltage += weight * point.voltage;
  sum.current += weight * point.current;
  sum.power += weight * point.power;
}

/** Whether the power curve between two voltages (V) has no corner: no limit, no window edge, no open circuit. */
export function isSmooth(terminals: Terminals, low: number, high: number): boolean {
  const { trackingMinimumVoltage, trackingMaximumVoltage, maximumPower } = terminals.converter;
  const { maximum } = terminals.condition;
  return (
    low >= Math.max(trackingMinimumVoltage, terminals.floor) &&
    high <= trackingMaximumVoltage &&
    maximum.power <= maximumPower &&
    terminals.power(high) > 0
  );
}

/**
 * Adds `weight` times the mean operating point over voltages equally likely in [low, high] (V), each clamped to the
 * window, ripple and limits included, to `sum`.
 *
 * Accuracy: 1e-9 of the maximum power. Smooth and narrow: 8 Gauss points; else 16 on each piece between corners.
 */
export function addMeanOver(
  terminals: Terminals,
  [low, high]: readonly [number, number],
  weight: number,
  sum: OperatingPoint,
): void {
  const narrow = high - low <= 2 * NARROW * terminals.condition.circuit.idealityVoltage;
  if (narrow && isSmooth(terminals, low, high)) {
    addPiece(terminals, [low, high, weight], GAUSS_8, sum);
    return;
  }
  const inside = terminals.corners().filter((corner) => corner > low && corner < high);
  const edges = [low, ...inside.sort((a, b) => a - b), high];
  for (let k = 0; k + 1 < edges.length; k++) {
    const share = (weight * (edges[k + 1] - edges[k])) / (high - low);
    addPiece(terminals, [edges[k], edges[k + 1], share], GAUSS_16, sum);
  }
}
