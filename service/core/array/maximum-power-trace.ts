import { emptyCircuit } from "../diode/circuit.ts";
import { emptyPoint, maximumPower } from "../diode/maximum-power.ts";
import type { PhotovoltaicArray } from "./array.ts";

/** Columns of one operating point a sample: V, A, W, each of shape [n]. */
export interface PointTrace {
  voltage: Float64Array;
  current: Float64Array;
  power: Float64Array;
}

/** A trace of `length` samples, all 0. */
export function emptyTrace(length: number): PointTrace {
  return {
    voltage: new Float64Array(length),
    current: new Float64Array(length),
    power: new Float64Array(length),
  };
}

/**
 * Writes the maximum power point at the converter's terminals for every sample.
 * @param irradiance plane of array, W/m2, shape [n]; 0 gives 0
 * @param cellTemperature degC, shape [n]
 * @param trace receives voltage, current and power, each of shape [n]; accuracy as `maximumPower`
 */
export function maximumPowerTrace(
  array: PhotovoltaicArray,
  irradiance: Float64Array,
  cellTemperature: Float64Array,
  trace: PointTrace,
): void {
  const circuit = emptyCircuit();
  const point = emptyPoint();
  for (let i = 0; i < irradiance.length; i++) {
    array.circuitAt(irradiance[i], cellTemperature[i], circuit);
    maximumPower(circuit, point);
    trace.voltage[i] = point.voltage;
    trace.current[i] = point.current;
    trace.power[i] = point.power;
  }
}
