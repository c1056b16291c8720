import type { RouteConfig } from "@hono/zod-openapi";
import type { ProblemCode } from "../wire/problem.ts";
import { PROBLEMS } from "../wire/problem.ts";

type Responses = RouteConfig["responses"];

const ref = (path: string) => ({ $ref: `#/components/${path}` });
const REQUEST_ID = { "x-request-id": ref("headers/RequestId") };
const MORE_HEADERS: Record<number, Record<string, { $ref: string }>> = {
  401: { "www-authenticate": ref("headers/WwwAuthenticate") },
  405: { allow: ref("headers/Allow") },
  503: { "retry-after": ref("headers/RetryAfter") },
};

/** What any request can meet, whatever it asks. */
export const ANY_REQUEST = [
  "malformed-request",
  "method-not-allowed",
  "not-acceptable",
  "headers-too-large",
  "internal",
] as const satisfies ProblemCode[];

/** What a request with a body under /v1 can meet besides. */
export const ANY_OPERATION = [
  ...ANY_REQUEST,
  "malformed-body",
  "unauthorized",
  "too-slow",
  "body-too-large",
  "unsupported-media-type",
  "invalid-request",
  "too-much-work",
  "time-limit-exceeded",
  "worker-lost",
  "overloaded",
  "draining",
] as const satisfies ProblemCode[];

/** The document's responses of the problems a route can answer with, one a status, their codes listed. */
export function problemResponses(codes: readonly ProblemCode[]): Responses {
  const responses: Record<string, unknown> = {};
  const statuses = [...new Set(codes.map((code) => PROBLEMS[code].status))].sort((a, b) => a - b);
  for (const status of statuses) {
    const here = codes.filter((code) => PROBLEMS[code].status === status);
    responses[status] = {
      description: here.map((code) => `\`${code}\`: ${PROBLEMS[code].meaning}`).join(" "),
      headers: { ...REQUEST_ID, ...MORE_HEADERS[status] },
      content: { "application/problem+json": { schema: ref("schemas/Problem") } },
      "x-problem-codes": here,
    };
  }
  return responses as Responses;
}

/** The document's response of a success, of a schema registered by name. */
export function success(schemaName: string, description: string, example?: unknown): Responses {
  const media = { schema: ref(`schemas/${schemaName}`), ...(example === undefined ? {} : { example }) };
  return { 200: { description, headers: REQUEST_ID, content: { "application/json": media } } } as Responses;
}
