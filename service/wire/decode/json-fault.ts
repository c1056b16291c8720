/** Where a text stops being JSON: an index into it, and what was wrong there. */
export interface JsonFault {
  index: number;
  reason: string;
}

const SPACE = /[ \t\n\r]*/y;
const NUMBER = /-?(?:0|[1-9][0-9]*)(?:\.[0-9]+)?(?:[eE][+-]?[0-9]+)?/y;
const WORD = /true|false|null/y;
const ESCAPE = /\\(?:["\\/bfnrt]|u[0-9a-fA-F]{4})/y;

/** Length of the match of a sticky pattern at `index`; -1 where there is none. */
function matchAt(pattern: RegExp, text: string, index: number): number {
  pattern.lastIndex = index;
  return pattern.exec(text)?.[0].length ?? -1;
}

/** The index after a string that begins at `index`, or its fault. */
function passString(text: string, index: number): number | JsonFault {
  for (let at = index + 1; at < text.length; at++) {
    const code = text.charCodeAt(at);
    if (code === 0x22) return at + 1;
    if (code < 0x20) return { index: at, reason: "a string may not hold a line break or other control character" };
    if (code !== 0x5c) continue;
    const length = matchAt(ESCAPE, text, at);
    if (length < 0) return { index: at, reason: "this is no escape of a JSON string" };
    at += length - 1;
  }
  return { index: text.length, reason: "the text ends inside a string" };
}

/** The index after a number or word at `index`, or its fault. */
function passScalar(text: string, index: number): number | JsonFault {
  const length = Math.max(matchAt(NUMBER, text, index), matchAt(WORD, text, index));
  const end = index + length;
  if (length > 0 && !/[\w.+-]/.test(text.charAt(end))) return end;
  const found = text.slice(index, index + 12);
  if (/^[-+]?(nan|inf)/i.test(found)) {
    return { index, reason: "NaN and Infinity are not JSON; write null for a missing sample" };
  }
  if (/^[-+.\w]*$/.test(text.slice(index, index + 32))) {
    const cut = index + 32 > text.length;
    if (cut) return { index, reason: "the text ends too early; was it cut off?" };
  }
  if (found.startsWith("'")) return { index, reason: "strings stand in double quotes" };
  if (found.startsWith("/")) return { index, reason: "JSON has no comments" };
  if (/^[\]}]/.test(found)) return { index, reason: "a value is missing here; is there a comma too many?" };
  return { index, reason: `${JSON.stringify(found)} does not begin a JSON value` };
}

/**
 * The first place where a text is not JSON (RFC 8259), or null where it is. Unlike the engine's message it is the same
 * in every engine; meant for texts that `JSON.parse` refused. One pass, memory by the depth of nesting.
 */
export function jsonFault(text: string): JsonFault | null {
  const closers: string[] = [];
  let expects: "value" | "name" | "separator" = "value";
  let index = 0;
  for (;;) {
    index += matchAt(SPACE, text, index);
    const here = text.charAt(index);
    if (expects === "separator") {
      const closer = closers.at(-1);
      if (closer === undefined) return index === text.length ? null : { index, reason: "the value has ended before" };
      if (here === closer) closers.pop();
      else if (here !== ",")
        return {
          index,
          reason: here === "" ? "the text ends too early; was it cut off?" : `"," or "${closer}" belongs here`,
        };
      else expects = closer === "}" ? "name" : "value";
      index++;
    } else if (expects === "name") {
      if (here !== '"') return { index, reason: "a member's name in double quotes belongs here" };
      const end = passString(text, index);
      if (typeof end !== "number") return end;
      index = end + matchAt(SPACE, text, end);
      if (text.charAt(index) !== ":") return { index, reason: '":" belongs here' };
      index++;
      expects = "value";
    } else if (here === "{" || here === "[") {
      const closer = here === "{" ? "}" : "]";
      index++;
      index += matchAt(SPACE, text, index);
      const empty = text.charAt(index) === closer;
      if (empty) index++;
      else closers.push(closer);
      expects = empty ? "separator" : closer === "}" ? "name" : "value";
    } else {
      const end = here === '"' ? passString(text, index) : passScalar(text, index);
      if (typeof end !== "number") return end;
      index = end;
      expects = "separator";
    }
  }
}
