import type { RuleKind } from "../core/rules/index.ts";
import type { Settings } from "../core/rules/rule.ts";
import { StudyError } from "./study-error.ts";

/** Settings that must be shorter than another: the interruption and the period it recurs in. */
const SHORTER = [
  ["sampleDuration", "samplePeriod"],
  ["sweepDuration", "scanPeriod"],
] as const;

/**
 * Refuses settings that contradict each other or the climate's length.
 * @param pointer of the rule in the request
 * @throws StudyError
 */
export function checkRule(kind: RuleKind, settings: Settings, samples: number, pointer: string): void {
  for (const [shorter, longer] of SHORTER) {
    const [duration, period] = [settings[shorter], settings[longer]];
    if (typeof duration !== "number" || typeof period !== "number" || duration < period) continue;
    throw new StudyError(
      "interruption-not-shorter-than-period",
      `${pointer}/${shorter}`,
      `${shorter} (${duration} s) must be shorter than ${longer} (${period} s).`,
      `less than ${period} s`,
    );
  }
  for (const [name, value] of Object.entries(settings)) {
    if (!(value instanceof Float64Array) || value.length === samples) continue;
    throw new StudyError(
      "unequal-columns",
      `${pointer}/${name}`,
      `${name} of ${kind} has ${value.length} values, the climate has ${samples} samples: give one value a sample, or a single number.`,
      `${samples} values`,
    );
  }
}
