import { DARK_IRRADIANCE, STANDARD_TEMPERATURE } from "../constants.ts";
import type { Circuit } from "../diode/circuit.ts";
import type { Module } from "./module.ts";

/** The standard's constants of one technology: fill factors of voltage and current, irradiance and temperature terms. */
interface TechnologyConstants {
  voltageFill: number;
  currentFill: number;
  /** C_G, W/m2. */
  irradianceScale: number;
  /** C_V. */
  logarithmicTerm: number;
  /** C_R, m2/W. */
  linearTerm: number;
  /** alpha, 1/K. */
  currentCoefficient: number;
  /** beta, 1/K. */
  voltageCoefficient: number;
}

/** EN 50530:2010 Annex C, IEC 62891:2020 Annex A. Crystalline silicon read in the source; thin film from memory. */
const TECHNOLOGIES = {
  "crystalline-silicon": {
    voltageFill: 0.8,
    currentFill: 0.9,
    irradianceScale: 2.514e-3,
    logarithmicTerm: 8.593e-2,
    linearTerm: 1.088e-4,
    currentCoefficient: 0.0004,
    voltageCoefficient: -0.004,
  },
  "thin-film": {
    voltageFill: 0.72,
    currentFill: 0.8,
    irradianceScale: 1.252e-3,
    logarithmicTerm: 8.419e-2,
    linearTerm: 1.476e-4,
    currentCoefficient: 0.0002,
    voltageCoefficient: -0.002,
  },
} as const satisfies Record<string, TechnologyConstants>;

export type TestGeneratorTechnology = keyof typeof TECHNOLOGIES;

/** The technologies the standard gives constants for. */
export const TEST_GENERATOR_TECHNOLOGIES = Object.keys(TECHNOLOGIES) as TestGeneratorTechnology[];

/** What the standard's generator is sized by: nominal maximum power (W) and its voltage (V). */
export interface TestGeneratorParameters {
  technology: TestGeneratorTechnology;
  maximumPower: number;
  maximumPowerVoltage: number;
}

/**
 * The standard's photovoltaic generator model (EN 50530:2010 Annex C; IEC 62891:2020 Annex A):
 * I = Isc - I0 (exp(U/(Uoc C_AQ)) - 1), a circuit without resistances. At 1000 W/m2 its Uoc lies 0.085 % (crystalline
 * silicon) or 0.34 % (thin film) below the nominal value: a property of the published constants, kept.
 */
export function testGeneratorModule(parameters: TestGeneratorParameters): Module {
  const of: TechnologyConstants = TECHNOLOGIES[parameters.technology];
  const { maximumPower, maximumPowerVoltage } = parameters;
  const standardOpenCircuitVoltage = maximumPowerVoltage / of.voltageFill;
  const standardShortCircuitCurrent = maximumPower / (maximumPowerVoltage * of.currentFill);
  // C_AQ, and ln of I0 = Isc,stc (1 - FF_I)^{1/(1 - FF_U)} G/1000.
  const curvature = (of.voltageFill - 1) / Math.log(1 - of.currentFill);
  const logSaturation = Math.log(standardShortCircuitCurrent) + Math.log(1 - of.currentFill) / (1 - of.voltageFill);

  const circuitAt = (irradiance: number, cellTemperature: number, circuit: Circuit): void => {
    if (!(irradiance > DARK_IRRADIANCE)) {
      circuit.photocurrent = 0;
      return;
    }
    const share = irradiance * 1e-3;
    const rise = cellTemperature - STANDARD_TEMPERATURE;
    const light = of.logarithmicTerm * Math.log(irradiance / of.irradianceScale + 1) - of.linearTerm * irradiance;
    const voltage = standardOpenCircuitVoltage * (1 + of.voltageCoefficient * rise) * light;
    circuit.photocurrent = standardShortCircuitCurrent * share * (1 + of.currentCoefficient * rise);
    circuit.logSaturationCurrent = logSaturation + Math.log(share);
    circuit.saturationCurrent = Math.exp(circuit.logSaturationCurrent);
    circuit.idealityVoltage = voltage * curvature;
    circuit.seriesResistance = 0;
    circuit.shuntConductance = 0;
  };
  return { circuitAt, standardOpenCircuitVoltage };
}
