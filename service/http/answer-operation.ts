import type { OperationName } from "../wire/operations.ts";
import type { RequestContext } from "./app-type.ts";
import { respondProblem } from "./problem.ts";
import { readBody } from "./read-body.ts";
import { sendBytes } from "./send.ts";
import type { Services } from "./services.ts";

/** The status of an answer that nobody waits for any more: seen in the log alone. */
const CLIENT_LEFT = 499;

/** Reads the body, has it computed, and sends what comes back. */
export async function answerOperation(
  context: RequestContext,
  services: Services,
  operation: OperationName,
): Promise<Response> {
  const body = await readBody(context, services);
  if (!body.ok) {
    // What is left of the body is not worth reading: the connection ends with the answer.
    const unread = body.problem.code === "body-too-large" || body.problem.code === "too-slow";
    return respondProblem(context, body.problem, unread ? { connection: "close" } : {});
  }
  const { signal } = context.req.raw;
  const answer = await services.compute(operation, body.bytes, signal);
  if (signal.aborted) return new Response(null, { status: CLIENT_LEFT });
  return answer.ok ? sendBytes(context, answer.bytes) : respondProblem(context, answer.problem);
}
