import type { Limits } from "../../wire/limits.ts";
import type { Line } from "../../wire/portfolio/portfolio.ts";
import { PortfolioEnd } from "../../wire/portfolio/portfolio-end.ts";
import { problem } from "../../wire/problem.ts";
import type { HeldMemory } from "./held-memory.ts";

const [LINE_BREAK, RETURN] = [0x0a, 0x0d];
const FIRST_CAPACITY = 4096;
/** A buffer that a long line has stretched above this is not kept for the next. */
const KEPT_CAPACITY = 256 * 1024;

/** Lines there may be, empty ones too, for the sites there may be. */
const mostLines = (sites: number) => 1000 + 5 * sites;

/**
 * The lines of a body that are not empty, each in a buffer of its own, which is held until the taker releases its bytes; the
 * last one needs no line break. A line above the limit is passed over, and comes without bytes; above the limit of a body
 * it ends the portfolio, as does a flood of empty lines. @throws PortfolioEnd
 */
export async function* linesOf(
  pieces: AsyncIterable<Uint8Array>,
  limits: Limits,
  held: HeldMemory,
): AsyncGenerator<Line> {
  const gathering = gather(limits, held);
  let number = 1;
  for await (const piece of pieces) {
    const bytes = Buffer.from(piece.buffer, piece.byteOffset, piece.byteLength);
    let from = 0;
    for (let at = bytes.indexOf(LINE_BREAK); at >= 0; at = bytes.indexOf(LINE_BREAK, from)) {
      gathering.add(bytes.subarray(from, at));
      from = at + 1;
      if (number > mostLines(limits.sites))
        throw new PortfolioEnd(problem("too-much-work", "There are too many lines."));
      const line = gathering.finish(number++);
      if (line !== null) yield line;
    }
    gathering.add(bytes.subarray(from));
  }
  const last = gathering.finish(number);
  if (last !== null) yield last;
}

/** Gathers one line after the other from pieces: by doubling, since pieces may be as small as a byte. */
function gather({ lineBytes, bodyBytes }: Limits, held: HeldMemory) {
  let buffer = new Uint8Array(0);
  let length = 0;
  const stretch = (capacity: number) => {
    if (!held.take(capacity)) throw noRoom();
    const larger = new Uint8Array(capacity);
    larger.set(buffer.subarray(0, Math.min(length, buffer.length)));
    held.release(buffer.length);
    buffer = larger;
  };
  return {
    add(piece: Uint8Array): void {
      const end = length + piece.length;
      if (end > Math.max(bodyBytes, lineBytes)) throw new PortfolioEnd(tooLong(bodyBytes));
      if (end <= lineBytes) {
        if (end > buffer.length) stretch(Math.max(end, Math.min(2 * buffer.length, lineBytes), FIRST_CAPACITY));
        buffer.set(piece, length);
      }
      length = end;
    },
    /** The line so far; null where it is empty. */
    finish(number: number): Line | null {
      const line = length > lineBytes ? null : buffer.slice(0, length);
      length = 0;
      if (buffer.length > KEPT_CAPACITY) {
        held.release(buffer.length);
        buffer = new Uint8Array(0);
      }
      if (line === null) return { number, bytes: null };
      if (line.length === 0 || (line.length === 1 && line[0] === RETURN)) return null;
      if (!held.take(line.length)) throw noRoom();
      return { number, bytes: line };
    },
  };
}

function noRoom(): PortfolioEnd {
  return new PortfolioEnd(problem("overloaded", "Too many bodies are being read; this one was not read on."));
}

function tooLong(limit: number) {
  return problem("body-too-large", `One line is longer than ${limit} bytes; is the body one line for each site?`);
}
