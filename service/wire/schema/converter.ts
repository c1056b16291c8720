import { z } from "@hono/zod-openapi";
import { quantity } from "./quantity.ts";

const VOLTAGE = { exclusiveMinimum: 0, maximum: 2000 };
const GAIN = { minimum: -0.2, maximum: 0.2 };
const OFFSET = { minimum: -0.2, maximum: 0.2 };
const RESOLUTION = { minimum: 0, maximum: 0.2 };
const OF_VOLTAGE = "1, of the array's open-circuit voltage at standard test conditions";
const OF_CURRENT = "1, of the array's short-circuit current at standard test conditions";

/** Errors of the converter's sensors. */
export const SensorErrorSchema = z
  .strictObject({
    voltageGain: quantity("1", "Reading over true voltage, minus 1.", GAIN).default(0),
    voltageOffset: quantity(OF_VOLTAGE, "Added to the voltage reading.", OFFSET).default(0),
    currentGain: quantity("1", "Reading over true current, minus 1.", GAIN).default(0),
    currentOffset: quantity(OF_CURRENT, "Added to the current reading.", OFFSET).default(0),
  })
  .openapi("SensorError", { description: "Errors of the converter's sensors; none by default." });

/** Steps of the converter's sensors. */
export const ResolutionSchema = z
  .strictObject({
    voltage: quantity(OF_VOLTAGE, "Step the voltage reading is rounded to; 0: not rounded.", RESOLUTION).default(0),
    current: quantity(OF_CURRENT, "Step the current reading is rounded to; 0: not rounded.", RESOLUTION).default(0),
  })
  .openapi("SensorResolution", { description: "Steps of the converter's sensors; none by default." });

/** What limits the rule. */
export const ConverterSchema = z
  .strictObject({
    trackingMinimumVoltage: quantity("V", "Lower end of the voltage window.", { minimum: 0, maximum: 2000 }).default(0),
    trackingMaximumVoltage: quantity("V", "Upper end of the voltage window; null: none.", VOLTAGE)
      .nullable()
      .default(null),
    inputVoltageRating: quantity(
      "V",
      "Highest voltage the input bears, for the caution only; null: not known.",
      VOLTAGE,
    )
      .nullable()
      .default(null),
    maximumPower: quantity("W", "Most the input takes; null: no limit.", { exclusiveMinimum: 0, maximum: 1e8 })
      .nullable()
      .default(null),
    maximumCurrent: quantity("A", "Most the input takes; null: no limit.", { exclusiveMinimum: 0, maximum: 1e6 })
      .nullable()
      .default(null),
    wakePower: quantity("W", "Asleep while the array could give less.", { minimum: 0, maximum: 1e7 }).default(0),
    rippleAmplitude: quantity("1, of the voltage", "Amplitude of the voltage ripple.", {
      minimum: 0,
      maximum: 0.5,
    }).default(0),
    sensorError: SensorErrorSchema.optional(),
    resolution: ResolutionSchema.optional(),
  })
  .openapi("Converter", { description: "What limits the rule: voltage window, limits, ripple and sensors." });
