import type { StandardPoint } from "../core/array/array.ts";
import { photovoltaicArray } from "../core/array/array.ts";
import { STANDARD_TEMPERATURE, ZERO_CELSIUS } from "../core/constants.ts";
import type { Circuit } from "../core/diode/circuit.ts";
import type { Misfits } from "../core/module/datasheet.ts";
import type { SingleDiodeParameters } from "../core/module/single-diode.ts";
import { logSaturationRise, singleDiodeModule } from "../core/module/single-diode.ts";
import type { MeasuredCurve } from "./measured-curve-fit.ts";
import { measuredCurveFit } from "./measured-curve-fit.ts";
import type { ModuleChoice } from "./module-choice.ts";
import { buildModule } from "./module-choice.ts";
import { StudyError } from "./study-error.ts";

/** A measured curve of one module, and what is known of it beyond the points. */
export interface MeasuredModule extends MeasuredCurve {
  kind: "measured-curve";
  cellsInSeries: number;
  /** W/m2 during the measurement. */
  irradiance: number;
  /** degC during the measurement. */
  cellTemperature: number;
  /** Relative change of the photocurrent, 1/K. */
  photocurrentCoefficient: number;
  /** eV. */
  bandgap: number;
  /** 1/K. */
  bandgapCoefficient: number;
}

export interface ModuleFitRequest {
  module: Extract<ModuleChoice, { kind: "datasheet" }> | MeasuredModule;
}

/** The circuit found, at standard test conditions and, for a measured curve, as it was measured. */
export interface ModuleFitResult {
  fit: "exact" | "nearest" | "measured";
  cellsInSeries: number;
  parameters: SingleDiodeParameters;
  /** Of a datasheet's five conditions; null for a measured curve. */
  misfits: Misfits | null;
  /** The circuit at the measurement's irradiance and temperature; null for a datasheet. */
  measured: Circuit | null;
  /** Root mean square of model current minus measured current, A; null for a datasheet. */
  rootMeanSquareError: number | null;
  standard: StandardPoint;
}

/** Finds the circuit of a module. @throws StudyError when none comes near */
export function fitModule({ module }: ModuleFitRequest): ModuleFitResult {
  return module.kind === "datasheet" ? fitDatasheet(module) : fitMeasured(module);
}

function fitDatasheet(module: Extract<ModuleChoice, { kind: "datasheet" }>): ModuleFitResult {
  const built = buildModule(module);
  return {
    fit: built.fit === "exact" ? "exact" : "nearest",
    cellsInSeries: module.cellsInSeries,
    parameters: built.parameters!,
    misfits: built.misfits,
    measured: null,
    rootMeanSquareError: null,
    standard: standardOf(built.parameters!),
  };
}

function fitMeasured(module: MeasuredModule): ModuleFitResult {
  const found = measuredCurveFit(module);
  if (found === null) throw notFitted("No circuit follows these points.");
  const highest = module.current.reduce((most, value) => Math.max(most, value), 0);
  const share = found.rootMeanSquareError / highest;
  if (!(share <= WORST_ERROR)) {
    throw notFitted(
      `The nearest circuit misses these points by ${found.rootMeanSquareError.toPrecision(3)} A root mean square, ${(100 * share).toFixed(1)} % of the highest current.`,
    );
  }
  const parameters = toStandard(found.circuit, module);
  return {
    fit: "measured",
    cellsInSeries: module.cellsInSeries,
    parameters,
    misfits: null,
    measured: found.circuit,
    rootMeanSquareError: found.rootMeanSquareError,
    standard: standardOf(parameters),
  };
}

/** Root mean square error over the highest current, above which a circuit no longer stands for its points: own choice. */
const WORST_ERROR = 0.05;

function notFitted(finding: string): StudyError {
  return new StudyError(
    "curve-not-fitted",
    "/module",
    `${finding} Look for outliers, for voltage and current swapped, and for points out of pairs; a sound curve falls from near short circuit to near open circuit.`,
    `points within ${100 * WORST_ERROR} % of one circuit`,
  );
}

/** The translation to irradiance and temperature undone: the parameters at standard test conditions. */
function toStandard(circuit: Circuit, module: MeasuredModule): SingleDiodeParameters {
  const { irradiance, cellTemperature, bandgap, bandgapCoefficient } = module;
  const rise = logSaturationRise(cellTemperature, bandgap, bandgapCoefficient);
  const warming = 1 + module.photocurrentCoefficient * (cellTemperature - STANDARD_TEMPERATURE);
  const photocurrent = (circuit.photocurrent * 1000) / (irradiance * warming);
  const kelvinRatio = (STANDARD_TEMPERATURE + ZERO_CELSIUS) / (cellTemperature + ZERO_CELSIUS);
  return {
    photocurrent,
    logSaturationCurrent: circuit.logSaturationCurrent - rise,
    seriesResistance: circuit.seriesResistance,
    shuntConductance: (circuit.shuntConductance * 1000) / irradiance,
    idealityVoltage: circuit.idealityVoltage * kelvinRatio,
    photocurrentCoefficient: module.photocurrentCoefficient * photocurrent,
    bandgap,
    bandgapCoefficient,
  };
}

function standardOf(parameters: SingleDiodeParameters): StandardPoint {
  const one = { modulesInSeries: 1, stringsInParallel: 1, wiringResistance: 0 };
  return photovoltaicArray(singleDiodeModule(parameters), one).standard;
}
