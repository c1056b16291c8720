import type { Direction, Seen } from "./rule.ts";
import { CLIMB_STEP_FRACTION, controlPeriod, defineRule } from "./rule.ts";

/** Voltages this near each other, relatively, are the same: a converter held at its limit differs by rounding alone. */
const SAME_VOLTAGE = 1e-9;

/** Up, down or stay, as a signed slope compares with its tolerance. */
function towards(slope: number, tolerance: number): Direction {
  if (slope > tolerance) return 1;
  return slope < -tolerance ? -1 : 0;
}

/** Compares the incremental with the instantaneous conductance, and may rest at the peak. */
export const incrementalConductance = defineRule({
  kind: "incremental-conductance",
  title: "Incremental conductance",
  description:
    "Compares dI/dV with -I/V, whose equality marks the peak; rests inside a tolerance and wakes when the current moves.",
  interrupts: "nothing",
  sources: ["Hussein, Muta, Hoshino & Osakada, IEE Proc. Gener. Transm. Distrib. 142(1) (1995) 59-64 (from memory)"],
  parameters: {
    controlPeriod: controlPeriod(0.1),
    stepFraction: CLIMB_STEP_FRACTION,
    holdTolerance: {
      type: "number",
      unit: "1, of the relative slope 1 + (V/I) dI/dV",
      description: "Relative slope of the power curve below which the rule rests; 0 never rests.",
      default: {
        as: "10 times stepFraction",
        value: (_array, settings) => 10 * (settings["stepFraction"] as number),
      },
      minimum: 0,
      maximum: 10,
      source: "own choice: the slope that one step makes on a crystalline silicon curve",
    },
    currentTolerance: {
      type: "number",
      unit: "1, of the current",
      description: "Relative change of the current, since it came to rest, that wakes a resting rule.",
      default: 1e-3,
      minimum: 0,
      maximum: 1,
      source: "own choice: the resolution of a common current sensor",
    },
  },
  prepare: (settings, array) => ({
    behaviour: "climb",
    controlPeriod: settings.controlPeriod,
    step: settings.stepFraction * array.standard.openCircuitVoltage,
    orbit: "own",
    restTolerance: settings.holdTolerance,
    sampling: null,
    decide: (seen: Seen): Direction => {
      const { earlierVoltage, earlierCurrent, voltage, current } = seen;
      if (!(current > 0) || Number.isNaN(earlierVoltage)) return -1;
      const change = current - earlierCurrent;
      if (Math.abs(voltage - earlierVoltage) <= SAME_VOLTAGE * voltage)
        return towards(change / current, settings.currentTolerance);
      return towards(1 + ((voltage / current) * change) / (voltage - earlierVoltage), settings.holdTolerance);
    },
  }),
});
