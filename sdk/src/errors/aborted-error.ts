import type { CallContext } from "./kneegap-error.ts";
import { KneegapError } from "./kneegap-error.ts";

/**
 * Thrown when the caller's AbortSignal fired before the answer was read; `cause` is the signal's reason. The service
 * frees the worker of a client that goes away.
 */
export class AbortedError extends KneegapError {
  override readonly name = "AbortedError";

  constructor(context: CallContext) {
    super("The call was aborted by its signal.", context);
  }
}
