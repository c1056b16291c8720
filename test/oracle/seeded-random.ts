/** Numbers that are the same on every machine and in every run. */
export interface SeededRandom {
  /** Uniform in [0, 1). */
  next(): number;
  /** Uniform in [low, high). */
  between(low: number, high: number): number;
  /** Log-uniform in [low, high); both above 0. */
  logBetween(low: number, high: number): number;
  /** A whole number in [low, high]. */
  whole(low: number, high: number): number;
  /** True with a probability. */
  chance(probability: number): boolean;
}

/** A generator of 32-bit state from a whole seed: mulberry32 (public domain, common practice, no source). */
export function seededRandom(seed: number): SeededRandom {
  let state = seed >>> 0;
  const next = (): number => {
    state = (state + 0x6d2b79f5) >>> 0;
    let z = state;
    z = Math.imul(z ^ (z >>> 15), z | 1);
    z ^= z + Math.imul(z ^ (z >>> 7), z | 61);
    return ((z ^ (z >>> 14)) >>> 0) / 4294967296;
  };
  const between = (low: number, high: number): number => low + (high - low) * next();
  return {
    next,
    between,
    logBetween: (low, high) => Math.exp(between(Math.log(low), Math.log(high))),
    whole: (low, high) => low + Math.floor((high - low + 1) * next()),
    chance: (probability) => next() < probability,
  };
}
