/** A dynamic test of the standard: levels W/m2, dwell s, and each slope (W/m2/s) with its repetitions. */
export interface RampTest {
  low: number;
  high: number;
  dwell: number;
  rows: readonly (readonly [slope: number, repetitions: number])[];
}

/** EN 50530:2010, dynamic sequences and start-up (from memory; the arithmetic of their durations closes). */
export const RAMP_TESTS = {
  "dynamic-100-500": {
    low: 100,
    high: 500,
    dwell: 10,
    rows: [
      [0.5, 2],
      [1, 2],
      [2, 3],
      [3, 4],
      [5, 6],
      [7, 8],
      [10, 10],
      [14, 10],
      [20, 10],
      [30, 10],
      [50, 10],
    ],
  },
  "dynamic-300-1000": {
    low: 300,
    high: 1000,
    dwell: 10,
    rows: [
      [10, 10],
      [14, 10],
      [20, 10],
      [30, 10],
      [50, 10],
      [100, 10],
    ],
  },
  "start-up": { low: 2, high: 100, dwell: 30, rows: [[0.1, 1]] },
} as const satisfies Record<string, RampTest>;

/** A row as values at equal instants, straight between them; the first `settle` samples are the settling. */
export interface RampRow {
  step: number;
  irradiance: number[];
  settle: number;
}

const SETTLING = 300;

/** Splits a dwell into the fewest parts that divide the ramp as well, and reads the row off at each. */
export function rampRow(test: RampTest, slope: number, repetitions: number): RampRow {
  const { low, high, dwell } = test;
  // In whole tenths, so that whether the parts divide the ramp is a question of whole numbers.
  const [rise, run] = [10 * (high - low), Math.round(10 * slope)];
  let parts = 1;
  while ((rise * parts) % (run * dwell) !== 0) parts++;
  const step = dwell / parts;
  const climb = (rise * parts) / (run * dwell);
  const settle = (SETTLING * parts) / dwell;
  const irradiance = new Array<number>(settle).fill(low);
  for (let k = 0; k < repetitions; k++) {
    for (let i = 0; i < climb; i++) irradiance.push(low + ((high - low) * i) / climb);
    for (let i = 0; i < parts; i++) irradiance.push(high);
    for (let i = 0; i < climb; i++) irradiance.push(high - ((high - low) * i) / climb);
    for (let i = 0; i < parts; i++) irradiance.push(low);
  }
  return { step, irradiance, settle };
}
