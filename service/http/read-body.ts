import { promisify } from "node:util";
import { gunzip } from "node:zlib";
import type { Problem } from "../wire/problem.ts";
import { problem } from "../wire/problem.ts";
import type { RequestContext } from "./app-type.ts";
import type { BodyBudget } from "./body-budget.ts";
import type { Services } from "./services.ts";

const decompress = promisify(gunzip);

/** A body and what it holds of the budget, to be released with its answer; or why there is none. */
export type ReadBody = { ok: true; bytes: Uint8Array; held: number } | { ok: false; problem: Problem };

const refuse = (of: Problem): ReadBody => ({ ok: false, problem: of });

function tooLarge(limit: number): Problem {
  return problem("body-too-large", `The body is longer than ${limit} bytes, decompressed; send fewer samples at once.`);
}

function tooSlow(idleTime: number, uploadTime: number): Problem {
  return problem("too-slow", `No byte for ${idleTime / 1000} s, or no end after ${uploadTime / 1000} s.`);
}

const NO_ROOM = problem("overloaded", "Too many bodies are being read; this one was not.");
const NOTHING = Promise.resolve({ done: true as const, value: undefined });

/** Reads a JSON body, plain or gzip, within the limits of size and time; the size is checked while reading. */
export async function readBody(context: RequestContext, services: Services): Promise<ReadBody> {
  const form = refuseForm(context, "application/json");
  if (form !== null) return refuse(form);
  const limit = services.limits.bodyBytes;
  if (Number(context.req.header("content-length") ?? 0) > limit) return refuse(tooLarge(limit));
  const read = await collect(context.req.raw.body, limit, services);
  if (!read.ok || encodingOf(context) === "identity") return read;
  return inflate(read, limit, services.budget);
}

/** Why the form of the body is not that of `mediaType`; null when it is. */
export function refuseForm(context: RequestContext, mediaType: string): Problem | null {
  const [type, ...parameters] = (context.req.header("content-type") ?? "").toLowerCase().split(";");
  const charset = parameters.map((parameter) => parameter.trim()).find((parameter) => parameter.startsWith("charset="));
  if (type.trim() !== mediaType || (charset ?? "charset=utf-8").replaceAll('"', "") !== "charset=utf-8") {
    return problem("unsupported-media-type", `Send the body as content-type: ${mediaType}, in UTF-8.`);
  }
  if (encodingOf(context) !== null) return null;
  return problem("unsupported-media-type", "The only content-encoding is gzip; leave the header out for a plain body.");
}

/** How the body is encoded; null: in a way that is none of ours. */
export function encodingOf(context: RequestContext): "gzip" | "identity" | null {
  const encoding = (context.req.header("content-encoding") ?? "identity").trim().toLowerCase();
  return encoding === "gzip" || encoding === "identity" ? encoding : null;
}

/** Decompresses what was read; the budget holds the result in its place. */
async function inflate(
  read: { bytes: Uint8Array; held: number },
  limit: number,
  budget: BodyBudget,
): Promise<ReadBody> {
  try {
    const bytes = await decompress(read.bytes, { maxOutputLength: limit });
    if (budget.take(bytes.length)) return { ok: true, bytes, held: bytes.length };
    return refuse(NO_ROOM);
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === "ERR_BUFFER_TOO_LARGE") return refuse(tooLarge(limit));
    return refuse(
      problem("malformed-body", "The content-encoding says gzip, but the body is not a whole gzip stream."),
    );
  } finally {
    budget.release(read.held);
  }
}

/** Gathers a stream's pieces; the stream is cancelled where a limit is passed. What it holds is taken from the budget. */
async function collect(
  stream: ReadableStream<Uint8Array> | null,
  limit: number,
  { idleTime, uploadTime, budget }: Services,
): Promise<ReadBody> {
  const pieces: Uint8Array[] = [];
  const end = performance.now() + uploadTime;
  const reader = stream?.getReader();
  const stop = (of: Problem, held: number): ReadBody => {
    budget.release(held);
    void reader?.cancel().catch(() => undefined);
    return refuse(of);
  };
  let length = 0;
  for (;;) {
    const piece = await within(reader?.read() ?? NOTHING, Math.min(idleTime, end - performance.now()));
    if (piece === "late") return stop(tooSlow(idleTime, uploadTime), length);
    if (piece.done) return { ok: true, bytes: joined(pieces, length), held: length };
    if (length + piece.value.length > limit) return stop(tooLarge(limit), length);
    if (!budget.take(piece.value.length)) return stop(NO_ROOM, length);
    length += piece.value.length;
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
