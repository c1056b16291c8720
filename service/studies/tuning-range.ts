import type { RuleChoice } from "../core/rules/index.ts";
import { ruleDefinition } from "../core/rules/index.ts";
import type { NumberParameter } from "../core/rules/rule.ts";
import { SHORTER } from "./rule-relations.ts";
import { StudyError } from "./study-error.ts";
import { unitAfter } from "./unit-after.ts";
import { setting } from "./work.ts";

/** Values of a setting, from the lowest to the highest. */
export interface TuningRange {
  from: number;
  to: number;
}

/** The rule, its setting that is tuned, and the values to try; null: around what is usual. */
export interface Tuned {
  rule: RuleChoice;
  parameter: string;
  range: TuningRange | null;
}

/** The declaration of a setting that can be tuned, or null. */
function tunable(rule: RuleChoice, parameter: string): NumberParameter | null {
  const { parameters } = ruleDefinition(rule.kind);
  const declared = Object.hasOwn(parameters, parameter) ? parameters[parameter] : undefined;
  return declared?.type === "number" && !declared.integer ? declared : null;
}

/** The declaration of the setting that is tuned. @throws StudyError for one that cannot be */
export function tunedDeclaration({ rule, parameter }: Tuned): NumberParameter {
  const declared = tunable(rule, parameter);
  if (declared !== null) return declared;
  const names = Object.keys(ruleDefinition(rule.kind).parameters).filter((name) => tunable(rule, name) !== null);
  if (names.length === 0) {
    const detail = `${rule.kind} has no setting to tune; choose another rule.`;
    throw new StudyError("not-tunable", "/parameter", detail);
  }
  const one = `one of: ${names.join(", ")}`;
  throw new StudyError("not-tunable", "/parameter", `${parameter} of ${rule.kind} cannot be tuned; name ${one}.`, one);
}

/** What the values of a setting must keep within. */
interface Limits {
  low: number;
  high: number;
  /** Whether the limit itself is outside. */
  aboveLow: boolean;
  belowHigh: boolean;
}

/** The limits of a setting: its own, and the setting it must stay longer or shorter than. */
function limitsOf({ rule, parameter }: Tuned, declared: NumberParameter): Limits {
  const { minimum, exclusiveMinimum = Number.NEGATIVE_INFINITY, maximum } = declared;
  const limits: Limits = {
    low: minimum ?? exclusiveMinimum,
    high: maximum,
    aboveLow: minimum === undefined,
    belowHigh: false,
  };
  for (const [shorter, longer] of SHORTER) {
    const least = setting(rule, shorter);
    const most = setting(rule, longer);
    if (parameter === longer && least >= limits.low) Object.assign(limits, { low: least, aboveLow: true });
    if (parameter === shorter && most <= limits.high) Object.assign(limits, { high: most, belowHigh: true });
  }
  return limits;
}

/** The usual range half as wide again on either side, inside the limits. */
function usualRange(limits: Limits, [low, high]: readonly [number, number]): TuningRange {
  const margin = (high - low) / 2;
  let from = Math.max(low > 0 ? 0.1 * low : limits.low, low - margin, limits.low);
  if (limits.aboveLow && from <= limits.low) from = 1.01 * limits.low;
  let to = Math.min(limits.high, high + margin);
  if (limits.belowHigh && to >= limits.high) to = 0.99 * limits.high;
  if (to <= from) to = Math.min(limits.high, 10 * from);
  return { from, to };
}

/**
 * The range asked for, or one around what is usual; where nothing is usual, around the setting's value today.
 * @param today null: not known; the answer is null where it would be needed
 * @throws StudyError for a range that leaves what the setting may be
 */
export function tuningRange(of: Tuned, today: number | null): TuningRange | null {
  const declared = tunedDeclaration(of);
  const limits = limitsOf(of, declared);
  if (of.range !== null) {
    checkRange(of, of.range, { declared, limits });
    return of.range;
  }
  if (declared.usual !== undefined) return usualRange(limits, [...declared.usual]);
  if (today === null) return null;
  return usualRange(limits, today > 0 ? [0.7 * today, 1.2 * today] : [1.2 * today, 0.7 * today]);
}

function checkRange(
  { parameter }: Tuned,
  { from, to }: TuningRange,
  { declared, limits }: { declared: NumberParameter; limits: Limits },
): void {
  if (from >= to) {
    const detail = `The range ${from} to ${to} does not rise; were from and to swapped?`;
    throw new StudyError("range-not-rising", "/range", detail, "from below to");
  }
  const { low, high, aboveLow, belowHigh } = limits;
  if (from >= low && to <= high && !(aboveLow && from === low) && !(belowHigh && to === high)) return;
  const bounds = `${aboveLow ? "above " : ""}${low} ${belowHigh ? "to below" : "to"} ${high}${unitAfter(declared.unit)}`;
  const isShare = declared.unit.startsWith("1") && from > high && to / 100 <= high && from / 100 > low;
  const hint = isShare ? ` Did you mean ${from / 100} to ${to / 100}? It is a share, not a percentage.` : "";
  const relation = SHORTER.find((pair) => pair.some((name) => name === parameter));
  const reason = relation === undefined ? "" : ` (${relation[0]} must stay shorter than ${relation[1]})`;
  throw new StudyError(
    "range-outside-setting",
    "/range",
    `${parameter} may be ${bounds}${reason}; ${from} to ${to} leaves that.${hint}`,
    bounds,
  );
}
