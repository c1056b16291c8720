import type { SingleDiodeParameters } from "../../../service/core/module/single-diode.ts";
import { SILICON_BANDGAP, SILICON_BANDGAP_COEFFICIENT } from "../../../service/core/module/single-diode.ts";
import papers from "../../fixtures/modules-from-papers.json" with { type: "json" };

/** A circuit as papers print it: A, ohm, V. */
export interface PrintedCircuit {
  photocurrent: number;
  saturationCurrent: number;
  seriesResistance: number;
  shuntResistance: number;
  idealityVoltage: number;
}

/** The parameters of a silicon module from a printed circuit; the photocurrent's coefficient in A/K. */
export function parametersOf(of: PrintedCircuit, photocurrentCoefficient = 0): SingleDiodeParameters {
  return {
    photocurrent: of.photocurrent,
    logSaturationCurrent: Math.log(of.saturationCurrent),
    seriesResistance: of.seriesResistance,
    shuntConductance: 1 / of.shuntResistance,
    idealityVoltage: of.idealityVoltage,
    photocurrentCoefficient,
    bandgap: SILICON_BANDGAP,
    bandgapCoefficient: SILICON_BANDGAP_COEFFICIENT,
  };
}

/** The 54-cell module of Villalva et al. 2009. */
export const VILLALVA = papers.rows[0];

/** The circuit that meets its datasheet's five conditions (computed independently, 30 digits). */
export const VILLALVA_SOLVED = parametersOf(VILLALVA.solved!, VILLALVA.datasheet!.currentCoefficientAPerK);
