/** The causes a lost watt can have, in the order in which they telescope from the array's maximum to what is delivered. */
export const CAUSES = ["voltageWindow", "wrongPeak", "setPoint", "heldSample", "regulation", "interruption"] as const;

export type Cause = (typeof CAUSES)[number];

/**
 * The powers (W) a sample passes through on the way from available to delivered. Each cause is the difference of two
 * neighbours, so that whatever the rule did, the causes add up to what is lost.
 */
export interface Cascade {
  /** The array's maximum within the power and current limits. */
  available: number;
  /** The best inside the voltage window. */
  best: number;
  /** The peak uphill of where the rule stands; `best` for target rules. */
  localPeak: number;
  /** At the fresh target; `localPeak` for climbers. */
  fresh: number;
  /** At the target held from the last sample. */
  held: number;
  /** At the voltage the rule really holds, ripple and hunting included. */
  operating: number;
  /** Share of the time in which nothing is delivered. */
  interrupted: number;
}

/** Adds the six lost powers of a cascade, W, in the order of `CAUSES`, to `sums` from `offset` on. */
export function addCauses(of: Cascade, sums: Float64Array, offset: number): void {
  sums[offset] += of.available - of.best;
  sums[offset + 1] += of.best - of.localPeak;
  sums[offset + 2] += of.localPeak - of.fresh;
  sums[offset + 3] += of.fresh - of.held;
  sums[offset + 4] += of.held - of.operating;
  sums[offset + 5] += of.interrupted * of.operating;
}
