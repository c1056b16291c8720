import { climbByPower } from "./climb-by-power.ts";
import { CLIMB_STEP_FRACTION, controlPeriod, defineRule, targetRule } from "./rule.ts";

/** Sweeps the whole window now and then, and goes to the best voltage found. */
export const powerCurveScan = defineRule({
  kind: "power-curve-scan",
  title: "Power curve scan",
  description:
    "Sweeps the whole window each scan period, nothing delivered meanwhile, then holds the best voltage or climbs from it.",
  interrupts: "sweep",
  sources: ["common practice, no source"],
  parameters: {
    scanPeriod: {
      type: "number",
      unit: "s",
      description: "Time from the start of one sweep to the start of the next.",
      default: 600,
      minimum: 0.1,
      maximum: 86400,
      usual: [60, 3600],
      source: "common practice, no source",
    },
    sweepDuration: {
      type: "number",
      unit: "s",
      description:
        "How long one sweep takes, nothing being delivered: an upper bound of its cost. Shorter than the scan period.",
      default: 2,
      minimum: 0,
      maximum: 3600,
      usual: [0.1, 5],
      source: "common practice, no source",
    },
    points: {
      type: "number",
      unit: "1",
      description: "Voltages tried in one sweep, equally spaced over the window inside 0 V to open circuit.",
      default: 100,
      minimum: 3,
      maximum: 1000,
      integer: true,
      usual: [50, 200],
      source: "common practice, no source",
    },
    afterwards: {
      type: "choice",
      choices: ["climb", "hold"],
      description: "What follows a sweep: climb from the best voltage by comparing powers, or hold it.",
      default: "climb",
      source: "common practice, no source",
    },
    controlPeriod: controlPeriod(0.1),
    stepFraction: CLIMB_STEP_FRACTION,
  },
  prepare: (settings, array) => {
    const sampling = {
      reads: "best-swept-voltage",
      period: settings.scanPeriod,
      duration: settings.sweepDuration,
      pilot: false,
      points: settings.points,
    } as const;
    if (settings.afterwards === "hold") {
      return targetRule({
        sensed: false,
        sampling,
        controlPeriod: settings.controlPeriod,
        step: 0,
        reference: (bestVoltage) => bestVoltage,
      });
    }
    return {
      behaviour: "climb",
      controlPeriod: settings.controlPeriod,
      step: settings.stepFraction * array.standard.openCircuitVoltage,
      orbit: "three-level",
      restTolerance: 0,
      sampling,
      decide: climbByPower,
    };
  },
});
