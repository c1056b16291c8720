import { PROBLEMS } from "../wire/problem.ts";
import { ProblemSchema } from "../wire/schema/problem.ts";
import { VERSION } from "../wire/version.ts";
import type { App } from "./app-type.ts";

const text = (description: string, more: Record<string, unknown> = {}) => ({
  description,
  schema: { type: "string" as const, ...more },
});

/** What all operations of the document share. */
export function describeShared(app: App): void {
  const registry = app.openAPIRegistry;
  registry.register("Problem", ProblemSchema);
  registry.registerComponent("securitySchemes", "key", {
    type: "http",
    scheme: "bearer",
    description:
      "A key of the operator's. Needed only where the operator has set keys; health, version and document never need one.",
  });
  registry.registerComponent("headers", "RequestId", text("Finds the request in the service's log."));
  registry.registerComponent("headers", "Allow", text("The methods that fit this path."));
  registry.registerComponent("headers", "WwwAuthenticate", text("How a key is shown: Bearer."));
  registry.registerComponent("headers", "RetryAfter", text("Seconds after which a retry makes sense."));
  registry.registerComponent("parameters", "RequestId", {
    name: "x-request-id",
    in: "header",
    required: false,
    description: "An id of the caller's for log and answer; one that does not match the pattern is replaced.",
    schema: { type: "string", pattern: "^[A-Za-z0-9._-]{1,64}$" },
  });
}

/** The OpenAPI 3.1 document of the app's routes, as JSON text; the same routes give the same text. */
export function documentText(app: App): string {
  const document = app.getOpenAPI31Document({
    openapi: "3.1.0",
    info: {
      title: "kneegap",
      version: VERSION,
      description:
        "How much energy a photovoltaic converter's tracking rule leaves behind, and why. Every POST is a pure function of its body: safe to retry, the same bytes on any replica. Requests are strict, answers are open: members may be added, enumerations may grow. Results are estimates for planning, not an electrical design; photovoltaic strings are a shock, arc and fire hazard and cannot be switched off in daylight. Follow local codes and leave the design to licensed practice.",
    },
    servers: [{ url: "/", description: "The service that serves this document." }],
    tags: [
      { name: "studies", description: "What an array delivers under a tracking rule." },
      { name: "reference", description: "What the service knows." },
      { name: "service", description: "What the service says of itself." },
    ],
  });
  for (const item of Object.values(document.paths ?? {})) {
    for (const operation of Object.values(item as Record<string, { parameters?: unknown[] }>)) {
      operation.parameters = [{ $ref: "#/components/parameters/RequestId" }];
    }
  }
  delete (document as { webhooks?: unknown }).webhooks;
  return JSON.stringify({ ...document, "x-problem-codes": PROBLEMS });
}
