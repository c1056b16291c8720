import { controlPeriod, defineRule, TARGET_STEP_FRACTION, targetRule } from "./rule.ts";
import { PILOT_CELL, SAMPLE_PERIOD, sampleDuration } from "./sampling-parameters.ts";

/** Holds a fraction of the open-circuit voltage that it samples now and then. */
export const fractionalOpenCircuitVoltage = defineRule({
  kind: "fractional-open-circuit-voltage",
  title: "Fractional open-circuit voltage",
  description:
    "Disconnects the array each sample period, reads its open-circuit voltage and holds a fraction of it until the next sample.",
  interrupts: "open-circuit",
  sources: [
    "Enslin, Wolf, Snyman & Swiegers, IEEE Trans. Ind. Electron. 44(6) (1997) 769-773 (fraction .76; from memory)",
    "Esram & Chapman, IEEE Trans. Energy Convers. 22(2) (2007) 439-449 (.71 to .78; from memory)",
  ],
  parameters: {
    fraction: {
      type: "number",
      unit: "1, of the sampled open-circuit voltage",
      description: "Share of the open-circuit voltage that is held.",
      default: 0.76,
      exclusiveMinimum: 0,
      maximum: 1,
      usual: [0.7, 0.8],
      source: "default: Enslin et al. 1997 (from memory); usual range: common practice, no source",
    },
    samplePeriod: SAMPLE_PERIOD,
    sampleDuration: sampleDuration(0.256),
    pilotCell: PILOT_CELL,
    controlPeriod: controlPeriod(1),
    stepFraction: TARGET_STEP_FRACTION,
  },
  prepare: (settings, array) =>
    targetRule({
      sampling: {
        reads: "open-circuit-voltage",
        period: settings.samplePeriod,
        duration: settings.sampleDuration,
        pilot: settings.pilotCell,
        points: 0,
      },
      controlPeriod: settings.controlPeriod,
      step: settings.stepFraction * array.standard.openCircuitVoltage,
      reference: (openCircuitVoltage) => settings.fraction * openCircuitVoltage,
    }),
});
