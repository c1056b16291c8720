/** The months a series touches, and the month of each of its samples. */
export interface Calendar {
  /** "2025-01", in order. */
  months: string[];
  /** Index into `months`, shape [n]. */
  monthOf: Uint16Array;
}

/**
 * Sorts samples into calendar months by the clock of the series' start.
 * @param start of the first sample, ms since 1970-01-01 UTC
 * @param utcOffset of the clock, ms
 * @param step s
 */
export function calendarOf(start: number, utcOffset: number, step: number, samples: number): Calendar {
  const months: string[] = [];
  const monthOf = new Uint16Array(samples);
  const local = start + utcOffset;
  let sample = 0;
  while (sample < samples) {
    const now = new Date(local + sample * step * 1000);
    const year = now.getUTCFullYear();
    const month = now.getUTCMonth();
    const next = Math.ceil((Date.UTC(year, month + 1, 1) - local) / (step * 1000));
    monthOf.fill(months.length, sample, Math.min(samples, next));
    months.push(`${String(year).padStart(4, "0")}-${String(month + 1).padStart(2, "0")}`);
    sample = next;
  }
  return { months, monthOf };
}

/** Days a series of whole steps lasts. */
export function daysOf(step: number, samples: number): number {
  return (step * samples) / 86_400;
}
