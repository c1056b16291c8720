/** One row of a sequence: a slope (W/m2/s) and how often it is repeated. */
export interface SequenceRow {
  slope: number;
  repetitions: number;
}

/** A dynamic test: irradiance between two levels (W/m2), dwelling (s) at each. */
interface Sequence {
  low: number;
  high: number;
  dwell: number;
  rows: readonly SequenceRow[];
}

const rows = (slopes: readonly number[], repetitions: (slope: number, index: number) => number): SequenceRow[] =>
  slopes.map((slope, index) => ({ slope, repetitions: repetitions(slope, index) }));

const SLOW_REPETITIONS = [2, 2, 3, 4, 6, 8, 10, 10, 10, 10, 10];

/** The dynamic sequences of EN 50530:2010 (from memory; their total durations 15939, 6987 and 2320 s close). */
export const SEQUENCES = {
  "dynamic-100-500": {
    low: 100,
    high: 500,
    dwell: 10,
    rows: rows([0.5, 1, 2, 3, 5, 7, 10, 14, 20, 30, 50], (_slope, index) => SLOW_REPETITIONS[index]),
  },
  "dynamic-300-1000": { low: 300, high: 1000, dwell: 10, rows: rows([10, 14, 20, 30, 50, 100], () => 10) },
  "start-up": { low: 2, high: 100, dwell: 30, rows: rows([0.1], () => 1) },
} as const satisfies Record<string, Sequence>;

export type SequenceName = keyof typeof SEQUENCES;

/** Settling at the low level before the ramps, s. */
export const SETTLING = 300;

/** Most samples of one dwell: every row closes with far fewer. */
const MOST_PARTS = 4096;

/** A row as an instant series: straight between its samples, constant after the last. */
export interface RampSeries {
  /** W/m2, shape [n]. */
  irradiance: Float64Array;
  /** s. */
  step: number;
  /** Samples of the settling. */
  settling: number;
  /** s. */
  duration: number;
}

/**
 * One row of a sequence: settling, then ramp up, dwell, ramp down, dwell, repeated. The step is the longest up to
 * `longest` (s) that divides dwell and ramp both, so that every corner is a sample.
 */
export function rampSequence(test: SequenceName, { slope, repetitions }: SequenceRow, longest: number): RampSeries {
  const { low, high, dwell } = SEQUENCES[test];
  const ramp = (high - low) / slope;
  let parts = Math.max(1, Math.ceil(dwell / longest));
  while (parts < MOST_PARTS && Math.abs((ramp * parts) / dwell - Math.round((ramp * parts) / dwell)) > 1e-9) parts++;
  const step = dwell / parts;
  const rampSamples = Math.round(ramp / step);
  const settling = Math.round(SETTLING / step);
  const irradiance = new Float64Array(settling + repetitions * 2 * (rampSamples + parts)).fill(low);
  for (let k = 0; k < repetitions; k++) {
    const start = settling + k * 2 * (rampSamples + parts);
    for (let i = 0; i < rampSamples; i++) {
      const rise = ((high - low) * i) / rampSamples;
      irradiance[start + i] = low + rise;
      irradiance[start + rampSamples + parts + i] = high - rise;
    }
    irradiance.fill(high, start + rampSamples, start + rampSamples + parts);
  }
  return { irradiance, step, settling, duration: SETTLING + repetitions * 2 * (ramp + dwell) };
}
