import { Decimal } from "decimal.js";
import { emptyCircuit } from "../../../service/core/diode/circuit.ts";
import type { TestGeneratorTechnology } from "../../../service/core/module/test-generator.ts";
import { testGeneratorModule } from "../../../service/core/module/test-generator.ts";
import type { ModuleChoice } from "../../../service/studies/module-choice.ts";
import optimum from "../../fixtures/optimum-fractions.json" with { type: "json" };
import facts from "../../fixtures/test-generator.json" with { type: "json" };
import type { Check } from "../check.ts";
import { printed, relative } from "../check.ts";
import { pointsOf } from "./modules-from-papers.ts";

/** The standard's generator of 1000 W and 100 V. */
export function generatorChoice(technology: string): Extract<ModuleChoice, { kind: "test-generator" }> {
  return {
    kind: "test-generator",
    technology: technology as TestGeneratorTechnology,
    maximumPower: 1000,
    maximumPowerVoltage: 100,
  };
}

/** C_AQ of EN 50530:2010 Annex C, (FF_U - 1)/ln(1 - FF_I): ideality over nominal open-circuit voltage. */
const CURVATURE: Record<string, number> = {
  "crystalline-silicon": -0.2 / Math.log(0.1),
  "thin-film": -0.28 / Math.log(0.2),
};

const CONSTANTS_SOURCE =
  "EN 50530:2010 Annex C; IEC 62891:2020 Annex A (crystalline silicon constants read, thin film from memory)";

/** C_G (W/m2), C_V and C_R (m2/W) of the same source. */
const LIGHT: Record<string, [scale: string, logarithmic: string, linear: string]> = {
  "crystalline-silicon": ["2.514e-3", "8.593e-2", "1.088e-4"],
  "thin-film": ["1.252e-3", "8.419e-2", "1.476e-4"],
};

/** C_V ln(G/C_G + 1) - C_R G in 40 digits: Uoc over Uoc,stc at 25 degC. */
function lightTerm(technology: string, irradiance: number): number {
  const Digits = Decimal.clone({ precision: 40 });
  const [scale, logarithmic, linear] = LIGHT[technology].map((constant) => new Digits(constant));
  return new Digits(irradiance).div(scale).add(1).ln().mul(logarithmic).sub(linear.mul(irradiance)).toNumber();
}

/** The generator at 25 degC, and its nominal open-circuit voltage, V. */
function generatorAt(technology: string, irradiance: number) {
  const module = testGeneratorModule(generatorChoice(technology));
  const circuit = emptyCircuit();
  module.circuitAt(irradiance, 25, circuit);
  const nominal = circuit.idealityVoltage / CURVATURE[technology];
  return { ...pointsOf(circuit), nominal, standard: module.standardOpenCircuitVoltage };
}

/** Decimals with which the ratio of the open-circuit voltages is known. */
const RATIO_DECIMALS: Record<string, number> = { "crystalline-silicon": 7, "thin-film": 6 };

const topic = "Test generator";
const { source } = facts;

/** What the published constants of the standard's generator give. */
export const TEST_GENERATOR: Check[] = [
  {
    topic,
    title: "True over nominal open-circuit voltage at 1000 W/m2, to the stated digits",
    source,
    figures: () =>
      facts.rows.map(({ technology, trueOverNominal }) => {
        const { openCircuitVoltage, nominal } = generatorAt(technology, 1000);
        return printed(technology, trueOverNominal, openCircuitVoltage / nominal, RATIO_DECIMALS[technology]);
      }),
  },
  {
    topic,
    title: "Uoc over Uoc,stc by irradiance",
    source: `${CONSTANTS_SOURCE}; formula evaluated with 40 digits by a decimal library`,
    figures: () =>
      facts.rows.flatMap(({ technology }) =>
        [10, 200, 1000].map((irradiance) => {
          const { nominal, standard } = generatorAt(technology, irradiance);
          const expected = lightTerm(technology, irradiance);
          return relative(`${technology}, ${irradiance} W/m2`, expected, nominal / standard, 1e-12);
        }),
      ),
  },
  {
    topic,
    title: "Peak of a generator given as 100 V, V, to the stated digits",
    source,
    figures: () =>
      facts.rows
        .filter(({ peakOf100V }) => peakOf100V !== null)
        .map(({ technology, peakOf100V }) =>
          printed(technology, peakOf100V!, generatorAt(technology, 1000).maximumPowerVoltage, 3),
        ),
  },
  {
    topic,
    title: "Vmp over the true open-circuit voltage at any irradiance, to the stated digits",
    source: optimum.source,
    figures: () =>
      optimum.rows.flatMap(({ technology, fraction }) =>
        [1, 20, 200, 1000, 1500].map((irradiance) => {
          const { maximumPowerVoltage, openCircuitVoltage } = generatorAt(technology, irradiance);
          return printed(`${technology}, ${irradiance} W/m2`, fraction, maximumPowerVoltage / openCircuitVoltage, 6);
        }),
      ),
  },
];
