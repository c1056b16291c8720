import { Ajv2020 } from "ajv/dist/2020.js";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { RULES } from "../../service/core/rules/index.ts";
import type { RuleDefinition } from "../../service/core/rules/rule.ts";
import { ruleCatalogue } from "../../service/wire/rule-catalogue.ts";
import { documentOf } from "../http/an-app.ts";
import { bases, bend, changes } from "./random-requests.ts";
import type { Json } from "./requests.ts";

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
    for (const name of Object.keys(bases)) reach(name);
    const requests = [...reached].flatMap((name) => [...walk(schemas[name], name)]);
    expect(requests.length).toBeGreaterThan(200);
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
