import type { Datasheet, Misfits } from "../core/module/datasheet.ts";
import { datasheetMisfits, exactDatasheetFit } from "../core/module/datasheet.ts";
import type { Module } from "../core/module/module.ts";
import type { SingleDiodeParameters } from "../core/module/single-diode.ts";
import { singleDiodeModule } from "../core/module/single-diode.ts";
import type { TestGeneratorParameters } from "../core/module/test-generator.ts";
import { testGeneratorModule } from "../core/module/test-generator.ts";
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
 * @throws StudyError `inconsistent-datasheet` when no circuit meets the datasheet
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

function fromDatasheet(datasheet: Datasheet): BuiltModule {
  const exact = exactDatasheetFit(datasheet);
  if (exact === null) {
    throw new StudyError(
      "inconsistent-datasheet",
      "/module",
      "No single-diode circuit meets this datasheet's five values; check Vmp, Imp and the voltage coefficient against the sheet.",
    );
  }
  return {
    module: singleDiodeModule(exact),
    parameters: exact,
    fit: "exact",
    misfits: datasheetMisfits(datasheet, exact),
  };
}
