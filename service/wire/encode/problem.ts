import type { Problem } from "../problem.ts";
import { PROBLEMS } from "../problem.ts";

/** A problem as answers show it (RFC 9457). */
export function encodeProblem({ code, detail, errorCount, errors }: Problem, requestId: string) {
  const { status, title } = PROBLEMS[code];
  return { type: `urn:kneegap:problem:${code}`, title, status, detail, code, requestId, errorCount, errors };
}
