import type { RuleChoice } from "../core/rules/index.ts";
import { StudyError } from "./study-error.ts";
import type { TuningRequest } from "./tuning.ts";
import { TRIED_BESIDES } from "./tuning.ts";
import type { TuningRange } from "./tuning-range.ts";
import { tuningRange } from "./tuning-range.ts";
import { scaleBetween } from "./tuning-scale.ts";
import { workOf } from "./work.ts";

/**
 * Work a tuning will take, in control periods, foreseen before anything is computed: the curve value by value, and the
 * closing in as if at the costlier end of the range. With many sites each is tuned by itself too.
 */
export function workOfTuning(request: TuningRequest): number {
  const { sites, points } = request;
  const rules = rulesTried(request, points);
  return sites.reduce((work, { climate, mode, converter }) => {
    const costOf = (tried: RuleChoice[]): number =>
      workOf(
        climate,
        mode,
        tried.map((rule) => ({ rule, converter, pointer: "" })),
      );
    const costliest = Math.max(costOf([rules[0]]), costOf([rules[rules.length - 1]]));
    return work + (sites.length > 1 ? 2 : 1) * (costOf(rules) + TRIED_BESIDES * costliest);
  }, 0);
}

/** The rule with each value of the curve; as it is where the range shows only later, or is refused then. */
function rulesTried(request: TuningRequest, points: number): RuleChoice[] {
  const { rule, parameter } = request;
  const range = rangeTried(request);
  if (range === null) return Array.from({ length: points }, () => rule);
  return scaleBetween(range)
    .spread(points)
    .map((value) => ({ kind: rule.kind, settings: { ...rule.settings, [parameter]: value } }));
}

function rangeTried(request: TuningRequest): TuningRange | null {
  try {
    return tuningRange(request, null);
  } catch (error) {
    if (error instanceof StudyError) return null;
    throw error;
  }
}
