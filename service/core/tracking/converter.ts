import type { StandardPoint } from "../array/array.ts";

/** Errors of one sensor: reading = true (1 + gain) + offset, rounded to `resolution` (0: not rounded). V or A. */
export interface Sensor {
  gain: number;
  offset: number;
  resolution: number;
}

/** What limits a rule: the converter's window, limits, ripple and sensors. */
export interface Converter {
  /** V. */
  trackingMinimumVoltage: number;
  /** V; Infinity for none. */
  trackingMaximumVoltage: number;
  /** W; Infinity for none. */
  maximumPower: number;
  /** A; Infinity for none. */
  maximumCurrent: number;
  /** W: asleep while less is available. */
  wakePower: number;
  /** Amplitude of the voltage ripple over the voltage. */
  rippleAmplitude: number;
  voltageSensor: Sensor;
  currentSensor: Sensor;
}

/** Errors of the sensors as the request states them: gains 1, offsets and resolutions of Voc,stc and Isc,stc. */
export interface SensorShares {
  voltageGain: number;
  voltageOffset: number;
  voltageResolution: number;
  currentGain: number;
  currentOffset: number;
  currentResolution: number;
}

/** The voltage and current sensors of an array's converter in V and A. */
export function sensorsOf(shares: SensorShares, standard: StandardPoint): { voltage: Sensor; current: Sensor } {
  return {
    voltage: {
      gain: shares.voltageGain,
      offset: shares.voltageOffset * standard.openCircuitVoltage,
      resolution: shares.voltageResolution * standard.openCircuitVoltage,
    },
    current: {
      gain: shares.currentGain,
      offset: shares.currentOffset * standard.shortCircuitCurrent,
      resolution: shares.currentResolution * standard.shortCircuitCurrent,
    },
  };
}

/** What the sensor reads of a true value. */
export function readingOf(sensor: Sensor, value: number): number {
  const reading = value * (1 + sensor.gain) + sensor.offset;
  return sensor.resolution > 0 ? Math.round(reading / sensor.resolution) * sensor.resolution : reading;
}

/** The true value at which the sensor, before rounding, reads `reading`; not below 0. */
export function valueReadAs(sensor: Sensor, reading: number): number {
  return Math.max(0, (reading - sensor.offset) / (1 + sensor.gain));
}

/** Whether the sensor reads the truth. */
export function isExact(sensor: Sensor): boolean {
  return sensor.gain === 0 && sensor.offset === 0 && sensor.resolution === 0;
}
