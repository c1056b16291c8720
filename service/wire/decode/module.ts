import type { z } from "@hono/zod-openapi";
import type { ModuleChoice } from "../../studies/module-choice.ts";
import type { Flaw } from "../problem.ts";
import type { DatasheetSchema, ModuleSchema, SingleDiodeSchema } from "../schema/module.ts";
import { currentCoefficientGuess, voltageCoefficientGuess } from "./coefficient.ts";

type RawModule = z.output<typeof ModuleSchema>;
type RawDatasheet = z.output<typeof DatasheetSchema>;

/** What is wrong between the members of a module. */
export function checkModule(module: RawModule): Flaw[] {
  if (module.kind === "datasheet")
    return [...checkMaximumPower(module), ...checkCells(module), ...checkCoefficients(module)];
  return module.kind === "single-diode" ? checkIdeality(module) : [];
}

function checkMaximumPower(of: RawDatasheet): Flaw[] {
  const flaws: Flaw[] = [];
  const below = (
    low: "maximumPowerVoltage" | "maximumPowerCurrent",
    high: "openCircuitVoltage" | "shortCircuitCurrent",
    unit: string,
  ) => {
    if (of[low] < of[high]) return;
    flaws.push({
      pointer: `/module/${low}`,
      code: "not-below-its-limit",
      detail: `${low} (${of[low]} ${unit}) must be below ${high} (${of[high]} ${unit}); were they swapped?`,
      expected: `below ${of[high]} ${unit}`,
    });
  };
  below("maximumPowerVoltage", "openCircuitVoltage", "V");
  below("maximumPowerCurrent", "shortCircuitCurrent", "A");
  return flaws;
}

function checkCells(of: RawDatasheet): Flaw[] {
  const perCell = of.openCircuitVoltage / of.cellsInSeries;
  if (perCell >= 0.2 && perCell <= 3) return [];
  return [
    {
      pointer: "/module/cellsInSeries",
      code: "implausible-cell-count",
      detail: `${of.openCircuitVoltage} V over ${of.cellsInSeries} cells in series is ${perCell.toPrecision(3)} V a cell; count the cells in series of one module, not those in parallel or of the whole array.`,
      expected: "0.2 to 3 V a cell",
    },
  ];
}

/** Coefficients that are inside their range, yet in another unit: no silicon module has them in %/K. */
function checkCoefficients(of: RawDatasheet): Flaw[] {
  const flaws: Flaw[] = [];
  const { openCircuitVoltageCoefficient: voltage, shortCircuitCurrentCoefficient: current } = of;
  const flaw = (name: string, given: number, guess: ReturnType<typeof currentCoefficientGuess>, wayOut: string) => {
    if (guess === null) return;
    flaws.push({
      pointer: `/module/${name}`,
      code: "unit-mistaken",
      detail: `${given} %/K is not credible: ${guess.because}. Did you mean ${guess.value} %/K? ${wayOut}`,
      expected: `${guess.value} %/K`,
    });
  };
  // A wide gap makes small voltage coefficients credible.
  if (voltage > -0.2 && of.bandgap < 1.3) {
    const guess = voltageCoefficientGuess(voltage, of.openCircuitVoltage);
    flaw("openCircuitVoltageCoefficient", voltage, guess, "Cells of another material: say so by their bandgap.");
  }
  if (current > 0 && current < 0.0125) {
    const guess = currentCoefficientGuess(current, of.shortCircuitCurrent);
    flaw("shortCircuitCurrentCoefficient", current, guess, "If it really is that small, send 0.");
  }
  return flaws;
}

/** k T/q at 25 degC, V. */
const THERMAL_VOLTAGE = 0.025693;

function checkIdeality(of: z.output<typeof SingleDiodeSchema>): Flaw[] {
  const factor = of.idealityVoltage / (of.cellsInSeries * THERMAL_VOLTAGE);
  if (factor >= 0.3) return [];
  return [
    {
      pointer: "/module/idealityVoltage",
      code: "unit-mistaken",
      detail: `${of.idealityVoltage} V over ${of.cellsInSeries} cells is an ideality factor of ${factor.toPrecision(2)}; is it the value of one cell? Multiply n k T/q by the cells in series.`,
      expected: `about ${(of.cellsInSeries * THERMAL_VOLTAGE).toPrecision(3)} V times the ideality factor`,
    },
  ];
}

/** A module of the wire as the studies take it: %/K become A/K and V/K, resistance becomes conductance. */
export function decodeModule(module: RawModule): ModuleChoice {
  switch (module.kind) {
    case "datasheet":
      return {
        ...module,
        shortCircuitCurrentCoefficient: (module.shortCircuitCurrentCoefficient / 100) * module.shortCircuitCurrent,
        openCircuitVoltageCoefficient: (module.openCircuitVoltageCoefficient / 100) * module.openCircuitVoltage,
      };
    case "single-diode": {
      const { saturationCurrent, shuntResistance, photocurrentCoefficient, ...same } = module;
      return {
        ...same,
        logSaturationCurrent: Math.log(saturationCurrent),
        shuntConductance: shuntResistance === null ? 0 : 1 / shuntResistance,
        photocurrentCoefficient: (photocurrentCoefficient / 100) * module.photocurrent,
      };
    }
    case "test-generator":
      return module;
  }
}
