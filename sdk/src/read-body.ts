import type { Readable } from "node:stream";

/**
 * All bytes of an answer's body, or null as soon as they pass `maximumBytes` (a stated length is believed when it is
 * larger, so such a body is not read at all). Leaving early destroys the stream and its connection. Throws what the
 * stream throws: a body cut short is an error, never a short result.
 */
export async function readBody(
  body: Readable,
  contentLength: string | undefined,
  maximumBytes: number,
): Promise<Uint8Array | null> {
  if (Number(contentLength ?? 0) > maximumBytes) {
    body.on("error", ignoreOwnDestroy).destroy();
    return null;
  }
  const chunks: Uint8Array[] = [];
  let length = 0;
  for await (const chunk of body as AsyncIterable<Uint8Array>) {
    length += chunk.length;
    if (length > maximumBytes) return null;
    chunks.push(chunk);
  }
  return Buffer.concat(chunks, length);
}

/** Destroying a body before its end makes it emit the error of our own doing. */
function ignoreOwnDestroy(): void {}
