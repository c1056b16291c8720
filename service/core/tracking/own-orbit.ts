import { conditionVoc } from "../array/condition.ts";
import { currentAt } from "../diode/current.ts";
import type { OperatingPoint } from "../diode/maximum-power.ts";
import { emptyPoint } from "../diode/maximum-power.ts";
import { bracketedRoot } from "../numeric/bracketed-root.ts";
import type { ClimbingRule } from "../rules/rule.ts";
import { climbOn, firstSight } from "./climber.ts";
import { isExact } from "./converter.ts";
import { addPoint } from "./mean-over-voltage.ts";
import type { Terminals } from "./terminals.ts";

/** Start offsets averaged over, as shares of one step. */
const STARTS = 64;
/** Steps above its resting edge at which a climber's way down is joined: true sensors, wrong ones, rounding ones. */
const MARGIN = 2;
const SENSOR_MARGIN = 8;
const ROUNDED_MARGIN = 512;
/** Most control periods followed from one start. */
const MOST_PERIODS = 1024;

/**
 * Writes the mean operating point of a climber at rest in steady light: its own decisions, entered from open circuit
 * (or the window's upper edge), averaged over 64 start offsets of one step. What the rule sees goes through its sensors.
 *
 * The way down from open circuit is joined near the peak, on the lattice it would have reached. The orbit is averaged
 * over exactly one turn; one that does not close within 1024 periods, over its last half. At most 64 x 1024 evaluations.
 */
export function ownOrbit(terminals: Terminals, rule: ClimbingRule, mean: OperatingPoint): void {
  mean.voltage = mean.current = mean.power = 0;
  const top = terminals.clamp(conditionVoc(terminals.condition));
  const join = restingEdge(terminals, rule);
  const margin = marginOf(terminals);
  for (let start = 0; start < STARTS; start++) {
    const from = top - (start / STARTS) * rule.step;
    const skipped = Math.max(0, Math.floor((from - join) / rule.step) - margin);
    addOrbit(terminals, rule, from - skipped * rule.step, mean);
  }
}

/** Steps above its resting edge at which a climber's way down is joined: a rounded reading may stall it anywhere. */
function marginOf({ converter: { voltageSensor, currentSensor } }: Terminals): number {
  if (voltageSensor.resolution > 0 || currentSensor.resolution > 0) return ROUNDED_MARGIN;
  return isExact(voltageSensor) && isExact(currentSensor) ? MARGIN : SENSOR_MARGIN;
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

/** Adds 1/64 of the mean point of the orbit entered at `from` (V). */
function addOrbit(terminals: Terminals, rule: ClimbingRule, from: number, mean: OperatingPoint): void {
  const point = emptyPoint();
  const turn = emptyPoint();
  const seen = firstSight();
  let voltage = terminals.clamp(from);
  // A turn is closed when voltage, the one before and the direction recur: all that a decision depends on. The state
  // compared with is moved to the present at each power of two, so that any turn is found (Brent, BIT 20 (1980) 176).
  let mark = { voltage: Number.NaN, earlier: Number.NaN, direction: 0, period: 0 };
  let earlier = Number.NaN;
  for (let period = 0; period < MOST_PERIODS; period++) {
    const closed =
      same(voltage, mark.voltage, rule.step) &&
      same(earlier, mark.earlier, rule.step) &&
      seen.direction === mark.direction;
    if (closed) {
      addPoint(mean, turn, 1 / (STARTS * (period - mark.period)));
      return;
    }
    if ((period & (period - 1)) === 0) {
      mark = { voltage, earlier, direction: seen.direction, period };
      turn.voltage = turn.current = turn.power = 0;
    }
    terminals.operate(voltage, point);
    addPoint(turn, point, 1);
    earlier = voltage;
    voltage = climbOn(rule, terminals, seen, voltage, point);
  }
  addPoint(mean, turn, 1 / (STARTS * (MOST_PERIODS - mark.period)));
}

/** Whether two voltages are the same level of the lattice. */
function same(voltage: number, other: number, step: number): boolean {
  return Math.abs(voltage - other) <= 1e-9 * step;
}
