import type { Pool } from "undici";
import { AnswerTooLargeError } from "./errors/answer-too-large-error.ts";
import { ConnectionError } from "./errors/connection-error.ts";
import type { CallContext } from "./errors/kneegap-error.ts";
import { KneegapError } from "./errors/kneegap-error.ts";
import { ProtocolError } from "./errors/protocol-error.ts";
import type { Operation } from "./operation.ts";
import type { Answer } from "./read-answer.ts";
import { readBody } from "./read-body.ts";

/** One request, ready to be sent as often as needed. */
export interface Message {
  readonly method: Operation["method"];
  readonly path: string;
  readonly headers: Readonly<Record<string, string>>;
  readonly body: Uint8Array | null;
}

/**
 * Sends `message` once and reads the whole answer, whatever its status. Throws the signal's reason when it fires,
 * AnswerTooLargeError past `maximumBytes`, ProtocolError for an answer that does not begin as HTTP, and ConnectionError
 * for any other failure before the last byte.
 */
export async function exchange(
  pool: Pool,
  message: Message,
  bounds: { readonly signal: AbortSignal; readonly maximumBytes: number },
  context: CallContext,
): Promise<Answer> {
  let began = false;
  try {
    const { statusCode, headers, body } = await pool.request({ ...message, signal: bounds.signal });
    began = true;
    const length = headers["content-length"];
    const bytes = await readBody(body, Array.isArray(length) ? length[0] : length, bounds.maximumBytes);
    if (bytes === null) throw new AnswerTooLargeError(bounds.maximumBytes, context);
    return { status: statusCode, headers, bytes };
  } catch (cause) {
    throw bounds.signal.aborted ? bounds.signal.reason : exchangeFault(cause, began, context);
  }
}

/**
 * The error of the SDK for what undici threw before an answer's last byte; `began` says whether the answer had begun. An
 * error of the SDK stays as it is, and so does a fault in how undici was called, which is ours.
 */
export function exchangeFault(cause: unknown, began: boolean, context: CallContext): unknown {
  if (cause instanceof KneegapError || isMisuse(cause)) return cause;
  // Once the answer has begun, undici's parser error means that a chunked body was cut short.
  if (!began && isNotHttp(cause)) {
    return new ProtocolError("it is not HTTP that can be read", null, { ...context, cause });
  }
  return new ConnectionError({ ...context, cause });
}

/** undici leaves the parser error's `code` undefined, so its name has to do. */
function isNotHttp(cause: unknown): boolean {
  return cause instanceof Error && (cause.name === "HTTPParserError" || cause.name === "HeadersOverflowError");
}

/** A fault in how undici was called is ours, not the connection's. */
function isMisuse(cause: unknown): boolean {
  return cause instanceof Error && cause.name === "InvalidArgumentError";
}
