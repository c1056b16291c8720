import type { Dispatcher, Pool } from "undici";
import { AnswerTooLargeError } from "./errors/answer-too-large-error.ts";
import { ConnectionError } from "./errors/connection-error.ts";
import type { CallContext } from "./errors/kneegap-error.ts";
import { ProtocolError } from "./errors/protocol-error.ts";
import type { Message } from "./exchange.ts";
import { exchangeFault } from "./exchange.ts";
import { LineSplitter } from "./line-splitter.ts";
import type { Operation } from "./operation.ts";
import { checkMediaType, errorOf, headerField } from "./read-answer.ts";
import { readBody } from "./read-body.ts";
import { SilenceWatch } from "./silence-watch.ts";

/** One request whose answer is lines. */
export interface LineRequest {
  readonly operation: Operation;
  readonly message: Message;
  readonly signal: AbortSignal;
  /** The longest time without a byte of the answer, ms. */
  readonly silence: number;
  /** Of the whole answer. */
  readonly maximumBytes: number;
  /** Called with each line's value; what it throws ends the request. */
  readonly onLine: (value: unknown, context: CallContext) => void;
}

/**
 * Sends a request once and hands each line of a success on as soon as it is complete, blank lines passed over. The
 * answer is read to its end whatever becomes of the lines, so that no slow caller makes the service wait. Throws the
 * error that belongs to any other answer, the signal's reason when it fires, ConnectionError for an answer that falls
 * silent or breaks off, in a line as well, AnswerTooLargeError, ProtocolError for a line that is no JSON, and what
 * `onLine` throws.
 */
export async function exchangeLines(pool: Pool, request: LineRequest, context: CallContext): Promise<void> {
  const { message, signal, silence } = request;
  const watch = new SilenceWatch(silence, signal);
  let answer: Dispatcher.ResponseData | null = null;
  try {
    answer = await pool.request({ ...message, signal: watch.signal });
    const requestId = headerField(answer, "x-request-id") ?? context.requestId;
    await readLines(answer, request, { ...context, requestId }, watch);
  } catch (cause) {
    answer?.body.on("error", ignoreOwnDestroy).destroy();
    if (signal.aborted) throw signal.reason;
    throw exchangeFault(watch.signal.aborted ? watch.signal.reason : cause, answer !== null, context);
  } finally {
    watch.release();
  }
}

/** Destroying a body before its end makes it emit the error of our own doing. */
function ignoreOwnDestroy(): void {}

async function readLines(
  answer: Dispatcher.ResponseData,
  request: LineRequest,
  context: CallContext,
  watch: SilenceWatch,
): Promise<void> {
  const { statusCode: status, headers, body } = answer;
  const { operation, maximumBytes } = request;
  if (!operation.successStatuses.includes(status)) {
    const bytes = await readBody(body, undefined, maximumBytes);
    if (bytes === null) throw new AnswerTooLargeError(maximumBytes, context);
    throw errorOf({ status, headers, bytes }, context);
  }
  checkMediaType(operation, { status, headers }, context);
  watch.refresh();
  const splitter = new LineSplitter();
  let length = 0;
  for await (const chunk of body as AsyncIterable<Uint8Array>) {
    watch.refresh();
    length += chunk.length;
    if (length > maximumBytes) throw new AnswerTooLargeError(maximumBytes, context);
    for (const line of decoded(splitter, chunk, context)) request.onLine(parse(line, context), context);
  }
  if (splitter.end() !== "") {
    throw new ConnectionError({ ...context, cause: new Error("the answer ended inside a line") });
  }
}

function decoded(splitter: LineSplitter, chunk: Uint8Array, context: CallContext): string[] {
  try {
    return splitter.write(chunk);
  } catch (cause) {
    throw new ProtocolError("its text is not UTF-8", null, { ...context, cause });
  }
}

function parse(line: string, context: CallContext): unknown {
  try {
    return JSON.parse(line);
  } catch (cause) {
    throw new ProtocolError("a line of it is not JSON", null, { ...context, cause });
  }
}
