import { describe, expect, it } from "vitest";
import { GAUSS_8, GAUSS_16 } from "../../../service/core/numeric/gauss-legendre.ts";

const mean = ({ nodes, weights }: typeof GAUSS_8, f: (x: number) => number): number =>
  nodes.reduce((sum, x, k) => sum + weights[k] * f(x), 0);

/** The mean of the Legendre polynomial Pn over [-1, 1] is 0 for n > 0; by its three-term recurrence. */
const legendre = (n: number, x: number): number => {
  let [before, now] = [1, x];
  if (n === 0) return 1;
  for (let k = 1; k < n; k++) [before, now] = [now, ((2 * k + 1) * x * now - k * before) / (k + 1)];
  return now;
};

describe.each([
  ["8", GAUSS_8, 8],
  ["16", GAUSS_16, 16],
])("Gauss-Legendre quadrature of %s points (Abramowitz & Stegun, 25.4.30)", (_name, rule, points) => {
  it("has its nodes at the zeros of the Legendre polynomial of its order", () => {
    expect(rule.nodes.length).toBe(points);
    for (const node of rule.nodes) expect(Math.abs(legendre(points, node))).toBeLessThan(1e-14);
  });

  it("averages every polynomial up to degree 2n - 1 exactly, and not the next", () => {
    for (let degree = 0; degree < 2 * points; degree++) {
      const exact = degree % 2 === 0 ? 1 / (degree + 1) : 0;
      expect(Math.abs(mean(rule, (x) => x ** degree) - exact)).toBeLessThan(1e-15);
    }
    const next = mean(rule, (x) => legendre(points, x) ** 2);
    expect(next).toBeLessThan(1e-20);
  });
});
