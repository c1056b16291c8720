import type { Circuit } from "../diode/circuit.ts";
import type { FollowingCurrent } from "../diode/following-current.ts";
import type { ClimbingRule, Seen } from "../rules/rule.ts";
import type { Converter } from "./converter.ts";
import type { PeriodGrid, Periods } from "./period-grid.ts";
import type { Stretch } from "./stretch.ts";
import type { Tally } from "./tally.ts";

/** A climber on its way: all that `climbAlong` reads and moves on. */
export interface Climb {
  readonly rule: ClimbingRule;
  readonly converter: Converter;
  readonly circuit: Circuit;
  readonly following: FollowingCurrent;
  readonly seen: Seen;
}

/**
 * Steps a climber along a stretch, from `voltage` (V), where nothing comes between it and the array: true sensors, no
 * limits, no ripple, no sweeps, no sleep. Returns the voltage after the last period, V.
 *
 * The same as `climbOn` period by period, in one small loop: most of all stepped time is spent here.
 */
export function climbAlong(
  { rule, converter, circuit, following, seen }: Climb,
  voltage: number,
  { stretch, grid, periods }: { stretch: Stretch; grid: PeriodGrid; periods: Periods },
  tally: Tally,
): number {
  const { trackingMinimumVoltage: low, trackingMaximumVoltage: high } = converter;
  const { period } = grid;
  const { step } = rule;
  let held = voltage;
  let [operating, voltages, currents] = [0, 0, 0];
  for (let k = periods.first; k < periods.end; k++) {
    stretch.circuitAt((k + 0.5) * period, circuit);
    const current = Math.max(0, following.at(circuit, held));
    const power = held * current;
    const weight = k === grid.last ? grid.lastWeight : 1;
    operating += weight * power;
    voltages += weight * held;
    currents += weight * current;
    // A rule at rest measures change from where it came to rest: see `climbOn`.
    if (!(seen.direction === 0 && seen.voltage === seen.earlierVoltage)) {
      seen.earlierVoltage = seen.voltage;
      seen.earlierCurrent = seen.current;
      seen.earlierPower = seen.power;
    }
    seen.voltage = held;
    seen.current = current;
    seen.power = power;
    seen.direction = rule.decide(seen);
    const wanted = held + seen.direction * step;
    held = Math.min(high, Math.max(low, wanted));
    seen.cut = held !== wanted;
  }
  tally.operating += operating;
  tally.voltage += voltages;
  tally.current += currents;
  tally.lit += periods.end - periods.first - (periods.end - 1 === grid.last ? 1 - grid.lastWeight : 0);
  return held;
}
