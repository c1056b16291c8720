import { ComparisonAnswerSchema, ComparisonRequestSchema } from "../../wire/schema/comparison.ts";
import type { App } from "../app-type.ts";
import { COMPARISON_EXAMPLE, exampleAnswer } from "../examples.ts";
import type { Services } from "../services.ts";
import { addOperationRoute } from "./operation-route.ts";

/** POST /v1/comparisons. */
export function addComparisons(app: App, services: Services): void {
  addOperationRoute(app, services, {
    operationId: "compare",
    path: "/v1/comparisons",
    summary: "Compare tracking rules and converters",
    description:
      "2 to 24 candidates on one array over one climate: what each delivers, its difference to the baseline and to the best, and what the difference is worth per year. Worth and payback need energyValue and a climate of 365 or 366 days.",
    request: { name: "ComparisonRequest", schema: ComparisonRequestSchema, example: COMPARISON_EXAMPLE },
    answer: {
      name: "ComparisonAnswer",
      schema: ComparisonAnswerSchema,
      description: "One result a candidate, in the order of the request.",
      example: exampleAnswer("compare", COMPARISON_EXAMPLE),
    },
  });
}
