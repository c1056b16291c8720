import { EfficiencyTestAnswerSchema, EfficiencyTestRequestSchema } from "../../wire/schema/efficiency-test.ts";
import type { App } from "../app-type.ts";
import { EFFICIENCY_TEST_EXAMPLE, exampleAnswer } from "../examples.ts";
import type { Services } from "../services.ts";
import { addOperationRoute } from "./operation-route.ts";

/** POST /v1/efficiency-tests. */
export function addEfficiencyTests(app: App, services: Services): void {
  addOperationRoute(app, services, {
    operationId: "testEfficiency",
    path: "/v1/efficiency-tests",
    summary: "Test a rule's MPPT efficiency by the standard",
    description:
      "The dynamic sequences and the static levels of EN 50530:2010 (from memory; their durations close) for any rule on any module, by cause, and on request the course of one row.",
    request: { name: "EfficiencyTestRequest", schema: EfficiencyTestRequestSchema, example: EFFICIENCY_TEST_EXAMPLE },
    answer: {
      name: "EfficiencyTestAnswer",
      schema: EfficiencyTestAnswerSchema,
      description: "Rows or levels with their efficiencies.",
      example: exampleAnswer("testEfficiency", EFFICIENCY_TEST_EXAMPLE),
    },
  });
}
