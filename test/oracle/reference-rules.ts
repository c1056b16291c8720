import { bisect } from "./diode-equation.ts";
import type { PowerCurve } from "./power-curve.ts";
import type { ReferenceRule } from "./steady-tracking.ts";

/** What the definitions of the rules need of the array: V of the whole array at standard test conditions, modules. */
export interface ReferenceArray {
  modulesInSeries: number;
  standardOpenCircuit: number;
  cellTemperature: number;
}

type Numbers = Readonly<Record<string, number>>;

/** The voltage of 0 or more at which the array gives a share of its short-circuit current. */
function voltageAtShare(curve: PowerCurve, share: number): number {
  return bisect((voltage) => curve.current(voltage) > share * curve.isc, 0, curve.voc);
}

/** The best of `points` voltages equally spaced over the window and [0, Voc]. */
function bestSwept(curve: PowerCurve, points: number): number {
  const low = curve.clamp(0);
  const high = Math.max(low, curve.clamp(curve.voc));
  const voltages = Array.from({ length: points }, (_, k) => low + ((high - low) * k) / (points - 1));
  return voltages.reduce((best, v) => (curve.ripplingPower(v) > curve.ripplingPower(best) ? v : best), voltages[0]);
}

/** Every rule of the table by its definition, from complete settings. */
export const REFERENCE_RULES: Readonly<Record<string, (s: Numbers, array: ReferenceArray) => ReferenceRule>> = {
  perfect: () => ({ behaves: "perfect" }),
  "constant-voltage": (s, array) => ({
    behaves: "target",
    duty: 0,
    step: s["stepFraction"] * array.standardOpenCircuit,
    target: () => s["setVoltagePerModule"] * array.modulesInSeries,
  }),
  "temperature-compensated-voltage": (s, array) => ({
    behaves: "target",
    duty: 0,
    step: s["stepFraction"] * array.standardOpenCircuit,
    target: () =>
      s["setVoltagePerModule"] * array.modulesInSeries * (1 + (s["coefficient"] / 100) * (array.cellTemperature - 25)),
  }),
  "fractional-open-circuit-voltage": (s, array) => ({
    behaves: "target",
    duty: s["sampleDuration"] / s["samplePeriod"],
    step: s["stepFraction"] * array.standardOpenCircuit,
    target: (curve) => s["fraction"] * curve.voc,
  }),
  "short-current-pulse": (s, array) => ({
    behaves: "target",
    duty: s["sampleDuration"] / s["samplePeriod"],
    step: s["stepFraction"] * array.standardOpenCircuit,
    target: (curve) => voltageAtShare(curve, s["fraction"]),
  }),
  "battery-coupled": (s, array) => ({
    behaves: "target",
    duty: 0,
    step: s["stepFraction"] * array.standardOpenCircuit,
    target: () => s["batteryVoltage"] + s["pathDrop"],
  }),
  "perturb-and-observe": (s, array) => ({
    behaves: "perturb",
    duty: 0,
    step: s["stepFraction"] * array.standardOpenCircuit,
  }),
  "incremental-conductance": (s, array) => ({
    behaves: "incremental",
    step: s["stepFraction"] * array.standardOpenCircuit,
    holdTolerance: s["holdTolerance"],
    currentTolerance: s["currentTolerance"],
  }),
  "power-curve-scan": (s, array) =>
    s["holds"] === 1
      ? {
          behaves: "target",
          duty: s["sweepDuration"] / s["scanPeriod"],
          step: 0,
          target: (curve) => bestSwept(curve, s["points"]),
        }
      : {
          behaves: "perturb",
          duty: s["sweepDuration"] / s["scanPeriod"],
          step: s["stepFraction"] * array.standardOpenCircuit,
        },
};
