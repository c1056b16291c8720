import { z } from "@hono/zod-openapi";
import { quantity } from "./quantity.ts";

/** How the rules are computed. */
export const ModeSchema = z.enum(["auto", "steady"]).default("auto").openapi({
  description: "steady: each sample at rest. auto: as the study finds fit, with its reason in the answer.",
});

/** The site's coldest temperature on record. */
export const RecordLowSchema = quantity(
  "degC",
  "Coldest temperature on record at the site, for the caution; null: not known.",
  {
    minimum: -90,
    maximum: 40,
  },
)
  .nullable()
  .default(null);
