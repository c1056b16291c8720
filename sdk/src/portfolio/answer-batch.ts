import type { CallContext } from "../errors/kneegap-error.ts";
import { ProblemError } from "../errors/problem-error.ts";
import { ProtocolError } from "../errors/protocol-error.ts";
import type { RetryOptions } from "../retry.ts";
import { isRetriable, retryDelay, sleep } from "../retry.ts";
import type { AnswerListener } from "./answer-reader.ts";
import { AnswerReader } from "./answer-reader.ts";
import type { OpenSite } from "./batch-source.ts";
import type { ComposedRequest } from "./compose-request.ts";

/** What answering a batch needs of the portfolio and of the transport. */
export interface BatchPort extends AnswerListener {
  readonly compose: (sites: readonly OpenSite[]) => ComposedRequest;
  /** Sends a body once. */
  readonly send: (
    body: Uint8Array,
    onLine: (value: unknown, context: CallContext) => void,
    context: CallContext,
  ) => Promise<void>;
  /** `attempts`: how many requests in a row may answer no site. */
  readonly retry: Required<RetryOptions>;
  /** A wait that an answer asks for must be shorter, ms. */
  readonly timeout: number;
  readonly signal: AbortSignal;
  /** How many sites of the whole portfolio were answered so far. */
  readonly answeredAnywhere: () => number;
  /** Told of the bytes of a body that was refused as too large. */
  readonly onTooLarge: (bytes: number) => void;
}

/** The service had no room: a smaller request would not have helped. */
const BUSY: ReadonlySet<number> = new Set([429, 503]);

/** The lines were whole when they were sent, so that a body which is not has been damaged on the way. */
function isDamage(error: unknown): boolean {
  return error instanceof ProblemError && error.problem?.code === "malformed-body";
}

/** A stock proxy takes no more than a mebibyte, and says so in a page of its own. */
function isTooLarge(error: unknown): boolean {
  return (error instanceof ProtocolError || error instanceof ProblemError) && error.status === 413;
}

/** How a batch stands. */
interface BatchState {
  readonly open: Map<string, OpenSite>;
  /** The most sites asked for at once. */
  most: number;
  /** Of the last request. */
  bytes: number;
  requests: number;
  /** Requests in a row that answered no site. */
  failures: number;
}

/**
 * Sends a batch until each of its sites is answered, once. What a cut answer left open is sent again; after a cut that
 * answered nothing, and where the body was refused as too large, in requests half as large: a proxy's patience and its
 * room have their limits.
 * Throws the last failure after `retry.attempts` in a row that answered nothing (where the service was busy: in the whole
 * portfolio), and at once a failure that is not {@link isRetriable} nor damage on the way.
 */
export async function answerBatch(batch: readonly OpenSite[], port: BatchPort, requestId: string): Promise<void> {
  const open = new Map(batch.map((site) => [site.id, site]));
  const state: BatchState = { open, most: batch.length, bytes: 0, requests: 0, failures: 0 };
  let answeredBefore = port.answeredAnywhere();
  while (open.size > 0) {
    const openBefore = open.size;
    state.requests += 1;
    try {
      await ask(state, port, { requestId, attempts: state.requests });
      state.failures = 0;
    } catch (error) {
      if (port.signal.aborted) throw port.signal.reason;
      if (open.size === 0) return;
      if (isTooLarge(error) && state.most > 1) {
        port.onTooLarge(state.bytes);
        state.most = halved(state);
        continue;
      }
      const busy = error instanceof ProblemError && BUSY.has(error.status);
      const progress = open.size < openBefore || (busy && port.answeredAnywhere() > answeredBefore);
      answeredBefore = port.answeredAnywhere();
      state.failures = progress ? 1 : state.failures + 1;
      if (!progress && !busy) state.most = halved(state);
      await backOff(error, state.failures, port);
    }
  }
}

/** Half as many sites as were asked for. */
function halved({ open, most }: BatchState): number {
  return Math.ceil(Math.min(most, open.size) / 2);
}

/** Asks once for the first of the open sites. Throws unless the answer is whole. */
async function ask(state: BatchState, port: BatchPort, context: CallContext): Promise<void> {
  const { open, most } = state;
  const { bytes, lines } = port.compose([...open.values()].slice(0, most));
  state.bytes = bytes.length;
  const reader = new AnswerReader(lines, open, port);
  await port.send(bytes, (value, of) => reader.take(value, of), context);
  reader.end(context);
}

/** Waits before the next request. Throws `error` when there is to be none. */
async function backOff(error: unknown, failures: number, { retry, timeout, signal }: BatchPort): Promise<void> {
  if (failures >= retry.attempts || !(isRetriable(error) || isDamage(error))) throw error;
  const asked = error instanceof ProblemError ? (error.retryAfter ?? 0) : 0;
  if (asked >= timeout) throw error;
  await sleep(retry, retryDelay(error, failures, retry), signal);
}
