import { describe, expect, it } from "vitest";
import { CEILINGS } from "../../service/wire/limits.ts";
import type { OperationName } from "../../service/wire/operations.ts";
import { OPERATIONS, performOperation } from "../../service/wire/operations.ts";
import { CurveRequestSchema } from "../../service/wire/schema/curve.ts";
import { answered, bodyOf, comparisonRequest, estimateRequest, refused } from "./requests.ts";
import { WRONG_BENCHES } from "./wrong-benches.ts";
import { WRONG_CLIMATES } from "./wrong-climates.ts";
import { bent, pointerOf, WRONG_COMPARISONS, WRONG_ESTIMATES } from "./wrong-requests.ts";
import { WRONG_TUNINGS } from "./wrong-tunings.ts";

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

  describe.each([...WRONG_BENCHES, ...WRONG_TUNINGS, ...WRONG_CLIMATES])(
    "$operation, $of",
    ({ operation, sound, wrongs }) => {
      it("is answered when nothing is wrong", () => {
        expect(() => answered(operation, sound())).not.toThrow();
      });

      it.each(wrongs)("with $what is told where and what to change", (wrong) => {
        const problem = refused(operation, bent(sound(), wrong));
        const flaw = problem.errors.find(({ pointer }) => pointer === pointerOf(wrong));
        expect(flaw, JSON.stringify(problem.errors)).toMatchObject({ code: wrong.code });
        expect(flaw?.detail).toMatch(wrong.says);
      });
    },
  );

  it("shows the first twenty errors and counts them all", () => {
    const request = estimateRequest();
    for (let k = 0; k < 30; k++) request.module[`odd${k}`] = k;
    const problem = refused("estimate", request);
    expect(problem.errorCount).toBe(30);
    expect(problem.errors).toHaveLength(20);
  });

  it("counts 200,000 errors in little more time than it takes to find them, explaining twenty", () => {
    const body = `{${Array.from({ length: 200_000 }, (_, k) => `"odd${k}":1`).join(",")}}`;
    const timed = (work: () => void): number => {
      const began = performance.now();
      work();
      return performance.now() - began;
    };
    const finding = timed(() => CurveRequestSchema.safeParse(JSON.parse(body)));
    const refusing = timed(() => {
      const problem = refused("curve", body);
      expect([problem.errorCount, problem.errors.length]).toEqual([200_003, 20]);
    });
    // Explaining each of them took 14 times the finding.
    expect(refusing).toBeLessThan(5 * finding + 300);
  });

  it("says what either of two forms of a member would be", () => {
    const gaps = { ...estimateRequest() };
    gaps.climate.gaps = 3600;
    expect(refused("estimate", gaps).errors[0].expected).toBe(
      "one of: refuse, skip; or an object with interpolateUpTo",
    );
    const battery = refused("estimate", {
      ...estimateRequest(),
      rule: { kind: "battery-coupled", batteryVoltage: "low" },
    });
    expect(battery.errors[0].expected).toBe("a number (0 to 2000 V); or an array of numbers");
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
    expect(given).toMatchObject({
      ok: false,
      problem: { code: "malformed-body", detail: expect.stringMatching(/not UTF-8; encode/) },
    });
  });
});

describe.each(Object.keys(OPERATIONS) as OperationName[])("a body for %s that no one can read", (operation) => {
  it.each([
    ["nothing", "", "malformed-body", /empty/],
    ["NaN", '{"irradiance":NaN}', "malformed-body", /NaN and Infinity are not JSON/],
    ["a cut text", '{"module":', "malformed-body", /cut off/],
    ["33 brackets", "[".repeat(33), "malformed-body", /32 deep/],
    ["a list", "[]", "invalid-request", /The body is an array; send a JSON object/],
    ["null", "null", "invalid-request", /The body is null; send a JSON object/],
    ["a string", '"module"', "invalid-request", /The body is a string/],
  ])("says so of %s", (_what, body, code, detail) => {
    const problem = refused(operation, body);
    expect(problem.code).toBe(code);
    expect(problem.detail).toMatch(detail);
  });

  it("says so of bytes that are no UTF-8", () => {
    const given = performOperation(operation, Uint8Array.of(0x7b, 0xff, 0x7d), CEILINGS);
    expect(given).toMatchObject({ ok: false, problem: { code: "malformed-body" } });
  });

  it("says of every number beyond doubles that it is too large", () => {
    const body = new TextDecoder().decode(bodyOf({ module: { kind: "test-generator", maximumPower: "X" } }));
    const problem = refused(operation, body.replace('"X"', "1e999"));
    const flaw = problem.errors.find(({ pointer }) => pointer === "/module/maximumPower");
    if (operation !== "fitModule") expect(flaw?.detail).toMatch(/too large for a double/);
    expect(JSON.stringify(problem)).not.toMatch(/Infinity|null/);
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
