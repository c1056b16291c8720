import { failure } from "../define-operation.ts";
import { performClimate } from "./climate-step.ts";
import { performDefaults } from "./defaults-step.ts";
import { performSite } from "./site-step.ts";
import type { Step, StepAnswer, StepName } from "./step.ts";

/** Performs a step on this thread. Never throws. */
export function performStep<Name extends StepName>(step: Step<Name>): StepAnswer<Name> {
  try {
    return perform(step) as StepAnswer<Name>;
  } catch (error) {
    return failure(error);
  }
}

function perform({ step, body, limits, given }: Step): StepAnswer {
  switch (step) {
    case "defaults":
      return performDefaults(body, limits);
    case "climate":
      return performClimate(body, limits);
    case "site":
      return performSite(body, given!, limits);
  }
}
