import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { byteWriter, written } from "../../service/wire/encode/byte-writer.ts";
import { rounded, writeColumn } from "../../service/wire/encode/fixed-decimals.ts";

/** JSON.stringify (ECMA-262) on rounded values: the independent writer. */
function expected(values: readonly number[], decimals: number): string {
  const scale = Number(`1e${decimals}`);
  return JSON.stringify(values.map((value) => Math.round(value * scale) / scale));
}

function column(values: readonly number[], decimals: number, skipped: Uint8Array | null = null): string {
  const writer = byteWriter(1);
  writeColumn(writer, Float64Array.from(values), decimals, skipped);
  return new TextDecoder().decode(written(writer));
}

const decimals = fc.integer({ min: 0, max: 9 });
const anyDouble = fc.double();
const nearDecimals = fc
  .tuple(fc.integer({ min: -10_000_000, max: 10_000_000 }), fc.integer({ min: 0, max: 10 }))
  .map(([whole, places]) => whole / 10 ** places);
const halves = fc.integer({ min: -1_000_000, max: 1_000_000 }).map((whole) => (whole + 0.5) / 1000);

describe("the fixed-decimal column writer", () => {
  it("writes the very bytes of JSON.stringify for any doubles", () => {
    fc.assert(
      fc.property(fc.array(fc.oneof(anyDouble, nearDecimals, halves)), decimals, (values, places) => {
        expect(column(values, places)).toBe(expected(values, places));
      }),
      { numRuns: 3000, seed: 1 },
    );
  });

  it("writes the very bytes of JSON.stringify where decimals run out and exponents begin", () => {
    const edges = [
      0,
      -0,
      1e-7,
      9.99e-7,
      1e-6,
      5e-10,
      -5e-10,
      1e15,
      1e15 - 0.5,
      2 ** 31,
      2 ** 31 - 1e-3,
      2 ** 53,
      1e21,
      1.5e300,
    ];
    for (let places = 0; places <= 9; places++) {
      const values = edges.flatMap((edge) => [edge, -edge, edge * 1.000001, edge / 3]);
      expect(column(values, places)).toBe(expected(values, places));
    }
  });

  it("writes long columns across its blocks", () => {
    const values = Array.from({ length: 10_001 }, (_, k) => Math.sin(k) * 1000);
    expect(column(values, 3)).toBe(expected(values, 3));
  });

  it("writes null for NaN, Infinity and skipped samples, and brackets for an empty column", () => {
    expect(column([1, Number.NaN, Number.POSITIVE_INFINITY, -1e308, 2.25], 1)).toBe(
      `[1,null,null,${expected([-1e308], 1).slice(1, -1)},2.3]`,
    );
    expect(column([1, 2, 3], 0, Uint8Array.of(0, 1, 0))).toBe("[1,null,3]");
    expect(column([], 3)).toBe("[]");
  });

  it("rounds as it writes", () => {
    expect(rounded(2.0005, 3)).toBe(Number(column([2.0005], 3).slice(1, -1)));
  });
});
