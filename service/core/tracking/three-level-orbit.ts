import type { OperatingPoint } from "../diode/maximum-power.ts";
import { emptyPoint } from "../diode/maximum-power.ts";
import { addMeanOver, addPoint, isSmooth } from "./mean-over-voltage.ts";
import type { Terminals } from "./terminals.ts";

/**
 * Five-point Gauss quadrature for the three-level orbit, in steps from the peak: levels Vc - D, Vc, Vc + D visited
 * 1 : 2 : 1 with Vc uniform within half a step of the peak is a density of 1/4, 1/2, 1/4 on the three steps around it.
 * Nodes and weights from the density's moments to 40 digits; exact for polynomials up to degree 9.
 */
const NODES = [-1.3535762722779681, -0.7581671478971147, 0, 0.7581671478971147, 1.3535762722779681];
const WEIGHTS = [
  0.09271901611730897, 0.21187559739590725, 0.3908107729735675, 0.21187559739590725, 0.09271901611730897,
];
/** Steps up to this many ideality voltages keep the five points within 1e-9 of the power. */
const NARROW = 0.5;

/**
 * Writes the mean operating point of a climber that steps by `step` (V) around `peak` (V) without ever resting:
 * levels Vc - D, Vc, Vc + D at 25/50/25 %, Vc uniform in peak +- D/2, each level clamped to the window.
 * Source: three-level orbit after Femia et al., IEEE Trans. Power Electron. 20(4) (2005) 963-973 (from memory).
 */
export function threeLevelOrbit(terminals: Terminals, peak: number, step: number, mean: OperatingPoint): void {
  mean.voltage = mean.current = mean.power = 0;
  const narrow = step <= NARROW * terminals.condition.circuit.idealityVoltage;
  if (narrow && isSmooth(terminals, peak - 1.5 * step, peak + 1.5 * step)) {
    const point = emptyPoint();
    for (let k = 0; k < NODES.length; k++) {
      terminals.operate(peak + step * NODES[k], point);
      addPoint(mean, point, WEIGHTS[k]);
    }
    return;
  }
  addMeanOver(terminals, [peak - 1.5 * step, peak - 0.5 * step], 0.25, mean);
  addMeanOver(terminals, [peak - 0.5 * step, peak + 0.5 * step], 0.5, mean);
  addMeanOver(terminals, [peak + 0.5 * step, peak + 1.5 * step], 0.25, mean);
}
