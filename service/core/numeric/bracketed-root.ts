const MAXIMUM_STEPS = 200;

/**
 * A root of `f` between `low` and `high`, whose signs must differ: bisection guarded inverse quadratic interpolation
 * (Chandrupatla, Advances in Engineering Software 28 (1997) 145-149).
 *
 * Accuracy: the bracket shrinks to 4 units in the last place of the root. At most 200 evaluations; about 10 are usual.
 * Returns NaN when the signs do not differ or a value is NaN.
 */
export function bracketedRoot(f: (x: number) => number, low: number, high: number): number {
  let [a, b] = [low, high];
  let [fa, fb] = [f(a), f(b)];
  if (fa === 0) return a;
  if (fb === 0) return b;
  if (!(fa * fb < 0)) return Number.NaN;
  let [c, fc] = [a, fa];
  let share = 0.5;
  for (let step = 0; step < MAXIMUM_STEPS; step++) {
    const x = a + share * (b - a);
    const fx = f(x);
    if (Number.isNaN(fx)) return Number.NaN;
    if (fx > 0 === fa > 0) {
      [c, fc] = [a, fa];
    } else {
      [c, fc] = [b, fb];
      [b, fb] = [a, fa];
    }
    [a, fa] = [x, fx];
    const best = Math.abs(fa) < Math.abs(fb) ? a : b;
    const tolerance = (2 * Number.EPSILON * Math.abs(best) + Number.MIN_VALUE) / Math.abs(b - a);
    if (tolerance > 0.5 || fa === 0 || fb === 0) return fb === 0 ? b : best;
    const xi = (a - b) / (c - b);
    const phi = (fa - fb) / (fc - fb);
    const interpolates = phi * phi < xi && (1 - phi) * (1 - phi) < 1 - xi;
    share = interpolates
      ? (fa / (fb - fa)) * (fc / (fb - fc)) + ((c - a) / (b - a)) * (fa / (fc - fa)) * (fb / (fc - fb))
      : 0.5;
    share = Math.min(1 - tolerance, Math.max(tolerance, share));
  }
  return Math.abs(fa) < Math.abs(fb) ? a : b;
}
