import { conditionVoc } from "../array/condition.ts";
import { currentAt } from "../diode/current.ts";
import type { OperatingPoint } from "../diode/maximum-power.ts";
import { bracketedRoot } from "../numeric/bracketed-root.ts";
import type { ClimbingRule, Seen } from "../rules/rule.ts";
import { isExact, readingOf } from "./converter.ts";
import { addPoint } from "./mean-over-voltage.ts";
import type { Terminals } from "./terminals.ts";

/** Start offsets averaged over, as shares of one step. */
const STARTS = 64;
/** Steps above its resting edge at which a climber's way down is joined: true sensors, and others. */
const MARGIN = 2;
const SENSOR_MARGIN = 8;
/** Control periods after which the orbit is taken as reached, and over which it is averaged. */
const SETTLE = 48;
const AVERAGE = 96;

/**
 * Writes the mean operating point of a climber at rest in steady light: its own decisions, entered from open circuit
 * (or the window's upper edge), averaged over 64 start offsets of one step. What the rule sees goes through its sensors.
 *
 * The way down from open circuit is joined near the peak, on the lattice it would have reached. An orbit that repeats
 * within 96 periods is averaged to within one period of it. At most 64 x 152 evaluations.
 */
export function ownOrbit(terminals: Terminals, rule: ClimbingRule, mean: OperatingPoint): void {
  mean.voltage = mean.current = mean.power = 0;
  const top = terminals.clamp(conditionVoc(terminals.condition));
  const join = restingEdge(terminals, rule);
  const { voltageSensor, currentSensor } = terminals.converter;
  const margin = isExact(voltageSensor) && isExact(currentSensor) ? MARGIN : SENSOR_MARGIN;
  for (let start = 0; start < STARTS; start++) {
    const from = top - (start / STARTS) * rule.step;
    const skipped = Math.max(0, Math.floor((from - join) / rule.step) - margin);
    addOrbit(terminals, rule, from - skipped * rule.step, mean);
  }
}

/** The highest voltage (V) at which the rule may do other than go down: secant slope over current above -tolerance. */
function restingEdge(terminals: Terminals, { step, restTolerance }: ClimbingRule): number {
  const { circuit, maximum } = terminals.condition;
  const slope = (voltage: number): number => {
    const current = currentAt(circuit, voltage);
    return current * (1 + restTolerance) + (voltage * (currentAt(circuit, voltage + step) - current)) / step;
  };
  const voc = conditionVoc(terminals.condition);
  const edge = bracketedRoot(slope, 0.1 * maximum.voltage, voc);
  return Math.max(terminals.converter.trackingMinimumVoltage, Number.isNaN(edge) ? voc : edge);
}

function addOrbit(terminals: Terminals, rule: ClimbingRule, from: number, mean: OperatingPoint): void {
  const { voltageSensor, currentSensor } = terminals.converter;
  const point = { voltage: 0, current: 0, power: 0 };
  const sum = { voltage: 0, current: 0, power: 0 };
  const seen: Seen = {
    earlierVoltage: Number.NaN,
    earlierCurrent: Number.NaN,
    voltage: 0,
    current: 0,
    direction: -1,
    cut: false,
  };
  let voltage = terminals.clamp(from);
  for (let period = 0; period < SETTLE + AVERAGE; period++) {
    terminals.operate(voltage, point);
    if (period >= SETTLE) addPoint(sum, point, 1);
    seen.voltage = readingOf(voltageSensor, voltage);
    seen.current = readingOf(currentSensor, point.current);
    seen.direction = rule.decide(seen);
    seen.earlierVoltage = seen.voltage;
    seen.earlierCurrent = seen.current;
    const wanted = voltage + seen.direction * rule.step;
    voltage = terminals.clamp(wanted);
    seen.cut = voltage !== wanted;
    if (seen.direction === 0 && period < SETTLE) {
      // At rest in steady light nothing moves any more.
      addPoint(mean, point, 1 / STARTS);
      return;
    }
  }
  addPoint(mean, sum, 1 / (STARTS * AVERAGE));
}
