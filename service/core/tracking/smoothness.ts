import type { Converter } from "./converter.ts";
import type { Contender } from "./steady.ts";

/** Whether the operating point follows the weather smoothly: no steps, no held samples, no sleep, no rounded reading. */
export function isSmooth({ rule, converter }: Contender): boolean {
  if (rule.behaviour === "perfect") return true;
  if (rule.behaviour === "climb" || rule.step > 0 || converter.wakePower > 0) return false;
  if (rule.sampling === null) return true;
  return rule.sampling.pilot && isUnrounded(converter);
}

/**
 * Whether the power at the fresh target is smooth enough to be checked. Where readings are rounded or come from a sweep
 * it moves in small stairs: the cubics then run through their middle, which touches only how the loss splits between
 * set point and held sample, by less than one stair.
 */
export function followsFresh({ rule, converter }: Contender): boolean {
  if (rule.behaviour !== "target") return false;
  return rule.sampling === null || (rule.sampling.reads !== "best-swept-voltage" && isUnrounded(converter));
}

function isUnrounded({ voltageSensor, currentSensor }: Converter): boolean {
  return voltageSensor.resolution === 0 && currentSensor.resolution === 0;
}
