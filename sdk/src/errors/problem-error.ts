import type { Problem } from "../generated/schema.ts";
import type { CallContext } from "./kneegap-error.ts";
import { KneegapError } from "./kneegap-error.ts";

/** What an answer with an error status said. */
export interface ProblemAnswer<P extends Problem | null = Problem | null> {
  /** The HTTP status. */
  readonly status: number;
  /** The problem document (RFC 9457); null when a proxy answered without one. */
  readonly problem: P;
  /** The wait the answer asked for (Retry-After), ms; null when it named none. */
  readonly retryAfter: number | null;
}

/** The base of the errors the service answers with; thrown as one of its subclasses, by the status' family. */
export abstract class ProblemError<P extends Problem | null = Problem | null> extends KneegapError {
  readonly status: number;
  readonly problem: P;
  readonly retryAfter: number | null;

  constructor(message: string, answer: ProblemAnswer<P>, context: CallContext) {
    super(message, context);
    this.status = answer.status;
    this.problem = answer.problem;
    this.retryAfter = answer.retryAfter;
  }
}
