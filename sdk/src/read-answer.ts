import type { ColumnKind } from "./columns.ts";
import { typeColumns } from "./columns.ts";
import type { CallContext, KneegapError } from "./errors/kneegap-error.ts";
import type { ProblemAnswer } from "./errors/problem-error.ts";
import { ProtocolError } from "./errors/protocol-error.ts";
import { RateLimitedError } from "./errors/rate-limited-error.ts";
import { RequestProblemError } from "./errors/request-problem-error.ts";
import { ServerProblemError } from "./errors/server-problem-error.ts";
import { UnavailableError } from "./errors/unavailable-error.ts";
import type { Problem } from "./generated/schema.ts";
import { isJson, isText } from "./media-type.ts";
import type { Operation } from "./operation.ts";
import { retryAfter } from "./retry-after.ts";

/** A whole answer as it came over the wire. */
export interface Answer {
  readonly status: number;
  /** Header fields by lower-case name. */
  readonly headers: Readonly<Record<string, string | string[] | undefined>>;
  readonly bytes: Uint8Array;
}

/**
 * The value of a success, in the type its media type asks for: parsed JSON, a string for text, XML and NDJSON, bytes for
 * the rest, undefined when the operation answers without a body. Throws the error that belongs to anything else.
 */
export function readAnswer(operation: Operation, answer: Answer, columns: ColumnKind, context: CallContext): unknown {
  if (!operation.successStatuses.includes(answer.status)) throw errorOf(answer, context);
  const expected = operation.responseMediaType;
  if (expected === null) return undefined;
  checkMediaType(operation, answer, context);
  if (!isJson(expected)) return isText(expected) ? readText(answer, context) : answer.bytes;
  const value = readJson(answer, context);
  return columns === "plain" ? value : withTypedColumns(operation, value, { ...context, status: answer.status });
}

/** Throws ProtocolError unless a success has the media type that the operation answers with. */
export function checkMediaType(operation: Operation, answer: Omit<Answer, "bytes">, context: CallContext): void {
  const received = mediaType(answer);
  if (received === operation.responseMediaType) return;
  const reason = `${answer.status} with ${received} instead of ${operation.responseMediaType}`;
  throw new ProtocolError(reason, answer.status, context);
}

/** `value` with the operation's columns typed, in place. Throws ProtocolError for a column of anything but numbers and null. */
export function withTypedColumns(
  operation: Operation,
  value: unknown,
  context: CallContext & { readonly status: number },
): unknown {
  try {
    return typeColumns(value, operation.columns);
  } catch (cause) {
    throw new ProtocolError((cause as Error).message, context.status, { ...context, cause });
  }
}

/** One header field, the first where it came more than once. */
export function headerField({ headers }: Pick<Answer, "headers">, name: string): string | undefined {
  const field = headers[name];
  return Array.isArray(field) ? field[0] : field;
}

/** The error that belongs to an answer whose status is no success. */
export function errorOf(answer: Answer, context: CallContext): KneegapError {
  const { status } = answer;
  const problem = readProblem(answer, context);
  const wait = retryAfter(headerField(answer, "retry-after"), headerField(answer, "date"), Date.now());
  return (
    problemError({ status, problem, retryAfter: wait }, context) ??
    new ProtocolError(`${status} with ${mediaType(answer)}, without a problem document`, status, context)
  );
}

/** The error of a problem's family, by its status; null for a status that is no error, or that needs a problem and has none. */
export function problemError(answer: ProblemAnswer, context: CallContext): KneegapError | null {
  const { status, problem } = answer;
  if (status === 429) return new RateLimitedError(answer, context);
  if (status === 408 || (status >= 502 && status <= 504)) return new UnavailableError(answer, context);
  if (problem === null || status < 400) return null;
  const certain: ProblemAnswer<Problem> = { ...answer, problem };
  return status < 500 ? new RequestProblemError(certain, context) : new ServerProblemError(certain, context);
}

/** The problem document of an error answer; null when it has none that can be read, as from a proxy. */
function readProblem(answer: Answer, context: CallContext): Problem | null {
  if (mediaType(answer) !== "application/problem+json") return null;
  try {
    const problem = readJson(answer, context) as Partial<Problem> | null;
    return typeof problem?.code === "string" && typeof problem.detail === "string" ? (problem as Problem) : null;
  } catch {
    return null;
  }
}

function readJson(answer: Answer, context: CallContext): unknown {
  const text = readText(answer, context);
  try {
    return JSON.parse(text);
  } catch (cause) {
    throw new ProtocolError("its JSON does not parse", answer.status, { ...context, cause });
  }
}

function readText(answer: Answer, context: CallContext): string {
  try {
    return new TextDecoder("utf-8", { fatal: true }).decode(answer.bytes);
  } catch (cause) {
    throw new ProtocolError("its text is not UTF-8", answer.status, { ...context, cause });
  }
}

/** The media type without its parameters, in lower case; "no content type" when the field is missing. */
function mediaType(answer: Pick<Answer, "headers">): string {
  const field = headerField(answer, "content-type");
  return field === undefined ? "no content type" : field.split(";", 1)[0].trim().toLowerCase();
}
