import { BOLTZMANN, DARK_IRRADIANCE, ELEMENTARY_CHARGE, STANDARD_TEMPERATURE, ZERO_CELSIUS } from "../constants.ts";
import type { Circuit } from "../diode/circuit.ts";
import { emptyCircuit } from "../diode/circuit.ts";
import { openCircuitVoltage } from "../diode/junction-at-current.ts";
import type { Module } from "./module.ts";

const REFERENCE_KELVIN = ZERO_CELSIUS + STANDARD_TEMPERATURE;

/** Band gap of silicon at 25 degC, eV (De Soto, Klein & Beckman, Solar Energy 80 (2006) 78-88; from memory). */
export const SILICON_BANDGAP = 1.121;
/** Its change with temperature, 1/K (same source; from memory). */
export const SILICON_BANDGAP_COEFFICIENT = -0.0002677;

/** The five parameters of a module at standard test conditions, and how they move with temperature. */
export interface SingleDiodeParameters {
  /** IL, A. */
  photocurrent: number;
  /** ln(I0 / 1 A). */
  logSaturationCurrent: number;
  /** Rs, ohm; 0 or more. */
  seriesResistance: number;
  /** 1/Rsh, siemens; 0 or more. */
  shuntConductance: number;
  /** a = n Ns k T/q, V. */
  idealityVoltage: number;
  /** Change of the photocurrent with temperature, A/K. */
  photocurrentCoefficient: number;
  /** Band gap at 25 degC, eV. */
  bandgap: number;
  /** Relative change of the band gap, 1/K. */
  bandgapCoefficient: number;
}

/**
 * ln(I0(T)/I0(25 degC)) at a cell temperature in degC:
 * 3 ln(T/T_ref) + (Eg_ref/T_ref - Eg/T) q/k (De Soto, Klein & Beckman 2006, eq. for I0; from memory).
 */
export function logSaturationRise(cellTemperature: number, bandgap: number, bandgapCoefficient: number): number {
  const kelvin = cellTemperature + ZERO_CELSIUS;
  const gap = bandgap * (1 + bandgapCoefficient * (cellTemperature - STANDARD_TEMPERATURE));
  return (
    3 * Math.log(kelvin / REFERENCE_KELVIN) +
    (bandgap / REFERENCE_KELVIN - gap / kelvin) * (ELEMENTARY_CHARGE / BOLTZMANN)
  );
}

/**
 * Writes the circuit at `irradiance` (W/m2) and `cellTemperature` (degC):
 * a ~ T, IL ~ G with its coefficient, Rsh ~ 1/G, Rs constant (De Soto, Klein & Beckman 2006; from memory).
 */
function translate(of: SingleDiodeParameters, irradiance: number, cellTemperature: number, circuit: Circuit): void {
  const share = irradiance * 1e-3;
  const rise = cellTemperature - STANDARD_TEMPERATURE;
  circuit.photocurrent = share * Math.max(0, of.photocurrent + of.photocurrentCoefficient * rise);
  circuit.logSaturationCurrent =
    of.logSaturationCurrent + logSaturationRise(cellTemperature, of.bandgap, of.bandgapCoefficient);
  circuit.saturationCurrent = Math.exp(circuit.logSaturationCurrent);
  circuit.idealityVoltage = (of.idealityVoltage * (cellTemperature + ZERO_CELSIUS)) / REFERENCE_KELVIN;
  circuit.seriesResistance = of.seriesResistance;
  circuit.shuntConductance = of.shuntConductance * share;
}

/** A module from its single-diode parameters at standard test conditions. */
export function singleDiodeModule(parameters: SingleDiodeParameters): Module {
  const circuitAt = (irradiance: number, cellTemperature: number, circuit: Circuit): void => {
    if (irradiance > DARK_IRRADIANCE) translate(parameters, irradiance, cellTemperature, circuit);
    else circuit.photocurrent = 0;
  };
  const standard = emptyCircuit();
  translate(parameters, 1000, STANDARD_TEMPERATURE, standard);
  return { circuitAt, standardOpenCircuitVoltage: openCircuitVoltage(standard) };
}
