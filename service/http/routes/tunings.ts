import { TuningAnswerSchema, TuningRequestSchema } from "../../wire/schema/tuning.ts";
import type { App } from "../app-type.ts";
import { exampleAnswer, TUNING_EXAMPLE } from "../examples.ts";
import type { Services } from "../services.ts";
import { addOperationRoute } from "./operation-route.ts";

/** POST /v1/tunings. */
export function addTunings(app: App, services: Services): void {
  addOperationRoute(app, services, {
    operationId: "tune",
    path: "/v1/tunings",
    summary: "Find the setting that loses least",
    description:
      "The best value of one numeric setting of a rule, the loss around it, the range in which it hardly matters, and what the setting of today loses. With several sites: the best common setting, each site's own, and what the common one costs it.",
    request: { name: "TuningRequest", schema: TuningRequestSchema, example: TUNING_EXAMPLE },
    answer: {
      name: "TuningAnswer",
      schema: TuningAnswerSchema,
      description: "The optimum and the loss curve.",
      example: exampleAnswer("tune", TUNING_EXAMPLE),
    },
  });
}
