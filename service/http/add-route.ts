import type { RouteConfig } from "@hono/zod-openapi";
import { createRoute } from "@hono/zod-openapi";
import type { App, RequestContext } from "./app-type.ts";

/**
 * Adds a route to app and document. Its schemas stand in the document by reference, so the library validates nothing:
 * bodies are decoded by `wire`, and every refusal is a problem of ours.
 */
export function addRoute(
  app: App,
  route: RouteConfig,
  handler: (context: RequestContext) => Response | Promise<Response>,
) {
  app.openapi(createRoute(route), handler as never);
}
