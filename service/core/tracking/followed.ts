import type { TrackingRule } from "../rules/rule.ts";
import type { PeriodGrid, Periods } from "./period-grid.ts";
import { followsFresh, isSmooth } from "./smoothness.ts";
import type { Contender } from "./steady.ts";
import type { Stretch } from "./stretch.ts";
import type { Tally } from "./tally.ts";
import { stretchExtremes } from "./tally.ts";

/** What a stepper wants as cubics along a stretch, by its place in the row: W, but the last two V and A. */
export const FOLLOWED = { available: 0, clipped: 1, best: 2, fresh: 3, power: 4, voltage: 5, current: 6 } as const;
export const FOLLOWED_COUNT = 7;

/** Largest error of a followed power, of the maximum power. */
const POWER = 3e-8;

/** The tolerance of each followed value; 0 for those that are not followed, or too uneven to be checked. */
export function followedTolerances(contender: Contender): number[] {
  const smooth = isSmooth(contender) ? POWER : 0;
  return [POWER, POWER, POWER, followsFresh(contender) ? POWER : 0, smooth, 0, 0];
}

/** What of a rule decides which of its sums can be taken from cubics. */
export interface SteppingKind {
  behaviour: TrackingRule["behaviour"];
  /** The operating point itself follows the weather smoothly. */
  smooth: boolean;
  /** What it holds is always fresh, and tallied period by period. */
  holdsFresh: boolean;
}

/** Which periods, and where the row of a stepper begins among the followed values of a stretch. */
interface FollowedPeriods {
  grid: PeriodGrid;
  periods: Periods;
  base: number;
}

/** Adds what is smooth along a stretch, summed over its periods without stepping them; the last of all may be cut. */
export function tallyFollowed(tally: Tally, stretch: Stretch, of: FollowedPeriods, kind: SteppingKind): void {
  const { grid, periods, base } = of;
  const count = periods.end - periods.first;
  const times = { first: grid.middleOf(periods.first), spacing: grid.period, count };
  const lastMiddle = grid.middleOf(periods.end - 1);
  const cut = 1 - grid.weightOf(periods.end - 1);
  const sum = (index: number): number => {
    const whole = stretch.sumFollowed(base + index, times);
    return cut > 0 ? whole - cut * stretch.followedAt(base + index, lastMiddle) : whole;
  };
  for (const q of [0, 1, 2] as const) {
    const whole = stretch.sumMaximum(q, times);
    tally.maximum[q] += cut > 0 ? whole - cut * stretch.maximumAt(q, lastMiddle) : whole;
  }
  tally.sunlit += count - cut;
  tally.available += sum(FOLLOWED.available);
  tally.clipped += sum(FOLLOWED.clipped);
  const best = sum(FOLLOWED.best);
  tally.best += best;
  const fresh = kind.behaviour === "target" ? sum(FOLLOWED.fresh) : best;
  if (!kind.holdsFresh) tally.fresh += fresh;
  if (kind.behaviour === "climb") tally.held += best;
  if (!kind.smooth) return;
  tally.held += fresh;
  tally.operating += kind.behaviour === "perfect" ? best : sum(FOLLOWED.power);
  tally.voltage += sum(FOLLOWED.voltage);
  tally.current += sum(FOLLOWED.current);
  tally.lit += count - cut;
  if (tally.keepsExtremes) tallyExtremes(tally, stretch, of);
}

function tallyExtremes(tally: Tally, stretch: Stretch, { grid, periods, base }: FollowedPeriods): void {
  for (let k = periods.first; k < periods.end; k++) {
    const time = grid.middleOf(k);
    const voltage = stretch.followedAt(base + FOLLOWED.voltage, time);
    stretchExtremes(tally, voltage, stretch.followedAt(base + FOLLOWED.power, time));
  }
}
