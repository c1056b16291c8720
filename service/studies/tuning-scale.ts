/** Values spread over a range: evenly, or by equal ratios where the range spans more than a decade. */
export interface TuningScale {
  /** `count` values over the whole range, its ends among them. */
  spread(count: number): number[];
  /** `count` values from `from` to `to`, both among them. */
  between(from: number, to: number, count: number): number[];
}

/** The scale of a range. */
export function scaleBetween({ from, to }: { from: number; to: number }): TuningScale {
  const byRatio = from > 0 && to / from > 10;
  const between = (low: number, high: number, count: number): number[] =>
    Array.from({ length: count }, (_, k) => {
      if (k === 0) return low;
      if (k === count - 1) return high;
      const share = k / (count - 1);
      return byRatio ? low * Math.exp(share * Math.log(high / low)) : low + share * (high - low);
    });
  return { spread: (count) => between(from, to, count), between };
}
