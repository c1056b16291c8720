import type { Direction, Seen } from "./rule.ts";

/** Powers this near each other, relatively, are equal: readings are products, and the last bit of one decides nothing. */
const ROUNDING = 1e-12;

/**
 * The decision of a climber that compares powers: turn where the last power is lower than the one before, or where
 * the window cut the last step short; equal powers keep the direction; without power, down. Before there is an
 * earlier power (NaN) the direction is kept.
 * Source: Femia, Petrone, Spagnuolo & Vitelli, IEEE Trans. Power Electron. 20(4) (2005) 963-973 (from memory).
 */
export function climbByPower(seen: Seen): Direction {
  if (seen.power <= 0 && seen.voltage > 0) return -1;
  const turns = seen.power < seen.earlierPower * (1 - ROUNDING) || seen.cut;
  return turns ? (-seen.direction as Direction) : seen.direction;
}
