import { z } from "@hono/zod-openapi";
import { quantity } from "./quantity.ts";

/** How the rules are computed. */
export const ModeChoiceSchema = z.enum(["auto", "steady", "stepped"]).openapi({
  description:
    "steady: each sample at rest. stepped: every rule at its own control period. auto: stepped up to a step of 300 s, steady above; the answer says which and why.",
});

/** How the rules are computed, as the step suggests where it is left out. */
export const ModeSchema = ModeChoiceSchema.default("auto");

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
