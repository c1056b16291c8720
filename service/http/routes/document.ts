import { addRoute } from "../add-route.ts";
import type { App } from "../app-type.ts";
import { documentText } from "../document.ts";
import { ANY_REQUEST, problemResponses } from "../documented.ts";
import { sendText } from "../send.ts";

/** GET /openapi.json: add it last, since its text is built once, from the routes there are by then. */
export function addDocument(app: App): void {
  let text = "";
  addRoute(
    app,
    {
      method: "get",
      path: "/openapi.json",
      operationId: "document",
      summary: "Read this document",
      description: "The OpenAPI 3.1 document of this version.",
      tags: ["service"],
      security: [{}],
      responses: {
        200: {
          description: "This document.",
          headers: { "x-request-id": { $ref: "#/components/headers/RequestId" } },
          content: { "application/json": { schema: { type: "object", description: "An OpenAPI 3.1 document." } } },
        },
        ...problemResponses(ANY_REQUEST),
      },
    },
    (context) => sendText(context, text),
  );
  text = documentText(app);
}
