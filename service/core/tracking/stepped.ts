import type { PhotovoltaicArray } from "../array/array.ts";
import type { Condition } from "../array/condition.ts";
import type { PointTrace } from "../array/maximum-power-trace.ts";
import type { Cascade } from "./causes.ts";
import { FOLLOWED_COUNT } from "./followed.ts";
import { CLASS_COLUMNS, enterOperating, enterSample, irradianceClass } from "./ledger.ts";
import type { Contender } from "./steady.ts";
import { Stepper } from "./stepper.ts";
import type { Piece } from "./stretch.ts";
import { Stretch } from "./stretch.ts";
import { clearTally } from "./tally.ts";
import type { Run, TimedWeather } from "./weather-path.ts";
import { locate, nodeOf, runsOf, valueAt } from "./weather-path.ts";

/** A stretch is not halved below this many control periods: from there on each period is solved exactly. */
const FEWEST_PERIODS = 6;
/** Halvings of one piece, at most: a stack this deep reaches a control period from any step. */
const MOST_HALVINGS = 40;

/**
 * Tracks every contender over the weather at its own control period. Irradiance and cell temperature run straight
 * between the samples; period k is [k Ta, (k + 1) Ta) from the series' start, evaluated at its middle, and belongs to
 * the sample that holds its middle; the last is cut. Darkness and gaps put the rules to sleep.
 *
 * What follows the weather smoothly is carried by cubics within 3e-8 of the maximum power; memory does not grow with
 * the number of periods.
 * @param maximum receives the mean maximum power point a sample, each column of shape [n]; null to leave it
 */
export function trackStepped(
  array: PhotovoltaicArray,
  weather: TimedWeather,
  contenders: readonly Contender[],
  maximum: PointTrace | null,
): void {
  const steppers = contenders.map((contender) => new Stepper(contender, array, weather));
  const walk = new Walk(array, weather, steppers, maximum);
  for (const run of runsOf(weather)) {
    for (const stepper of steppers) stepper.sleep();
    for (let sample = run.first; sample <= run.last; sample++) walk.takeSample(sample, run);
  }
}

/** One pass over the weather, sample by sample, piece by piece. */
class Walk {
  private readonly weather: TimedWeather;
  private readonly steppers: Stepper[];
  private readonly maximum: PointTrace | null;
  private readonly stretch: Stretch;
  private readonly shortest: number;
  private run: Run = { first: 0, last: 0 };
  private readonly place = { left: 0, right: 0, share: 0 };

  constructor(array: PhotovoltaicArray, weather: TimedWeather, steppers: Stepper[], maximum: PointTrace | null) {
    this.weather = weather;
    this.steppers = steppers;
    this.maximum = maximum;
    this.shortest = FEWEST_PERIODS * Math.min(...steppers.map((stepper) => stepper.grid.period));
    this.stretch = new Stretch(array, {
      count: steppers.length * FOLLOWED_COUNT,
      tolerances: steppers.flatMap((stepper) => stepper.tolerances),
      write: (condition: Condition, { time }, values, offset) => {
        for (let c = 0; c < steppers.length; c++) {
          steppers[c].follow(condition, time, this.run, values, offset + c * FOLLOWED_COUNT);
        }
      },
    });
  }

  takeSample(sample: number, run: Run): void {
    const { step, irradiance, spanOf } = this.weather;
    const node = nodeOf(this.weather);
    this.run = run;
    const [from, to] = [sample * step, (sample + 1) * step];
    const isEnd = sample === irradiance.length - 1;
    if (node > 0) {
      const middle = (sample + node) * step;
      this.takePiece(this.pieceOf(from, middle), false);
      this.takePiece(this.pieceOf(middle, to), isEnd);
    } else {
      this.takePiece(this.pieceOf(from, to), isEnd);
    }
    const place = { sample, span: spanOf[sample], irradianceClass: irradianceClass(irradiance[sample]) };
    if (this.maximum !== null) this.closeMaximum(this.maximum, sample);
    for (const stepper of this.steppers) {
      stepper.contender.ledger.classes[place.irradianceClass * CLASS_COLUMNS]++;
      this.close(stepper, place);
    }
  }

  private pieceOf(from: number, to: number): Piece {
    const { irradiance, cellTemperature } = this.weather;
    const { place } = this;
    // Read just inside, so that a bend at either end belongs to the neighbour.
    const inside = 1e-3 * (to - from);
    const line = (column: Float64Array): [number, number] => {
      locate(this.weather, this.run, from + inside, place);
      const early = valueAt(column, place);
      locate(this.weather, this.run, to - inside, place);
      const slope = (valueAt(column, place) - early) / (to - from - 2 * inside);
      return [early - slope * inside, early + slope * (to - from - inside)];
    };
    const [fromIrradiance, toIrradiance] = line(irradiance);
    const [fromTemperature, toTemperature] = line(cellTemperature);
    return { from, to, fromIrradiance, toIrradiance, fromTemperature, toTemperature };
  }

  private takePiece(piece: Piece, isEnd: boolean): void {
    if (piece.fromIrradiance <= 0 && piece.toIrradiance <= 0) {
      // A rule sleeps where a period of its own falls into the dark, not between two.
      for (const stepper of this.steppers) {
        const { first, end } = stepper.grid.periodsIn(piece.from, piece.to, isEnd);
        if (end > first) stepper.sleep();
      }
      return;
    }
    const ends = [piece.to];
    let from = piece.from;
    for (let guard = 0; ends.length > 0 && guard < 1 << 20; guard++) {
      const to = ends[ends.length - 1];
      const last = isEnd && to === piece.to;
      const short = to - from <= this.shortest || ends.length > MOST_HALVINGS;
      if (short) this.stepExactly(piece, from, to, last);
      else if (this.stretch.fit(piece, from, to)) this.stepAlong(piece, from, to, last);
      else {
        ends.push(from + 0.5 * (to - from));
        continue;
      }
      from = to;
      ends.pop();
    }
  }

  private stepAlong(piece: Piece, from: number, to: number, isEnd: boolean): void {
    for (const [c, stepper] of this.steppers.entries()) {
      stepper.stepAlong(this.stretch, piece, this.run, stepper.grid.periodsIn(from, to, isEnd), c * FOLLOWED_COUNT);
    }
  }

  private stepExactly(piece: Piece, from: number, to: number, isEnd: boolean): void {
    for (const stepper of this.steppers) stepper.stepExactly(piece, this.run, stepper.grid.periodsIn(from, to, isEnd));
  }

  /** Writes a sample's mean maximum power point: voltage over its lit time, current and power over all of it. */
  private closeMaximum(maximum: PointTrace, sample: number): void {
    const [{ tally, grid }] = this.steppers;
    const share = grid.period / this.weather.step;
    if (tally.sunlit > 0) maximum.voltage[sample] = tally.maximum[0] / tally.sunlit;
    maximum.current[sample] = tally.maximum[1] * share;
    maximum.power[sample] = tally.maximum[2] * share;
  }

  /** Enters a sample's tally, as means over the sample, and clears it. */
  private close(stepper: Stepper, place: { sample: number; span: number; irradianceClass: number }): void {
    const { tally, grid, contender } = stepper;
    const share = grid.period / this.weather.step;
    const cascade: Cascade = {
      available: tally.available * share,
      best: tally.best * share,
      localPeak: tally.best * share,
      fresh: tally.fresh * share,
      held: tally.held * share,
      operating: tally.operating * share,
      interrupted: tally.operating > 0 ? tally.interrupted / tally.operating : 0,
    };
    if (tally.lit > 0 || tally.available > 0) {
      enterSample(contender.ledger, place, cascade, tally.clipped * share);
      enterOperating(contender.ledger, place.sample, {
        voltage: tally.lit > 0 ? tally.voltage / tally.lit : 0,
        current: tally.current * share,
        power: (tally.operating - tally.interrupted) * share,
      });
    }
    const { extremes } = contender.ledger;
    if (extremes !== null && tally.lit > 0) {
      extremes.leastVoltage[place.sample] = tally.leastVoltage;
      extremes.mostVoltage[place.sample] = tally.mostVoltage;
      extremes.leastPower[place.sample] = tally.leastPower;
      extremes.mostPower[place.sample] = tally.mostPower;
    }
    clearTally(tally);
  }
}
