import type { StandardPoint } from "../core/array/array.ts";
import type { Converter, SensorShares } from "../core/tracking/converter.ts";
import { sensorsOf } from "../core/tracking/converter.ts";

/** A converter as it was described: null where it sets no bound. */
export interface ConverterChoice {
  /** V. */
  trackingMinimumVoltage: number;
  /** V. */
  trackingMaximumVoltage: number | null;
  /** V; for the caution only. */
  inputVoltageRating: number | null;
  /** W. */
  maximumPower: number | null;
  /** A. */
  maximumCurrent: number | null;
  /** W. */
  wakePower: number;
  /** 1, of the voltage. */
  rippleAmplitude: number;
  sensors: SensorShares;
}

/** Sensors that read the truth. */
export const TRUE_SENSORS: SensorShares = {
  voltageGain: 0,
  voltageOffset: 0,
  voltageResolution: 0,
  currentGain: 0,
  currentOffset: 0,
  currentResolution: 0,
};

/** A converter that limits nothing. */
export const OPEN_CONVERTER: ConverterChoice = {
  trackingMinimumVoltage: 0,
  trackingMaximumVoltage: null,
  inputVoltageRating: null,
  maximumPower: null,
  maximumCurrent: null,
  wakePower: 0,
  rippleAmplitude: 0,
  sensors: TRUE_SENSORS,
};

/** The converter of a choice on an array. */
export function buildConverter(choice: ConverterChoice, standard: StandardPoint): Converter {
  const sensors = sensorsOf(choice.sensors, standard);
  return {
    trackingMinimumVoltage: choice.trackingMinimumVoltage,
    trackingMaximumVoltage: choice.trackingMaximumVoltage ?? Number.POSITIVE_INFINITY,
    maximumPower: choice.maximumPower ?? Number.POSITIVE_INFINITY,
    maximumCurrent: choice.maximumCurrent ?? Number.POSITIVE_INFINITY,
    wakePower: choice.wakePower,
    rippleAmplitude: choice.rippleAmplitude,
    voltageSensor: sensors.voltage,
    currentSensor: sensors.current,
  };
}
