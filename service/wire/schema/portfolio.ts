import { z } from "@hono/zod-openapi";
import { ArraySchema } from "./array.ts";
import { ClimateSchema } from "./climate.ts";
import { BaselineSchema, CandidatesSchema, EnergyValueSchema } from "./comparison.ts";
import { ConverterSchema } from "./converter.ts";
import { ModuleSchema } from "./module.ts";
import { name } from "./name.ts";
import { quantity } from "./quantity.ts";
import { ModeChoiceSchema, RecordLowSchema } from "./request-parts.ts";

const NamedClimateSchema = z
  .strictObject({
    kind: z.literal("named"),
    name: name("Of a climate line above.", "Cold Bay"),
  })
  .openapi("NamedClimate", { description: "A climate that a line above gives by name." });

/** What sites may share and what each may have of its own. */
function partsWith<Climate extends z.ZodType>(climate: Climate) {
  return {
    module: ModuleSchema.optional(),
    array: ArraySchema.optional(),
    converter: ConverterSchema.optional(),
    candidates: CandidatesSchema.optional(),
    baseline: BaselineSchema.optional(),
    climate: climate.optional(),
    mode: ModeChoiceSchema.optional(),
    energyValue: EnergyValueSchema.optional(),
    recordLowTemperature: RecordLowSchema.unwrap().optional(),
    count: quantity("1", "How many such sites there are: the totals count it as often. 1 when left out.", {
      minimum: 1,
      maximum: 1_000_000,
      integer: true,
    }).optional(),
    group: name("Group whose totals the site is added to besides the whole.", "north").optional(),
  };
}

const defaultsWith = <Climate extends z.ZodType>(climate: Climate) =>
  z.strictObject({ kind: z.literal("defaults"), ...partsWith(climate) });

const siteWith = <Climate extends z.ZodType>(climate: Climate) =>
  z.strictObject({
    kind: z.literal("site"),
    id: name("Of the site in its answer; each id once.", "Heron Bank"),
    ...partsWith(climate),
  });

/** A climate line. */
export const ClimateLineSchema = z
  .strictObject({
    kind: z.literal("climate"),
    name: name("By which sites below name this climate.", "Cold Bay"),
    climate: ClimateSchema,
  })
  .openapi("PortfolioClimate", { description: "A climate that many sites share, given once and named by each." });

/** A line whose climate, if it has one, stands in it. */
export const PlainLineSchema = z.discriminatedUnion("kind", [
  defaultsWith(ClimateSchema),
  ClimateLineSchema,
  siteWith(ClimateSchema),
]);

/** A line whose climate is named. */
export const NamingLineSchema = z.discriminatedUnion("kind", [
  defaultsWith(NamedClimateSchema),
  ClimateLineSchema,
  siteWith(NamedClimateSchema),
]);

const EITHER = z
  .union([ClimateSchema, NamedClimateSchema])
  .openapi({ description: "The climate itself, or the name of one given by a line above." });

/** One line of the body of POST /v1/portfolios, as the document has it. */
export const PortfolioInputLineSchema = z
  .discriminatedUnion("kind", [
    defaultsWith(EITHER).openapi("PortfolioDefaults", {
      description:
        "What sites share; only the first line may be one. A site's own member takes the place of the whole member here.",
    }),
    ClimateLineSchema,
    siteWith(EITHER).openapi("PortfolioSite", {
      description:
        "One site. With what it has from the defaults it needs a module, candidates and a climate, and is then compared as by `compare`.",
    }),
  ])
  .openapi("PortfolioInputLine", { description: "One line of a portfolio's request." });
