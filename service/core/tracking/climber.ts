import type { ClimbingRule, Seen } from "../rules/rule.ts";
import { readingOf } from "./converter.ts";
import type { Terminals } from "./terminals.ts";

/** What a climber knows at waking: it is on its way down and has seen nothing. */
export function firstSight(): Seen {
  return {
    earlierVoltage: Number.NaN,
    earlierCurrent: Number.NaN,
    voltage: Number.NaN,
    current: Number.NaN,
    direction: -1,
    cut: false,
  };
}

/**
 * Lets a climber see a period's voltage (V) and mean current (A) through its sensors, decide, and step.
 * Returns the next voltage, V, inside the window.
 */
export function climbOn(
  rule: ClimbingRule,
  terminals: Terminals,
  seen: Seen,
  [voltage, current]: readonly [number, number],
): number {
  const { voltageSensor, currentSensor } = terminals.converter;
  seen.earlierVoltage = seen.voltage;
  seen.earlierCurrent = seen.current;
  seen.voltage = readingOf(voltageSensor, voltage);
  seen.current = readingOf(currentSensor, current);
  seen.direction = rule.decide(seen);
  const wanted = voltage + seen.direction * rule.step;
  const next = terminals.clamp(wanted);
  seen.cut = next !== wanted;
  return next;
}
