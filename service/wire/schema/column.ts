import { z } from "@hono/zod-openapi";
import { CEILINGS } from "../limits.ts";
import type { Bounds } from "./quantity.ts";
import { withUnit } from "./quantity.ts";

/** A column as JSON has it: a number a sample, null where it is missing. */
export type RawColumn = (number | null)[];

/** What a column's one finding says beside its path. */
export interface ColumnFinding {
  finding: "not-an-array" | "empty" | "too-many" | "not-a-number" | "out-of-range";
  unit: string;
  minimum: number;
  maximum: number;
  /** How many of the values are wrong. */
  wrong: number;
}

/** The bounds of one column's values. */
export interface ColumnBounds extends Bounds {
  minimum: number;
}

interface Scanned {
  finding: ColumnFinding["finding"];
  /** Of the first wrong value; null where the whole column is meant. */
  index: number | null;
  wrong: number;
}

/** One pass over a column: the first wrong value and how many there are, or null. A thousand issues cost no more than one. */
function scanColumn(values: unknown, bounds: ColumnBounds): Scanned | null {
  if (!Array.isArray(values)) return { finding: "not-an-array", index: null, wrong: 1 };
  if (values.length === 0) return { finding: "empty", index: null, wrong: 1 };
  if (values.length > CEILINGS.samples) return { finding: "too-many", index: null, wrong: 1 };
  let first: Scanned | null = null;
  for (let i = 0; i < values.length; i++) {
    const value = values[i];
    if (value === null || (value >= bounds.minimum && value <= bounds.maximum && typeof value === "number")) continue;
    first ??= { finding: typeof value === "number" ? "out-of-range" : "not-a-number", index: i, wrong: 0 };
    first.wrong++;
  }
  return first;
}

/** The document's schema of a column. */
function columnDocument(unit: string, description: string, bounds?: ColumnBounds) {
  const range = bounds === undefined ? {} : { minimum: bounds.minimum, maximum: bounds.maximum };
  const size = bounds === undefined ? {} : { minItems: 1, maxItems: CEILINGS.samples };
  return {
    type: "array" as const,
    items: { type: ["number", "null"] as ("number" | "null")[], ...range, description: withUnit(unit, "One sample.") },
    ...size,
    description: withUnit(unit, description),
    "x-column": true,
  };
}

/** A column of a request: at most 600,000 samples, null for a missing one, checked by one scan. */
export function column(unit: string, description: string, bounds: ColumnBounds) {
  return z
    .custom<RawColumn>()
    .check((context) => {
      const scanned = scanColumn(context.value, bounds);
      if (scanned !== null) context.issues.push(columnIssue(scanned, unit, bounds, context.value));
    })
    .openapi(columnDocument(unit, description, bounds));
}

/** The issue that carries a scan's finding to the problem. */
function columnIssue(scanned: Scanned, unit: string, bounds: ColumnBounds, input: unknown) {
  const { minimum, maximum } = bounds;
  const params: ColumnFinding = { finding: scanned.finding, unit, minimum, maximum, wrong: scanned.wrong };
  const path = scanned.index === null ? [] : [scanned.index];
  return { code: "custom" as const, path, message: scanned.finding, params: { ...params }, input };
}

/** A column of an answer: null where a sample was left out. */
export function reportedColumn(unit: string, description: string) {
  return z.custom<RawColumn>(Array.isArray).openapi(columnDocument(unit, description));
}

/** A column as numbers alone: shape [n], NaN where null stood. */
export function toColumn(values: RawColumn): Float64Array {
  const column = new Float64Array(values.length);
  for (let i = 0; i < column.length; i++) column[i] = values[i] ?? Number.NaN;
  return column;
}
