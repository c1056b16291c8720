/** Panels a range is cut into before any is refined, so that no corner hides between the first points. */
const PANELS = 16;
const DEEPEST = 40;

/** Adaptive Simpson over one panel, refined until halving it changes its mean by less than `tolerance`. */
function panelMean(
  f: (x: number) => number,
  ends: readonly [number, number],
  values: readonly [number, number, number],
  tolerance: number,
  depth: number,
): number {
  const [low, high] = ends;
  const [atLow, atMiddle, atHigh] = values;
  const middle = (low + high) / 2;
  const atLeft = f((low + middle) / 2);
  const atRight = f((middle + high) / 2);
  const coarse = (atLow + 4 * atMiddle + atHigh) / 6;
  const left = (atLow + 4 * atLeft + atMiddle) / 6;
  const right = (atMiddle + 4 * atRight + atHigh) / 6;
  const fine = (left + right) / 2;
  if (depth >= DEEPEST || Math.abs(fine - coarse) <= tolerance) return fine + (fine - coarse) / 15;
  return (
    (panelMean(f, [low, middle], [atLow, atLeft, atMiddle], 2 * tolerance, depth + 1) +
      panelMean(f, [middle, high], [atMiddle, atRight, atHigh], 2 * tolerance, depth + 1)) /
    2
  );
}

/** The mean of `f` over [low, high], corners included, to about `tolerance`. */
export function adaptiveMean(f: (x: number) => number, low: number, high: number, tolerance: number): number {
  let sum = 0;
  const width = (high - low) / PANELS;
  for (let k = 0; k < PANELS; k++) {
    const [from, to] = [low + k * width, low + (k + 1) * width];
    const values: [number, number, number] = [f(from), f((from + to) / 2), f(to)];
    sum += panelMean(f, [from, to], values, tolerance, 0);
  }
  return sum / PANELS;
}
