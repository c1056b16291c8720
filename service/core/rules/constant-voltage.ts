import { controlPeriod, defineRule, TARGET_STEP_FRACTION, targetRule } from "./rule.ts";

/** Holds one terminal voltage, whatever the weather. */
export const constantVoltage = defineRule({
  kind: "constant-voltage",
  title: "Constant voltage",
  description: "Holds one voltage per module, set once, in all weather.",
  interrupts: "nothing",
  sources: ["Esram & Chapman, IEEE Trans. Energy Convers. 22(2) (2007) 439-449 (from memory)"],
  parameters: {
    setVoltagePerModule: {
      type: "number",
      unit: "V",
      description: "Voltage held, per module in series.",
      default: {
        as: "maximum power voltage of the module at standard test conditions",
        value: (array) => array.standard.maximumPowerVoltage / array.modulesInSeries,
      },
      exclusiveMinimum: 0,
      maximum: 2000,
      source: "common practice, no source",
    },
    controlPeriod: controlPeriod(1),
    stepFraction: TARGET_STEP_FRACTION,
  },
  prepare: (settings, array) => {
    const voltage = settings.setVoltagePerModule * array.modulesInSeries;
    return targetRule({
      controlPeriod: settings.controlPeriod,
      step: settings.stepFraction * array.standard.openCircuitVoltage,
      reference: () => voltage,
    });
  },
});
