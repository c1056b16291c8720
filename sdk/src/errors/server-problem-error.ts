import type { Problem } from "../generated/schema.ts";
import { describeProblem } from "./describe-problem.ts";
import type { CallContext } from "./kneegap-error.ts";
import type { ProblemAnswer } from "./problem-error.ts";
import { ProblemError } from "./problem-error.ts";

/**
 * Thrown for a 5xx answer other than 502, 503 and 504: a fault of the service (`internal`) or a worker lost to this
 * request (`worker-lost`). It is not retried: the same request would likely end the same way. Report it with `requestId`.
 */
export class ServerProblemError extends ProblemError<Problem> {
  override readonly name = "ServerProblemError";

  constructor(answer: ProblemAnswer<Problem>, context: CallContext) {
    super(describeProblem(answer), answer, context);
  }
}
