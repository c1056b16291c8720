/** How a steady temperature runs between samples, and what a sample of the answer is. */
export type LagTiming =
  /** Samples are means over intervals: the steady value rests within each; the answer is the lagged mean of the interval. */
  | "mean"
  /** Samples are instants: the steady value runs linearly in between; the answer is the lagged value at the instant. */
  | "instant";

/**
 * The temperatures (degC) of cells that follow their steady temperatures `steady` (degC, one each `step` seconds) with a
 * first-order lag of `timeConstant` seconds: T' = (steady - T)/timeConstant, solved exactly between samples.
 *
 * Starts at rest on the first sample and anew after each NaN, which stays NaN. A time constant of 0 returns the steady
 * temperatures; empty in, empty out. The linear differential equation's exact response to a constant (`mean`) or linear
 * (`instant`) input; a first-order model of the module's heat capacity is common practice, no source.
 */
export function laggedTemperatures(
  steady: Float64Array,
  step: number,
  timeConstant: number,
  timing: LagTiming,
): Float64Array {
  if (timeConstant === 0) return steady.slice();
  const h = step / timeConstant;
  const decay = Math.exp(-h);
  const reached = -Math.expm1(-h);
  const out = new Float64Array(steady.length);
  let state = Number.NaN;
  for (let i = 0; i < steady.length; i++) {
    const u = steady[i];
    const before = Number.isNaN(state) ? u : state;
    if (timing === "mean") {
      out[i] = u + ((before - u) * reached) / h;
      state = u + (before - u) * decay;
    } else {
      const last = i > 0 && !Number.isNaN(steady[i - 1]) ? steady[i - 1] : u;
      const slope = (u - last) / h; // K per time constant: T trails a ramp by it
      state = u - slope + (before - last + slope) * decay;
      out[i] = state;
    }
  }
  return out;
}
