import type { Answer } from "../wire/operation.ts";
import type { OperationName } from "../wire/operations.ts";
import type { ProblemCode } from "../wire/problem.ts";
import type { RequestContext } from "./app-type.ts";
import { respondProblem } from "./problem.ts";
import { readBody } from "./read-body.ts";
import { sendBytes } from "./send.ts";
import type { Services } from "./services.ts";

/** The status of an answer that nobody waits for any more: seen in the log alone. */
const CLIENT_LEFT = 499;

/** Problems found before the body was read to its end. */
const UNREAD: ReadonlySet<ProblemCode> = new Set([
  "body-too-large",
  "too-slow",
  "overloaded",
  "unsupported-media-type",
]);

/** Reads the body, has it computed, and sends what comes back. */
export async function answerOperation(
  context: RequestContext,
  services: Services,
  operation: OperationName,
): Promise<Response> {
  const body = await readBody(context, services);
  if (!body.ok) {
    // What is left of the body is not worth reading: the connection ends with the answer.
    return respondProblem(context, body.problem, UNREAD.has(body.problem.code) ? { connection: "close" } : {});
  }
  const { signal } = context.req.raw;
  const answer = await computed(services, operation, body, signal);
  if (signal.aborted) return new Response(null, { status: CLIENT_LEFT });
  if (!answer.ok && answer.fault !== undefined) {
    services.log.error({ requestId: context.get("requestId"), fault: answer.fault }, "request failed");
  }
  return answer.ok ? sendBytes(context, answer.bytes, answer.contentType) : respondProblem(context, answer.problem);
}

async function computed(
  { compute, budget }: Services,
  operation: OperationName,
  { bytes, held }: { bytes: Uint8Array; held: number },
  signal: AbortSignal,
): Promise<Answer> {
  try {
    return await compute(operation, bytes, signal);
  } finally {
    budget.release(held);
  }
}
