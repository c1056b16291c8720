import { describe, expect, it } from "vitest";
import { CEILINGS } from "../../service/wire/limits.ts";
import { performOperation } from "../../service/wire/operations.ts";
import { comparisonRequest, estimateRequest, refused } from "./requests.ts";
import { bent, pointerOf, WRONG_COMPARISONS, WRONG_ESTIMATES } from "./wrong-requests.ts";

describe("a wrong request", () => {
  it.each(WRONG_ESTIMATES)("of an estimate with $what is told where and what to change", (wrong) => {
    const problem = refused("estimate", bent(estimateRequest(), wrong));
    expect(problem.code).toBe("invalid-request");
    const flaw = problem.errors.find(({ pointer }) => pointer === pointerOf(wrong));
    expect(flaw, JSON.stringify(problem.errors)).toMatchObject({ code: wrong.code });
    expect(flaw?.detail).toMatch(wrong.says);
  });

  it.each(WRONG_COMPARISONS)("of a comparison with $what is told where and what to change", (wrong) => {
    const problem = refused("compare", bent(comparisonRequest(), wrong));
    const flaw = problem.errors.find(({ pointer }) => pointer === pointerOf(wrong));
    expect(flaw, JSON.stringify(problem.errors)).toMatchObject({ code: wrong.code });
    expect(flaw?.detail).toMatch(wrong.says);
  });

  it("shows the first twenty errors and counts them all", () => {
    const request = estimateRequest();
    for (let k = 0; k < 30; k++) request.module[`odd${k}`] = k;
    const problem = refused("estimate", request);
    expect(problem.errorCount).toBe(30);
    expect(problem.errors).toHaveLength(20);
  });

  it("names all of several errors at once", () => {
    const request = estimateRequest();
    request.module.openCircuitVoltage = "38.9";
    request.climate.step = 0;
    request.rule = undefined;
    const pointers = refused("estimate", request).errors.map(({ pointer }) => pointer);
    expect(pointers.sort()).toEqual(["/climate/step", "/module/openCircuitVoltage", "/rule"]);
  });
});

describe("a body that is no JSON", () => {
  const text = (from: string, to: string) => JSON.stringify(estimateRequest()).replace(from, to);
  it.each([
    ["NaN", text('"step":3600', '"step":NaN'), /line 1, column \d+: NaN and Infinity are not JSON; write null/],
    ["nothing", "", /empty/],
    ["half a body", text("", "").slice(0, 100), /cut off/],
    ["deep nesting", "[".repeat(33), /32 deep/],
  ])("for %s is a malformed body", (_what, body, detail) => {
    const problem = refused("estimate", body);
    expect(problem.code).toBe("malformed-body");
    expect(problem.detail).toMatch(detail);
  });

  it("admits brackets inside strings and nesting of 32", () => {
    expect(refused("estimate", JSON.stringify({ note: "[".repeat(100) })).code).toBe("invalid-request");
    expect(refused("estimate", "[".repeat(32) + "]".repeat(32)).code).toBe("invalid-request");
  });

  it("says that a number too large for a double is too large", () => {
    const problem = refused("estimate", text('"step":3600', '"step":1e999'));
    expect(problem.errors[0]).toMatchObject({ pointer: "/climate/step", detail: expect.stringMatching(/too large/) });
  });

  it("refuses bytes that are no UTF-8", () => {
    const given = performOperation("estimate", Uint8Array.of(0x7b, 0xff, 0x7d), CEILINGS);
    expect(given).toMatchObject({ ok: false, problem: { code: "malformed-body", detail: "The body is not UTF-8." } });
  });
});

describe("the limits in force", () => {
  it("admit as many samples as they say and not one more", () => {
    const limits = { ...CEILINGS, samples: 24 };
    expect(() => refused("estimate", estimateRequest(24), limits)).toThrow("answered");
    const problem = refused("estimate", estimateRequest(25), limits);
    expect(problem.errors[0]).toMatchObject({
      pointer: "/climate/irradiance/values",
      code: "too-many",
      expected: "at most 24 samples",
    });
  });

  it("admit as many candidates as they say and not one more", () => {
    expect(() => refused("compare", comparisonRequest(), { ...CEILINGS, candidates: 2 })).toThrow("answered");
    const request = comparisonRequest();
    request.candidates.push({ label: "third", rule: { kind: "perfect" } });
    expect(refused("compare", request, { ...CEILINGS, candidates: 2 }).errors[0]).toMatchObject({ code: "too-many" });
  });

  it("refuse too much work before it starts, with the estimate and the limit", () => {
    const problem = refused("estimate", estimateRequest(24), { ...CEILINGS, controlPeriods: 10 });
    expect(problem.code).toBe("too-much-work");
    expect(problem.detail).toMatch(/as much work as \d+ control periods; the limit is 10/);
  });
});
