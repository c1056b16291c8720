import type { CallContext } from "./kneegap-error.ts";
import { KneegapError } from "./kneegap-error.ts";

/**
 * Thrown when an answer is not what the OpenAPI document says: another media type, JSON that does not parse, a status
 * without its problem document, no HTTP at all. Usually the base URL points at something else, or a proxy answered.
 */
export class ProtocolError extends KneegapError {
  override readonly name: string = "ProtocolError";
  /** The HTTP status of the answer; null when there was none to read. */
  readonly status: number | null;

  constructor(reason: string, status: number | null, context: CallContext) {
    super(`The answer is not what the API document says: ${reason}.`, context);
    this.status = status;
  }
}
