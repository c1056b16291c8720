import { z } from "@hono/zod-openapi";
import { ProvenanceSchema } from "./answer.ts";
import { ArraySchema } from "./array.ts";
import { ClimateSchema } from "./climate.ts";
import { ConverterSchema } from "./converter.ts";
import { ModuleSchema } from "./module.ts";
import { quantity, reported, reportedOrNull } from "./quantity.ts";
import { ModeSchema } from "./request-parts.ts";
import { RuleSchema } from "./rule.ts";

const SITES = 100;
/** 1 to 100 characters without control characters. */
const ID = /^\P{Cc}{1,100}$/u;

const TuningSiteSchema = z
  .strictObject({
    id: z
      .string()
      .regex(ID)
      .openapi({ pattern: ID.source, description: "Name of the site in the answer.", example: "Heron Bank" }),
    module: ModuleSchema.optional(),
    array: ArraySchema.optional(),
    converter: ConverterSchema.optional(),
    climate: ClimateSchema.optional(),
  })
  .openapi("TuningSite", { description: "One site; what it leaves out it has from the request." });

const RangeSchema = z
  .strictObject({
    from: quantity("that of the setting", "Lowest value tried.", { minimum: -1e6, maximum: 1e6 }),
    to: quantity("that of the setting", "Highest value tried.", { minimum: -1e6, maximum: 1e6 }),
  })
  .openapi("TuningRange", { description: "Values tried." });

/** The body of POST /v1/tunings. */
export const TuningRequestSchema = z
  .strictObject({
    module: ModuleSchema.optional(),
    array: ArraySchema.optional(),
    converter: ConverterSchema.optional(),
    climate: ClimateSchema.optional(),
    sites: z.array(TuningSiteSchema).min(1).max(SITES).optional().openapi({
      description: "Up to 100 sites that share one setting; left out, the request itself is the one site.",
    }),
    rule: RuleSchema,
    parameter: z.string().min(1).max(60).openapi({
      description: "The rule's numeric setting to tune.",
      example: "fraction",
    }),
    range: RangeSchema.nullable()
      .default(null)
      .openapi({ description: "Null: half as wide again as what is usual for the setting." }),
    points: quantity("1", "Points of the loss curve.", { minimum: 41, maximum: 201, integer: true }).default(41),
    mode: ModeSchema,
  })
  .openapi("TuningRequest", { description: "A rule's setting that is to lose least." });

const LossAtSchema = z
  .object({
    value: reported("that of the setting", "Value of the setting."),
    lost: reported("kWh", "Lost energy at it."),
    lostFraction: reportedOrNull("1", "Lost over available; null when nothing was available."),
  })
  .openapi("LossAt", { description: "What a value of the setting loses." });

const TunedSiteSchema = z
  .object({
    id: z.string(),
    available: reported("kWh", "What the site's array could have given."),
    optimum: LossAtSchema.openapi({ description: "The site's own best setting." }),
    atCommon: LossAtSchema.openapi({ description: "The common setting at this site." }),
    regret: reported("kWh", "Lost by the common setting beyond the site's own."),
  })
  .openapi("TunedSite", { description: "One site's own optimum and what the common setting costs it." });

/** The answer of POST /v1/tunings. */
export const TuningAnswerSchema = z
  .object({
    parameter: z.string(),
    unit: z.string().openapi({ description: "Of the setting." }),
    today: LossAtSchema.openapi({ description: "The setting as sent, or its default at the first site." }),
    optimum: LossAtSchema.openapi({ description: "The common setting that loses least." }),
    flatRange: z
      .object({
        from: reported("that of the setting", "Lower end."),
        to: reported("that of the setting", "Upper end."),
      })
      .openapi("FlatRange", { description: "Around the optimum, within 0.1 points of its lost fraction." }),
    curve: z.array(LossAtSchema).openapi({ description: "The loss over the range." }),
    sites: z.array(TunedSiteSchema),
    mode: z.string(),
    provenance: ProvenanceSchema,
  })
  .openapi("TuningAnswer", { description: "The best setting, the loss around it, and each site's own." });
