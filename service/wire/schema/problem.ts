import { z } from "@hono/zod-openapi";
import { PROBLEMS } from "../problem.ts";
import { reported } from "./quantity.ts";

const FlawSchema = z
  .object({
    pointer: z.string().openapi({ description: "JSON pointer (RFC 6901) into the request.", example: "/climate/step" }),
    code: z.string().openapi({ description: "What kind of error this is." }),
    detail: z.string().openapi({ description: "What is wrong and what to change." }),
    expected: z.string().optional().openapi({ description: "What would be right, where that can be said." }),
  })
  .openapi("ProblemError", { description: "One thing to change in the request." });

/** The body of every answer that is not a success (RFC 9457). */
export const ProblemSchema = z
  .object({
    type: z.string().openapi({ description: "urn:kneegap:problem: and the code." }),
    title: z.string(),
    status: reported("1", "The HTTP status."),
    detail: z.string(),
    code: z.string().openapi({
      description: `One of: ${Object.keys(PROBLEMS).join(", ")}; more may come, none changes its meaning.`,
    }),
    requestId: z.string().openapi({ description: "As in the x-request-id header; finds the request in the log." }),
    errorCount: reported("1", "How many errors there are."),
    errors: z.array(FlawSchema).openapi({ description: "The first 20 of them." }),
  })
  .openapi("Problem", { description: "Why there is no answer, and what to change (RFC 9457)." });
