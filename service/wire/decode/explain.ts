import type { z } from "@hono/zod-openapi";
import type { Flaw } from "../problem.ts";
import { SHOWN_FLAWS } from "../problem.ts";
import type { ColumnFinding } from "../schema/column.ts";
import { unitOf } from "../schema/quantity.ts";
import { expectedBy, rangeOf } from "./expected.ts";
import { columnFlaw } from "./explain-column.ts";
import { rangeHint } from "./hints.ts";
import { nearestName } from "./nearest-name.ts";
import type { Path } from "./schema-at.ts";
import { alternativesAt, kindsOf, kindsWith, membersAt, pointerOf, schemaAt, valueAt } from "./schema-at.ts";
import { shown, typeDetail, withArticle } from "./words.ts";

type Issue = z.core.$ZodIssue;

/** A request that its schema refused. */
interface Refusal {
  schema: z.ZodType;
  root: unknown;
}

/** The first flaws behind a schema's issues, each saying what would be right, and how many there are in all. */
export function explain(issues: readonly Issue[], schema: z.ZodType, root: unknown): { flaws: Flaw[]; count: number } {
  const flaws: Flaw[] = [];
  let count = 0;
  for (const issue of issues) {
    const explained = flaws.length < SHOWN_FLAWS ? explainOne(issue, { schema, root }) : [];
    flaws.push(...explained);
    count += issue.code === "unrecognized_keys" ? issue.keys.length : Math.max(1, explained.length);
  }
  return { flaws, count };
}

function explainOne(issue: Issue, refusal: Refusal): Flaw[] {
  const { path } = issue;
  const pointer = pointerOf(path);
  const value = valueAt(refusal.root, path);
  if (issue.code === "unrecognized_keys") {
    return issue.keys.slice(0, SHOWN_FLAWS).map((key) => unknownMember(key, path, refusal));
  }
  if (value === undefined) return [missing(path, refusal)];
  switch (issue.code) {
    case "custom":
      return [columnFlaw(path, issue.params as unknown as ColumnFinding, refusal.root)];
    case "invalid_type":
      return [wrongType(path, issue.expected, value)];
    case "too_small":
    case "too_big":
      if (issue.origin === "array") return [wrongCount(issue, path, value)];
      return [issue.origin === "string" ? wrongFormat(pointer, path, String(value)) : outOfRange(path, refusal)];
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

/** Alternatives that no member tells apart: what is wrong is said of the one whose type the value has, else of none. */
function explainUnion(errors: readonly (readonly Issue[])[], path: Path, refusal: Refusal): Flaw[] {
  const meant = errors.findIndex((issues) => !issues.some(isOfAnotherType));
  const flaws = errors[Math.max(0, meant)].flatMap((issue) =>
    explainOne({ ...issue, path: [...path, ...issue.path] } as Issue, refusal),
  );
  if (meant >= 0) return flaws;
  const expected = alternativesAt(refusal.schema, path, refusal.root).map(expectedBy).join("; or ");
  return flaws.map((flaw) => ({ ...flaw, expected }));
}

/** Whether an issue says that the whole value is none of what an alternative takes. */
function isOfAnotherType(issue: Issue): boolean {
  if (issue.path.length > 0) return false;
  if (issue.code === "custom") return issue.params?.["finding"] === "not-an-array";
  return issue.code === "invalid_type" || issue.code === "invalid_value";
}

function unknownMember(key: string, path: Path, { schema, root }: Refusal): Flaw {
  const known = membersAt(schema, path, root);
  const others = kindsWith(key, schema, path, root);
  const meant = nearestName(key, known);
  const question = meant === undefined ? "." : `; did you mean "${meant}"?`;
  const hint = others.length > 0 ? `; it belongs to kind ${others.join(", ")}.` : question;
  const detail = `There is no member ${shown(key)} here${hint}`;
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
  const alternatives = alternativesAt(schema, path, root);
  const at = schemaAt(schema, path, root);
  const wanted = alternatives.length > 0 ? alternatives : at === undefined ? [] : [at];
  const expected = kinds.length > 0 ? `one of: ${kinds.join(", ")}` : wanted.map(expectedBy).join("; or ");
  return { pointer: pointerOf(path), code: "missing", detail: `${name} is required; add it.`, expected };
}

function wrongType(path: Path, wanted: string, value: unknown): Flaw {
  const expected = wanted === "int" ? "a whole number" : withArticle(wanted);
  return { pointer: pointerOf(path), code: "wrong-type", detail: typeDetail(wanted, value, path), expected };
}

function wrongCount(
  issue: { code: string; minimum?: number | bigint; maximum?: number | bigint },
  path: Path,
  value: unknown,
): Flaw {
  const count = (value as unknown[]).length;
  const [code, bound, verb] =
    issue.code === "too_small"
      ? ["too-few", `at least ${issue.minimum}`, "needed"]
      : ["too-many", `at most ${issue.maximum}`, "admitted"];
  const isOne = bound === "at least 1";
  const number = count === 0 ? "none" : count;
  const detail = `There are ${number} in ${String(path.at(-1))}; ${bound} ${isOne ? "is" : "are"} ${verb}.`;
  return { pointer: pointerOf(path), code, detail, expected: `${bound} of them` };
}

function outOfRange(path: Path, { schema, root }: Refusal): Flaw {
  const value = valueAt(root, path);
  const at = schemaAt(schema, path, root) as z.ZodNumber;
  const expected = rangeOf(at);
  const hint = rangeHint({
    value,
    path,
    root,
    unit: unitOf(at) ?? "1",
    minimum: at.minValue ?? Number.NEGATIVE_INFINITY,
    maximum: at.maxValue ?? Number.POSITIVE_INFINITY,
  });
  return {
    pointer: pointerOf(path),
    code: "out-of-range",
    detail: `${value} is out of range (${expected}).${hint}`,
    expected,
  };
}

function notOneOf(pointer: string, value: unknown, choices: readonly string[]): Flaw {
  const meant = typeof value === "string" ? nearestName(value, choices) : undefined;
  const question = meant === undefined ? "" : ` Did you mean "${meant}"?`;
  const expected = choices.length === 1 ? choices[0] : `one of: ${choices.join(", ")}`;
  return { pointer, code: "not-one-of", detail: `${shown(value)} is not known here.${question}`, expected };
}

const FORMATS: Record<string, { expected: string; detail: (value: string) => string }> = {
  parameter: {
    expected: "the name of a numeric setting of the rule",
    detail: (value) => `${shown(value)} names no setting; the rule's settings are listed at GET /v1/rules.`,
  },
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
  return {
    pointer,
    code: "wrong-format",
    detail: `${shown(value)} will not do as ${String(path.at(-1))}; give it a short name.`,
    expected,
  };
}
