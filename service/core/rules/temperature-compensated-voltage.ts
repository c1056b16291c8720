import { STANDARD_TEMPERATURE } from "../constants.ts";
import { controlPeriod, defineRule, TARGET_STEP_FRACTION, targetRule } from "./rule.ts";

/** Holds a voltage that follows the cell temperature. */
export const temperatureCompensatedVoltage = defineRule({
  kind: "temperature-compensated-voltage",
  title: "Temperature-compensated voltage",
  description:
    "Holds a set voltage per module, corrected by a coefficient times the cell temperature's distance from 25 degC.",
  interrupts: "nothing",
  sources: ["Esram & Chapman, IEEE Trans. Energy Convers. 22(2) (2007) 439-449 (from memory)"],
  parameters: {
    setVoltagePerModule: {
      type: "number",
      unit: "V",
      description: "Voltage held at a cell temperature of 25 degC, per module in series.",
      default: {
        as: "maximum power voltage of the module at standard test conditions",
        value: (array) => array.standard.maximumPowerVoltage / array.modulesInSeries,
      },
      exclusiveMinimum: 0,
      maximum: 2000,
      source: "common practice, no source",
    },
    coefficient: {
      type: "number",
      unit: "%/K, of the set voltage",
      description: "Change of the held voltage with cell temperature.",
      default: {
        as: "the module's change of open-circuit voltage in V/K, over the set voltage",
        value: (array, settings) =>
          (100 * array.standard.openCircuitVoltageCoefficient) /
          ((settings["setVoltagePerModule"] as number) * array.modulesInSeries),
      },
      minimum: -5,
      maximum: 1,
      usual: [-0.6, -0.2],
      source: "common practice, no source",
    },
    controlPeriod: controlPeriod(1),
    stepFraction: TARGET_STEP_FRACTION,
  },
  prepare: (settings, array) => {
    const voltage = settings.setVoltagePerModule * array.modulesInSeries;
    const perKelvin = settings.coefficient / 100;
    return targetRule({
      controlPeriod: settings.controlPeriod,
      step: settings.stepFraction * array.standard.openCircuitVoltage,
      reference: (_reading, cellTemperature) => voltage * (1 + perKelvin * (cellTemperature - STANDARD_TEMPERATURE)),
    });
  },
});
