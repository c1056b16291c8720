import { photovoltaicArray } from "../../../service/core/array/array.ts";
import { conditionVoc, emptyCondition, enterCondition } from "../../../service/core/array/condition.ts";
import type { RuleKind } from "../../../service/core/rules/index.ts";
import type { ModuleChoice } from "../../../service/studies/module-choice.ts";
import { buildModule } from "../../../service/studies/module-choice.ts";
import { VILLALVA, VILLALVA_SOLVED } from "../../core/module/paper-modules.ts";
import { SINGLE, steadyPoint } from "../../core/tracking/steady-run.ts";
import falling from "../../fixtures/falling-light.json" with { type: "json" };
import resting from "../../fixtures/incremental-conductance-steady.json" with { type: "json" };
import curvature from "../../fixtures/peak-curvature.json" with { type: "json" };
import orbit from "../../fixtures/perturb-orbit.json" with { type: "json" };
import type { Check, Figure } from "../check.ts";
import { printed, relative } from "../check.ts";
import { restingLoss } from "../climb-run.ts";
import { fallingShare } from "../falling-light.ts";
import { generatorChoice } from "./test-generator.ts";

const standardOf = (choice: ModuleChoice) => photovoltaicArray(buildModule(choice).module, SINGLE).standard;

/** Loss (W) of perturb and observe with a step of `step` V at rest, its orbit `offset` steps off the peak. */
function perturbLoss(choice: ModuleChoice, step: number, offset: number): number {
  const { maximumPowerVoltage: vmp, openCircuitVoltage: voc } = standardOf(choice);
  return restingLoss(
    choice,
    { kind: "perturb-and-observe", settings: { stepFraction: step / voc } },
    vmp + (6 + offset) * step,
  );
}

const OFFSETS = Array.from({ length: 64 }, (_, k) => k / 64);

/** Figures of a loss law in (D/Vmp)^2: `law` per kappa, `lost` as a share of the power. */
function lawFigures(law: number, tolerance: number, lost: (choice: ModuleChoice, share: number) => number): Figure[] {
  return curvature.rows.flatMap(({ technology, kappa }) =>
    [0.005, 0.01, 0.02].map((share) =>
      relative(
        `${technology}, D = ${share} Vmp`,
        law * kappa * share ** 2,
        lost(generatorChoice(technology), share),
        tolerance,
      ),
    ),
  );
}

/** Lost share of perturb and observe for a step of `share` of Vmp, its orbit `offset` steps off the peak. */
function perturbShare(choice: ModuleChoice, share: number, offset: number): number {
  const { maximumPowerVoltage: vmp, maximumPower } = standardOf(choice);
  return perturbLoss(choice, share * vmp, offset) / maximumPower;
}

/** Lost share at rest in the steady mode, at 1000 W/m2 and 25 degC. */
function steadyShare(choice: ModuleChoice, kind: RuleKind, settings: Record<string, number>): number {
  return 1 - steadyPoint(buildModule(choice).module, [1000, 25], { kind, settings }).efficiency;
}

/**
 * Mean lost share over 64 starts Voc - (j/64) D at rest, on the rule's own clock, with a step of 1 % of Uoc,stc. At
 * 1000 W/m2 the open-circuit voltage is the true one, not the nominal Uoc,stc.
 */
function steppedShare(choice: ModuleChoice, kind: RuleKind): number {
  const { openCircuitVoltage: nominal, maximumPower } = standardOf(choice);
  const condition = emptyCondition();
  enterCondition(condition, photovoltaicArray(buildModule(choice).module, SINGLE), 1000, 25);
  const rule = { kind, settings: { stepFraction: 0.01 } };
  const losses = OFFSETS.map((offset) => restingLoss(choice, rule, conditionVoc(condition) - offset * 0.01 * nominal));
  return losses.reduce((sum, loss) => sum + loss, 0) / (64 * maximumPower);
}

/** Mean lost share over 20 starts within half a step of the first peak. */
function meanFallingShare(slope: number): number {
  const shares = Array.from({ length: 20 }, (_, k) => fallingShare(slope, k / 20 - 0.5));
  return shares.reduce((sum, share) => sum + share, 0) / shares.length;
}

const SOLVED: ModuleChoice = {
  kind: "single-diode",
  cellsInSeries: VILLALVA.datasheet!.cellsInSeries,
  ...VILLALVA_SOLVED,
};

const topic = "Climbing rules";

/** Perturb and observe and incremental conductance at rest, and in falling light. */
export const CLIMBING_RULES: Check[] = [
  {
    topic,
    title: "Perturb and observe on the 54-cell module of Villalva et al. 2009, loss in W, to the printed digits",
    source: orbit.source,
    figures: () =>
      orbit.rows.map(({ step, loss }) =>
        printed(`step ${step} V`, loss, perturbLoss(SOLVED, step, 0), loss < 0.1 ? 7 : 6),
      ),
  },
  {
    topic,
    title: "Perturb and observe, centred orbit: (kappa/4)(D/Vmp)^2",
    source: curvature.source,
    figures: () => lawFigures(1 / 4, 0.02, (choice, share) => perturbShare(choice, share, 0)),
  },
  {
    topic,
    title: "Perturb and observe, mean orbit: (7 kappa/24)(D/Vmp)^2",
    source: curvature.source,
    figures: () =>
      lawFigures(7 / 24, 0.02, (choice, share) => {
        const { maximumPowerVoltage: vmp, openCircuitVoltage: voc } = standardOf(choice);
        return steadyShare(choice, "perturb-and-observe", { stepFraction: (share * vmp) / voc });
      }),
  },
  {
    topic,
    title: "Perturb and observe, worst orbit: (3 kappa/8)(D/Vmp)^2",
    source: curvature.source,
    figures: () =>
      lawFigures(3 / 8, 0.1, (choice, share) =>
        Math.max(...OFFSETS.map((offset) => perturbShare(choice, share, offset))),
      ),
  },
  {
    topic,
    title: "Perturb and observe on its own clock, mean of 64 starts, D = 1 % of Uoc,stc: (7 kappa/24)(D/Vmp)^2",
    source: curvature.source,
    figures: () =>
      curvature.rows.map(({ technology, kappa }) => {
        const choice = generatorChoice(technology);
        const { maximumPowerVoltage: vmp, openCircuitVoltage: voc } = standardOf(choice);
        const expected = ((7 * kappa) / 24) * ((0.01 * voc) / vmp) ** 2;
        return relative(technology, expected, steppedShare(choice, "perturb-and-observe"), 0.02);
      }),
  },
  {
    topic,
    title: "Incremental conductance at rest, lost fraction at 1000 W/m2",
    source: resting.source,
    figures: () =>
      resting.rows.map(({ technology, loss }) =>
        relative(technology, loss, steadyShare(generatorChoice(technology), "incremental-conductance", {}), 0.02),
      ),
  },
  {
    topic,
    title: "Incremental conductance on its own clock, mean of 64 starts",
    source: resting.source,
    figures: () =>
      resting.rows.map(({ technology, loss }) =>
        relative(technology, loss, steppedShare(generatorChoice(technology), "incremental-conductance"), 0.02),
      ),
  },
  {
    topic,
    title: "Perturb and observe while the light falls from 500 to 100 W/m2, lost fraction",
    source: falling.source,
    figures: () =>
      falling.rows.map(({ slope, loss }) => relative(`${slope} W/m2/s`, loss, meanFallingShare(slope), 0.1)),
  },
];
