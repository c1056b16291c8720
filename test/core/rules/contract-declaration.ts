import { expect, it } from "vitest";
import { photovoltaicArray } from "../../../service/core/array/array.ts";
import type { RuleKind } from "../../../service/core/rules/index.ts";
import { completeSettings } from "../../../service/core/rules/index.ts";
import type { NumberParameter, Parameters, RuleDefinition } from "../../../service/core/rules/rule.ts";
import { SINGLE } from "../tracking/steady-run.ts";
import { MODULE } from "./random-trials.ts";

/** What a rule says of itself and of its parameters. */
export function declaresItself(rule: RuleDefinition): void {
  const parameters = Object.entries(rule.parameters as Parameters);
  const array = { modulesInSeries: 1, standard: photovoltaicArray(MODULE, SINGLE).standard };
  const defaults: Record<string, unknown> = completeSettings({ kind: rule.kind as RuleKind, settings: {} }, array);

  it("by kind, title, description and sources", () => {
    expect(rule.kind).toMatch(/^[a-z]+(-[a-z]+)*$/);
    expect(rule.title.length).toBeGreaterThan(0);
    expect(rule.description.length).toBeGreaterThan(20);
    expect(rule.sources.length).toBeGreaterThan(0);
    for (const source of rule.sources) expect(source).toMatch(/\d{4}|no source/);
  });

  it("by parameters that say what they are, in which unit, and where their numbers come from", () => {
    for (const [name, parameter] of parameters) {
      expect(name).toMatch(/^[a-z][A-Za-z]+$/);
      expect(parameter.description.length, name).toBeGreaterThan(10);
      expect(parameter.source, name).toMatch(/\d{4}|no source|own choice/);
      if (parameter.type === "number" || parameter.type === "series") expect(parameter.unit, name).not.toBe("");
    }
  });

  it("by ranges that hold the default and the usual range", () => {
    const numbers = parameters.filter(([, parameter]) => parameter.type === "number") as [string, NumberParameter][];
    for (const [name, { minimum, exclusiveMinimum, maximum, usual, integer }] of numbers) {
      expect(minimum === undefined, `${name} has one lower bound`).toBe(exclusiveMinimum !== undefined);
      const low = minimum ?? exclusiveMinimum!;
      const value = defaults[name] as number;
      expect(value, name).toBeLessThanOrEqual(maximum);
      if (exclusiveMinimum === undefined) expect(value, name).toBeGreaterThanOrEqual(low);
      else expect(value, name).toBeGreaterThan(low);
      if (integer) expect(Number.isInteger(value), name).toBe(true);
      if (usual === undefined) continue;
      expect(usual[0], name).toBeLessThan(usual[1]);
      expect(usual[0], name).toBeGreaterThanOrEqual(low);
      expect(usual[1], name).toBeLessThanOrEqual(maximum);
    }
  });

  it("by choices that hold their default, and series that must be given", () => {
    for (const [name, parameter] of parameters) {
      if (parameter.type === "choice") expect(parameter.choices, name).toContain(parameter.default);
      if (parameter.type === "series") expect(defaults[name], name).toBeUndefined();
    }
  });
}
