import { z } from "@hono/zod-openapi";
import { CEILINGS } from "../limits.ts";
import {
  CautionSchema,
  CoverageSchema,
  EnergySchema,
  LostByCauseSchema,
  ModuleAnswerSchema,
  ProvenanceSchema,
  ResolvedArraySchema,
  ResolvedConverterSchema,
} from "./answer.ts";
import { ArraySchema } from "./array.ts";
import { ClimateSchema } from "./climate.ts";
import { ConverterSchema } from "./converter.ts";
import { ModuleSchema } from "./module.ts";
import { name } from "./name.ts";
import { quantity, reported, reportedOrNull } from "./quantity.ts";
import { ModeSchema, RecordLowSchema } from "./request-parts.ts";
import { ResolvedRuleSchema, RuleSchema } from "./rule.ts";

const CURRENCY = /^[A-Z]{3}$/;

const labelOf = (description: string) => name(description, "hold a fraction");

/** One rule on one converter under a name. */
export const CandidateSchema = z
  .strictObject({
    label: labelOf("Name of the candidate in the answer: 1 to 100 characters, each name once."),
    rule: RuleSchema,
    converter: ConverterSchema.optional(),
    price: quantity("the currency of energyValue", "Price of this candidate's converter.", {
      minimum: 0,
      maximum: 1e9,
    }).optional(),
  })
  .openapi("Candidate", {
    description: "One rule on one converter under a name; without a converter it has that of the request.",
  });

const CurrencySchema = z
  .string()
  .regex(CURRENCY)
  .openapi({ pattern: CURRENCY.source, description: "ISO 4217 code.", example: "EUR" });

/** What a kilowatt-hour is worth. */
export const EnergyValueSchema = z
  .strictObject({
    currency: CurrencySchema,
    perKilowattHour: quantity("the currency per kWh", "Worth of a delivered kilowatt-hour.", {
      minimum: 0,
      maximum: 1e6,
    }),
  })
  .openapi("EnergyValue", { description: "What a kilowatt-hour is worth." });

/** What is compared. */
export const CandidatesSchema = z.array(CandidateSchema).min(2).max(CEILINGS.candidates).openapi({
  description: "2 to 24 rules on converters; `converter` above holds for those without their own.",
});

/** What the others are compared with. */
export const BaselineSchema = labelOf("Label of the candidate the others are compared with; left out: the first.");

/** The body of POST /v1/comparisons. */
export const ComparisonRequestSchema = z
  .strictObject({
    module: ModuleSchema,
    array: ArraySchema.optional(),
    converter: ConverterSchema.optional(),
    candidates: CandidatesSchema,
    baseline: BaselineSchema.optional(),
    climate: ClimateSchema,
    mode: ModeSchema,
    energyValue: EnergyValueSchema.optional(),
    recordLowTemperature: RecordLowSchema,
  })
  .openapi("ComparisonRequest", { description: "Several rules and converters on one array over one climate." });

const ComparedCandidateSchema = z
  .object({
    label: z.string(),
    rank: reported("1", "From 1, by delivered energy; equals share a rank."),
    energy: EnergySchema,
    lostByCause: LostByCauseSchema,
    differenceToBaseline: reported("kWh", "Delivered more than the baseline."),
    differenceToBest: reported("kWh", "Delivered against the best candidate: 0 or below."),
    worthPerYear: reportedOrNull("the currency of energyValue", "Of the difference to the baseline."),
    worthReason: z.string().nullable().openapi({ description: "Why no worth per year can be said; null when it can." }),
    payback: reportedOrNull(
      "years",
      "In which the worth pays the price above the baseline's; null where there is none.",
    ),
  })
  .openapi("ComparedCandidate", { description: "One candidate's figures beside the baseline's and the best one's." });

const ResolvedCandidateSchema = z
  .object({
    label: z.string(),
    rule: ResolvedRuleSchema,
    converter: ResolvedConverterSchema,
    price: reportedOrNull("the currency of energyValue", "Price of this candidate's converter; null: not given."),
  })
  .openapi("ResolvedCandidate", { description: "A candidate as it was computed, every default filled in." });

/** The answer of POST /v1/comparisons. */
export const ComparisonAnswerSchema = z
  .object({
    resolved: z
      .object({
        array: ResolvedArraySchema,
        candidates: z.array(ResolvedCandidateSchema),
        baseline: z.string().openapi({ description: "Label of the candidate the others are compared with." }),
        energyValue: z
          .object({ currency: z.string(), perKilowattHour: reported("the currency per kWh", "As it was sent.") })
          .openapi("ResolvedEnergyValue", { description: "What a kilowatt-hour is worth." })
          .nullable()
          .openapi({ description: "Null when not given." }),
        mode: z.string(),
        modeReason: z.string(),
      })
      .openapi("ResolvedComparison", { description: "What was computed, every default filled in." }),
    results: z.array(ComparedCandidateSchema).openapi({ description: "In the order of the request." }),
    coverage: CoverageSchema,
    module: ModuleAnswerSchema,
    cautions: z.array(CautionSchema),
    provenance: ProvenanceSchema,
  })
  .openapi("ComparisonAnswer", { description: "What each candidate delivers, and what the difference is worth." });
