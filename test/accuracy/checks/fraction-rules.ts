import { testGeneratorModule } from "../../../service/core/module/test-generator.ts";
import type { RuleKind } from "../../../service/core/rules/index.ts";
import { OPEN_CONVERTER } from "../../../service/studies/converter-choice.ts";
import { tune } from "../../../service/studies/tuning.ts";
import { steadyPoint } from "../../core/tracking/steady-run.ts";
import fractions from "../../fixtures/fractions-on-test-generator.json" with { type: "json" };
import optimum from "../../fixtures/optimum-fractions.json" with { type: "json" };
import type { Check } from "../check.ts";
import { absolute, relative } from "../check.ts";
import { instantClimate } from "../climb-run.ts";
import { generatorChoice } from "./test-generator.ts";

const IRRADIANCES = [5, 50, 200, 700, 1000, 1400];

const efficiencyOf = (
  technology: string,
  irradiance: number,
  kind: RuleKind,
  settings: Record<string, number | boolean>,
): number =>
  steadyPoint(testGeneratorModule(generatorChoice(technology)), [irradiance, 25], { kind, settings }).efficiency;

const topic = "Fraction rules";

/** One line a rule and a technology. */
const kept = (rule: RuleKind, technology: string): Check => ({
  topic,
  title: `Efficiency of ${rule} on the ${technology} test generator at any irradiance`,
  source: fractions.source,
  figures: () =>
    fractions.rows
      .filter((row) => row.rule === rule && row.technology === technology)
      .flatMap(({ fraction, efficiency }) =>
        IRRADIANCES.map((irradiance) =>
          absolute(
            `fraction ${fraction}, ${irradiance} W/m2`,
            efficiency,
            efficiencyOf(technology, irradiance, rule, { fraction, pilotCell: true }),
            1e-5,
          ),
        ),
      ),
});

/** Interruptions as settings and the share of the time they take. */
const INTERRUPTIONS: { kind: RuleKind; settings: Record<string, number>; share: number }[] = [
  { kind: "fractional-open-circuit-voltage", settings: {}, share: 0.256 / 16 },
  { kind: "short-current-pulse", settings: {}, share: 0.032 / 16 },
  { kind: "short-current-pulse", settings: { sampleDuration: 0.1, samplePeriod: 4 }, share: 0.025 },
];

/** What fractions of open-circuit voltage and short-circuit current keep, what sampling costs, what is best. */
export const FRACTION_RULES: Check[] = [
  kept("fractional-open-circuit-voltage", "crystalline-silicon"),
  kept("fractional-open-circuit-voltage", "thin-film"),
  kept("short-current-pulse", "crystalline-silicon"),
  kept("short-current-pulse", "thin-film"),
  {
    topic,
    title: "Sampling keeps 1 - duration/period of the power, exactly",
    source: "arithmetic; defaults: common practice, no source",
    figures: () =>
      INTERRUPTIONS.map(({ kind, settings, share }) => {
        const sampled = efficiencyOf("crystalline-silicon", 1000, kind, settings);
        const unbroken = efficiencyOf("crystalline-silicon", 1000, kind, { ...settings, pilotCell: true });
        return relative(`${kind}, ${share} of the time`, 1 - share, sampled / unbroken, 1e-12);
      }),
  },
  {
    topic,
    title: "Fraction .76 with .256 s in 16 s, efficiency",
    source: `${fractions.source} Interruption: arithmetic.`,
    figures: () => [
      absolute(
        "crystalline-silicon",
        0.97311,
        efficiencyOf("crystalline-silicon", 1000, "fractional-open-circuit-voltage", {}),
        1e-5,
      ),
    ],
  },
  {
    topic,
    title: "Best fraction of the open-circuit voltage, found by tuning",
    source: optimum.source,
    figures: () =>
      optimum.rows.map(({ technology, fraction }) => absolute(technology, fraction, tunedFraction(technology), 1e-4)),
  },
];

function tunedFraction(technology: string): number {
  const site = {
    id: technology,
    pointers: { module: "/module", climate: "/climate" },
    module: generatorChoice(technology),
    array: { modulesInSeries: 1, stringsInParallel: 1, wiringResistance: 0 },
    climate: instantClimate([150, 400, 700, 1000], 3600),
    mode: "steady" as const,
    converter: OPEN_CONVERTER,
  };
  const rule = { kind: "fractional-open-circuit-voltage" as const, settings: { pilotCell: true } };
  return tune({ sites: [site], rule, parameter: "fraction", range: null, points: 41 }).optimum.value;
}
