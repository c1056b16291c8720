import { STANDARD_IRRADIANCE, STANDARD_TEMPERATURE, ZERO_CELSIUS } from "../constants.ts";
import { emptyCircuit } from "../diode/circuit.ts";
import { currentAt, powerSlopeAt, shortCircuitCurrent } from "../diode/current.ts";
import { openCircuitVoltage } from "../diode/junction-at-current.ts";
import { bracketedRoot } from "../numeric/bracketed-root.ts";
import type { SingleDiodeParameters } from "./single-diode.ts";
import { logSaturationRise, singleDiodeModule } from "./single-diode.ts";

/** What a datasheet prints at standard test conditions, temperature coefficients in A/K and V/K. */
export interface Datasheet {
  shortCircuitCurrent: number;
  openCircuitVoltage: number;
  maximumPowerCurrent: number;
  maximumPowerVoltage: number;
  /** A/K. */
  shortCircuitCurrentCoefficient: number;
  /** V/K, below 0. */
  openCircuitVoltageCoefficient: number;
  /** eV. */
  bandgap: number;
  /** 1/K. */
  bandgapCoefficient: number;
}

/** How far a circuit is from each of the five conditions, relative; 0 is met. */
export interface Misfits {
  shortCircuitCurrent: number;
  openCircuitVoltage: number;
  maximumPowerCurrent: number;
  /** dP/dV at Vmp over Imp. */
  maximumPowerSlope: number;
  openCircuitVoltageCoefficient: number;
}

const WARM = STANDARD_TEMPERATURE + 10;
const WARM_RATIO = (WARM + ZERO_CELSIUS) / (STANDARD_TEMPERATURE + ZERO_CELSIUS);
const RESISTANCE_STEPS = 64;
/** How far outside its bounds a root may lie by rounding, in the scale of the datasheet. */
const BOUND_ROUNDING = 1e-9;
/** Bounds of Voc/a: from a far too soft to a far too sharp knee for any diode. */
const SOFTEST = 3;
const SHARPEST = 300;

/** Saturation current times e^{Voc/a} (A), and shunt conductance (S), that meet Isc, Voc and Imp at given Rs and a. */
function linearPart(of: Datasheet, seriesResistance: number, a: number) {
  const { shortCircuitCurrent: isc, openCircuitVoltage: voc, maximumPowerCurrent: imp } = of;
  const shortJunction = isc * seriesResistance - voc;
  const peakJunction = of.maximumPowerVoltage + imp * seriesResistance - voc;
  const shortRise = -Math.expm1(shortJunction / a);
  const peakRise = -Math.expm1(peakJunction / a);
  const determinant = peakRise * shortJunction - shortRise * peakJunction;
  const knee = (imp * shortJunction - isc * peakJunction) / determinant;
  const shunt = (imp * shortRise - isc * peakRise) / determinant;
  return { knee, shunt, peakDiode: knee * Math.exp(peakJunction / a) };
}

/** ln of the ratio of the light's to the diode's current at 35 degC and Voc + 10 muVoc: 0 meets the fifth condition. */
function warmResidual(of: Datasheet, seriesResistance: number, a: number): number {
  const { knee, shunt } = linearPart(of, seriesResistance, a);
  const voc = of.openCircuitVoltage;
  const rise = logSaturationRise(WARM, of.bandgap, of.bandgapCoefficient);
  const warmVoltage = voc + 10 * of.openCircuitVoltageCoefficient;
  const saturation = knee * Math.exp(-voc / a);
  const photocurrent = knee - saturation + shunt * voc;
  const light =
    photocurrent + 10 * of.shortCircuitCurrentCoefficient + saturation * Math.exp(rise) - shunt * warmVoltage;
  return Math.log(light / knee) - (rise - voc / a + warmVoltage / (a * WARM_RATIO));
}

/** a (V) that meets all conditions but dP/dV = 0, for a series resistance (ohm); NaN where there is none. */
function idealityFor(of: Datasheet, seriesResistance: number): number {
  const { openCircuitVoltage: voc } = of;
  return bracketedRoot((a) => warmResidual(of, seriesResistance, a), voc / SHARPEST, voc / SOFTEST);
}

/** dP/dV at Vmp over Imp, times 1 + Rs dI/dx: 0 meets the fourth condition. */
function slopeResidual(of: Datasheet, seriesResistance: number): number {
  const a = idealityFor(of, seriesResistance);
  const { shunt, peakDiode } = linearPart(of, seriesResistance, a);
  const conductance = peakDiode / a + shunt;
  const ratio = of.maximumPowerCurrent / of.maximumPowerVoltage;
  return (conductance * (1 - seriesResistance * ratio)) / ratio - 1;
}

function parametersFor(of: Datasheet, seriesResistance: number): SingleDiodeParameters {
  const idealityVoltage = idealityFor(of, seriesResistance);
  const { knee, shunt } = linearPart(of, seriesResistance, idealityVoltage);
  const logSaturationCurrent = Math.log(knee) - of.openCircuitVoltage / idealityVoltage;
  return {
    photocurrent: knee - Math.exp(logSaturationCurrent) + shunt * of.openCircuitVoltage,
    logSaturationCurrent,
    seriesResistance,
    shuntConductance: shunt,
    idealityVoltage,
    photocurrentCoefficient: of.shortCircuitCurrentCoefficient,
    bandgap: of.bandgap,
    bandgapCoefficient: of.bandgapCoefficient,
  };
}

/**
 * The circuit that meets the five conditions of a datasheet exactly (Isc, Voc, Imp at Vmp, dP/dV = 0 there, and
 * Voc(35 degC) = Voc + 10 muVoc) with Rs >= 0 and Rsh > 0, or null where there is none.
 *
 * Source: De Soto, Klein & Beckman, Solar Energy 80 (2006) 78-88 (conditions from memory); the 10 K step belongs to
 * the definition. For given Rs and a three conditions are linear in IL, I0 and 1/Rsh; the other two are bracketed,
 * a inside Rs. Accuracy: every misfit below 1e-9, or null. Of several roots that with the least Rs is taken.
 */
export function exactDatasheetFit(of: Datasheet): SingleDiodeParameters | null {
  const highest = (of.openCircuitVoltage - of.maximumPowerVoltage) / of.maximumPowerCurrent;
  let last = 0;
  let lastResidual = slopeResidual(of, 0);
  // A root at the bound itself may lie outside by rounding.
  const atBound = Math.abs(lastResidual) <= BOUND_ROUNDING ? acceptable(of, 0) : null;
  if (atBound !== null) return atBound;
  for (let k = 1; k < RESISTANCE_STEPS; k++) {
    const next = (highest * k) / RESISTANCE_STEPS;
    const residual = slopeResidual(of, next);
    if (lastResidual * residual <= 0) {
      const root = bracketedRoot((seriesResistance) => slopeResidual(of, seriesResistance), last, next);
      const found = acceptable(of, root);
      if (found !== null) return found;
    }
    last = next;
    lastResidual = residual;
  }
  return null;
}

function acceptable(of: Datasheet, seriesResistance: number): SingleDiodeParameters | null {
  if (Number.isNaN(seriesResistance)) return null;
  const found = parametersFor(of, seriesResistance);
  const leastShunt = -BOUND_ROUNDING * (of.shortCircuitCurrent / of.openCircuitVoltage);
  if (found.shuntConductance < 0 && found.shuntConductance >= leastShunt) found.shuntConductance = 0;
  if (!(found.shuntConductance >= 0 && found.photocurrent > 0 && Number.isFinite(found.logSaturationCurrent))) {
    return null;
  }
  const worst = Math.max(...Object.values(datasheetMisfits(of, found)).map(Math.abs));
  return worst <= 1e-9 ? found : null;
}

/** How far the circuit of `parameters` is from each of the datasheet's five conditions. */
export function datasheetMisfits(of: Datasheet, parameters: SingleDiodeParameters): Misfits {
  const module = singleDiodeModule(parameters);
  const circuit = emptyCircuit();
  module.circuitAt(STANDARD_IRRADIANCE, WARM, circuit);
  const warmVoltage = openCircuitVoltage(circuit);
  module.circuitAt(STANDARD_IRRADIANCE, STANDARD_TEMPERATURE, circuit);
  const voltage = openCircuitVoltage(circuit);
  const current = currentAt(circuit, of.maximumPowerVoltage);
  return {
    shortCircuitCurrent: shortCircuitCurrent(circuit) / of.shortCircuitCurrent - 1,
    openCircuitVoltage: voltage / of.openCircuitVoltage - 1,
    maximumPowerCurrent: current / of.maximumPowerCurrent - 1,
    maximumPowerSlope: powerSlopeAt(circuit, of.maximumPowerVoltage) / of.maximumPowerCurrent,
    openCircuitVoltageCoefficient: (warmVoltage - voltage) / (10 * of.openCircuitVoltageCoefficient) - 1,
  };
}
