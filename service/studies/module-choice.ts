import type { Datasheet, Misfits } from "../core/module/datasheet.ts";
import { datasheetMisfits, exactDatasheetFit } from "../core/module/datasheet.ts";
import type { Module } from "../core/module/module.ts";
import type { SingleDiodeParameters } from "../core/module/single-diode.ts";
import { singleDiodeModule } from "../core/module/single-diode.ts";
import type { TestGeneratorParameters } from "../core/module/test-generator.ts";
import { testGeneratorModule } from "../core/module/test-generator.ts";
import { nearestDatasheetFit } from "./nearest-datasheet-fit.ts";
import { StudyError } from "./study-error.ts";

/** A module as it was described; SI units, coefficients in A/K and V/K. */
export type ModuleChoice =
  | ({ kind: "datasheet"; cellsInSeries: number } & Datasheet)
  | ({ kind: "single-diode"; cellsInSeries: number } & SingleDiodeParameters)
  | ({ kind: "test-generator" } & TestGeneratorParameters);

/** How the circuit was come by. */
export type Fit = "exact" | "nearest" | "given";

/** A module ready to be asked, and what to say of it. */
export interface BuiltModule {
  module: Module;
  /** The circuit at standard test conditions; null for the test generator, whose formula is its own. */
  parameters: SingleDiodeParameters | null;
  fit: Fit;
  misfits: Misfits | null;
}

/**
 * The module of a choice.
 * A datasheet that no circuit meets exactly gets the nearest, if that is within 2 % of every condition.
 * @throws StudyError `inconsistent-datasheet` when it is not
 */
export function buildModule(choice: ModuleChoice): BuiltModule {
  switch (choice.kind) {
    case "test-generator":
      return { module: testGeneratorModule(choice), parameters: null, fit: "given", misfits: null };
    case "single-diode":
      return { module: singleDiodeModule(choice), parameters: choice, fit: "given", misfits: null };
    case "datasheet":
      return fromDatasheet(choice);
  }
}

/** Above this a circuit no longer stands for its datasheet. */
const WORST_MISFIT = 0.02;

function fromDatasheet(datasheet: Datasheet): BuiltModule {
  const exact = exactDatasheetFit(datasheet);
  if (exact !== null) {
    const misfits = datasheetMisfits(datasheet, exact);
    return { module: singleDiodeModule(exact), parameters: exact, fit: "exact", misfits };
  }
  const { parameters, misfits } = nearestDatasheetFit(datasheet);
  const bad = Object.entries(misfits).filter(([, misfit]) => !(Math.abs(misfit) <= WORST_MISFIT));
  if (bad.length > 0) {
    const shown = Object.entries(misfits).map(([name, misfit]) => `${name} ${(100 * misfit).toFixed(2)} %`);
    throw new StudyError(
      "inconsistent-datasheet",
      "/module",
      `No single-diode circuit comes near this datasheet; the nearest misses by: ${shown.join(", ")}. Check ${bad.map(([name]) => name.replace("Slope", "Voltage")).join(", ")} against the sheet.`,
      "values that one circuit can meet within 2 % each",
    );
  }
  return { module: singleDiodeModule(parameters), parameters, fit: "nearest", misfits };
}
