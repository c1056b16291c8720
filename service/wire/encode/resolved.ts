import type { ConverterChoice } from "../../studies/converter-choice.ts";
import type { Tracked } from "../../studies/tracking-run.ts";

/** A converter as the wire states it, nothing left out. */
export function encodeConverter(converter: ConverterChoice) {
  const { sensors } = converter;
  return {
    trackingMinimumVoltage: converter.trackingMinimumVoltage,
    trackingMaximumVoltage: converter.trackingMaximumVoltage,
    inputVoltageRating: converter.inputVoltageRating,
    maximumPower: converter.maximumPower,
    maximumCurrent: converter.maximumCurrent,
    wakePower: converter.wakePower,
    rippleAmplitude: converter.rippleAmplitude,
    sensorError: {
      voltageGain: sensors.voltageGain,
      voltageOffset: sensors.voltageOffset,
      currentGain: sensors.currentGain,
      currentOffset: sensors.currentOffset,
    },
    resolution: { voltage: sensors.voltageResolution, current: sensors.currentResolution },
  };
}

/** A rule as the wire states it, flat: its kind, then every setting; null in the place of a column. */
export function encodeRule({ kind, settings }: Tracked["rule"]) {
  const flat = Object.entries(settings).map(([name, value]) => [name, value instanceof Float64Array ? null : value]);
  return { kind, ...Object.fromEntries(flat) };
}
