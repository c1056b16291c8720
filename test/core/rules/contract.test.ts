import { describe, expect, it } from "vitest";
import { RULES } from "../../../service/core/rules/index.ts";
import type { RuleDefinition } from "../../../service/core/rules/rule.ts";
import { contract } from "./contract.ts";

describe("the table of rules", () => {
  it("names every rule once", () => {
    expect(new Set(RULES.map((rule) => rule.kind)).size).toBe(RULES.length);
  });
});

for (const rule of RULES) contract(rule as unknown as RuleDefinition);
