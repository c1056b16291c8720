import type { OperatingPoint } from "../diode/maximum-power.ts";
import type { ClimbingRule, Seen } from "../rules/rule.ts";
import { readingOf } from "./converter.ts";
import type { Terminals } from "./terminals.ts";

/** What a climber knows at waking: it is on its way down and has seen nothing. */
export function firstSight(): Seen {
  return {
    earlierVoltage: Number.NaN,
    earlierCurrent: Number.NaN,
    earlierPower: Number.NaN,
    voltage: Number.NaN,
    current: Number.NaN,
    power: Number.NaN,
    direction: -1,
    cut: false,
  };
}

/**
 * Lets a climber see, through its sensors, the mean current and power of a period it spent at `voltage` (V), decide,
 * and step. Returns the next voltage, V, inside the window.
 */
export function climbOn(
  rule: ClimbingRule,
  terminals: Terminals,
  seen: Seen,
  voltage: number,
  point: OperatingPoint,
): number {
  const { voltageSensor, currentSensor } = terminals.converter;
  seen.earlierVoltage = seen.voltage;
  seen.earlierCurrent = seen.current;
  seen.earlierPower = seen.power;
  seen.voltage = readingOf(voltageSensor, voltage);
  seen.current = readingOf(currentSensor, point.current);
  // Ripple makes the mean power differ from voltage times mean current: the readings keep that ratio.
  const apparent = voltage * point.current;
  seen.power = apparent > 0 ? (seen.voltage * seen.current * point.power) / apparent : seen.voltage * seen.current;
  seen.direction = rule.decide(seen);
  const wanted = voltage + seen.direction * rule.step;
  const next = terminals.clamp(wanted);
  seen.cut = next !== wanted;
  return next;
}
