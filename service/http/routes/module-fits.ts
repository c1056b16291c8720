import { ModuleFitAnswerSchema, ModuleFitRequestSchema } from "../../wire/schema/module-fit.ts";
import type { App } from "../app-type.ts";
import { exampleAnswer, MODULE_FIT_EXAMPLE } from "../examples.ts";
import type { Services } from "../services.ts";
import { addOperationRoute } from "./operation-route.ts";

/** POST /v1/module-fits. */
export function addModuleFits(app: App, services: Services): void {
  addOperationRoute(app, services, {
    operationId: "fitModule",
    path: "/v1/module-fits",
    summary: "Find a module's circuit",
    description:
      "From a datasheet or from measured I-V points to the single-diode circuit, which can be sent back as a module, and how well it fits. A datasheet that no circuit meets gets the nearest one, or is refused with every misfit shown.",
    request: { name: "ModuleFitRequest", schema: ModuleFitRequestSchema, example: MODULE_FIT_EXAMPLE },
    answer: {
      name: "ModuleFitAnswer",
      schema: ModuleFitAnswerSchema,
      description: "The circuit and its misfits.",
      example: exampleAnswer("fitModule", MODULE_FIT_EXAMPLE),
    },
  });
}
