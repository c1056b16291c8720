/** Where a cubic is fitted, and where it is checked: shares of its stretch. */
export const CUBIC_NODES = [0, 1 / 3, 2 / 3, 1] as const;
export const CUBIC_CHECKS = [1 / 6, 1 / 2, 5 / 6] as const;

/**
 * Writes the cubic through `values[from .. from+3]` at the nodes 0, 1/3, 2/3, 1 into `coefficients[to .. to+3]`, in rising
 * powers.
 */
export function fitCubic(values: Float64Array, from: number, coefficients: Float64Array, to: number): void {
  const f0 = values[from];
  const f1 = values[from + 1];
  const f2 = values[from + 2];
  const f3 = values[from + 3];
  coefficients[to] = f0;
  if (f0 === f1 && f1 === f2 && f2 === f3) {
    // A constant to the last bit: what compares one instant with another must find them equal.
    coefficients.fill(0, to + 1, to + 4);
    return;
  }
  coefficients[to + 1] = 0.5 * (-11 * f0 + 18 * f1 - 9 * f2 + 2 * f3);
  coefficients[to + 2] = 0.5 * (18 * f0 - 45 * f1 + 36 * f2 - 9 * f3);
  coefficients[to + 3] = 0.5 * (-9 * f0 + 27 * f1 - 27 * f2 + 9 * f3);
}

/** The cubic at share `s` of its stretch. */
export function cubicAt(coefficients: Float64Array, from: number, s: number): number {
  return coefficients[from] + s * (coefficients[from + 1] + s * (coefficients[from + 2] + s * coefficients[from + 3]));
}

/**
 * The sum of a cubic over `count` points equally spaced by `spacing`, the first at `first`: exactly, by the midpoint
 * rule's end correction h^2/24 (f'(B) - f'(A)), which a cubic fulfils (Euler-Maclaurin; Abramowitz & Stegun 25.4.2-3).
 */
export function sumCubic(
  coefficients: Float64Array,
  from: number,
  { first, spacing, count }: { first: number; spacing: number; count: number },
): number {
  const a = first - 0.5 * spacing;
  const b = a + count * spacing;
  const c0 = coefficients[from];
  const c1 = coefficients[from + 1] / 2;
  const c2 = coefficients[from + 2] / 3;
  const c3 = coefficients[from + 3] / 4;
  const integral = b * (c0 + b * (c1 + b * (c2 + b * c3))) - a * (c0 + a * (c1 + a * (c2 + a * c3)));
  // f' = 2 (c1) + ... in the halved coefficients: f'(s) = 2 c1 + 6 c2 s + 12 c3 s^2.
  const slopes = 6 * c2 * (b - a) + 12 * c3 * (b * b - a * a);
  return (integral - (spacing * spacing * slopes) / 24) / spacing;
}
