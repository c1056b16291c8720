import type { CallContext } from "./kneegap-error.ts";
import { KneegapError } from "./kneegap-error.ts";

/**
 * Thrown when an answer is larger than `maximumAnswerBytes`; the rest of it is not read. Ask for less (`traces`,
 * `traceDecimals`) or raise the bound.
 */
export class AnswerTooLargeError extends KneegapError {
  override readonly name = "AnswerTooLargeError";
  /** The bound that was passed, bytes. */
  readonly maximumAnswerBytes: number;

  constructor(maximumAnswerBytes: number, context: CallContext) {
    super(`The answer is larger than maximumAnswerBytes (${maximumAnswerBytes}); ask for less or raise it.`, context);
    this.maximumAnswerBytes = maximumAnswerBytes;
  }
}
