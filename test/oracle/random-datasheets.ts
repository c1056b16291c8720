import type { ReferenceDiode } from "./diode-equation.ts";
import { referenceCurrent, referenceOpenCircuit, referencePeak, referenceSlope } from "./diode-equation.ts";
import type { SeededRandom } from "./seeded-random.ts";
import type { ReferenceModule } from "./weather-circuit.ts";
import { moduleInWeather, thermalVoltage } from "./weather-circuit.ts";

/** A datasheet as printed, coefficients in A/K and V/K. */
export interface ReferenceDatasheet {
  shortCircuitCurrent: number;
  openCircuitVoltage: number;
  maximumPowerCurrent: number;
  maximumPowerVoltage: number;
  shortCircuitCurrentCoefficient: number;
  openCircuitVoltageCoefficient: number;
}

/**
 * A plausible crystalline silicon module (ranges are common practice, no source): 36 to 144 cells of .58 to .74 V,
 * 2 to 14 A, ideality .95 to 1.4, series resistance .5 to 9 % and shunt 15 to 300 times Voc/Isc, .03 to .07 %/K. The
 * two modules of the papers in the fixtures have 8.4 % and 7.9 %, so that the range is not chosen for its ratios.
 */
export function plausibleModule(random: SeededRandom): ReferenceModule {
  const cellsInSeries = random.whole(36, 144);
  const ideality = random.between(0.95, 1.4);
  const photocurrent = random.between(2, 14);
  const openCircuit = cellsInSeries * random.between(0.58, 0.74);
  const resistance = openCircuit / photocurrent;
  return {
    photocurrent,
    saturationCurrent: photocurrent / Math.expm1(openCircuit / thermalVoltage(ideality, cellsInSeries, 25)),
    seriesResistance: resistance * random.between(0.005, 0.09),
    shuntResistance: resistance * random.logBetween(15, 300),
    ideality,
    cellsInSeries,
    photocurrentCoefficient: photocurrent * random.between(0.0003, 0.0007),
  };
}

/** The datasheet that a module would print, from its circuit by bisection; Voc's coefficient over 10 K. */
export function datasheetOf(module: ReferenceModule): ReferenceDatasheet {
  const standard = moduleInWeather(module, 1000, 25);
  const openCircuitVoltage = referenceOpenCircuit(standard);
  const peak = referencePeak(standard);
  return {
    shortCircuitCurrent: referenceCurrent(standard, 0),
    openCircuitVoltage,
    maximumPowerCurrent: peak.current,
    maximumPowerVoltage: peak.voltage,
    shortCircuitCurrentCoefficient: module.photocurrentCoefficient,
    openCircuitVoltageCoefficient: (referenceOpenCircuit(moduleInWeather(module, 1000, 35)) - openCircuitVoltage) / 10,
  };
}

/** The five conditions' relative misfits of a circuit at 25 degC and at 35 degC. */
export function referenceMisfits(sheet: ReferenceDatasheet, standard: ReferenceDiode, warm: ReferenceDiode): number[] {
  const voc = referenceOpenCircuit(standard);
  const at = (voltage: number): number => referenceCurrent(standard, voltage);
  const { maximumPowerVoltage: vmp, maximumPowerCurrent: imp } = sheet;
  const slope = at(vmp) + vmp * referenceSlope(standard, vmp, at(vmp));
  return [
    at(0) / sheet.shortCircuitCurrent - 1,
    voc / sheet.openCircuitVoltage - 1,
    at(vmp) / imp - 1,
    slope / imp,
    (referenceOpenCircuit(warm) - voc) / (10 * sheet.openCircuitVoltageCoefficient) - 1,
  ];
}
