import { z } from "@hono/zod-openapi";
import {
  CautionSchema,
  CoverageSchema,
  EnergySchema,
  IrradianceClassSchema,
  LostByCauseSchema,
  ModuleAnswerSchema,
  MonthSchema,
  ProvenanceSchema,
  ResolvedArraySchema,
  ResolvedConverterSchema,
  TracesSchema,
} from "./answer.ts";
import { ArraySchema } from "./array.ts";
import { ClimateSchema } from "./climate.ts";
import { ConverterSchema } from "./converter.ts";
import { ModuleSchema } from "./module.ts";
import { quantity } from "./quantity.ts";
import { ModeSchema, RecordLowSchema } from "./request-parts.ts";
import { ResolvedRuleSchema, RuleSchema } from "./rule.ts";

/** The body of POST /v1/estimates. */
export const EstimateRequestSchema = z
  .strictObject({
    module: ModuleSchema,
    array: ArraySchema.optional(),
    converter: ConverterSchema.optional(),
    rule: RuleSchema,
    climate: ClimateSchema,
    mode: ModeSchema,
    traces: z.enum(["full", "power", "causes", "none"]).default("full").openapi({
      description: "Columns of the answer: voltage, current and power; powers; lost energy by cause; none.",
    }),
    traceDecimals: quantity("1", "Decimals of the traces.", { minimum: 0, maximum: 9, integer: true }).default(3),
    recordLowTemperature: RecordLowSchema,
  })
  .openapi("EstimateRequest", { description: "One module, one array, one rule on a converter, one climate." });

/** The answer of POST /v1/estimates. */
export const EstimateAnswerSchema = z
  .object({
    resolved: z
      .object({
        array: ResolvedArraySchema,
        converter: ResolvedConverterSchema,
        rule: ResolvedRuleSchema,
        mode: z.string(),
        modeReason: z.string(),
      })
      .openapi("ResolvedEstimate", { description: "What was computed, every default filled in." }),
    energy: EnergySchema,
    lostByCause: LostByCauseSchema,
    months: z.array(MonthSchema).openapi({ description: "Every month the climate touches." }),
    irradianceClasses: z.array(IrradianceClassSchema).openapi({ description: "Every class that has samples." }),
    coverage: CoverageSchema,
    traces: TracesSchema.nullable().openapi({ description: "Null where none were asked for." }),
    module: ModuleAnswerSchema,
    cautions: z.array(CautionSchema),
    provenance: ProvenanceSchema,
  })
  .openapi("EstimateAnswer", { description: "Energy, its loss by cause, and where it was lost." });
