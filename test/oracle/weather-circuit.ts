import type { ReferenceDiode } from "./diode-equation.ts";

/** A module at 1000 W/m2 and 25 degC as papers print it: A, ohm, A/K; ideality factor and cells in series. */
export interface ReferenceModule {
  photocurrent: number;
  saturationCurrent: number;
  seriesResistance: number;
  shuntResistance: number;
  ideality: number;
  cellsInSeries: number;
  photocurrentCoefficient: number;
}

const K = 1.380649e-23;
const Q = 1.602176634e-19;

/** n Ns k T/q, V, at a cell temperature in degC, with the constants of the SI of 2019. */
export function thermalVoltage(ideality: number, cells: number, cellTemperature: number): number {
  return (ideality * cells * K * (cellTemperature + 273.15)) / Q;
}

/** The circuit in a weather: De Soto, Klein & Beckman, Solar Energy 80 (2006) 78-88, silicon (from memory). */
export function moduleInWeather(of: ReferenceModule, irradiance: number, cellTemperature: number): ReferenceDiode {
  const kelvin = cellTemperature + 273.15;
  const gap = 1.121 * (1 - 0.0002677 * (cellTemperature - 25));
  const rise = (kelvin / 298.15) ** 3 * Math.exp(((1.121 / 298.15 - gap / kelvin) * Q) / K);
  return {
    photocurrent: (irradiance / 1000) * (of.photocurrent + of.photocurrentCoefficient * (cellTemperature - 25)),
    saturationCurrent: of.saturationCurrent * rise,
    idealityVoltage: thermalVoltage(of.ideality, of.cellsInSeries, cellTemperature),
    seriesResistance: of.seriesResistance,
    shuntResistance: (of.shuntResistance * 1000) / irradiance,
  };
}

/** Fill factors and irradiance terms of the standard's two technologies (thin film from memory). */
const STANDARD_GENERATORS = {
  "crystalline-silicon": { ffu: 0.8, ffi: 0.9, cg: 2.514e-3, cv: 8.593e-2, cr: 1.088e-4, alpha: 0.0004, beta: -0.004 },
  "thin-film": { ffu: 0.72, ffi: 0.8, cg: 1.252e-3, cv: 8.419e-2, cr: 1.476e-4, alpha: 0.0002, beta: -0.002 },
};

export type Technology = keyof typeof STANDARD_GENERATORS;

/** The standard's test generator by maximum power (W) and its voltage (V) at standard test conditions. */
export interface ReferenceGenerator {
  technology: Technology;
  maximumPower: number;
  maximumPowerVoltage: number;
}

/** Its nominal open-circuit voltage at standard test conditions, V. */
export function nominalOpenCircuit(of: ReferenceGenerator): number {
  return of.maximumPowerVoltage / STANDARD_GENERATORS[of.technology].ffu;
}

/** Its circuit in a weather: EN 50530:2010 Annex C. */
export function generatorInWeather(
  of: ReferenceGenerator,
  irradiance: number,
  cellTemperature: number,
): ReferenceDiode {
  const c = STANDARD_GENERATORS[of.technology];
  const standardCurrent = of.maximumPower / (of.maximumPowerVoltage * c.ffi);
  const light = c.cv * Math.log(irradiance / c.cg + 1) - c.cr * irradiance;
  const voltage = nominalOpenCircuit(of) * (1 + c.beta * (cellTemperature - 25)) * light;
  return {
    photocurrent: ((standardCurrent * irradiance) / 1000) * (1 + c.alpha * (cellTemperature - 25)),
    saturationCurrent: (standardCurrent * (1 - c.ffi) ** (1 / (1 - c.ffu)) * irradiance) / 1000,
    idealityVoltage: (voltage * (c.ffu - 1)) / Math.log(1 - c.ffi),
    seriesResistance: 0,
    shuntResistance: Number.POSITIVE_INFINITY,
  };
}

/** Modules in series, strings in parallel, and a wiring resistance (ohm), as one circuit. */
export function wired(of: ReferenceDiode, series: number, strings: number, wiringResistance: number): ReferenceDiode {
  return {
    photocurrent: of.photocurrent * strings,
    saturationCurrent: of.saturationCurrent * strings,
    idealityVoltage: of.idealityVoltage * series,
    seriesResistance: (of.seriesResistance * series) / strings + wiringResistance,
    shuntResistance: (of.shuntResistance * series) / strings,
  };
}
