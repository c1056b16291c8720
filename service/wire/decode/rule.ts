import type { z } from "@hono/zod-openapi";
import type { RuleChoice } from "../../core/rules/index.ts";
import { toColumn } from "../schema/column.ts";
import type { RawRule, RuleSchema } from "../schema/rule.ts";

/** A rule of the wire as the studies take it. */
export function decodeRule(rule: z.output<typeof RuleSchema>): RuleChoice {
  const { kind, ...given } = rule as RawRule;
  const settings: Record<string, number | boolean | string | Float64Array> = {};
  for (const [name, value] of Object.entries(given)) {
    if (value !== undefined) settings[name] = Array.isArray(value) ? toColumn(value) : value;
  }
  return { kind, settings };
}
