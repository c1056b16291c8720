import type { CallContext } from "./kneegap-error.ts";
import { KneegapError } from "./kneegap-error.ts";

/** Thrown when an operation is called after `close()`. Nothing was sent. */
export class ClosedError extends KneegapError {
  override readonly name = "ClosedError";

  constructor(context: CallContext) {
    super("The client is closed; make a new one.", context);
  }
}
