import { controlPeriod, defineRule, TARGET_STEP_FRACTION, targetRule } from "./rule.ts";
import { PILOT_CELL, SAMPLE_PERIOD, sampleDuration } from "./sampling-parameters.ts";

/** Holds a fraction of the short-circuit current that it samples with short pulses. */
export const shortCurrentPulse = defineRule({
  kind: "short-current-pulse",
  title: "Short-current pulse",
  description:
    "Short-circuits the array each sample period, reads its short-circuit current and holds a fraction of it until the next pulse.",
  interrupts: "short-circuit",
  sources: [
    "Noguchi, Togashi & Nakamoto, IEEE Trans. Ind. Electron. 49(1) (2002) 217-223 (fraction .92; from memory)",
    "Esram & Chapman, IEEE Trans. Energy Convers. 22(2) (2007) 439-449 (.78 to .92; from memory)",
  ],
  parameters: {
    fraction: {
      type: "number",
      unit: "1, of the sampled short-circuit current",
      description: "Share of the short-circuit current that is held.",
      default: 0.92,
      exclusiveMinimum: 0,
      maximum: 1,
      usual: [0.78, 0.92],
      source: "default: Noguchi et al. 2002 (from memory); usual range: Esram & Chapman 2007 (from memory)",
    },
    samplePeriod: SAMPLE_PERIOD,
    sampleDuration: sampleDuration(0.032),
    pilotCell: PILOT_CELL,
    controlPeriod: controlPeriod(1),
    stepFraction: TARGET_STEP_FRACTION,
  },
  prepare: (settings, array) =>
    targetRule({
      regulates: "current",
      sampling: {
        reads: "short-circuit-current",
        period: settings.samplePeriod,
        duration: settings.sampleDuration,
        pilot: settings.pilotCell,
        points: 0,
      },
      controlPeriod: settings.controlPeriod,
      step: settings.stepFraction * array.standard.openCircuitVoltage,
      reference: (shortCircuitCurrent) => settings.fraction * shortCircuitCurrent,
    }),
});
