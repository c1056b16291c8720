import { describe, expect, it } from "vitest";
import { CUBIC_NODES, cubicAt, fitCubic, sumCubic } from "../../../service/core/numeric/cubic.ts";
import { seededRandom } from "../../oracle/seeded-random.ts";

const random = seededRandom(3);
const CUBICS = Array.from({ length: 50 }, () => Array.from({ length: 4 }, () => random.between(-5, 5)));
const value = ([a, b, c, d]: number[], s: number): number => a + b * s + c * s ** 2 + d * s ** 3;

describe("a cubic through four values", () => {
  it("gives back the coefficients of any cubic, wherever it stands in its arrays", () => {
    for (const cubic of CUBICS) {
      const values = Float64Array.from([9, 9, ...CUBIC_NODES.map((s) => value(cubic, s))]);
      const coefficients = new Float64Array(7);
      fitCubic(values, 2, coefficients, 3);
      for (let k = 0; k < 4; k++) expect(coefficients[3 + k]).toBeCloseTo(cubic[k], 11);
      for (const s of [0, 0.21, 0.5, 1]) expect(cubicAt(coefficients, 3, s)).toBeCloseTo(value(cubic, s), 11);
    }
  });

  it("sums over equally spaced points as adding them one by one does", () => {
    for (const cubic of CUBICS) {
      const times = { first: random.between(0, 0.2), spacing: random.between(0.001, 0.02), count: random.whole(1, 40) };
      let sum = 0;
      for (let k = 0; k < times.count; k++) sum += value(cubic, times.first + k * times.spacing);
      expect(Math.abs(sumCubic(Float64Array.from(cubic), 0, times) - sum)).toBeLessThan(1e-10);
    }
  });
});
