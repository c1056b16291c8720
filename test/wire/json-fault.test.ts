import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { jsonFault } from "../../service/wire/decode/json-fault.ts";

function engineRefuses(text: string): boolean {
  try {
    JSON.parse(text);
    return false;
  } catch {
    return true;
  }
}

describe("the place where a text stops being JSON", () => {
  it("exists exactly where the engine's own parser refuses (RFC 8259)", () => {
    const bent = fc
      .tuple(fc.json(), fc.nat(), fc.constantFrom("", ",", "]", "}", '"', "NaN", "\n", "\\", "0", "-", "e"))
      .map(([text, at, piece]) => {
        const cut = at % (text.length + 1);
        return text.slice(0, cut) + piece + text.slice(cut + (at % 2));
      });
    fc.assert(
      fc.property(bent, (text) => (jsonFault(text) !== null) === engineRefuses(text)),
      { numRuns: 5000, seed: 2 },
    );
  });

  it.each([
    ['{"a":[1,NaN]}', 8, /write null for a missing sample/],
    ['{"a":[1,-Infinity]}', 8, /write null/],
    ['{"a":1,}', 7, /name in double quotes/],
    ["[1,2,]", 5, /comma too many/],
    ['{"a":1', 6, /cut off/],
    ['{"a" 1}', 5, /":" belongs here/],
    ["{'a':1}", 1, /double quotes/],
    ["[01]", 1, /begin a JSON value/],
    ["[1] [2]", 4, /ended before/],
    ['["a\nb"]', 3, /line break/],
    ["", 0, /too early/],
  ])("of %s is %i", (text, index, reason) => {
    const fault = jsonFault(text);
    expect(fault?.index).toBe(index);
    expect(fault?.reason).toMatch(reason);
  });
});
