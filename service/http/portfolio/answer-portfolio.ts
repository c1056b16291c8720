import { Portfolio } from "../../wire/portfolio/portfolio.ts";
import { problem } from "../../wire/problem.ts";
import { LINES_TYPE } from "../accept.ts";
import type { RequestContext } from "../app-type.ts";
import type { BodyBudget } from "../body-budget.ts";
import { respondProblem } from "../problem.ts";
import { refuseForm } from "../read-body.ts";
import type { Services } from "../services.ts";
import { bodyStream } from "./body-stream.ts";
import { holdFrom } from "./held-memory.ts";
import { PortfolioSession } from "./session.ts";

/** The status of an answer that nobody waits for any more: seen in the log alone. */
const CLIENT_LEFT = 499;

/** Whatever is left of the body is not worth reading: the connection ends with the refusal. */
const CLOSE = { connection: "close" };

const NO_ROOM = problem("overloaded", "Too many portfolios are being answered; this one was not begun.");

/** Answers a portfolio line by line; `rooms` are taken by portfolios that are being answered. */
export async function answerPortfolio(
  context: RequestContext,
  services: Services,
  rooms: BodyBudget,
): Promise<Response> {
  const form = refuseForm(context, LINES_TYPE);
  if (form !== null) return respondProblem(context, form, CLOSE);
  if (!rooms.take(1)) return respondProblem(context, NO_ROOM, CLOSE);
  const session = sessionOf(context, services);
  const { signal } = context.req.raw;
  signal.addEventListener("abort", () => session.leave(), { once: true });
  const refusal = await session.open();
  if (refusal !== null || session.isLeft) {
    session.close();
    rooms.release(1);
    return refusal === null ? new Response(null, { status: CLIENT_LEFT }) : respondProblem(context, refusal, CLOSE);
  }
  void session.answer().then(() => rooms.release(1));
  return new Response(session.stream, { headers: { "content-type": LINES_TYPE } });
}

function sessionOf(context: RequestContext, { limits, budget, portfolio: service, log }: Services): PortfolioSession {
  const requestId = context.get("requestId");
  const held = holdFrom(budget);
  return new PortfolioSession({
    portfolio: new Portfolio({ limits, requestId, hold: (bytes) => held.take(bytes) }),
    body: bodyStream(context),
    limits,
    held,
    service,
    onFault: (fault) => log.error({ requestId, fault }, "portfolio failed"),
    onEnd: (counts, cause) => log.info({ requestId, ...counts, cause }, "portfolio"),
  });
}
