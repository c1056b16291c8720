import type { ProblemAnswer } from "./problem-error.ts";

const LISTED_ERRORS = 3;

/** The one-line message of a problem: status, code, detail and the first three faulty members; the status alone when a proxy answered. */
export function describeProblem({ status, problem }: ProblemAnswer): string {
  if (problem === null) return `${status}: no problem document came with the answer; a proxy may have sent it.`;
  const listed = (problem.errors ?? []).slice(0, LISTED_ERRORS).map((error) => `${error.pointer}: ${error.detail}`);
  return [`${status} ${problem.code}: ${problem.detail}`, ...listed].join(" | ");
}
