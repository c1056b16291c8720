/** Periods [first, end) of a stretch of time. */
export interface Periods {
  first: number;
  end: number;
}

/** The control periods of one rule: period k is [k Ta, (k + 1) Ta) from the series' start; the last is cut by its end. */
export class PeriodGrid {
  /** Ta, s. */
  readonly period: number;
  /** Index of the last period. */
  readonly last: number;
  /** Share of the last period that counts, in (0, 1]. */
  readonly lastWeight: number;

  constructor(period: number, duration: number) {
    this.period = period;
    this.last = Math.ceil(duration / period - 1e-9) - 1;
    this.lastWeight = Math.min(1, duration / period - this.last);
  }

  /** Periods whose middle lies in [from, to), s; at the series' end the last one whatever its middle. */
  periodsIn(from: number, to: number, isEnd: boolean): Periods {
    return { first: this.firstFrom(from), end: isEnd ? this.last + 1 : this.firstFrom(to) };
  }

  /** The first period whose middle is at or after `time`, s; a middle within rounding of it counts as at it. */
  private firstFrom(time: number): number {
    return Math.ceil(time / this.period - 0.5 - 1e-9);
  }

  /** Middle of a period, s. */
  middleOf(k: number): number {
    return (k + 0.5) * this.period;
  }

  /** Share of a period that counts. */
  weightOf(k: number): number {
    return k === this.last ? this.lastWeight : 1;
  }
}
