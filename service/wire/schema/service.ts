import { z } from "@hono/zod-openapi";
import { reported } from "./quantity.ts";

/** The answer of the two health checks. */
export const HealthSchema = z
  .object({ status: z.string().openapi({ description: "live or ready." }) })
  .openapi("Health", { description: "What the service says of itself." });

/** The answer of GET /version. */
export const VersionSchema = z
  .object({
    name: z.string(),
    version: z.string().openapi({ description: "Of the service." }),
    limits: z
      .object({
        bodyBytes: reported("byte", "Longest request body, decompressed."),
        samples: reported("1", "Most samples of a climate."),
        candidates: reported("1", "Most candidates of a comparison."),
        controlPeriods: reported("1", "Most control periods of all candidates together, or as much other work."),
        computeSeconds: reported("s", "Longest computing of one request, or of one site of a portfolio."),
        lineBytes: reported("byte", "Longest line of a portfolio."),
        sites: reported("1", "Most sites of a portfolio."),
        namedClimates: reported("1", "Most named climates of a portfolio."),
        namedClimateBytes: reported("byte", "Longest the lines of its named climates may be together."),
      })
      .openapi("LimitsInForce", { description: "At most the ceilings of this document; the operator may lower them." }),
  })
  .openapi("VersionAnswer", { description: "Which service this is and what it admits." });
