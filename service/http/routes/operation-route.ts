import type { z } from "@hono/zod-openapi";
import type { OperationName } from "../../wire/operations.ts";
import { addRoute } from "../add-route.ts";
import { answerOperation } from "../answer-operation.ts";
import type { App } from "../app-type.ts";
import { ANY_OPERATION, problemResponses, success } from "../documented.ts";
import type { Services } from "../services.ts";

/** What a POST under /v1 says of itself in the document. */
export interface OperationRoute {
  operationId: OperationName;
  path: string;
  summary: string;
  description: string;
  request: { name: string; schema: z.ZodType; example: unknown };
  answer: { name: string; schema: z.ZodType; description: string; example: unknown };
}

/** Adds an operation of the table as POST route. */
export function addOperationRoute(app: App, services: Services, route: OperationRoute): void {
  const { operationId, path, summary, description, request, answer } = route;
  app.openAPIRegistry.register(request.name, request.schema);
  app.openAPIRegistry.register(answer.name, answer.schema);
  const media = { schema: { $ref: `#/components/schemas/${request.name}` }, example: request.example };
  addRoute(
    app,
    {
      method: "post",
      path,
      operationId,
      summary,
      description,
      tags: ["studies"],
      security: [{}, { key: [] }],
      request: { body: { required: true, content: { "application/json": media } } },
      responses: { ...success(answer.name, answer.description, answer.example), ...problemResponses(ANY_OPERATION) },
    },
    (context) => answerOperation(context, services, operationId),
  );
}
