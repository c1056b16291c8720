import { describe, expect, it } from "vitest";
import { ClimateError } from "../../service/climate/climate-error.ts";
import { bridgeGaps, closeGaps } from "../../service/climate/gaps.ts";

const no = Number.NaN;

describe("gaps", () => {
  it("are refused with the column and the first sample named", () => {
    const attempt = () => closeGaps({ a: Float64Array.of(1, 2, 3), b: Float64Array.of(1, no, no) }, 60, "refuse");
    expect(attempt).toThrow(ClimateError);
    expect(attempt).toThrow(expect.objectContaining({ code: "missing-samples", column: "b", index: 1 }));
  });

  it("are left alone where there are none: the same arrays, nothing marked", () => {
    const a = Float64Array.of(1, 2);
    for (const policy of ["refuse", "skip", { interpolateUpTo: 60 }] as const) {
      const closed = closeGaps({ a }, 60, policy);
      expect(closed.columns[0]).toBe(a);
      expect(closed).toMatchObject({ used: null, filled: 0, skipped: 0 });
    }
  });

  it("skip every sample that lacks any column", () => {
    const closed = closeGaps({ a: Float64Array.of(no, 1, 1, 1), b: Float64Array.of(1, 1, no, 1) }, 60, "skip");
    expect([...(closed.used ?? [])]).toEqual([0, 1, 0, 1]);
    expect(closed).toMatchObject({ filled: 0, skipped: 2 });
  });

  it("are filled along a straight line up to the stated length and not beyond, nor at the ends", () => {
    const a = Float64Array.of(no, 0, no, no, 30, no, no, no, 70, no);
    const closed = closeGaps({ a }, 60, { interpolateUpTo: 120 });
    expect([...closed.columns[0]]).toEqual([no, 0, 10, 20, 30, no, no, no, 70, no]);
    expect([...(closed.used ?? [])]).toEqual([0, 1, 1, 1, 1, 0, 0, 0, 1, 0]);
    expect(closed).toMatchObject({ filled: 2, skipped: 5 });
    expect([...a]).toEqual([no, 0, no, no, 30, no, no, no, 70, no]);
  });

  it("count a gap as missing samples times step: 119 s do not fill two minutes", () => {
    const a = Float64Array.of(0, no, no, 30);
    expect(closeGaps({ a }, 60, { interpolateUpTo: 119 }).skipped).toBe(2);
    expect(closeGaps({ a }, 60, { interpolateUpTo: 120 }).used).toBeNull();
  });

  it("are filled column by column", () => {
    const closed = closeGaps({ a: Float64Array.of(0, no, 2), b: Float64Array.of(5, 5, 5) }, 1, { interpolateUpTo: 1 });
    expect([...closed.columns[0]]).toEqual([0, 1, 2]);
    expect(closed).toMatchObject({ used: null, filled: 1, skipped: 0 });
  });

  it("stay gaps in a column of nothing, and an empty column has none", () => {
    expect([...bridgeGaps(Float64Array.of(no, no), 5)]).toEqual([no, no]);
    expect(bridgeGaps(new Float64Array(0), 5)).toHaveLength(0);
  });
});
