import { describeProblem } from "./describe-problem.ts";
import type { CallContext } from "./kneegap-error.ts";
import type { ProblemAnswer } from "./problem-error.ts";
import { ProblemError } from "./problem-error.ts";

/**
 * Thrown when every attempt was answered 408, 502, 503 or 504, or when the wait asked for is longer than the call's
 * timeout allows: queue full, draining, or no replica behind the balancer. The same request may succeed later.
 * `problem` is null when a proxy answered for the service.
 */
export class UnavailableError extends ProblemError {
  override readonly name = "UnavailableError";

  constructor(answer: ProblemAnswer, context: CallContext) {
    super(describeProblem(answer), answer, context);
  }
}
