import type { z } from "@hono/zod-openapi";
import type { Flaw } from "../problem.ts";
import type { ColumnFinding } from "../schema/column.ts";
import { unitOf } from "../schema/quantity.ts";
import { rangeHint } from "./hints.ts";
import { nearestName } from "./nearest-name.ts";
import type { Path } from "./schema-at.ts";
import { kindsOf, membersAt, pointerOf, schemaAt, valueAt } from "./schema-at.ts";

type Issue = z.core.$ZodIssue;

/** A request that its schema refused. */
interface Refusal {
  schema: z.ZodType;
  root: unknown;
}

/** The flaws behind a schema's issues, each saying what would be right. */
export function explain(issues: readonly Issue[], schema: z.ZodType, root: unknown): Flaw[] {
  return issues.flatMap((issue) => explainOne(issue, { schema, root }));
}

function explainOne(issue: Issue, refusal: Refusal): Flaw[] {
  const { path } = issue;
  const pointer = pointerOf(path);
  const value = valueAt(refusal.root, path);
  if (issue.code === "unrecognized_keys") return issue.keys.map((key) => unknownMember(key, path, refusal));
  if (value === undefined) return [missing(path, refusal)];
  switch (issue.code) {
    case "custom":
      return [columnFlaw(path, issue.params as unknown as ColumnFinding, refusal)];
    case "invalid_type":
      return [wrongType(pointer, issue.expected, value)];
    case "too_small":
    case "too_big":
      return issue.origin === "array" ? [wrongCount(issue, pointer, value)] : [outOfRange(path, refusal)];
    case "invalid_value":
      return [notOneOf(pointer, value, issue.values.map(String))];
    case "invalid_union":
      if (issue.errors.length > 0) return explainUnion(issue.errors, path, refusal);
      return [notOneOf(pointer, value, kindsOf(schemaAt(refusal.schema, path.slice(0, -1), refusal.root)))];
    case "invalid_format":
      return [wrongFormat(pointer, path, String(value))];
    default:
      return [{ pointer, code: "invalid", detail: issue.message }];
  }
}

/** A number or a column: an array is told what is wrong with it as a column, anything else as a number. */
function explainUnion(errors: readonly (readonly Issue[])[], path: Path, refusal: Refusal): Flaw[] {
  const issues = Array.isArray(valueAt(refusal.root, path)) ? errors[1] : errors[0];
  return issues.flatMap((issue) => explainOne({ ...issue, path: [...path, ...issue.path] } as Issue, refusal));
}

/** A value as one would quote it, shortened. */
function shown(value: unknown): string {
  const text = JSON.stringify(value) ?? "nothing";
  return text.length > 40 ? `${text.slice(0, 40)}...` : text;
}

function unknownMember(key: string, path: Path, { schema, root }: Refusal): Flaw {
  const known = membersAt(schema, path, root);
  const meant = nearestName(key, known);
  const name = shown(key);
  const detail =
    meant === undefined
      ? `There is no member ${name} here.`
      : `There is no member ${name} here; did you mean "${meant}"?`;
  return {
    pointer: pointerOf([...path, key]),
    code: "unknown-member",
    detail,
    expected: `one of: ${known.join(", ")}`,
  };
}

function missing(path: Path, { schema, root }: Refusal): Flaw {
  const name = String(path.at(-1) ?? "The body");
  const kinds = name === "kind" ? kindsOf(schemaAt(schema, path.slice(0, -1), root)) : [];
  const unit = unitOf(schemaAt(schema, path, root) ?? {});
  const expected =
    kinds.length > 0
      ? { expected: `one of: ${kinds.join(", ")}` }
      : unit === undefined
        ? {}
        : { expected: `a number in ${unit}` };
  return { pointer: pointerOf(path), code: "missing", detail: `${name} is required.`, ...expected };
}

function wrongType(pointer: string, wanted: string, value: unknown): Flaw {
  const expected = /^[aeiou]/.test(wanted) ? `an ${wanted}` : `a ${wanted}`;
  return {
    pointer,
    code: "wrong-type",
    detail: typeDetail(wanted, value),
    expected: wanted === "int" ? "a whole number" : expected,
  };
}

function typeDetail(wanted: string, value: unknown): string {
  const numeric = wanted === "number" || wanted === "int";
  if (numeric && typeof value === "number") {
    return Number.isFinite(value) ? `${value} is not a whole number.` : "The number is too large to be one.";
  }
  if (numeric && typeof value === "string") {
    const plain = value.trim().replace(/^([-+]?\d+),(\d+)$/, "$1.$2");
    const number = plain === "" ? Number.NaN : Number(plain);
    if (Number.isFinite(number)) return `${shown(value)} is a string; write ${number}, without quotes.`;
  }
  if (value === null) return "null will not do here; leave the member out for its default, if it has one.";
  return `${shown(value)} is ${Array.isArray(value) ? "an array" : `a ${typeof value}`}.`;
}

function wrongCount(
  issue: { code: string; minimum?: number | bigint; maximum?: number | bigint },
  pointer: string,
  value: unknown,
): Flaw {
  const count = (value as unknown[]).length;
  const bound = issue.code === "too_small" ? `at least ${issue.minimum}` : `at most ${issue.maximum}`;
  const code = issue.code === "too_small" ? "too-few" : "too-many";
  return { pointer, code, detail: `There are ${count}; ${bound} will do.`, expected: `${bound} elements` };
}

function outOfRange(path: Path, { schema, root }: Refusal): Flaw {
  const value = valueAt(root, path);
  const at = schemaAt(schema, path, root) as z.ZodNumber;
  const unit = unitOf(at) ?? "1";
  const expected = `${rangeOf(at)}${unit === "1" ? "" : ` ${unit}`}`;
  const hint = rangeHint({ value, path, root, unit, maximum: at.maxValue ?? Number.POSITIVE_INFINITY });
  return {
    pointer: pointerOf(path),
    code: "out-of-range",
    detail: `${value} is out of range (${expected}).${hint}`,
    expected,
  };
}

function rangeOf(schema: z.ZodNumber): string {
  const { exclusiveMinimum } = schema._zod.bag as { exclusiveMinimum?: number };
  const low = exclusiveMinimum === undefined ? `${schema.minValue} to` : `above ${exclusiveMinimum}, up to`;
  return `${low} ${schema.maxValue}`;
}

function notOneOf(pointer: string, value: unknown, choices: readonly string[]): Flaw {
  const meant = typeof value === "string" ? nearestName(value, choices) : undefined;
  const question = meant === undefined ? "" : ` Did you mean "${meant}"?`;
  const expected = choices.length === 1 ? choices[0] : `one of: ${choices.join(", ")}`;
  return { pointer, code: "not-one-of", detail: `${shown(value)} is not known here.${question}`, expected };
}

const FORMATS: Record<string, { expected: string; detail: (value: string) => string }> = {
  start: {
    expected: "ISO 8601 with offset from UTC, of 1950 to 2099, such as 2025-01-01T00:00:00+01:00",
    detail: (value) =>
      /^\d{4}-\d\d-\d\d[T ]\d\d:\d\d(:\d\d(\.\d+)?)?$/.test(value)
        ? `${shown(value)} has no offset from UTC: add Z, or one such as +01:00 for a clock one hour ahead.`
        : `${shown(value)} is not an instant with offset from UTC.`,
  },
  currency: {
    expected: "three capital letters of ISO 4217, such as EUR",
    detail: (value) => `${shown(value)} is not a currency code.`,
  },
};

function wrongFormat(pointer: string, path: Path, value: string): Flaw {
  const format = FORMATS[String(path.at(-1))];
  if (format !== undefined)
    return { pointer, code: "wrong-format", detail: format.detail(value), expected: format.expected };
  const expected = "1 to 100 characters, none of them a control character";
  return { pointer, code: "wrong-format", detail: `${shown(value)} will not do as a label.`, expected };
}

function columnFlaw(path: Path, finding: ColumnFinding, { root }: Refusal): Flaw {
  const { unit, minimum, maximum, wrong } = finding;
  const value = valueAt(root, path);
  const pointer = pointerOf(path);
  const range = `${minimum} to ${maximum} ${unit}`;
  const more = wrong > 1 ? ` So are ${wrong - 1} more of this column.` : "";
  switch (finding.finding) {
    case "not-an-array":
      return {
        pointer,
        code: "wrong-type",
        detail: `${shown(value)} is not a column.`,
        expected: "an array of numbers, null for a missing sample",
      };
    case "empty":
      return {
        pointer,
        code: "too-few",
        detail: "The column is empty; a climate has at least one sample.",
        expected: `${range}, one value a sample`,
      };
    case "too-many":
      return {
        pointer,
        code: "too-many",
        detail: `The column has ${(value as unknown[]).length} values.`,
        expected: "at most 600000 samples",
      };
    case "not-a-number":
      return {
        pointer,
        code: "wrong-type",
        detail: `${typeDetail("number", value)}${more}`,
        expected: "a number, or null for a missing sample",
      };
    case "out-of-range": {
      if (!Number.isFinite(value))
        return { pointer, code: "wrong-type", detail: typeDetail("number", value), expected: range };
      const hint = rangeHint({ value, path, root, unit, maximum });
      return {
        pointer,
        code: "out-of-range",
        detail: `${value} is out of range (${range}).${hint}${more}`,
        expected: range,
      };
    }
  }
}
