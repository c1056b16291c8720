import { describe, expect, it } from "vitest";
import { laggedTemperatures } from "../../service/climate/thermal-lag.ts";
import { seededRandom } from "./seeded-random.ts";

/** Independent: T' = (u(t) - T)/tau by the classical Runge-Kutta method, `parts` steps a sample. */
function integrate(at: (t: number) => number, start: number, span: number, tau: number): { end: number; mean: number } {
  const parts = 2000;
  const h = span / parts;
  let temperature = start;
  let sum = 0;
  for (let k = 0; k < parts; k++) {
    const t = k * h;
    const f = (x: number, y: number) => (at(x) - y) / tau;
    const k1 = f(t, temperature);
    const k2 = f(t + h / 2, temperature + (h / 2) * k1);
    const k3 = f(t + h / 2, temperature + (h / 2) * k2);
    const k4 = f(t + h, temperature + h * k3);
    const next = temperature + (h / 6) * (k1 + 2 * k2 + 2 * k3 + k4);
    sum += ((temperature + next) / 2) * h;
    temperature = next;
  }
  return { end: temperature, mean: sum / span };
}

describe("thermal lag", () => {
  it("has covered 1 - 1/e of a step after one time constant (the first-order system's definition)", () => {
    const steady = new Float64Array(11).fill(50);
    steady[0] = 20;
    const found = laggedTemperatures(steady, 30, 300, "mean");
    const [first] = found;
    expect(first).toBe(20);
    const means = [20, 50].concat(Array(9).fill(50));
    let state = 20;
    means.forEach((u, i) => {
      const exact = integrate(() => u, state, 30, 300);
      expect(found[i]).toBeCloseTo(exact.mean, 6);
      state = exact.end;
    });
    expect(state).toBeCloseTo(20 + 30 * (1 - Math.exp(-1)), 8);
  });

  it("follows instants along straight lines as a Runge-Kutta integration does", () => {
    const random = seededRandom(31);
    const steady = Float64Array.from({ length: 40 }, () => 60 * random());
    const found = laggedTemperatures(steady, 60, 420, "instant");
    let state = steady[0];
    for (let i = 1; i < steady.length; i++) {
      state = integrate((t) => steady[i - 1] + ((steady[i] - steady[i - 1]) * t) / 60, state, 60, 420).end;
      expect(found[i]).toBeCloseTo(state, 8);
    }
  });

  it("trails a long ramp by slope times time constant", () => {
    const steady = Float64Array.from({ length: 400 }, (_, i) => 0.1 * i);
    expect(laggedTemperatures(steady, 60, 600, "instant")[399]).toBeCloseTo(39.9 - 0.1 * 10, 8);
  });

  it("changes nothing without a time constant, at rest, or for an empty series, and hardly anything with a tiny one", () => {
    const steady = Float64Array.of(20, 30, 25);
    expect(laggedTemperatures(steady, 60, 0, "mean")).toEqual(steady);
    expect(laggedTemperatures(new Float64Array(5).fill(31), 60, 300, "mean")).toEqual(new Float64Array(5).fill(31));
    expect(laggedTemperatures(new Float64Array(0), 60, 300, "mean")).toHaveLength(0);
    for (const timing of ["mean", "instant"] as const)
      laggedTemperatures(steady, 60, 1e-6, timing).forEach((t, i) => {
        expect(t).toBeCloseTo(steady[i], 5);
      });
  });

  it("keeps NaN and starts at rest after it", () => {
    for (const timing of ["mean", "instant"] as const) {
      const found = laggedTemperatures(Float64Array.of(20, 40, Number.NaN, 60, 60), 60, 600, timing);
      expect(found[1]).toBeLessThan(30);
      expect(found[2]).toBeNaN();
      expect([found[3], found[4]]).toEqual([60, 60]);
    }
  });
});
