import { STATUS_CODES } from "node:http";
import type { Socket } from "node:net";
import type { ProblemCode } from "../wire/problem.ts";
import { PROBLEMS, problem } from "../wire/problem.ts";
import { PROBLEM_TYPE, problemText } from "./problem.ts";
import { SECURITY_HEADERS } from "./security-headers.ts";

const CODES: Record<string, ProblemCode> = {
  HPE_HEADER_OVERFLOW: "headers-too-large",
  ERR_HTTP_REQUEST_TIMEOUT: "too-slow",
};

const DETAILS: Partial<Record<ProblemCode, string>> = {
  "headers-too-large": "Request line and headers are longer than 16 KiB.",
  "too-slow": "The headers did not come in time.",
};

/**
 * Writes what the HTTP parser could not read as a problem, and closes. Gives the problem's code; null where there is
 * nobody left to write to.
 */
export function answerParserError(error: NodeJS.ErrnoException, socket: Socket, requestId: string): ProblemCode | null {
  if (!socket.writable || error.code === "ECONNRESET" || error.code === "EPIPE") return null;
  const code = CODES[error.code ?? ""] ?? "malformed-request";
  const detail = DETAILS[code] ?? "This is not a request of HTTP/1.1 that can be read.";
  const body = Buffer.from(problemText(problem(code, detail), requestId));
  const { status } = PROBLEMS[code];
  const headers = [
    ["content-type", PROBLEM_TYPE],
    ["content-length", String(body.length)],
    ["connection", "close"],
    ["x-request-id", requestId],
    ...SECURITY_HEADERS,
  ];
  const lines = headers.map(([name, value]) => `${name}: ${value}\r\n`).join("");
  socket.end(Buffer.concat([Buffer.from(`HTTP/1.1 ${status} ${STATUS_CODES[status]}\r\n${lines}\r\n`), body]));
  return code;
}
