import { STANDARD_IRRADIANCE, STANDARD_TEMPERATURE } from "../constants.ts";
import type { Circuit } from "../diode/circuit.ts";
import { emptyCircuit } from "../diode/circuit.ts";
import { shortCircuitCurrent } from "../diode/current.ts";
import { openCircuitVoltage } from "../diode/junction-at-current.ts";
import { emptyPoint, maximumPower } from "../diode/maximum-power.ts";
import type { Module } from "../module/module.ts";

/** Modules in series x strings in parallel, and the wiring between array and converter. */
export interface Layout {
  modulesInSeries: number;
  stringsInParallel: number;
  /** ohm, of the whole array. */
  wiringResistance: number;
}

/** Writes the circuit seen at the converter's terminals at an irradiance (W/m2) and a cell temperature (degC). */
export type CircuitAt = (irradiance: number, cellTemperature: number, circuit: Circuit) => void;

/** An array as its converter sees it, and what its rules are stated in. All voltages V, currents A, powers W. */
export interface PhotovoltaicArray {
  readonly layout: Layout;
  readonly circuitAt: CircuitAt;
  /** At standard test conditions, before the wiring. */
  readonly standard: StandardPoint;
}

/** The array at standard test conditions, even light, before the wiring. */
export interface StandardPoint {
  maximumPowerVoltage: number;
  maximumPowerCurrent: number;
  maximumPower: number;
  /** What voltage steps and sensor offsets are stated in; the standard's test generator: its nominal Uoc. */
  openCircuitVoltage: number;
  shortCircuitCurrent: number;
  /** (Voc(35 degC) - Voc(25 degC))/10 K, V/K. */
  openCircuitVoltageCoefficient: number;
}

/**
 * Modules alike, in series and in parallel, behind a wiring resistance: again one single-diode circuit, with
 * a, Rs and Rsh times modules in series, IL, I0 and 1/Rsh, 1/Rs times strings in parallel, and the wiring in Rs.
 */
export function photovoltaicArray(module: Module, layout: Layout): PhotovoltaicArray {
  const { modulesInSeries, stringsInParallel, wiringResistance } = layout;
  const logStrings = Math.log(stringsInParallel);
  const resistanceScale = modulesInSeries / stringsInParallel;

  const circuitAt: CircuitAt = (irradiance, cellTemperature, circuit) => {
    module.circuitAt(irradiance, cellTemperature, circuit);
    if (circuit.photocurrent <= 0) return;
    circuit.photocurrent *= stringsInParallel;
    circuit.logSaturationCurrent += logStrings;
    circuit.saturationCurrent *= stringsInParallel;
    circuit.idealityVoltage *= modulesInSeries;
    circuit.seriesResistance = circuit.seriesResistance * resistanceScale + wiringResistance;
    circuit.shuntConductance /= resistanceScale;
  };
  return { layout, circuitAt, standard: standardPoint(module, modulesInSeries, stringsInParallel) };
}

function standardPoint(module: Module, modulesInSeries: number, stringsInParallel: number): StandardPoint {
  const circuit = emptyCircuit();
  module.circuitAt(STANDARD_IRRADIANCE, STANDARD_TEMPERATURE + 10, circuit);
  const warmVoltage = openCircuitVoltage(circuit);
  module.circuitAt(STANDARD_IRRADIANCE, STANDARD_TEMPERATURE, circuit);
  const point = emptyPoint();
  maximumPower(circuit, point);
  return {
    maximumPowerVoltage: point.voltage * modulesInSeries,
    maximumPowerCurrent: point.current * stringsInParallel,
    maximumPower: point.power * modulesInSeries * stringsInParallel,
    openCircuitVoltage: module.standardOpenCircuitVoltage * modulesInSeries,
    shortCircuitCurrent: shortCircuitCurrent(circuit) * stringsInParallel,
    openCircuitVoltageCoefficient: ((warmVoltage - openCircuitVoltage(circuit)) / 10) * modulesInSeries,
  };
}
