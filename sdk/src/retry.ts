import { ConnectionError } from "./errors/connection-error.ts";
import { ProblemError } from "./errors/problem-error.ts";

/** How a call is retried. Times in ms. */
export interface RetryOptions {
  /** How often a request may be sent, the first time included. Default 8: the waits outlast the ~2 s a balancer needs to notice a lost replica. */
  readonly attempts?: number;
  /** The upper end of the first wait. Default 250. */
  readonly baseDelay?: number;
  /** The upper end of any wait that the service does not ask for itself. Default 5000. */
  readonly maximumDelay?: number;
  /** For tests: a number in [0, 1) for the jitter. Default Math.random. */
  readonly random?: () => number;
  /** For tests: resolves after `delay` ms and rejects once `signal` fires. Default a timer. */
  readonly sleep?: (delay: number, signal: AbortSignal) => Promise<void>;
}

const RETRIED_STATUSES: ReadonlySet<number> = new Set([408, 429, 502, 503, 504]);
const FINAL_CODES: ReadonlySet<string> = new Set(["worker-lost", "too-much-work"]);

/**
 * Whether sending the same request again may help: true for a ConnectionError and for 408, 429, 502, 503 and 504,
 * except when the problem's code is `worker-lost` or `too-much-work`. Every operation is a pure function of its body,
 * so a POST is as safe to send twice as a GET.
 */
export function isRetriable(error: unknown): boolean {
  if (error instanceof ConnectionError) return true;
  if (!(error instanceof ProblemError) || !RETRIED_STATUSES.has(error.status)) return false;
  return error.problem === null || !FINAL_CODES.has(error.problem.code);
}

/**
 * The wait before attempt `attempt + 1`, ms: exponential backoff with full jitter, uniform in
 * [0, min(maximumDelay, baseDelay * 2^(attempt - 1))) (M. Brooker, "Exponential Backoff and Jitter", 2015, from memory).
 * Where the answer named a Retry-After it is that time and a jitter below `baseDelay` more, never less.
 */
export function retryDelay(error: unknown, attempt: number, retry: Required<RetryOptions>): number {
  const asked = error instanceof ProblemError ? error.retryAfter : null;
  if (asked !== null) return asked + retry.random() * retry.baseDelay;
  return retry.random() * Math.min(retry.maximumDelay, retry.baseDelay * 2 ** (attempt - 1));
}

/** Waits `delay` ms. Throws the signal's reason when it fires: the timer's own rejection says only that it was aborted. */
export async function sleep(retry: Required<RetryOptions>, delay: number, signal: AbortSignal): Promise<void> {
  try {
    await retry.sleep(delay, signal);
  } catch (error) {
    throw signal.aborted ? signal.reason : error;
  }
}
