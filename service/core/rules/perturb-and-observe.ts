import { climbByPower } from "./climb-by-power.ts";
import { CLIMB_STEP_FRACTION, controlPeriod, defineRule } from "./rule.ts";

/** Steps the voltage, compares the power with the one before, and turns when it fell. */
export const perturbAndObserve = defineRule({
  kind: "perturb-and-observe",
  title: "Perturb and observe",
  description:
    "Steps the voltage at each decision and turns when the power fell. Never rests; moving light can mislead it.",
  interrupts: "nothing",
  sources: ["Femia, Petrone, Spagnuolo & Vitelli, IEEE Trans. Power Electron. 20(4) (2005) 963-973 (from memory)"],
  parameters: { controlPeriod: controlPeriod(0.1), stepFraction: CLIMB_STEP_FRACTION },
  prepare: (settings, array) => ({
    behaviour: "climb",
    controlPeriod: settings.controlPeriod,
    step: settings.stepFraction * array.standard.openCircuitVoltage,
    orbit: "three-level",
    restTolerance: 0,
    sampling: null,
    decide: climbByPower,
  }),
});
