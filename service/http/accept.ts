import type { MiddlewareHandler } from "hono";
import { problem } from "../wire/problem.ts";
import type { Environment } from "./app-type.ts";
import { respondProblem } from "./problem.ts";

/** The weight an Accept or Accept-Encoding header gives to the first of `names` it lists, in the order of `names`; null when it lists none. */
export function weightOf(header: string, names: readonly string[]): number | null {
  const weights = new Map<string, number>();
  for (const part of header.split(",")) {
    const [name, ...parameters] = part.split(";").map((piece) => piece.trim().toLowerCase());
    const weight = parameters.find((parameter) => parameter.startsWith("q="));
    weights.set(name, weight === undefined ? 1 : Number(weight.slice(2)) || 0);
  }
  const listed = names.find((name) => weights.has(name));
  return listed === undefined ? null : weights.get(listed)!;
}

/** The media type of lines of JSON. */
export const LINES_TYPE = "application/x-ndjson";

/** Refuses with 406 what will not take the form of answer that its path gives: lines for portfolios, else JSON. */
export function checkAccept(linesPath: string): MiddlewareHandler<Environment> {
  return async (context, next) => {
    const type = context.req.path === linesPath ? LINES_TYPE : "application/json";
    const accept = context.req.header("accept") ?? "";
    const weight = accept === "" ? 1 : weightOf(accept, [type, "application/*", "*/*"]);
    if (weight !== null && weight > 0) return next();
    return respondProblem(context, problem("not-acceptable", `Answers are ${type}; let the Accept header say so.`));
  };
}
