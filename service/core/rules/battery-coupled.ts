import { controlPeriod, defineRule, TARGET_STEP_FRACTION, targetRule } from "./rule.ts";

/** No tracking: the array is switched straight onto a battery and takes its voltage. */
export const batteryCoupled = defineRule({
  kind: "battery-coupled",
  title: "Battery-coupled",
  description:
    "No tracking: the array works at the battery's voltage plus the drop of the path. A full battery is not modelled.",
  interrupts: "nothing",
  sources: ["common practice, no source"],
  parameters: {
    batteryVoltage: {
      type: "series",
      unit: "V",
      description: "Battery voltage at the converter's terminals: one value, or one a sample of the climate.",
      minimum: 0,
      maximum: 2000,
      source: "common practice, no source",
    },
    pathDrop: {
      type: "number",
      unit: "V",
      description: "Voltage drop between the array's terminals and the battery (blocking diode, switch, fuse).",
      default: 0,
      minimum: 0,
      maximum: 100,
      usual: [0, 1],
      source: "common practice, no source",
    },
    controlPeriod: controlPeriod(1),
    stepFraction: TARGET_STEP_FRACTION,
  },
  prepare: (settings, array) =>
    targetRule({
      sensed: false,
      outside: settings.batteryVoltage,
      controlPeriod: settings.controlPeriod,
      step: settings.stepFraction * array.standard.openCircuitVoltage,
      reference: (_reading, _cellTemperature, batteryVoltage) => batteryVoltage + settings.pathDrop,
    }),
});
