/** A climate file: its text, its bytes, or either in pieces, such as a file stream. */
export type ClimateText = string | Uint8Array | Iterable<string | Uint8Array> | AsyncIterable<string | Uint8Array>;

const PIECE = 65_536;

/**
 * The text in pieces of at most about 64 Ki characters, decoded, without a byte order mark and with every line ended by
 * "\n" alone. Bytes are UTF-8 unless they begin with the mark of UTF-16 or `encoding` (a label of the WHATWG Encoding
 * standard) is given; bytes that are not text in it become U+FFFD. Empty input yields nothing. Throws TypeError for a
 * chunk that is neither a string nor bytes, RangeError for an unknown encoding, and what the source throws; leaving
 * early closes the source.
 */
export async function* textPieces(text: ClimateText, encoding?: string): AsyncGenerator<string, void, undefined> {
  const withUnixLines = lineEndings();
  let atStart = true;
  for await (const decoded of decode(text, encoding)) {
    const piece = withUnixLines(atStart && decoded.startsWith("\uFEFF") ? decoded.slice(1) : decoded, false);
    if (decoded !== "") atStart = false;
    if (piece !== "") yield piece;
  }
  const rest = withUnixLines("", true);
  if (rest !== "") yield rest;
}

async function* decode(text: ClimateText, encoding?: string): AsyncGenerator<string, void, undefined> {
  let decoder = encoding === undefined ? null : new TextDecoder(encoding);
  for await (const chunk of chunksOf(text)) {
    if (typeof chunk === "string") {
      yield* slices(chunk);
    } else if (chunk instanceof Uint8Array) {
      decoder ??= new TextDecoder(encodingByMark(chunk));
      for (let at = 0; at < chunk.length; at += PIECE) {
        yield decoder.decode(chunk.subarray(at, at + PIECE), { stream: true });
      }
    } else {
      throw new TypeError(`the text must come as strings or bytes, not as ${typeof chunk}`);
    }
  }
  if (decoder !== null) yield decoder.decode();
}

function chunksOf(text: ClimateText): Iterable<string | Uint8Array> | AsyncIterable<string | Uint8Array> {
  if (typeof text === "string" || text instanceof Uint8Array) return [text];
  if (typeof text === "object" && text !== null && (Symbol.asyncIterator in text || Symbol.iterator in text)) {
    return text;
  }
  throw new TypeError("the text must be a string, bytes, or an iterable of either, such as a file stream");
}

/** The byte order marks of the WHATWG Encoding standard, section 6 (from memory). */
function encodingByMark(bytes: Uint8Array): string {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return "utf-16le";
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return "utf-16be";
  return "utf-8";
}

/** Cuts a long string, never between the halves of a surrogate pair. */
function* slices(text: string): Generator<string, void, undefined> {
  let at = 0;
  while (at < text.length) {
    let end = Math.min(at + PIECE, text.length);
    if (end < text.length && /[\uD800-\uDBFF]/.test(text[end - 1])) end += 1;
    yield text.slice(at, end);
    at = end;
  }
}

/** A carriage return at the end of a piece waits for what follows it. */
function lineEndings(): (piece: string, atEnd: boolean) => string {
  let waiting = "";
  return (piece, atEnd) => {
    const text = waiting + piece;
    waiting = !atEnd && text.endsWith("\r") ? "\r" : "";
    return text.slice(0, text.length - waiting.length).replace(/\r\n?/g, "\n");
  };
}
