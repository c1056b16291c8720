import { CurveAnswerSchema, CurveRequestSchema } from "../../wire/schema/curve.ts";
import type { App } from "../app-type.ts";
import { CURVE_EXAMPLE, exampleAnswer } from "../examples.ts";
import type { Services } from "../services.ts";
import { addOperationRoute } from "./operation-route.ts";

/** POST /v1/curves. */
export function addCurves(app: App, services: Services): void {
  addOperationRoute(app, services, {
    operationId: "curve",
    path: "/v1/curves",
    summary: "Draw the I-V and P-V curve",
    description:
      "The curve of an array in one weather as its converter sees it, every peak, and where each given rule sits at rest with what it loses and why.",
    request: { name: "CurveRequest", schema: CurveRequestSchema, example: CURVE_EXAMPLE },
    answer: {
      name: "CurveAnswer",
      schema: CurveAnswerSchema,
      description: "The curve, its peaks, and the place of each rule.",
      example: exampleAnswer("curve", CURVE_EXAMPLE),
    },
  });
}
