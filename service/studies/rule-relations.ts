import type { RuleKind } from "../core/rules/index.ts";
import type { Settings } from "../core/rules/rule.ts";
import { StudyError } from "./study-error.ts";

/** Settings that must be shorter than another: the interruption and the period it recurs in. */
export const SHORTER = [
  ["sampleDuration", "samplePeriod"],
  ["sweepDuration", "scanPeriod"],
] as const;

/** What a rule's columns must match; null where there is no climate to follow. */
export type ColumnFrame = {
  samples: number;
  /** 1 where a sample is left out of every sum; null where none is. */
  skipped: Uint8Array | null;
} | null;

/**
 * Refuses settings that contradict each other, and columns that do not follow the climate sample by sample.
 * @param pointer of the rule in the request
 * @throws StudyError
 */
export function checkRule(kind: RuleKind, settings: Settings, frame: ColumnFrame, pointer: string): void {
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
    if (value instanceof Float64Array) checkColumn(`${name} of ${kind}`, value, frame, `${pointer}/${name}`);
  }
}

function checkColumn(name: string, column: Float64Array, frame: ColumnFrame, pointer: string): void {
  if (frame === null) {
    const detail = `There is no climate here that a column could follow: give ${name} as a single number.`;
    throw new StudyError("column-without-climate", pointer, detail, "a single number");
  }
  const { samples, skipped } = frame;
  if (column.length !== samples) {
    throw new StudyError(
      "unequal-columns",
      pointer,
      `${name} has ${column.length} values, the climate has ${samples} samples: give one value a sample, or a single number.`,
      `${samples} values`,
    );
  }
  const missing = column.findIndex((value, i) => Number.isNaN(value) && skipped?.[i] !== 1);
  if (missing < 0) return;
  throw new StudyError(
    "missing-samples",
    `${pointer}/${missing}`,
    `${name} has no value at sample ${missing}, which counts: fill it, or leave the sample out by a null in the climate and gaps "skip".`,
    "a number at every sample that counts",
  );
}
