import type { RuleChoice, RuleKind } from "../../../service/core/rules/index.ts";
import { OPEN_CONVERTER } from "../../../service/studies/converter-choice.ts";
import type { DynamicEfficiency } from "../../../service/studies/dynamic-efficiency.ts";
import { testEfficiency } from "../../../service/studies/efficiency-test.ts";
import type { SequenceName } from "../../../service/studies/ramp-sequence.ts";
import held from "../../fixtures/held-references.json" with { type: "json" };
import durations from "../../fixtures/test-durations.json" with { type: "json" };
import type { Check } from "../check.ts";
import { absolute } from "../check.ts";
import { generatorChoice } from "./test-generator.ts";

const SEQUENCES = ["dynamic-100-500", "dynamic-300-1000"] as const;

/** The dynamic test of a rule on the crystalline silicon test generator at 25 degC. */
function dynamicTest(test: SequenceName, rule: RuleChoice): DynamicEfficiency {
  return testEfficiency({
    module: generatorChoice("crystalline-silicon"),
    rule,
    converter: OPEN_CONVERTER,
    test,
    cellTemperature: 25,
    temperatureLag: null,
    traceSlope: null,
  }).dynamic!;
}

const untracked = (test: string): DynamicEfficiency =>
  dynamicTest(test as SequenceName, { kind: "perfect", settings: {} });

const topic = "Dynamic efficiency tests";

/** The standard's sequences: how long they last, and what rules on their own clock lose on them. */
export const DYNAMIC_SEQUENCES: Check[] = [
  {
    topic,
    title: "Durations of the rows, s, to the nearest second",
    source: durations.source,
    figures: () =>
      durations.rows.flatMap((row) =>
        untracked(row.test).rows.map(({ slope, duration }, k) =>
          absolute(`${row.test}, ${slope} W/m2/s`, row.durations[k], duration, 0.5),
        ),
      ),
  },
  {
    topic,
    title: "Total durations, s, to the nearest second",
    source: durations.source,
    figures: () => durations.rows.map(({ test, total }) => absolute(test, total, untracked(test).duration, 0.5)),
  },
  {
    topic,
    title: "Lost fraction of held references",
    source: held.source,
    figures: () =>
      held.rows.flatMap((row) =>
        SEQUENCES.map((test) => {
          const { fraction, ...sampling } = row.settings;
          const settings = { fraction, ...sampling, controlPeriod: 1 };
          const { efficiency } = dynamicTest(test, { kind: row.rule as RuleKind, settings });
          return absolute(`${row.rule}, fraction ${fraction}, ${test}`, row[test], 1 - efficiency, 0.003);
        }),
      ),
  },
  {
    topic,
    title: "Incremental conductance that never rests, beside perturb and observe (expected: our figure for the latter)",
    source: "Sera et al., IEEE J. Photovolt. 3(3) (2013) 1070-1078: the two are equivalent (from memory)",
    figures: () =>
      SEQUENCES.map((test) => {
        const perturb = dynamicTest(test, { kind: "perturb-and-observe", settings: {} });
        const incremental = dynamicTest(test, { kind: "incremental-conductance", settings: { holdTolerance: 0 } });
        // Ours too, so to six digits, which no machine moves.
        const beside = Number(perturb.efficiency.toFixed(6));
        return absolute(`efficiency, ${test}`, beside, incremental.efficiency, 0.002);
      }),
  },
];
