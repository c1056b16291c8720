import type { PhotovoltaicArray } from "../array/array.ts";
import type { Condition } from "../array/condition.ts";
import { conditionVoc, emptyCondition } from "../array/condition.ts";
import { FollowingCurrent } from "../diode/following-current.ts";
import type { OperatingPoint } from "../diode/maximum-power.ts";
import { emptyPoint, maximumPower } from "../diode/maximum-power.ts";
import type { Seen } from "../rules/rule.ts";
import { climbAlong } from "./climb-along.ts";
import { climbOn, firstSight } from "./climber.ts";
import { isExact } from "./converter.ts";
import type { SteppingKind } from "./followed.ts";
import { FOLLOWED, FOLLOWED_COUNT, followedTolerances, tallyFollowed } from "./followed.ts";
import type { Periods } from "./period-grid.ts";
import { PeriodGrid } from "./period-grid.ts";
import { SampleClock } from "./sample-clock.ts";
import { isSmooth } from "./smoothness.ts";
import type { Contender } from "./steady.ts";
import type { Piece, Stretch } from "./stretch.ts";
import { enterPiece, temperatureAt } from "./stretch.ts";
import type { Tally } from "./tally.ts";
import { emptyTally, tallyPoint } from "./tally.ts";
import { readSample, targetVoltage } from "./target.ts";
import { Terminals } from "./terminals.ts";
import type { Place, Run, TimedWeather } from "./weather-path.ts";
import { locate, valueAt } from "./weather-path.ts";

/** `perfect` has no period of its own: its energy is summed as finely as this, s. */
const PERFECT_PERIOD = 1;
/**
 * One rule on its own clock. Each period is evaluated once, at its middle: that power counts for the whole period and
 * is what the rule sees next. State is a handful of numbers; nothing grows with the periods.
 */
export class Stepper {
  readonly contender: Contender;
  readonly grid: PeriodGrid;
  readonly tally: Tally;
  /** Whether the operating point follows the weather smoothly, so that no period need be stepped one by one. */
  readonly smooth: boolean;
  readonly tolerances: readonly number[];
  private readonly kind: SteppingKind;
  /** A pilot cell stepped period by period: what it holds is always fresh. */
  private readonly holdsFresh: boolean;
  private readonly array: PhotovoltaicArray;
  private readonly weather: TimedWeather;
  private readonly terminals: Terminals;
  private readonly condition: Condition = emptyCondition();
  private readonly limited: boolean;
  /** Neither limits nor ripple: the array's own current at the held voltage. */
  private readonly plain: boolean;
  /** A climber with nothing between it and the array, see `climbAlong`. */
  private readonly free: boolean;
  private readonly following = new FollowingCurrent();
  private readonly point: OperatingPoint = emptyPoint();
  private readonly place: Place = { left: 0, right: 0, share: 0 };
  private readonly clock: SampleClock | null;
  private seen: Seen = firstSight();
  private asleep = true;
  private reading = Number.NaN;
  private voltage = Number.NaN;

  constructor(contender: Contender, array: PhotovoltaicArray, weather: TimedWeather) {
    const { rule, converter } = contender;
    this.contender = contender;
    this.tally = emptyTally(contender.ledger.extremes !== null);
    this.array = array;
    this.weather = weather;
    this.terminals = new Terminals(converter);
    const period = rule.behaviour === "perfect" ? Math.min(PERFECT_PERIOD, weather.step) : rule.controlPeriod;
    this.grid = new PeriodGrid(period, weather.step * weather.irradiance.length);
    this.limited = Number.isFinite(converter.maximumPower) || Number.isFinite(converter.maximumCurrent);
    this.plain = !this.limited && converter.rippleAmplitude === 0;
    this.smooth = isSmooth(contender);
    const sampling = rule.behaviour === "perfect" ? null : rule.sampling;
    this.clock = sampling === null ? null : new SampleClock(sampling, converter, array, weather);
    this.holdsFresh = !this.smooth && sampling !== null && sampling.pilot;
    this.kind = { behaviour: rule.behaviour, smooth: this.smooth, holdsFresh: this.holdsFresh };
    this.tolerances = followedTolerances(contender);
    const exact = isExact(converter.voltageSensor) && isExact(converter.currentSensor);
    this.free = this.plain && exact && this.clock === null && converter.wakePower === 0 && !this.tally.keepsExtremes;
  }

  /** Writes what the stepper follows of a condition (see `FOLLOWED`). */
  follow(condition: Condition, time: number, run: Run, values: Float64Array, offset: number): void {
    const { rule } = this.contender;
    const { terminals, point } = this;
    terminals.enter(condition);
    values[offset] = terminals.available;
    values[offset + 1] = terminals.clipped;
    values[offset + 2] = terminals.best;
    if (rule.behaviour === "climb") {
      values.fill(0, offset + 3, offset + FOLLOWED_COUNT);
      return;
    }
    if (rule.behaviour === "perfect") {
      terminals.operateWithoutRipple(terminals.bestVoltage, point);
      point.power = terminals.best;
    } else {
      const reading = rule.sampling === null ? 0 : readSample(rule.sampling, terminals);
      const fresh = targetVoltage(rule, terminals, reading, this.outsideAt(time, run));
      values[offset + 3] = terminals.power(fresh);
      if (this.smooth) terminals.operate(fresh, point);
    }
    if (rule.behaviour === "perfect") values[offset + 3] = terminals.best;
    values[offset + 4] = point.power;
    values[offset + 5] = point.voltage;
    values[offset + 6] = point.current;
  }

  private outsideAt(time: number, run: Run): number {
    const { rule } = this.contender;
    if (rule.behaviour !== "target") return 0;
    if (typeof rule.outside === "number") return rule.outside;
    locate(this.weather, run, time, this.place);
    return valueAt(rule.outside, this.place);
  }

  /** Forgets everything: darkness or a gap. */
  sleep(): void {
    this.asleep = true;
  }

  /** Steps the periods of a stretch whose cubics hold. `base` is the index of the stepper's first followed quantity. */
  stepAlong(stretch: Stretch, piece: Piece, run: Run, periods: Periods, base: number): void {
    const count = periods.end - periods.first;
    if (count <= 0) return;
    tallyFollowed(this.tally, stretch, { grid: this.grid, periods, base }, this.kind);
    if (this.smooth) return;
    const { circuit } = this.condition;
    const { rule, converter } = this.contender;
    if (this.free && rule.behaviour === "climb") {
      if (this.asleep) this.wakeIn(stretch, periods.first);
      const climb = { rule, converter, circuit, following: this.following, seen: this.seen };
      this.voltage = climbAlong(climb, this.voltage, { stretch, grid: this.grid, periods }, this.tally);
      return;
    }
    for (let k = periods.first; k < periods.end; k++) {
      const time = this.grid.middleOf(k);
      stretch.circuitAt(time, circuit);
      this.condition.cellTemperature = temperatureAt(piece, time);
      this.condition.openCircuitVoltage = Number.NaN;
      this.condition.shortCircuitCurrent = Number.NaN;
      if (this.limited) {
        maximumPower(circuit, this.condition.maximum);
        this.terminals.enter(this.condition);
      } else {
        this.terminals.condition = this.condition;
      }
      const wakePower = this.contender.converter.wakePower;
      const idle = wakePower > 0 && stretch.followedAt(base + FOLLOWED.available, time) < wakePower;
      this.stepPeriod(k, run, idle);
    }
  }

  /** Steps the periods of a piece too short or too crooked for cubics: everything solved period by period. */
  stepExactly(piece: Piece, run: Run, periods: Periods): void {
    const { tally, condition, terminals } = this;
    const { rule, converter } = this.contender;
    const values = new Float64Array(FOLLOWED_COUNT);
    for (let k = periods.first; k < periods.end; k++) {
      const time = this.grid.middleOf(k);
      enterPiece(condition, this.array, piece, time);
      if (condition.maximum.power <= 0) {
        this.sleep();
        continue;
      }
      this.follow(condition, time, run, values, 0);
      const weight = this.grid.weightOf(k);
      tally.maximum[0] += weight * condition.maximum.voltage;
      tally.maximum[1] += weight * condition.maximum.current;
      tally.maximum[2] += weight * condition.maximum.power;
      tally.sunlit += weight;
      tally.available += weight * values[FOLLOWED.available];
      tally.clipped += weight * values[FOLLOWED.clipped];
      tally.best += weight * values[FOLLOWED.best];
      if (!this.holdsFresh)
        tally.fresh += weight * (rule.behaviour === "climb" ? values[FOLLOWED.best] : values[FOLLOWED.fresh]);
      if (rule.behaviour === "climb") tally.held += weight * values[FOLLOWED.best];
      if (this.smooth) {
        tally.held += weight * values[FOLLOWED.fresh];
        tallyPoint(tally, this.point, weight, 0);
      } else {
        this.stepPeriod(k, run, terminals.available < converter.wakePower);
      }
    }
  }

  /** One period in the condition the terminals have entered. */
  private stepPeriod(k: number, run: Run, idle: boolean): void {
    const { rule } = this.contender;
    const { terminals, point, tally } = this;
    if (rule.behaviour === "perfect") return;
    const weight = this.grid.weightOf(k);
    if (this.asleep) this.wake(k);
    if (this.clock !== null) this.sample(this.clock, k, run);
    if (rule.behaviour === "climb") {
      this.operate();
      this.settle(k, idle, weight);
      this.voltage = climbOn(rule, terminals, this.seen, this.voltage, point);
      return;
    }
    const target = targetVoltage(rule, terminals, this.reading, this.outsideAt(this.grid.middleOf(k), run));
    if (rule.step === 0) this.voltage = target;
    this.operate();
    const plain = rule.step === 0 && this.contender.converter.rippleAmplitude === 0;
    const held = plain ? point.power : terminals.power(target);
    tally.held += weight * held;
    if (this.holdsFresh) tally.fresh += weight * held;
    this.settle(k, idle, weight);
    if (rule.step > 0) {
      this.voltage = terminals.clamp(this.voltage + (this.voltage < target ? rule.step : -rule.step));
    }
  }

  /** Writes the operating point at the held voltage. */
  private operate(): void {
    const { point, voltage } = this;
    if (!this.plain) {
      this.terminals.operate(voltage, point);
      return;
    }
    point.voltage = voltage;
    point.current = Math.max(0, this.following.at(this.condition.circuit, voltage));
    point.power = voltage * point.current;
  }

  private settle(k: number, idle: boolean, weight: number): void {
    tallyPoint(this.tally, this.point, weight, idle ? 1 : this.interruptedShare(k, weight));
  }

  /** Wakes in the circuit of a stretch at the middle of period `k`. */
  private wakeIn(stretch: Stretch, k: number): void {
    stretch.circuitAt(this.grid.middleOf(k), this.condition.circuit);
    this.condition.openCircuitVoltage = Number.NaN;
    this.terminals.condition = this.condition;
    this.wake(k);
  }

  private wake(k: number): void {
    this.asleep = false;
    this.clock?.wake(k * this.grid.period);
    this.seen = firstSight();
    this.reading = 0;
    this.voltage = this.terminals.clamp(conditionVoc(this.condition));
  }

  /** Takes the latest sample due at the middle of period `k`; a pilot cell is read anew. */
  private sample(clock: SampleClock, k: number, run: Run): void {
    if (clock.sampling.pilot) {
      this.reading = readSample(clock.sampling, this.terminals);
      return;
    }
    if (!clock.isDue(this.grid.middleOf(k))) return;
    this.reading = clock.read(run);
    if (this.contender.rule.behaviour !== "climb") return;
    this.voltage = this.terminals.clamp(this.reading);
    this.seen = firstSight();
  }

  /** Share of period `k` that samples take, of the part of it that counts. */
  private interruptedShare(k: number, weight: number): number {
    if (this.clock === null || this.clock.sampling.pilot) return 0;
    const { period } = this.grid;
    return this.clock.interruptedShare(k * period, (k + weight) * period);
  }
}
