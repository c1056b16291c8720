import { CEILINGS } from "../../wire/limits.ts";
import { PortfolioInputLineSchema } from "../../wire/schema/portfolio.ts";
import { PortfolioOutputLineSchema } from "../../wire/schema/portfolio-answer.ts";
import { LINES_TYPE } from "../accept.ts";
import { addRoute } from "../add-route.ts";
import type { App } from "../app-type.ts";
import { createBodyBudget } from "../body-budget.ts";
import { ANY_OPERATION, problemResponses } from "../documented.ts";
import { PORTFOLIO_EXAMPLE } from "../examples.ts";
import { answerPortfolio } from "../portfolio/answer-portfolio.ts";
import type { Services } from "../services.ts";

/** The path whose answers are lines. */
export const PORTFOLIOS = "/v1/portfolios";

const DESCRIPTION = `Compares candidates at many sites, streamed: one JSON object a line, in and out. A defaults line (the first or none) holds what sites share; climate lines name climates that sites below refer to; each other line is a site. Results come as sites are done, in any order, and the totals last; an answer without a totals line was cut. A line that is wrong gets a line that says why and leaves the others alone; a wrong first line refuses the request, unless it is a site or a climate. Read the answer while you send: lines are taken no faster than results are read. At most ${CEILINGS.lineBytes} bytes a line, ${CEILINGS.sites} sites, ${CEILINGS.namedClimates} named climates of ${CEILINGS.namedClimateBytes} bytes together, and 60 s without a byte either way.`;

/** The document's body of lines of a registered schema. */
function linesOf(schema: string, example?: string) {
  const media = { schema: { type: "string", "x-line-schema": schema }, ...(example === undefined ? {} : { example }) };
  return { [LINES_TYPE]: media } as { [LINES_TYPE]: { schema: { type: "string" } } };
}

/** POST /v1/portfolios. */
export function addPortfolios(app: App, services: Services): void {
  app.openAPIRegistry.register("PortfolioInputLine", PortfolioInputLineSchema);
  app.openAPIRegistry.register("PortfolioOutputLine", PortfolioOutputLineSchema);
  const rooms = createBodyBudget(services.portfolio.most);
  addRoute(
    app,
    {
      method: "post",
      path: PORTFOLIOS,
      operationId: "portfolio",
      summary: "Compare candidates at many sites",
      description: DESCRIPTION,
      tags: ["studies"],
      security: [{}, { key: [] }],
      request: { body: { required: true, content: linesOf("PortfolioInputLine", PORTFOLIO_EXAMPLE) } },
      responses: {
        200: {
          description: "One line for each site, and the totals.",
          headers: { "x-request-id": { $ref: "#/components/headers/RequestId" } },
          content: linesOf("PortfolioOutputLine"),
        },
        ...problemResponses(ANY_OPERATION),
      },
    },
    (context) => answerPortfolio(context, services, rooms),
  );
}
