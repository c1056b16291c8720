import { adaptiveMean } from "./adaptive-mean.ts";
import type { ReferenceDiode } from "./diode-equation.ts";
import { bisect, referenceCurrent, referenceOpenCircuit, referencePeak, referenceSlope } from "./diode-equation.ts";

/** What a converter allows: V, W, A; amplitude of the voltage ripple over the voltage. */
export interface ReferenceLimits {
  lowest: number;
  highest: number;
  mostPower: number;
  mostCurrent: number;
  ripple: number;
}

/** The curve of one circuit as a converter's limits leave it. */
export interface PowerCurve {
  voc: number;
  isc: number;
  vmp: number;
  pmp: number;
  /** Voltage below which the current limit is passed. */
  floor: number;
  clamp(voltage: number): number;
  /** Current of the array, 0 beyond open circuit. */
  current(voltage: number): number;
  /** Power within the limits, without ripple. */
  power(voltage: number): number;
  /** Voltage at which the power averaged over the ripple, before any limit, peaks. */
  ripplingPeak: number;
  /** Power within the limits, averaged over the ripple. */
  ripplingPower(voltage: number): number;
  /** Current within the limits, averaged over the ripple. */
  ripplingCurrent(voltage: number): number;
}

const CELLS = 3072;

interface Table {
  current(voltage: number): number;
  /** dI/dV. */
  slope(voltage: number): number;
}

/** The current as piecewise cubic Hermite polynomials between 3073 bisected points: within 1e-9 of the photocurrent. */
function tabulate(of: ReferenceDiode, voc: number): Table {
  const width = voc / CELLS;
  const value = new Float64Array(CELLS + 1);
  const slope = new Float64Array(CELLS + 1);
  for (let k = 0; k <= CELLS; k++) {
    value[k] = referenceCurrent(of, k * width);
    slope[k] = referenceSlope(of, k * width, value[k]) * width;
  }
  const cellOf = (voltage: number) => {
    const at = Math.max(0, voltage) / width;
    const k = Math.min(CELLS - 1, Math.floor(at));
    const rise = value[k + 1] - value[k];
    return { s: at - k, start: value[k], rise, bent: slope[k] - rise, curled: slope[k + 1] - rise };
  };
  return {
    current: (voltage) => {
      if (voltage >= voc) return 0;
      const { s, start, rise, bent, curled } = cellOf(voltage);
      return Math.max(0, start + s * rise + s * (1 - s) * ((1 - s) * bent - s * curled));
    },
    slope: (voltage) => {
      if (voltage >= voc) return 0;
      const { s, rise, bent, curled } = cellOf(voltage);
      return (rise + (1 - 2 * s) * ((1 - s) * bent - s * curled) - s * (1 - s) * (bent + curled)) / width;
    },
  };
}

/** The power curve of a circuit within limits. */
export function powerCurve(of: ReferenceDiode, limits: ReferenceLimits): PowerCurve {
  const voc = referenceOpenCircuit(of);
  const peak = referencePeak(of);
  const { current, slope } = tabulate(of, voc);
  const isc = referenceCurrent(of, 0);
  const floor = isc > limits.mostCurrent ? bisect((v) => current(v) > limits.mostCurrent, 0, voc) : 0;
  const raised = (voltage: number): number => Math.max(voltage, floor);
  const bare = (voltage: number): number => (voltage > 0 ? voltage * current(voltage) : 0);
  const cut = (power: number): number => Math.min(limits.mostPower, power);
  const cycle = (f: (voltage: number) => number, centre: number): number => {
    const swing = (phase: number): number => f(centre * (1 + limits.ripple * Math.sin(phase)));
    return adaptiveMean(swing, -Math.PI / 2, Math.PI / 2, 1e-11 * peak.power);
  };
  /** d/dV of the mean of P(V (1 + r sin)): the mean of (v/V) dP/dv. */
  const isRising = (voltage: number): boolean =>
    cycle((v) => (v / voltage) * (current(v) + v * slope(v)) * peak.voltage, voltage) > 0;
  return {
    voc,
    isc,
    vmp: peak.voltage,
    pmp: peak.power,
    floor,
    clamp: (voltage) => Math.min(limits.highest, Math.max(limits.lowest, voltage)),
    current,
    power: (voltage) => cut(bare(raised(voltage))),
    ripplingPeak: limits.ripple > 0 ? bisect(isRising, 0.5 * peak.voltage, voc) : peak.voltage,
    ripplingPower: (voltage) => cut(limits.ripple > 0 ? cycle(bare, raised(voltage)) : bare(raised(voltage))),
    ripplingCurrent: (voltage) => (limits.ripple > 0 ? cycle(current, raised(voltage)) : current(raised(voltage))),
  };
}
