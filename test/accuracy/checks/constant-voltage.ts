import { testGeneratorModule } from "../../../service/core/module/test-generator.ts";
import { OPEN_CONVERTER } from "../../../service/studies/converter-choice.ts";
import { testEfficiency } from "../../../service/studies/efficiency-test.ts";
import { steadyPoint } from "../../core/tracking/steady-run.ts";
import constant from "../../fixtures/constant-voltage-on-test-generator.json" with { type: "json" };
import levels from "../../fixtures/static-levels.json" with { type: "json" };
import weighted from "../../fixtures/weighted-efficiencies.json" with { type: "json" };
import type { Check } from "../check.ts";
import { absolute, printed } from "../check.ts";
import { generatorChoice } from "./test-generator.ts";

const CHOICE = generatorChoice("crystalline-silicon");
const MODULE = testGeneratorModule(CHOICE);
const RULE = { kind: "constant-voltage", settings: {} } as const;

const efficiencyAt = (irradiance: number): number => steadyPoint(MODULE, [irradiance, 25], RULE).efficiency;

const staticTest = () =>
  testEfficiency({
    module: CHOICE,
    rule: RULE,
    converter: OPEN_CONVERTER,
    test: "static",
    cellTemperature: 25,
    temperatureLag: null,
    traceSlope: null,
  }).static!;

const topic = "Constant voltage";

/** The crystalline silicon test generator held at its maximum power voltage of 1000 W/m2. */
export const CONSTANT_VOLTAGE: Check[] = [
  {
    topic,
    title: "Efficiency by irradiance, set at the peak of 1000 W/m2",
    source: constant.source,
    figures: () =>
      constant.rows.map(({ irradiance, efficiency }) =>
        absolute(`${irradiance} W/m2`, efficiency, efficiencyAt(irradiance), 1e-4),
      ),
  },
  {
    topic,
    title: "Irradiance of the static test's levels, W/m2, to the printed digits",
    source: levels.source,
    figures: () => {
      const ours = staticTest().levels;
      return levels.rows.map(({ level, irradiance }) =>
        printed(`${level} % of the power`, irradiance, ours.find((one) => 100 * one.level === level)!.irradiance, 3),
      );
    },
  },
  {
    topic,
    title: "Weighted efficiency, the standard's levels of power",
    source: weighted.source,
    figures: () => {
      const { europeanWeighted, cecWeighted } = staticTest();
      const ours: Record<string, number> = { european: europeanWeighted, cec: cecWeighted };
      return weighted.rows
        .filter(({ levelsOf }) => levelsOf === "power")
        .map(({ weighting, efficiency }) => absolute(weighting, efficiency, ours[weighting], 1e-4));
    },
  },
  {
    topic,
    title: "Weighted efficiency, levels of irradiance",
    source: weighted.source,
    figures: () =>
      weighted.rows
        .filter(({ levelsOf }) => levelsOf === "irradiance")
        .map(({ weighting, efficiency, weights }) => {
          const ours = weights.reduce((sum, { level, weight }) => sum + weight * efficiencyAt(10 * level), 0);
          return absolute(weighting, efficiency, ours, 1e-4);
        }),
  },
];
