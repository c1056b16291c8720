import type { Circuit } from "../diode/circuit.ts";
import { emptyCircuit } from "../diode/circuit.ts";
import { shortCircuitCurrent } from "../diode/current.ts";
import { openCircuitVoltage } from "../diode/junction-at-current.ts";
import type { OperatingPoint } from "../diode/maximum-power.ts";
import { emptyPoint, maximumPower } from "../diode/maximum-power.ts";
import type { PhotovoltaicArray } from "./array.ts";

/** An array in one weather, seen at the converter's terminals. */
export interface Condition {
  readonly circuit: Circuit;
  readonly maximum: OperatingPoint;
  irradiance: number;
  cellTemperature: number;
  /** V; NaN until `conditionVoc` is asked. */
  openCircuitVoltage: number;
  /** A; NaN until `conditionIsc` is asked. */
  shortCircuitCurrent: number;
}

/** A condition to be written into by `enterCondition`. */
export function emptyCondition(): Condition {
  return {
    circuit: emptyCircuit(),
    maximum: emptyPoint(),
    irradiance: Number.NaN,
    cellTemperature: Number.NaN,
    openCircuitVoltage: Number.NaN,
    shortCircuitCurrent: Number.NaN,
  };
}

/** Writes the array's circuit and maximum power point at an irradiance (W/m2) and cell temperature (degC). */
export function enterCondition(
  condition: Condition,
  array: PhotovoltaicArray,
  irradiance: number,
  cellTemperature: number,
): void {
  array.circuitAt(irradiance, cellTemperature, condition.circuit);
  maximumPower(condition.circuit, condition.maximum);
  condition.irradiance = irradiance;
  condition.cellTemperature = cellTemperature;
  condition.openCircuitVoltage = Number.NaN;
  condition.shortCircuitCurrent = Number.NaN;
}

/** The open-circuit voltage of a condition, V, computed once. */
export function conditionVoc(condition: Condition): number {
  if (Number.isNaN(condition.openCircuitVoltage)) condition.openCircuitVoltage = openCircuitVoltage(condition.circuit);
  return condition.openCircuitVoltage;
}

/** The short-circuit current of a condition, A, computed once: at 0 V behind the wiring. */
export function conditionIsc(condition: Condition): number {
  if (Number.isNaN(condition.shortCircuitCurrent)) {
    condition.shortCircuitCurrent = shortCircuitCurrent(condition.circuit);
  }
  return condition.shortCircuitCurrent;
}
