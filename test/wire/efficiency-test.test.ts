import { describe, expect, it } from "vitest";
import held from "../fixtures/held-references.json" with { type: "json" };
import levels from "../fixtures/static-levels.json" with { type: "json" };
import durations from "../fixtures/test-durations.json" with { type: "json" };
import weighted from "../fixtures/weighted-efficiencies.json" with { type: "json" };
import type { Json } from "./requests.ts";
import { answered, curveRequest, efficiencyTestRequest, GENERATOR, MODULE } from "./requests.ts";

const tested = (request: Json) => answered("testEfficiency", { ...efficiencyTestRequest(), ...request }).answer;
const sumOf = (causes: Record<string, number>) => Object.values(causes).reduce((all, one) => all + one, 0);

describe("the static test", () => {
  const answer = tested({});

  it("finds the irradiance of each level of power (static-levels)", () => {
    expect(answer.levels.map(({ level }: Json) => level)).toEqual([0.05, 0.1, 0.2, 0.25, 0.3, 0.5, 0.75, 1]);
    for (const [index, { level, irradiance }] of levels.rows.entries()) {
      expect(answer.levels[index].level).toBeCloseTo(level / 100, 12);
      expect(Math.abs(answer.levels[index].irradiance - irradiance)).toBeLessThan(6e-4);
    }
  });

  it("weighs the generator held at its maximum power voltage as the standard does, within 1e-4", () => {
    const of = Object.fromEntries(
      weighted.rows.filter((row) => row.levelsOf === "power").map((row) => [row.weighting, row.efficiency]),
    );
    expect(Math.abs(answer.europeanWeighted - of["european"])).toBeLessThan(1e-4);
    expect(Math.abs(answer.cecWeighted - of["cec"])).toBeLessThan(1e-4);
  });

  it("has no row, no duration, no trace, and names its edition and models", () => {
    expect([answer.rows, answer.efficiency, answer.duration, answer.trace]).toEqual([null, null, null, null]);
    expect(answer.edition).toContain("EN 50530");
    expect(answer.provenance.models.map(({ name }: Json) => name)).toContain("efficiency-test");
  });

  it("states causes as shares that add up to what the efficiency lacks", () => {
    for (const { efficiency, lostByCause } of answer.levels) {
      expect(efficiency + sumOf(lostByCause)).toBeCloseTo(1, 12);
      expect(lostByCause.setPoint).toBeGreaterThan(-1e-12);
    }
  });

  it("takes any module, and gives each level what a curve gives it", () => {
    const rule = { kind: "short-current-pulse" };
    const { levels: found } = tested({ module: MODULE, rule, cellTemperature: 45 });
    for (const { irradiance, efficiency, level } of found) {
      const curve = answered("curve", { ...curveRequest(), irradiance, cellTemperature: 45, rules: [rule] }).answer;
      expect(curve.places[0].power / curve.peaks[0].power).toBeCloseTo(efficiency, 12);
      const full = answered("curve", { ...curveRequest(), irradiance: 1000, cellTemperature: 45 }).answer;
      expect(curve.peaks[0].power / full.peaks[0].power).toBeCloseTo(level, 9);
    }
  });
});

describe("a dynamic test", () => {
  it.each(durations.rows)("$test lasts as the standard's rows do: $total s", ({ test, durations: rows, total }) => {
    const answer = tested({ test });
    expect(answer.rows.map(({ duration }: Json) => Math.round(duration))).toEqual(rows);
    expect(Math.round(answer.duration)).toBe(total);
    expect([answer.levels, answer.europeanWeighted, answer.cecWeighted]).toEqual([null, null, null]);
  });

  it.each(held.rows)("loses what was computed independently, within .003: $rule $settings.fraction", (row) => {
    for (const test of ["dynamic-100-500", "dynamic-300-1000"] as const) {
      const { efficiency, rows } = tested({ test, rule: { kind: row.rule, ...row.settings } });
      expect(Math.abs(1 - efficiency - row[test])).toBeLessThan(0.003);
      const mean = rows.reduce((all: number, one: Json) => all + one.efficiency, 0) / rows.length;
      expect(efficiency).toBeCloseTo(mean, 12);
      for (const one of rows) expect(one.efficiency + sumOf(one.lostByCause)).toBeCloseTo(1, 12);
    }
  });

  it("loses nothing by the perfect rule", () => {
    for (const test of ["dynamic-100-500", "dynamic-300-1000", "start-up"]) {
      expect(tested({ test, rule: { kind: "perfect" } }).efficiency).toBeCloseTo(1, 9);
    }
  });

  it("with a lag of no rise is the test without; cells that warm lower what a constant voltage takes", () => {
    const at = (temperatureLag: Json) => tested({ test: "dynamic-300-1000", temperatureLag }).efficiency;
    const plain = at(null);
    expect(Math.abs(at({ rise: 0, timeConstant: 120 }) - plain)).toBeLessThan(1e-6);
    // Voc falls .4 %/K (EN 50530:2010 Annex C): 20 K and more move the maximum well below the held voltage.
    expect(at({ rise: 30, timeConstant: 120 })).toBeLessThan(plain - 0.01);
  });
});

describe("the course of a row", () => {
  const rule = { kind: "fractional-open-circuit-voltage", fraction: 0.8 };
  const answer = tested({ test: "dynamic-300-1000", traceSlope: 100, rule });
  const { trace } = answer;
  const row = answer.rows.find(({ slope }: Json) => slope === 100);

  it("is given in spans of at most 1 s over the whole row, from the low level on", () => {
    expect(trace.slope).toBe(100);
    expect(trace.step).toBeLessThanOrEqual(1);
    expect(trace.irradiance.length * trace.step).toBeCloseTo(row.duration, 6);
    expect([Math.min(...trace.irradiance), Math.max(...trace.irradiance)]).toEqual([300, 1000]);
    expect(trace.irradiance.slice(0, 300 / trace.step)).toEqual(Array(300 / trace.step).fill(300));
    for (const column of [trace.leastPower, trace.operating.power, trace.maximumPower.voltage]) {
      expect(column).toHaveLength(trace.irradiance.length);
    }
  });

  it("holds means between its extremes, below the maximum", () => {
    for (const [k, power] of trace.operating.power.entries()) {
      expect(trace.leastPower[k]).toBeLessThanOrEqual(power + 2e-3);
      expect(power).toBeLessThanOrEqual(trace.mostPower[k] + 2e-3);
      // The control period is 1 s and the trace is no finer here: both stand for the same light.
      expect(trace.leastVoltage[k]).toBeLessThanOrEqual(trace.mostVoltage[k]);
    }
  });

  it("sums, after the settling, to the row's efficiency", () => {
    const sum = (column: number[]) => column.slice(300 / trace.step).reduce((all, one) => all + one, 0);
    expect(sum(trace.operating.power) / sum(trace.maximumPower.power)).toBeCloseTo(row.efficiency, 5);
  });

  it("is presentation: the digest and the figures are those without it", () => {
    const without = tested({ test: "dynamic-300-1000", rule });
    expect(without.trace).toBeNull();
    expect(without.provenance.inputDigest).toBe(answer.provenance.inputDigest);
    for (const [index, { efficiency }] of without.rows.entries()) {
      expect(answer.rows[index].efficiency).toBeCloseTo(efficiency, 6);
    }
  });
});

describe("the generator's own voltage", () => {
  it("is what constant voltage holds by default: 99.709 V of nominal 100 V (derived from the stated formulas)", () => {
    expect(tested({ module: GENERATOR }).resolved.rule.setVoltagePerModule).toBeCloseTo(99.709, 3);
  });
});
