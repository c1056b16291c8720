import { promisify } from "node:util";
import { gunzip } from "node:zlib";
import type { Problem } from "../wire/problem.ts";
import { problem } from "../wire/problem.ts";
import type { RequestContext } from "./app-type.ts";
import type { Services } from "./services.ts";

const decompress = promisify(gunzip);

/** A body, or why there is none. */
export type ReadBody = { ok: true; bytes: Uint8Array } | { ok: false; problem: Problem };

const refuse = (of: Problem): ReadBody => ({ ok: false, problem: of });

function tooLarge(limit: number): ReadBody {
  return refuse(
    problem("body-too-large", `The body is longer than ${limit} bytes, decompressed; send fewer samples at once.`),
  );
}

/** Reads a JSON body, plain or gzip, within the limits of size and time; the size is checked while reading. */
export async function readBody(context: RequestContext, services: Services): Promise<ReadBody> {
  const form = refuseForm(context);
  if (form !== null) return refuse(form);
  const limit = services.limits.bodyBytes;
  if (Number(context.req.header("content-length") ?? 0) > limit) return tooLarge(limit);
  const read = await collect(context.req.raw.body, limit, services);
  if (!read.ok || context.req.header("content-encoding") === undefined) return read;
  return inflate(read.bytes, limit);
}

/** Why the form of the body is none of ours; null when it is. */
function refuseForm(context: RequestContext): Problem | null {
  const [type, ...parameters] = (context.req.header("content-type") ?? "").toLowerCase().split(";");
  const charset = parameters.map((parameter) => parameter.trim()).find((parameter) => parameter.startsWith("charset="));
  if (type.trim() !== "application/json" || (charset ?? "charset=utf-8").replaceAll('"', "") !== "charset=utf-8") {
    return problem("unsupported-media-type", "Send the body as content-type: application/json, in UTF-8.");
  }
  const encoding = context.req.header("content-encoding")?.trim().toLowerCase() ?? "gzip";
  if (encoding === "gzip") return null;
  return problem("unsupported-media-type", "The only content-encoding is gzip; leave the header out for a plain body.");
}

async function inflate(bytes: Uint8Array, limit: number): Promise<ReadBody> {
  try {
    return { ok: true, bytes: await decompress(bytes, { maxOutputLength: limit }) };
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === "ERR_BUFFER_TOO_LARGE") return tooLarge(limit);
    return refuse(
      problem("malformed-body", "The content-encoding says gzip, but the body is not a whole gzip stream."),
    );
  }
}

/** Gathers a stream's pieces; the stream is cancelled where a limit is passed. */
async function collect(
  stream: ReadableStream<Uint8Array> | null,
  limit: number,
  { idleTime, uploadTime }: Services,
): Promise<ReadBody> {
  if (stream === null) return { ok: true, bytes: new Uint8Array(0) };
  const reader = stream.getReader();
  const pieces: Uint8Array[] = [];
  const end = performance.now() + uploadTime;
  let length = 0;
  for (;;) {
    const piece = await within(reader.read(), Math.min(idleTime, end - performance.now()));
    if (piece === "late") {
      void reader.cancel().catch(() => undefined);
      return refuse(problem("too-slow", `No byte for ${idleTime / 1000} s, or no end after ${uploadTime / 1000} s.`));
    }
    if (piece.done) return { ok: true, bytes: joined(pieces, length) };
    length += piece.value.length;
    if (length > limit) {
      void reader.cancel().catch(() => undefined);
      return tooLarge(limit);
    }
    pieces.push(piece.value);
  }
}

/** What `promise` gives within `time` ms, else "late". */
async function within<T>(promise: Promise<T>, time: number): Promise<T | "late"> {
  let timer: NodeJS.Timeout | undefined;
  const late = new Promise<"late">((resolve) => {
    timer = setTimeout(resolve, Math.max(0, time), "late");
  });
  try {
    return await Promise.race([promise, late]);
  } finally {
    clearTimeout(timer);
  }
}

/** The pieces in one buffer of their own, which can be moved to another thread. */
function joined(pieces: readonly Uint8Array[], length: number): Uint8Array {
  const bytes = new Uint8Array(length);
  let offset = 0;
  for (const piece of pieces) {
    bytes.set(piece, offset);
    offset += piece.length;
  }
  return bytes;
}
