import { NESTING } from "../limits.ts";
import type { Problem } from "../problem.ts";
import { problem } from "../problem.ts";
import { jsonFault } from "./json-fault.ts";

/** A parsed body, or why it could not be parsed. */
export type Parsed = { ok: true; value: unknown } | { ok: false; problem: Problem };

const malformed = (detail: string): Parsed => ({ ok: false, problem: problem("malformed-body", detail) });

/** Parses a JSON body of UTF-8 bytes, nested at most 32 deep. */
export function parseBody(body: Uint8Array): Parsed {
  if (body.length === 0) return malformed("The body is empty; send a JSON object.");
  if (deeperThan(body, NESTING))
    return malformed(`Objects and arrays nest more than ${NESTING} deep; no request needs half of that.`);
  let text: string;
  try {
    text = new TextDecoder("utf-8", { fatal: true }).decode(body);
  } catch {
    return malformed("The body is not UTF-8; encode the text as UTF-8 before sending it.");
  }
  try {
    return { ok: true, value: JSON.parse(text) };
  } catch {
    return malformed(faultOf(text));
  }
}

function faultOf(text: string): string {
  const fault = jsonFault(text);
  if (fault === null) return "The body is not JSON.";
  const before = text.slice(0, fault.index);
  const line = before.split("\n").length;
  const column = fault.index - before.lastIndexOf("\n");
  return `Not JSON at line ${line}, column ${column}: ${fault.reason}.`;
}

const [QUOTE, BACKSLASH] = [0x22, 0x5c];

/** Whether brackets outside strings nest deeper than `limit`: asked of the bytes, before anything is built from them. */
function deeperThan(body: Uint8Array, limit: number): boolean {
  let depth = 0;
  for (let i = 0; i < body.length; i++) {
    const byte = body[i];
    // Below the first bracket lie the digits, signs, commas and spaces that columns are made of.
    if (byte < 0x5b && byte !== QUOTE) continue;
    if (byte === QUOTE) {
      for (i++; i < body.length && body[i] !== QUOTE; i++) if (body[i] === BACKSLASH) i++;
    } else if (byte === 0x5b || byte === 0x7b) {
      if (++depth > limit) return true;
    } else if (byte === 0x5d || byte === 0x7d) depth--;
  }
  return false;
}
