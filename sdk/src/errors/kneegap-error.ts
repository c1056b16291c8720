/** What every error of the SDK knows about the call it ended. */
export interface CallContext {
  /** The id the service answered with, or the one that was sent when no answer named one. */
  readonly requestId: string;
  /** How often the request was sent; 0 when it never left. */
  readonly attempts: number;
  /** What lies beneath: a socket error, the reason given to an abort signal. */
  readonly cause?: unknown;
}

/** The base of every error the SDK throws for a call. Catch this to catch them all; it is never thrown itself. */
export abstract class KneegapError extends Error {
  readonly requestId: string;
  readonly attempts: number;

  constructor(message: string, context: CallContext) {
    super(message, { cause: context.cause });
    this.requestId = context.requestId;
    this.attempts = context.attempts;
  }
}
