import { describeProblem } from "./describe-problem.ts";
import type { CallContext } from "./kneegap-error.ts";
import type { ProblemAnswer } from "./problem-error.ts";
import { ProblemError } from "./problem-error.ts";

/**
 * Thrown when every attempt was answered 429, or when the wait asked for is longer than the call's timeout allows.
 * `retryAfter` says how long to hold back; `problem` is null when a proxy set the limit.
 */
export class RateLimitedError extends ProblemError {
  override readonly name = "RateLimitedError";

  constructor(answer: ProblemAnswer, context: CallContext) {
    super(describeProblem(answer), answer, context);
  }
}
