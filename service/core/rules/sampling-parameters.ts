import type { FlagParameter, NumberParameter } from "./rule.ts";

/** The time between two samples, s. */
export const SAMPLE_PERIOD = {
  type: "number",
  unit: "s",
  description: "Time from the start of one sample to the start of the next.",
  default: 16,
  minimum: 0.01,
  maximum: 86400,
  usual: [1, 600],
  source: "common practice, no source",
} as const satisfies NumberParameter;

/** How long one sample interrupts the power, s. */
export function sampleDuration(duration: number): NumberParameter {
  return {
    type: "number",
    unit: "s",
    description: "How long one sample interrupts the power; shorter than the sample period.",
    default: duration,
    minimum: 0,
    maximum: 3600,
    usual: [0.001, 1],
    source: "common practice, no source",
  };
}

/** A small cell of its own is read instead of the array. */
export const PILOT_CELL = {
  type: "flag",
  description: "Reads a pilot cell of its own, fresh at each decision, instead of interrupting the array.",
  default: false,
  source: "common practice, no source",
} as const satisfies FlagParameter;
