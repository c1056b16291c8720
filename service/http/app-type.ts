import type { OpenAPIHono } from "@hono/zod-openapi";
import type { Context } from "hono";

/** What a request carries on its way through the service. */
export interface Environment {
  Variables: {
    requestId: string;
    /** Name of the key that was shown; null without one. */
    keyName: string | null;
    /** Code of the problem that answered, for the log; null for a success. */
    problemCode: string | null;
  };
}

export type App = OpenAPIHono<Environment>;
export type RequestContext = Context<Environment>;
