import type { z } from "@hono/zod-openapi";
import { parseBody } from "../decode/parse-body.ts";
import { valueAt } from "../decode/schema-at.ts";
import { conform } from "../define-operation.ts";
import type { Refusal } from "../operation.ts";
import { NamingLineSchema, PlainLineSchema } from "../schema/portfolio.ts";

type Line = z.output<typeof PlainLineSchema> | z.output<typeof NamingLineSchema>;

/** A line as its schema has it, or why it cannot be read. Throws Error for a line of another kind than its head said. */
export function readLine<Kind extends Line["kind"]>(
  bytes: Uint8Array,
  kind: Kind,
): { ok: true; data: Extract<Line, { kind: Kind }> } | Refusal {
  const parsed = parseBody(bytes);
  if (!parsed.ok) return parsed;
  // Chosen here, so that what is wrong is said of the climate that was meant.
  const named = valueAt(parsed.value, ["climate", "kind"]) === "named";
  const read = named ? conform(NamingLineSchema, parsed.value) : conform(PlainLineSchema, parsed.value);
  if (!read.ok) return read;
  if (read.data.kind !== kind) throw new Error(`the head of a ${read.data.kind} line said ${kind}`);
  return { ok: true, data: read.data as Extract<Line, { kind: Kind }> };
}
