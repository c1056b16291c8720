import type { CallContext } from "./kneegap-error.ts";
import { KneegapError } from "./kneegap-error.ts";

/**
 * Thrown when no whole answer arrived: the connection was refused, reset, or closed midway, or the host has no address.
 * It is thrown after the last attempt; `cause` holds the socket's error. The call may be repeated: operations are pure.
 */
export class ConnectionError extends KneegapError {
  override readonly name = "ConnectionError";

  constructor(context: CallContext) {
    const reason = context.cause instanceof Error ? describe(context.cause) : "the connection failed";
    super(`No whole answer arrived (${reason}).`, context);
  }
}

/** Node joins the failures of every address of a host in an AggregateError whose own message is empty. */
function describe(cause: Error): string {
  if (cause.message !== "") return cause.message;
  return "code" in cause ? String(cause.code) : cause.name;
}
