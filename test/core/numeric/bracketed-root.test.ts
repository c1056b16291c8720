import { describe, expect, it } from "vitest";
import { bracketedRoot } from "../../../service/core/numeric/bracketed-root.ts";

/** Roots known in closed form or to 16 digits (Dottie number; Lambert W0(1), W0(10): 50-digit evaluation). */
const KNOWN: [string, (x: number) => number, number, number, number][] = [
  ["cos x = x", (x) => Math.cos(x) - x, 0, 1, 0.7390851332151607],
  ["x e^x = 1", (x) => x * Math.exp(x) - 1, 0, 1, 0.5671432904097838],
  ["x e^x = 10", (x) => x * Math.exp(x) - 10, 0, 10, 1.7455280027406994],
  ["x^3 = 2", (x) => x ** 3 - 2, -10, 10, Math.cbrt(2)],
  ["a root 1e-12 beside the end", (x) => x - 1e-12, 0, 1, 1e-12],
  ["a steep exponential", (x) => Math.exp(50 * x) - 1e10, -1, 1, Math.log(1e10) / 50],
  ["a flat ninth power", (x) => (x - 0.3) ** 9, -1, 1, 0.3],
];

describe("a bracketed root", () => {
  it.each(KNOWN)("of %s is found to the last digits, from either side", (name, f, low, high, root) => {
    const tolerance = name.startsWith("a flat") ? 1e-9 : 8 * Number.EPSILON * Math.max(Math.abs(root), 1e-12);
    expect(Math.abs(bracketedRoot(f, low, high) - root)).toBeLessThanOrEqual(tolerance);
    expect(Math.abs(bracketedRoot(f, high, low) - root)).toBeLessThanOrEqual(tolerance);
    expect(Math.abs(bracketedRoot((x) => -f(x), low, high) - root)).toBeLessThanOrEqual(tolerance);
  });

  it("at an end is returned as it is", () => {
    expect(bracketedRoot((x) => x - 2, 2, 5)).toBe(2);
    expect(bracketedRoot((x) => x - 5, 2, 5)).toBe(5);
  });

  it("does not exist where the signs do not differ or a value is not a number", () => {
    expect(bracketedRoot((x) => x * x + 1, -1, 1)).toBeNaN();
    expect(bracketedRoot(() => Number.NaN, -1, 1)).toBeNaN();
    expect(bracketedRoot((x) => (Math.abs(x) < 0.5 ? Number.NaN : x), -1, 1)).toBeNaN();
  });

  it("costs no more than 200 evaluations, on a step about 60", () => {
    let count = 0;
    const root = bracketedRoot(
      (x) => {
        count++;
        return x > Math.PI ? 1 : -1;
      },
      0,
      10,
    );
    expect(root).toBeCloseTo(Math.PI, 13);
    expect(count).toBeLessThan(120);
  });
});
