import { z } from "@hono/zod-openapi";
import { unitAfter } from "../../studies/unit-after.ts";
import { unitOf } from "../schema/quantity.ts";
import { kindsOf } from "./schema-at.ts";

/** What a number may be, with its unit. */
export function rangeOf(schema: z.ZodNumber): string {
  const { exclusiveMinimum } = schema._zod.bag as { exclusiveMinimum?: number };
  const low = exclusiveMinimum === undefined ? `${schema.minValue} to` : `above ${exclusiveMinimum}, up to`;
  return `${low} ${schema.maxValue}${unitAfter(unitOf(schema) ?? "1")}`;
}

/** What a schema takes, in words. */
export function expectedBy(schema: z.ZodType): string {
  if (schema instanceof z.ZodNumber) return `a number (${rangeOf(schema)})`;
  if (schema instanceof z.ZodEnum) return `one of: ${schema.options.join(", ")}`;
  if (schema instanceof z.ZodDiscriminatedUnion) return `an object of kind ${kindsOf(schema).join(" or ")}`;
  if (schema instanceof z.ZodObject) return `an object with ${Object.keys(schema.shape).join(", ")}`;
  if (schema instanceof z.ZodString) return "a string";
  return schema instanceof z.ZodArray ? "an array" : "an array of numbers";
}
