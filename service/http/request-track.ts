import { randomUUID } from "node:crypto";
import type { MiddlewareHandler } from "hono";
import { routePath } from "hono/route";
import type { Environment } from "./app-type.ts";
import { SECURITY_HEADERS } from "./security-headers.ts";
import type { Services } from "./services.ts";

const REQUEST_ID = /^[A-Za-z0-9._-]{1,64}$/;

/** The caller's request id where it is harmless, else a new one. */
function requestIdOf(given: string | undefined): string {
  return given !== undefined && REQUEST_ID.test(given) ? given : randomUUID();
}

/**
 * Gives every request its id, every answer its common headers, and the log one line a request: id, method, route
 * pattern, status, duration, key name, problem code. Never a body, a query, a path as it was sent, or a key.
 */
export function trackRequest({ log, state }: Services): MiddlewareHandler<Environment> {
  return async (context, next) => {
    const start = performance.now();
    const requestId = requestIdOf(context.req.header("x-request-id"));
    context.set("requestId", requestId);
    context.set("keyName", null);
    context.set("problemCode", null);
    await next();
    const { headers, status } = context.res;
    headers.set("x-request-id", requestId);
    for (const [name, value] of SECURITY_HEADERS) headers.set(name, value);
    if (state() === "draining") headers.set("connection", "close");
    log.info(
      {
        requestId,
        method: context.req.method,
        route: routePath(context, -1),
        status,
        duration: Math.round((performance.now() - start) * 10) / 10,
        key: context.get("keyName"),
        problem: context.get("problemCode"),
      },
      "request",
    );
  };
}
