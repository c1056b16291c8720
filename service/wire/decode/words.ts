import type { Path } from "./schema-at.ts";

/** A value as one would quote it, shortened. */
export function shown(value: unknown): string {
  const text = JSON.stringify(value) ?? "nothing";
  return text.length > 40 ? `${text.slice(0, 40)}...` : text;
}

/** A noun with its article. */
export function withArticle(noun: string): string {
  return /^[aeiou]/.test(noun) ? `an ${noun}` : `a ${noun}`;
}

/** Why a value is not of the type that is wanted, and how to write it. */
export function typeDetail(wanted: string, value: unknown, path: Path): string {
  const numeric = wanted === "number" || wanted === "int";
  if (numeric && typeof value === "number") {
    return Number.isFinite(value)
      ? `${value} is not a whole number.`
      : "The number is too large for a double; write one within the range.";
  }
  if (numeric && typeof value === "string") {
    const plain = value.trim().replace(/^([-+]?\d+),(\d+)$/, "$1.$2");
    const number = plain === "" ? Number.NaN : Number(plain);
    if (Number.isFinite(number)) return `${shown(value)} is a string; write ${number}, without quotes.`;
  }
  const kind = Array.isArray(value) ? "an array" : withArticle(typeof value);
  if (path.length === 0) return `The body is ${value === null ? "null" : kind}; send a JSON object.`;
  if (value !== null) {
    return `${shown(value)} is ${kind}; ${withArticle(wanted === "int" ? "whole number" : wanted)} belongs here.`;
  }
  if (typeof path.at(-1) === "number") return "null will not do here: leave this point out of every column.";
  return "null will not do here; leave the member out for its default, if it has one.";
}
