import type { CallContext } from "./kneegap-error.ts";
import { KneegapError } from "./kneegap-error.ts";

/**
 * Thrown when the call's `timeout` ran out while an attempt or a wait was under way. The timeout covers the whole call:
 * queueing for a connection, every attempt and the waits between them.
 */
export class TimeoutError extends KneegapError {
  override readonly name = "TimeoutError";
  /** The timeout that ran out, ms. */
  readonly timeout: number;

  constructor(timeout: number, context: CallContext) {
    super(`The call was not answered within its timeout of ${timeout} ms.`, context);
    this.timeout = timeout;
  }
}
