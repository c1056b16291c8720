import type { z } from "@hono/zod-openapi";
import { Ajv2020 } from "ajv/dist/2020.js";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { RULES } from "../../service/core/rules/index.ts";
import type { RuleDefinition } from "../../service/core/rules/rule.ts";
import { ruleCatalogue } from "../../service/wire/rule-catalogue.ts";
import { ComparisonRequestSchema } from "../../service/wire/schema/comparison.ts";
import { EstimateRequestSchema } from "../../service/wire/schema/estimate.ts";
import { documentOf } from "../http/an-app.ts";
import type { Json } from "./requests.ts";
import { comparisonRequest, estimateRequest } from "./requests.ts";

const document = await documentOf();
const schemas: Record<string, Json> = document.components.schemas;
const rules = RULES as unknown as readonly RuleDefinition[];

/** Every schema object of the document's components, with its place. */
function* walk(node: Json, place: string): Generator<[string, Json]> {
  if (typeof node !== "object" || node === null) return;
  yield [place, node];
  for (const [name, child] of Object.entries(node))
    if (name !== "example" && name !== "default") yield* walk(child, `${place}/${name}`);
}

const numeric = (node: Json) => [node.type].flat().some((type) => type === "number" || type === "integer");

describe("the document's schemas", () => {
  const nodes = Object.entries(schemas).flatMap(([name, schema]) => [...walk(schema, name)]);

  it("state the unit of every number", () => {
    const numbers = nodes.filter(([, node]) => numeric(node));
    expect(numbers.length).toBeGreaterThan(150);
    const silent = numbers.filter(([, node]) => !/Unit: [^.]+.*\.$/.test(node.description ?? ""));
    expect(silent.map(([place]) => place)).toEqual([]);
  });

  it("mark every column", () => {
    const columns = nodes.filter(([, node]) => node.type === "array" && numeric(node.items));
    expect(columns.length).toBeGreaterThan(10);
    expect(columns.filter(([, node]) => node["x-column"] !== true).map(([place]) => place)).toEqual([]);
  });

  it("bound every number and every array of a request", () => {
    const reached = new Set<string>();
    const reach = (name: string) => {
      if (reached.has(name)) return;
      reached.add(name);
      for (const [, node] of walk(schemas[name], name))
        if (typeof node.$ref === "string") reach(node.$ref.split("/").at(-1));
    };
    reach("EstimateRequest");
    reach("ComparisonRequest");
    const requests = [...reached].flatMap((name) => [...walk(schemas[name], name)]);
    const loose = requests.filter(([, node]) => {
      if (numeric(node)) return node.maximum === undefined || (node.minimum ?? node.exclusiveMinimum) === undefined;
      return node.type === "array" && node.maxItems === undefined;
    });
    expect(loose.map(([place]) => place)).toEqual([]);
    const open = requests.filter(([, node]) => node.type === "object" && node.additionalProperties !== false);
    expect(open.map(([place]) => place)).toEqual([]);
  });

  it("have a variant for every rule of the table, with every setting", () => {
    const mapping: Record<string, string> = schemas["Rule"].discriminator.mapping;
    expect(Object.keys(mapping)).toEqual(rules.map(({ kind }) => kind));
    for (const { kind, parameters } of rules) {
      const variant = schemas[mapping[kind].split("/").at(-1)!];
      expect(Object.keys(variant.properties)).toEqual(["kind", ...Object.keys(parameters)]);
      for (const [name, parameter] of Object.entries(parameters)) {
        expect(variant.properties[name].description).toContain(parameter.description);
        if (parameter.type === "number" && typeof parameter.default === "number") {
          expect(variant.properties[name].default).toBe(parameter.default);
        }
      }
    }
  });
});

describe("the rule catalogue", () => {
  it("holds every rule of the table with every parameter's default, unit and source", () => {
    const catalogue = ruleCatalogue();
    expect(catalogue.rules.map(({ kind }) => kind)).toEqual(rules.map(({ kind }) => kind));
    for (const [index, { parameters }] of rules.entries()) {
      for (const entry of catalogue.rules[index].parameters) {
        const parameter = parameters[entry.name];
        expect(entry.source).toBe(parameter.source);
        expect(entry.required).toBe(parameter.type === "series");
        if (parameter.type === "number") expect(entry.unit).toBe(parameter.unit);
      }
    }
  });
});

/** Values that are often wrong in one way or another. */
const odd = fc.oneof(
  fc.constantFrom<Json>(
    null,
    true,
    "",
    "datasheet",
    "single-diode",
    "perfect",
    "ambient",
    "noct",
    [],
    {},
    "EUR",
    "\u{1f600}".repeat(100),
    "\u{1f600}".repeat(101),
    "a\u0000",
    "2025-01-01T00:00Z",
    "2025-13-01T00:00:00Z",
    Number.POSITIVE_INFINITY,
  ),
  fc.double({ noNaN: true, min: -1e4, max: 1e4 }),
  fc.integer({ min: -3, max: 700 }),
  fc.array(fc.oneof(fc.double({ noNaN: true, min: -20, max: 2100 }), fc.constant(null)), { maxLength: 4 }),
);

/** Every place of a value, as path. */
function places(value: Json, path: string[] = []): string[][] {
  if (typeof value !== "object" || value === null) return [path];
  return [path, ...Object.keys(value).flatMap((name) => places(value[name], [...path, name]))];
}

type Change = { at: number; how: "set" | "drop" | "add"; value: Json; name: string };

const changes: fc.Arbitrary<Change[]> = fc.array(
  fc.record({
    at: fc.nat(),
    how: fc.constantFrom("set" as const, "set" as const, "drop" as const, "add" as const),
    value: odd,
    name: fc.constantFrom(
      "array",
      "converter",
      "mode",
      "traces",
      "label",
      "price",
      "fraction",
      "windSpeed",
      "model",
      "sensorError",
      "odd",
    ),
  }),
  { minLength: 0, maxLength: 3 },
);

function bend(request: Json, list: readonly Change[]): Json {
  for (const { at, how, value, name } of list) {
    const all = places(request).filter((path) => path.length > 0);
    const path = all[at % all.length];
    const parent = path.slice(0, -1).reduce((node, step) => node[step], request);
    if (how === "set") parent[path.at(-1)!] = value;
    else if (how === "add" && !Array.isArray(parent)) parent[name] = value;
    else if (Array.isArray(parent)) parent.splice(Number(path.at(-1)), 1);
    else delete parent[path.at(-1)!];
  }
  return request;
}

const bases: Record<string, { schema: z.ZodType; make: () => Json[] }> = {
  EstimateRequest: {
    schema: EstimateRequestSchema,
    make: () => [
      estimateRequest(3),
      ...rules.map(({ kind, parameters }) => ({ ...estimateRequest(2), rule: { kind, ...fillIn(parameters) } })),
      {
        ...estimateRequest(2),
        module: { kind: "test-generator", technology: "thin-film", maximumPower: 100, maximumPowerVoltage: 40 },
        converter: { trackingMaximumVoltage: 50, sensorError: { voltageGain: 0.01 } },
        array: { modulesInSeries: 2 },
      },
      {
        ...estimateRequest(2),
        module: {
          kind: "single-diode",
          cellsInSeries: 36,
          photocurrent: 5,
          saturationCurrent: 1e-9,
          seriesResistance: 0.2,
          shuntResistance: null,
          idealityVoltage: 1.2,
        },
        recordLowTemperature: -10,
      },
    ],
  },
  ComparisonRequest: {
    schema: ComparisonRequestSchema,
    make: () => [
      {
        ...comparisonRequest(2),
        baseline: "hold",
        energyValue: { currency: "EUR", perKilowattHour: 0.2 },
        converter: { maximumPower: null },
      },
    ],
  },
};

function fillIn(parameters: RuleDefinition["parameters"]): Json {
  const filled = Object.entries(parameters).map(([name, parameter]) => [
    name,
    parameter.type === "series" ? [20, null] : parameter.type === "number" ? parameter.maximum : parameter.default,
  ]);
  return Object.fromEntries(filled);
}

describe("an independent validator of the document and the service's own", () => {
  const ajv = new Ajv2020({ strict: false, allErrors: false });
  ajv.addSchema({ $id: "document", components: document.components });

  it.each(Object.entries(bases))("agree on whether %s has the right form", (name, { schema, make }) => {
    const validate = ajv.getSchema(`document#/components/schemas/${name}`)!;
    let sound = 0;
    fc.assert(
      fc.property(fc.nat(), changes, (which, list) => {
        const options = make();
        const request = JSON.parse(
          JSON.stringify(bend(options[which % options.length], list)).replace(/Infinity/g, "null"),
        );
        const ours = schema.safeParse(request).success;
        if (ours) sound++;
        expect(validate(request), JSON.stringify(request)).toBe(ours);
      }),
      { numRuns: 5000, seed: 3 },
    );
    expect(sound).toBeGreaterThan(1000);
    expect(sound).toBeLessThan(4500);
  });
});
