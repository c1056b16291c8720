import type { Flaw } from "../problem.ts";
import type { ColumnFinding } from "../schema/column.ts";
import { rangeHint } from "./hints.ts";
import type { Path } from "./schema-at.ts";
import { pointerOf, valueAt } from "./schema-at.ts";
import { shown, typeDetail } from "./words.ts";

/** The flaw of a column at a path of `root`: of the whole, or of its first wrong value with the count of the others. */
export function columnFlaw(path: Path, finding: ColumnFinding, root: unknown): Flaw {
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
        detail: `${shown(value)} is not a column; send one number a sample in square brackets.`,
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
        detail: `${typeDetail("number", value, path)}${more}`,
        expected: "a number, or null for a missing sample",
      };
    case "out-of-range": {
      if (!Number.isFinite(value))
        return { pointer, code: "wrong-type", detail: typeDetail("number", value, path), expected: range };
      const hint = rangeHint({ value, path, root, unit, minimum, maximum });
      return {
        pointer,
        code: "out-of-range",
        detail: `${value} is out of range (${range}).${hint}${more}`,
        expected: range,
      };
    }
  }
}
