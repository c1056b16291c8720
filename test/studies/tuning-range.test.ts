import { describe, expect, it } from "vitest";
import type { RuleChoice } from "../../service/core/rules/index.ts";
import { StudyError } from "../../service/studies/study-error.ts";
import { tuningRange } from "../../service/studies/tuning-range.ts";

const FRACTIONAL: RuleChoice = { kind: "fractional-open-circuit-voltage", settings: {} };
const rangeOf = (parameter: string, rule = FRACTIONAL, today: number | null = null) =>
  tuningRange({ rule, parameter, range: null }, today);

function refusal(parameter: string, from: number, to: number, rule = FRACTIONAL): StudyError {
  try {
    tuningRange({ rule, parameter, range: { from, to } }, null);
  } catch (error) {
    if (error instanceof StudyError) return error;
  }
  throw new Error("not refused");
}

describe("the range of a tuning", () => {
  it("is the usual one half as wide again on either side: .70 to .80 becomes .65 to .85", () => {
    const { from, to } = rangeOf("fraction")!;
    expect(from).toBeCloseTo(0.65, 12);
    expect(to).toBeCloseTo(0.85, 12);
  });

  it("keeps a negative setting's usual values inside: -.6 to -.2 %/K becomes -.8 to 0", () => {
    const { from, to } = rangeOf("coefficient", { kind: "temperature-compensated-voltage", settings: {} })!;
    expect(from).toBeCloseTo(-0.8, 12);
    expect(to).toBeCloseTo(0, 12);
  });

  it("stays above the sample that recurs, and below the period it recurs in", () => {
    expect(rangeOf("samplePeriod")!.from).toBeGreaterThan(0.256);
    const long = { ...FRACTIONAL, settings: { sampleDuration: 1000 } };
    const { from, to } = rangeOf("samplePeriod", long)!;
    expect(from).toBeGreaterThan(1000);
    expect(to).toBeGreaterThan(from);
    expect(rangeOf("sampleDuration", { ...FRACTIONAL, settings: { samplePeriod: 1 } })!.to).toBeLessThan(1);
    expect(rangeOf("scanPeriod", { kind: "power-curve-scan", settings: {} })!.from).toBeGreaterThan(2);
  });

  it("lies around today's value where nothing is usual, and is not known without it", () => {
    const rule: RuleChoice = { kind: "constant-voltage", settings: {} };
    expect(rangeOf("setVoltagePerModule", rule)).toBeNull();
    const { from, to } = rangeOf("setVoltagePerModule", rule, 30)!;
    expect(from).toBeLessThan(21);
    expect(to).toBeGreaterThan(36);
  });

  it("is taken as it was asked for", () => {
    expect(tuningRange({ rule: FRACTIONAL, parameter: "fraction", range: { from: 0.1, to: 1 } }, null)).toEqual({
      from: 0.1,
      to: 1,
    });
  });

  it.each([
    ["fraction", 0, 0.9, "range-outside-setting", /above 0 to 1, of the sampled/],
    ["fraction", 0.5, 1.5, "range-outside-setting", /leaves that\.$/],
    ["fraction", 70, 90, "range-outside-setting", /0\.7 to 0\.9\?/],
    ["fraction", 0.8, 0.8, "range-not-rising", /does not rise/],
    ["samplePeriod", 0.256, 10, "range-outside-setting", /above 0\.256 to 86400 s/],
    ["sampleDuration", 0.1, 16, "range-outside-setting", /0 to below 16 s/],
  ])("of %s from %d to %d is refused: %s", (parameter, from, to, code, says) => {
    const error = refusal(parameter, from, to);
    expect([error.code, error.pointer]).toEqual([code, "/range"]);
    expect(error.message).toMatch(says);
  });
});
