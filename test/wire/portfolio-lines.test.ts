import { Ajv2020 } from "ajv/dist/2020.js";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { headOf } from "../../service/wire/portfolio/line-head.ts";
import { SeenIds } from "../../service/wire/portfolio/seen-ids.ts";
import { withSharedColumns } from "../../service/wire/portfolio/shared-columns.ts";
import { NamingLineSchema, PlainLineSchema } from "../../service/wire/schema/portfolio.ts";
import { documentOf } from "../http/an-app.ts";
import { CANDIDATES, defaultsLine, siteLine } from "./portfolio-requests.ts";
import { bend, changes } from "./random-requests.ts";
import type { Json } from "./requests.ts";
import { bodyOf, climateOf } from "./requests.ts";

/** JSON text of an object, its members in any order, with spaces anywhere and any character escaped. */
const jsonLines = fc
  .array(
    fc.tuple(
      fc.oneof(fc.constantFrom("kind", "id", "climate", "name", 'a"b', "{", "kind\\"), fc.string()),
      fc.oneof(
        fc.constantFrom<Json>("site", "climate", "named", { kind: "named", name: "x" }, { kind: "named", name: 3 }, [
          { kind: "no" },
        ]),
        fc.string({ unit: "binary" }),
        fc.jsonValue(),
      ),
      fc.boolean(),
    ),
    { maxLength: 6 },
  )
  .map((members) => {
    const texts = members.map(([name, value, escaped]) => {
      const key = JSON.stringify(name);
      return `${escaped && /^"\w+"$/.test(key) ? escapedText(name) : key} : ${JSON.stringify(value, null, 1)}`;
    });
    return `{ ${texts.join(" ,\t")} }`;
  });

function escapedText(text: string): string {
  const units = [...text].map((letter) => `\\u${letter.charCodeAt(0).toString(16).padStart(4, "0")}`);
  return `"${units.join("")}"`;
}

describe("the head of a line", () => {
  it("says what JSON.parse says of its kind, its id and the climate it names", () => {
    let named = 0;
    fc.assert(
      fc.property(jsonLines, (text) => {
        const { kind, id, climate } = JSON.parse(text);
        const isNamed = climate?.kind === "named" && typeof climate.name === "string";
        if (isNamed) named++;
        expect(headOf(bodyOf(text)), text).toEqual({
          kind: typeof kind === "string" ? kind : null,
          id: typeof id === "string" && /^\P{Cc}{1,100}$/u.test(new TextDecoder().decode(bodyOf(id))) ? id : null,
          climate: isNamed ? climate.name : null,
        });
      }),
      { numRuns: 5000, seed: 4 },
    );
    expect(named).toBeGreaterThan(50);
  });

  it("is found in whatever is no JSON without a throw", () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 60 }), fc.nat(), (noise, at) => {
        const line = bodyOf('{"kind":"site","id":"a","climate":{"kind":"named"}}').slice();
        line.set(noise.subarray(0, line.length), at % line.length > line.length - noise.length ? 0 : at % line.length);
        headOf(line);
        headOf(noise);
      }),
      { numRuns: 2000, seed: 5 },
    );
  });

  it("is that of the whole line, however long its climate", () => {
    const line = { climate: climateOf(8760), kind: "site", id: "last" };
    expect(headOf(bodyOf(line))).toEqual({ kind: "site", id: "last", climate: null });
  });
});

describe("the ids that were seen", () => {
  it("are known again, and no others are, over 100,000 of them in at most 100 bytes each", () => {
    const seen = new SeenIds();
    for (let index = 0; index < 100_000; index++) expect(seen.add(`site ${index}`)).toBe(true);
    for (let index = 0; index < 100_000; index += 7) expect(seen.add(`site ${index}`)).toBe(false);
    expect(seen.add("site -1")).toBe(true);
    expect(seen.bytes / 100_000).toBeLessThan(100);
  });

  it("tell any two strings apart, lone surrogates too", () => {
    fc.assert(
      fc.property(fc.uniqueArray(fc.string({ unit: "binary" }), { maxLength: 50 }), (ids) => {
        const seen = new SeenIds();
        expect(ids.map((id) => seen.add(id))).toEqual(ids.map(() => true));
        expect(ids.map((id) => seen.add(id))).toEqual(ids.map(() => false));
      }),
      { numRuns: 200, seed: 6 },
    );
    const seen = new SeenIds();
    expect([seen.add("\ud800"), seen.add("\ud801"), seen.add("\ufffd")]).toEqual([true, true, true]);
  });
});

describe("data with shared columns", () => {
  it("is the same data, its columns in shared memory, one that stands twice only once", () => {
    const column = Float64Array.of(1, Number.NaN, 3);
    const data = { a: column, list: [{ b: column, c: Uint8Array.of(7) }], d: null, e: "x", f: undefined };
    const shared = withSharedColumns(data);
    expect(shared.data).toEqual(data);
    expect(shared.data.a.buffer).toBeInstanceOf(SharedArrayBuffer);
    expect(shared.data.list[0].b).toBe(shared.data.a);
    expect(shared.bytes).toBe(3 * 8 + 1);
    expect(structuredClone(shared.data).a.buffer.byteLength).toBe(24);
    shared.data.a[0] = 9;
    expect(column[0]).toBe(1);
  });
});

describe("an independent validator of the document and the service's own", () => {
  it("agree on whether a line of a portfolio has the right form", async () => {
    const document = await documentOf();
    const ajv = new Ajv2020({ strict: false });
    ajv.addSchema({ $id: "document", components: document.components });
    const validate = ajv.getSchema("document#/components/schemas/PortfolioInputLine")!;
    const bases = (): Json[] => [
      defaultsLine({ baseline: "hold", count: 3, group: "g", mode: "steady", recordLowTemperature: null }),
      siteLine("a", { converter: {}, array: {}, energyValue: { currency: "EUR", perKilowattHour: 1 } }),
      siteLine("b", { candidates: structuredClone(CANDIDATES), climate: { kind: "named", name: "x" } }),
      { kind: "climate", name: "x", climate: climateOf(3) },
    ];
    let sound = 0;
    fc.assert(
      fc.property(fc.nat(3), changes, (which, list) => {
        const line = JSON.parse(JSON.stringify(bend(bases()[which], list)).replace(/Infinity/g, "null"));
        const schema = line.climate?.kind === "named" ? NamingLineSchema : PlainLineSchema;
        const ours = schema.safeParse(line).success;
        if (ours) sound++;
        expect(validate(line), JSON.stringify(line)).toBe(ours);
      }),
      { numRuns: 4000, seed: 3 },
    );
    expect(sound).toBeGreaterThan(800);
    expect(sound).toBeLessThan(3600);
  });
});
