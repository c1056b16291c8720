import type { Problem } from "../generated/schema.ts";
import { describeProblem } from "./describe-problem.ts";
import type { CallContext } from "./kneegap-error.ts";
import type { ProblemAnswer } from "./problem-error.ts";
import { ProblemError } from "./problem-error.ts";

/**
 * Thrown for a 4xx answer other than 408 and 429: the request must change before it can succeed. `problem.errors` says
 * where (JSON Pointers) and what would be right; `problem.code` is stable.
 */
export class RequestProblemError extends ProblemError<Problem> {
  override readonly name = "RequestProblemError";

  constructor(answer: ProblemAnswer<Problem>, context: CallContext) {
    super(describeProblem(answer), answer, context);
  }
}
