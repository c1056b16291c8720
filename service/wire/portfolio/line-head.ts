import { isName } from "../schema/name.ts";

/** What of a line must be known before it is decoded; null where the line does not say it. */
export interface LineHead {
  kind: string | null;
  /** Only one that will do as a name. */
  id: string | null;
  /** Name of the climate, where the line refers to one. */
  climate: string | null;
}

const [QUOTE, BACKSLASH, COLON, COMMA] = [0x22, 0x5c, 0x3a, 0x2c];
const [OPEN_ARRAY, CLOSE_ARRAY, OPEN_OBJECT, CLOSE_OBJECT] = [0x5b, 0x5d, 0x7b, 0x7d];

/** A climate in its own right is longer than any reference to one, bytes. */
const LONGEST_REFERENCE = 2048;
const READ = new Set(["kind", "id", "climate"]);

/**
 * Kind, id and climate's name of a line, by one pass over its bytes that builds nothing but these. A line that is no JSON
 * gives whatever stands where they would; it is refused when it is decoded.
 */
export function headOf(line: Uint8Array): LineHead {
  const members = new Map<string, unknown>();
  for (const { name, from, to } of topMembers(line)) {
    const fits = name !== null && READ.has(name) && to - from <= LONGEST_REFERENCE;
    // The last of two members of one name counts, as it does for JSON.parse.
    if (name !== null && READ.has(name)) members.set(name, fits ? parsed(line, from, to) : undefined);
  }
  const [kind, id] = [members.get("kind"), members.get("id")];
  return {
    kind: typeof kind === "string" ? kind : null,
    id: typeof id === "string" && isName(id) ? id : null,
    climate: referenceOf(members.get("climate")),
  };
}

function referenceOf(climate: unknown): string | null {
  if (typeof climate !== "object" || climate === null) return null;
  const { kind, name } = climate as { kind?: unknown; name?: unknown };
  return kind === "named" && typeof name === "string" ? name : null;
}

const decoder = new TextDecoder();

function parsed(line: Uint8Array, from: number, to: number): unknown {
  try {
    return JSON.parse(decoder.decode(line.subarray(from, to)));
  } catch {
    return undefined;
  }
}

/** Where a member's value stands. */
interface Member {
  name: string | null;
  from: number;
  to: number;
}

/** The members of the line's object, in their order. */
function* topMembers(line: Uint8Array): Generator<Member> {
  let string = { from: 0, to: 0 };
  let open: { name: string | null; from: number } | null = null;
  for (let i = line.indexOf(OPEN_OBJECT) + 1; i < line.length; i++) {
    const byte = line[i];
    if (byte === QUOTE) {
      const to = endOfString(line, i);
      string = { from: i, to };
      i = to - 1;
    } else if (byte === OPEN_OBJECT || byte === OPEN_ARRAY) i = endOfNested(line, i);
    else if (byte === COLON) open = { name: nameAt(line, string), from: i + 1 };
    else if (byte === COMMA || byte === CLOSE_OBJECT) {
      if (open !== null) yield { ...open, to: i };
      open = null;
    }
  }
}

/** Where the object or array that begins at `start` ends; the end of the line where it does not. */
function endOfNested(line: Uint8Array, start: number): number {
  let depth = 0;
  for (let at = start; at < line.length; at++) {
    const byte = line[at];
    // Below the first bracket lie the digits, signs, commas and spaces that columns are made of.
    if (byte < OPEN_ARRAY && byte !== QUOTE) continue;
    if (byte === QUOTE) at = endOfString(line, at) - 1;
    else if (byte === OPEN_ARRAY || byte === OPEN_OBJECT) depth++;
    else if ((byte === CLOSE_ARRAY || byte === CLOSE_OBJECT) && --depth === 0) return at;
  }
  return line.length;
}

/** One past the quote that ends the string which begins at `start`. */
function endOfString(line: Uint8Array, start: number): number {
  let at = start + 1;
  for (; at < line.length && line[at] !== QUOTE; at++) if (line[at] === BACKSLASH) at++;
  return Math.min(at + 1, line.length);
}

function nameAt(line: Uint8Array, { from, to }: { from: number; to: number }): string | null {
  // Longer than any of those that are read, every letter escaped.
  if (to - from > 50) return null;
  const name = parsed(line, from, to);
  return typeof name === "string" ? name : null;
}
