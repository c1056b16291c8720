import { CEILINGS } from "./limits.ts";

/** Every code a problem can have: its HTTP status, title and what it means. A code never changes meaning. */
export const PROBLEMS = {
  "malformed-body": {
    status: 400,
    title: "The body is not JSON",
    meaning: "Not UTF-8, not JSON, nested too deep, or not gzip.",
  },
  "malformed-request": {
    status: 400,
    title: "The request is not HTTP",
    meaning: "The HTTP parser could not read the request.",
  },
  unauthorized: { status: 401, title: "A key is needed", meaning: "No key, or none that is known." },
  "not-found": { status: 404, title: "Nothing is here", meaning: "The path is not one of the document's." },
  "method-not-allowed": {
    status: 405,
    title: "The method does not fit",
    meaning: "The Allow header names those that do.",
  },
  "not-acceptable": {
    status: 406,
    title: "No such form of answer",
    meaning: "The Accept header rules out application/json, or application/x-ndjson for a portfolio.",
  },
  "too-slow": {
    status: 408,
    title: "The request came too slowly",
    meaning: "No byte of it arrived for a while, or it took too long as a whole.",
  },
  "body-too-large": {
    status: 413,
    title: "The body is too large",
    meaning: `Above the limit of at most ${CEILINGS.bodyBytes} bytes, or of ${CEILINGS.lineBytes} for a line of a portfolio, decompressed.`,
  },
  "unsupported-media-type": {
    status: 415,
    title: "No such form of body",
    meaning: "The body must be application/json in UTF-8, or application/x-ndjson for a portfolio, plain or gzip.",
  },
  "invalid-request": {
    status: 422,
    title: "The request cannot be answered as it stands",
    meaning: "Schema, relations or physics; every error says where and what would be right.",
  },
  "too-much-work": {
    status: 422,
    title: "The request is too much work",
    meaning: "Refused before starting, with the estimate and the limit.",
  },
  "time-limit-exceeded": {
    status: 422,
    title: "The computing took too long",
    meaning: "Stopped at the limit of computing time; the same request would end the same.",
  },
  "headers-too-large": {
    status: 431,
    title: "The headers are too large",
    meaning: "Request line and headers exceed 16 KiB.",
  },
  internal: {
    status: 500,
    title: "The service failed",
    meaning: "A defect of the service; the request id finds it in the log.",
  },
  "worker-lost": {
    status: 500,
    title: "The computing was lost",
    meaning: "The worker died or ran out of memory with this request; do not simply retry.",
  },
  overloaded: {
    status: 503,
    title: "Too busy now",
    meaning: "The queue is full; nothing was begun. Retry after the time that Retry-After says.",
  },
  draining: {
    status: 503,
    title: "Shutting down",
    meaning: "Nothing was begun; another replica, or this one after its restart, will answer.",
  },
  warming: { status: 503, title: "Starting up", meaning: "The workers are not warm yet." },
} as const satisfies Record<string, { status: number; title: string; meaning: string }>;

export type ProblemCode = keyof typeof PROBLEMS;

/** One thing to change in the request. */
export interface Flaw {
  /** JSON pointer (RFC 6901) into the request. */
  pointer: string;
  code: string;
  detail: string;
  /** What would be right, where that can be said. */
  expected?: string;
}

/** How many flaws a problem shows. */
export const SHOWN_FLAWS = 20;

/** Why a request was not answered: plain data, which `http/problem.ts` alone makes a response. */
export interface Problem {
  code: ProblemCode;
  detail: string;
  errorCount: number;
  /** The first of them. */
  errors: Flaw[];
}

/** A problem without flaws of its own. */
export function problem(code: ProblemCode, detail: string): Problem {
  return { code, detail, errorCount: 0, errors: [] };
}

/** The problem of a request whose flaws are known; at least one. */
export function flawed(flaws: readonly Flaw[], count: number = flaws.length): Problem {
  const more = count > 1 ? ` (and ${count - 1} more)` : "";
  const [first] = flaws;
  const detail = `${first.pointer === "" ? "The request" : first.pointer}: ${first.detail}${more}`;
  return { code: "invalid-request", detail, errorCount: count, errors: flaws.slice(0, SHOWN_FLAWS) };
}
