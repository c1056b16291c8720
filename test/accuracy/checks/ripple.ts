import { testGeneratorModule } from "../../../service/core/module/test-generator.ts";
import { steadyPoint } from "../../core/tracking/steady-run.ts";
import ripple from "../../fixtures/ripple-loss.json" with { type: "json" };
import { bisect } from "../../oracle/diode-equation.ts";
import type { Check } from "../check.ts";
import { absolute } from "../check.ts";
import { generatorChoice } from "./test-generator.ts";

/** Lost fraction of the generator held at its peak of 1000 W/m2 with a ripple. */
function lossAt(technology: string, rippleAmplitude: number): number {
  const module = testGeneratorModule(generatorChoice(technology));
  const trial = { kind: "constant-voltage", settings: {}, converter: { rippleAmplitude } } as const;
  return 1 - steadyPoint(module, [1000, 25], trial).efficiency;
}

const topic = "Ripple";

/** What a ripple of the voltage costs. */
export const RIPPLE: Check[] = [
  {
    topic,
    title: "Lost fraction held at the peak, averaged over a cycle",
    source: ripple.source,
    figures: () =>
      ripple.rows.map(({ technology, amplitude, loss }) =>
        absolute(`${technology}, amplitude ${amplitude}`, loss, lossAt(technology, amplitude), 1e-5),
      ),
  },
  {
    topic,
    title: "Amplitude that costs 2 %, as published",
    source: "Kjaer, Pedersen & Blaabjerg, IEEE Trans. Ind. Appl. 41(5) (2005) 1292-1306, eq. 1 (from memory)",
    figures: () => [
      absolute(
        "crystalline-silicon",
        0.085,
        bisect((amplitude) => lossAt("crystalline-silicon", amplitude) < 0.02, 0.01, 0.2),
        0.004,
      ),
    ],
  },
];
