import { pipeline, Readable } from "node:stream";
import type { ReadableStream } from "node:stream/web";
import { createGunzip } from "node:zlib";
import type { RequestContext } from "../app-type.ts";
import { encodingOf } from "../read-body.ts";

/** The body of a request as it comes, decompressed; read no faster than it is taken. Destroying it stops the upload. */
export function bodyStream(context: RequestContext): Readable {
  const { body } = context.req.raw;
  const source = body === null ? Readable.from([]) : Readable.fromWeb(body as ReadableStream<Uint8Array>);
  // What fails shows where the last stream is read.
  return encodingOf(context) === "gzip" ? pipeline(source, createGunzip(), () => undefined) : source;
}

/** Why a body could not be read on, where that is the body's fault: a detail for the problem. */
export function bodyFault(error: unknown): string {
  const code = (error as NodeJS.ErrnoException | null)?.code ?? "";
  return code.startsWith("Z_")
    ? "The content-encoding says gzip, but the body is not a whole gzip stream."
    : "The body broke off.";
}
