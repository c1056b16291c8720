import { encodeProblem } from "../wire/encode/problem.ts";
import type { Problem } from "../wire/problem.ts";
import { PROBLEMS } from "../wire/problem.ts";
import type { RequestContext } from "./app-type.ts";

/** The media type of a problem (RFC 9457). */
export const PROBLEM_TYPE = "application/problem+json";

/** The JSON text of a problem. */
export function problemText(of: Problem, requestId: string): string {
  return JSON.stringify(encodeProblem(of, requestId));
}

/** Makes a problem the response: the only place where one does (and `serve.ts`, where there is no request to answer). */
export function respondProblem(context: RequestContext, of: Problem, headers: Record<string, string> = {}): Response {
  context.set("problemCode", of.code);
  const status = PROBLEMS[of.code].status;
  const retry: Record<string, string> = status === 503 ? { "retry-after": "1" } : {};
  return new Response(problemText(of, context.get("requestId")), {
    status,
    headers: { "content-type": PROBLEM_TYPE, ...retry, ...headers },
  });
}
