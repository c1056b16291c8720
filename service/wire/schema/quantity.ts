import { z } from "@hono/zod-openapi";

/** What a number may be. */
export interface Bounds {
  minimum?: number;
  exclusiveMinimum?: number;
  maximum: number;
  integer?: boolean;
}

const units = new WeakMap<object, string>();

/** The unit of a schema made by `quantity`; undefined for any other. */
export function unitOf(schema: object): string | undefined {
  return units.get(schema);
}

/** A description that ends in the unit, the way every number of the document states it. */
export function withUnit(unit: string, description: string): string {
  return `${description} Unit: ${unit}.`;
}

/** A number of a request: bounded, with its unit ("1" for a pure number). */
export function quantity(unit: string, description: string, bounds: Bounds) {
  const base = (bounds.integer ? z.int() : z.number()).max(bounds.maximum);
  const above = bounds.exclusiveMinimum === undefined ? base : base.gt(bounds.exclusiveMinimum);
  const bounded = bounds.minimum === undefined ? above : above.min(bounds.minimum);
  const schema = bounded.openapi({ description: withUnit(unit, description) });
  units.set(schema, unit);
  return schema;
}

/** A number of an answer, with its unit; never NaN or Infinity. */
export function reported(unit: string, description: string) {
  return z.number().openapi({ description: withUnit(unit, description) });
}

/** A number of an answer that may be absent: null, for the reason its description gives. */
export function reportedOrNull(unit: string, description: string) {
  return z
    .number()
    .nullable()
    .openapi({ description: withUnit(unit, description) });
}
