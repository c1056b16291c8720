import { describe, expect, it } from "vitest";
import heldReferences from "../../fixtures/held-references.json" with { type: "json" };
import durations from "../../fixtures/test-durations.json" with { type: "json" };
import type { RampTest } from "../../oracle/ramp-rows.ts";
import { RAMP_TESTS, rampRow } from "../../oracle/ramp-rows.ts";
import type { Trial } from "./stepped-run.ts";
import { run } from "./stepped-run.ts";

type Sequence = keyof typeof RAMP_TESTS;

/** Lost fraction of trials on a sequence: the unweighted mean of its rows, settling not counted (physics 10). */
function sequenceLoss(sequence: Sequence, trials: readonly Trial[]): number[] {
  const test: RampTest = RAMP_TESTS[sequence];
  const sums = trials.map(() => 0);
  for (const [slope, repetitions] of test.rows) {
    const { step, irradiance, settle } = rampRow(test, slope, repetitions);
    const results = run({ irradiance, step, from: settle }, trials);
    for (const [c, { fraction }] of results.entries()) sums[c] += fraction / test.rows.length;
  }
  return sums;
}

describe("the standard's dynamic sequences", () => {
  it.each(durations.rows)("$test lasts as published, row by row", ({ test: name, durations: published, total }) => {
    const test: RampTest = RAMP_TESTS[name as Sequence];
    const lasting = test.rows.map(([slope, repetitions]) => {
      const { step, irradiance } = rampRow(test, slope, repetitions);
      return step * irradiance.length;
    });
    expect(lasting.map(Math.round)).toEqual(published);
    expect(Math.round(lasting.reduce((sum, one) => sum + one, 0))).toBe(total);
  });

  it.each(["dynamic-100-500", "dynamic-300-1000"] as const)("cost held references what is known, %s", (sequence) => {
    const trials = heldReferences.rows.map(({ rule, settings }) => ({ kind: rule as Trial["kind"], settings }));
    const losses = sequenceLoss(sequence, trials);
    for (const [c, row] of heldReferences.rows.entries()) {
      expect(Math.abs(losses[c] - row[sequence]), JSON.stringify(row.settings)).toBeLessThan(0.003);
    }
  });

  // Sera et al., IEEE J. Photovolt. 3(3) (2013) 1070-1078 (from memory): the two rules are one under test conditions.
  it.each(["dynamic-100-500", "dynamic-300-1000"] as const)("do not tell the climbing rules apart, %s", (sequence) => {
    const [observing, conducting] = sequenceLoss(sequence, [
      { kind: "perturb-and-observe", settings: { controlPeriod: 0.1, stepFraction: 0.01 } },
      { kind: "incremental-conductance", settings: { controlPeriod: 0.1, stepFraction: 0.01, holdTolerance: 0 } },
    ]);
    expect(observing).toBeGreaterThan(0.0005);
    expect(Math.abs(observing - conducting)).toBeLessThan(0.002);
  });
});

describe("sampling in steady light", () => {
  // Duty .256 s of 16 s and the fraction's own .98893 on this generator at any irradiance: derived from the formulas of
  // EN 50530:2010 Annex C independently, product .97311 to 1e-5.
  it.each([150, 600, 1000])("costs its duty times its set point's loss, %i W/m2", (level) => {
    const irradiance = new Array<number>(10 * 16).fill(level);
    const [{ fraction, causes, available }] = run({ irradiance, step: 1 }, [
      { kind: "fractional-open-circuit-voltage", settings: { fraction: 0.76 } },
    ]);
    expect(Math.abs(1 - fraction - 0.97311)).toBeLessThan(1e-5);
    expect(causes[5] / (available - causes[2])).toBeCloseTo(0.016, 10);
  });
});
