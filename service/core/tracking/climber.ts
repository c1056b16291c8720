import type { OperatingPoint } from "../diode/maximum-power.ts";
import type { ClimbingRule, Seen } from "../rules/rule.ts";
import { isExact, readingOf } from "./converter.ts";
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
 * The power (W) that a converter's sensors make of an operating point: the product of their readings. Ripple makes the
 * mean power differ from voltage times mean current; the readings keep that ratio.
 */
export function readPower({ converter }: Terminals, point: OperatingPoint): number {
  if (isExact(converter.voltageSensor) && isExact(converter.currentSensor)) return point.power;
  const reading = readingOf(converter.voltageSensor, point.voltage) * readingOf(converter.currentSensor, point.current);
  const apparent = point.voltage * point.current;
  return converter.rippleAmplitude > 0 && apparent > 0 ? reading * (point.power / apparent) : reading;
}

/**
 * Lets a climber see, through its sensors, the operating point of a period in which it asked for `voltage` (V), decide,
 * and step from there. Returns the next voltage, V, inside the window.
 */
export function climbOn(
  rule: ClimbingRule,
  terminals: Terminals,
  seen: Seen,
  voltage: number,
  point: OperatingPoint,
): number {
  const { voltageSensor, currentSensor } = terminals.converter;
  // A rule at rest measures change from where it came to rest, not from period to period: a slow drift adds up.
  const rests = seen.direction === 0 && seen.voltage === seen.earlierVoltage;
  if (!rests) {
    seen.earlierVoltage = seen.voltage;
    seen.earlierCurrent = seen.current;
    seen.earlierPower = seen.power;
  }
  seen.voltage = readingOf(voltageSensor, point.voltage);
  seen.current = readingOf(currentSensor, point.current);
  seen.power = readPower(terminals, point);
  seen.direction = rule.decide(seen);
  const wanted = voltage + seen.direction * rule.step;
  const next = terminals.clamp(wanted);
  seen.cut = next !== wanted;
  return next;
}
