import { randomUUID } from "node:crypto";
import { Pool } from "undici";
import type { Settings } from "./client-options.ts";
import { checkCount, checkNumber, LONGEST_TIMEOUT } from "./client-options.ts";
import { Deadline } from "./deadline.ts";
import { encodeBody } from "./encode-body.ts";
import { ClosedError } from "./errors/closed-error.ts";
import type { CallContext } from "./errors/kneegap-error.ts";
import type { Message } from "./exchange.ts";
import { exchange } from "./exchange.ts";
import type { LineRequest } from "./exchange-lines.ts";
import { exchangeLines } from "./exchange-lines.ts";
import type { CallOptions, Operation } from "./operation.ts";
import { headerField, readAnswer } from "./read-answer.ts";
import { isRetriable, retryDelay, sleep } from "./retry.ts";

const REQUEST_ID = /^[A-Za-z0-9._-]{1,64}$/;
/** Below node's own 5 s: of the two ends of an idle connection, ours must let go first. */
const KEEP_ALIVE = 4000;
const CONNECT_TIMEOUT = 5000;

/** One call under way. */
interface Call {
  readonly operation: Operation;
  readonly message: Message;
  readonly requestId: string;
  readonly attempts: number;
  readonly deadline: Deadline;
}

/** Makes calls over a pool of connections to one service: deadline, retries, errors. */
export class Transport {
  readonly #settings: Settings;
  readonly #pool: Pool;
  readonly #underWay = new Set<Promise<unknown>>();
  #closing: Promise<void> | null = null;

  constructor(settings: Settings) {
    this.#settings = settings;
    this.#pool = new Pool(settings.origin, {
      connections: settings.connections,
      pipelining: 1,
      keepAliveTimeout: KEEP_ALIVE,
      keepAliveMaxTimeout: KEEP_ALIVE,
      connect: { timeout: CONNECT_TIMEOUT },
      // The call's own deadline covers both.
      headersTimeout: 0,
      bodyTimeout: 0,
    });
  }

  /**
   * Sends `body` to `operation` and returns what it answers, see {@link readAnswer}. Sends again after a failure that
   * {@link isRetriable}, at most `attempts` times and only while the wait ends before the deadline; then throws the
   * last failure. Throws TypeError or RangeError for call options that cannot be used.
   */
  async request(operation: Operation, body: unknown, options: CallOptions = {}): Promise<unknown> {
    const requestId = checkRequestId(options.requestId ?? randomUUID());
    return this.hold(requestId, () => this.#start(operation, body, { ...options, requestId }));
  }

  /**
   * Sends `lines` to `operation` once, without a deadline and without retries, and hands its answer's lines on, see
   * {@link exchangeLines}. To be called within {@link Transport.hold}.
   */
  requestLines(
    operation: Operation,
    lines: Uint8Array,
    bounds: Pick<LineRequest, "signal" | "silence" | "onLine">,
    context: CallContext,
  ): Promise<void> {
    const message = this.#message(operation, lines, context.requestId);
    const { maximumAnswerBytes: maximumBytes } = this.#settings;
    return exchangeLines(this.#pool, { operation, message, maximumBytes, ...bounds }, context);
  }

  /** Does `work` as one call: refused with ClosedError after `close()`, and waited for by it. */
  async hold<T>(requestId: string, work: () => Promise<T>): Promise<T> {
    if (this.#closing !== null) throw new ClosedError({ requestId, attempts: 0 });
    const done = work();
    this.#underWay.add(done);
    try {
      return await done;
    } finally {
      this.#underWay.delete(done);
    }
  }

  /** The client's own settings, for calls that do their retries themselves. */
  get settings(): Settings {
    return this.#settings;
  }

  /** Waits for the calls under way, then closes the connections. Calling it again returns the same promise. */
  close(): Promise<void> {
    this.#closing ??= Promise.allSettled(this.#underWay).then(() => this.#pool.close());
    return this.#closing;
  }

  async #start(operation: Operation, body: unknown, options: CallOptions & { requestId: string }): Promise<unknown> {
    const { requestId } = options;
    const attempts = checkCount("attempts", options.attempts ?? this.#settings.retry.attempts, 100);
    const timeout = checkNumber("timeout", options.timeout ?? this.#settings.timeout, [1, LONGEST_TIMEOUT]);
    const message = this.#message(operation, body, requestId);
    const progress = { attempts: 0 };
    const deadline = new Deadline(timeout, options.signal, () => ({ requestId, attempts: progress.attempts }));
    try {
      return await this.#attempt({ operation, message, requestId, attempts, deadline }, progress);
    } finally {
      deadline.release();
    }
  }

  async #attempt(call: Call, progress: { attempts: number }): Promise<unknown> {
    const { retry } = this.#settings;
    for (;;) {
      call.deadline.signal.throwIfAborted();
      progress.attempts += 1;
      try {
        return await this.#once(call, { requestId: call.requestId, attempts: progress.attempts });
      } catch (error) {
        if (progress.attempts >= call.attempts || !isRetriable(error)) throw error;
        const delay = retryDelay(error, progress.attempts, retry);
        if (delay >= call.deadline.remaining()) throw error;
        await sleep(retry, delay, call.deadline.signal);
      }
    }
  }

  async #once({ operation, message, deadline }: Call, context: CallContext): Promise<unknown> {
    const { maximumAnswerBytes: maximumBytes, columns } = this.#settings;
    const answer = await exchange(this.#pool, message, { signal: deadline.signal, maximumBytes }, context);
    const requestId = headerField(answer, "x-request-id") ?? context.requestId;
    return readAnswer(operation, answer, columns, { ...context, requestId });
  }

  #message(operation: Operation, body: unknown, requestId: string): Message {
    const { headers: common, pathPrefix } = this.#settings;
    const accept = [operation.responseMediaType, "application/problem+json"].filter((type) => type !== null).join(", ");
    const headers: Record<string, string> = { ...common, accept, "x-request-id": requestId };
    const { method, requestMediaType } = operation;
    if (requestMediaType === null) return { method, path: pathPrefix + operation.path, headers, body: null };
    headers["content-type"] = requestMediaType;
    const bytes = encodeBody(body, requestMediaType, { requestId, attempts: 0 });
    return { method, path: pathPrefix + operation.path, headers, body: bytes };
  }
}

/** Throws TypeError for a request id that the service would not take. */
export function checkRequestId(requestId: string): string {
  if (REQUEST_ID.test(requestId)) return requestId;
  throw new TypeError("requestId must be 1 to 64 characters out of A-Z, a-z, 0-9, dot, underscore and hyphen");
}
