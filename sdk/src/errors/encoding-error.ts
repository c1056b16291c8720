import type { CallContext } from "./kneegap-error.ts";
import { KneegapError } from "./kneegap-error.ts";

/**
 * Thrown when a request holds a value that JSON cannot carry: Infinity anywhere, NaN outside a typed array, a bigint, a
 * function, or a structure that contains itself. Nothing was sent.
 */
export class EncodingError extends KneegapError {
  override readonly name = "EncodingError";
  /** Where the value stands, as a JSON Pointer (RFC 6901). */
  readonly pointer: string;

  constructor(pointer: string, reason: string, context: CallContext) {
    super(`The request cannot be written as JSON: ${pointer === "" ? "the request" : pointer} ${reason}.`, context);
    this.pointer = pointer;
  }
}
