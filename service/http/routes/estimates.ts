import { EstimateAnswerSchema, EstimateRequestSchema } from "../../wire/schema/estimate.ts";
import type { App } from "../app-type.ts";
import { ESTIMATE_EXAMPLE, exampleAnswer } from "../examples.ts";
import type { Services } from "../services.ts";
import { addOperationRoute } from "./operation-route.ts";

/** POST /v1/estimates. */
export function addEstimates(app: App, services: Services): void {
  addOperationRoute(app, services, {
    operationId: "estimate",
    path: "/v1/estimates",
    summary: "Estimate what a tracking rule loses",
    description:
      "One module, one array, one rule on a converter, one climate: available, delivered and lost energy, the loss by cause, by month and by irradiance, and what each sample did. Only module, rule and climate are required.",
    request: { name: "EstimateRequest", schema: EstimateRequestSchema, example: ESTIMATE_EXAMPLE },
    answer: {
      name: "EstimateAnswer",
      schema: EstimateAnswerSchema,
      description: "Energies, causes, months, irradiance classes, traces and cautions.",
      example: exampleAnswer("estimate", ESTIMATE_EXAMPLE),
    },
  });
}
