import { z } from "@hono/zod-openapi";
import {
  LostShareByCauseSchema,
  ModuleAnswerSchema,
  PointTraceSchema,
  ProvenanceSchema,
  ResolvedConverterSchema,
} from "./answer.ts";
import { reportedColumn } from "./column.ts";
import { ConverterSchema } from "./converter.ts";
import { ModuleSchema } from "./module.ts";
import { quantity, reported, reportedOrNull } from "./quantity.ts";
import { ResolvedRuleSchema, RuleSchema } from "./rule.ts";

const TemperatureLagSchema = z
  .strictObject({
    rise: quantity("K", "Rise of the cells over cellTemperature at rest under 1000 W/m2.", { minimum: 0, maximum: 80 }),
    timeConstant: quantity("s", "Time constant of the first-order lag.", { minimum: 1, maximum: 3600 }),
  })
  .openapi("TemperatureLag", { description: "Cells that warm with the light; the standard keeps them constant." });

/** The body of POST /v1/efficiency-tests. */
export const EfficiencyTestRequestSchema = z
  .strictObject({
    module: ModuleSchema,
    rule: RuleSchema,
    converter: ConverterSchema.optional(),
    test: z.enum(["dynamic-100-500", "dynamic-300-1000", "start-up", "static"]).openapi({
      description: "A dynamic sequence of ramps, the start-up ramp, or the static levels.",
    }),
    cellTemperature: quantity("degC", "Cell temperature, constant.", { minimum: -40, maximum: 100 }).default(25),
    temperatureLag: TemperatureLagSchema.nullable()
      .default(null)
      .openapi({ description: "Null: the cells keep cellTemperature, as in the standard." }),
    traceSlope: quantity("W/m2/s", "Slope of the row whose course is wanted; null: none.", {
      minimum: 0,
      maximum: 100,
    })
      .nullable()
      .default(null),
  })
  .openapi("EfficiencyTestRequest", { description: "One module, one rule, one of the standard's tests." });

const EfficiencyRowSchema = z
  .object({
    slope: reported("W/m2/s", "Slope of the ramps."),
    repetitions: reported("1", "How often up and down."),
    duration: reported("s", "With 300 s of settling, which does not count."),
    efficiency: reported("1", "Delivered over available energy."),
    lostByCause: LostShareByCauseSchema,
  })
  .openapi("EfficiencyRow", { description: "One row of a dynamic test." });

const EfficiencyLevelSchema = z
  .object({
    level: reported("1", "Share of the maximum power at 1000 W/m2."),
    irradiance: reported("W/m2", "At which the module gives that power."),
    efficiency: reported("1", "Delivered over available power at rest."),
    lostByCause: LostShareByCauseSchema,
  })
  .openapi("EfficiencyLevel", { description: "One level of the static test." });

const RowTraceSchema = z
  .object({
    slope: reported("W/m2/s", "Of the row shown."),
    step: reported("s", "Length of one span, at most 1 s."),
    irradiance: reportedColumn("W/m2", "At the start of each span; straight between. The first 300 s settle."),
    maximumPower: PointTraceSchema,
    operating: PointTraceSchema,
    leastVoltage: reportedColumn("V", "Least of the control periods in each span."),
    mostVoltage: reportedColumn("V", "Most of the control periods in each span."),
    leastPower: reportedColumn("W", "Least delivered by a control period in each span."),
    mostPower: reportedColumn("W", "Most delivered by a control period in each span."),
  })
  .openapi("RowTrace", { description: "The course of one row: means over each span, and its extremes." });

/** The answer of POST /v1/efficiency-tests: rows for a dynamic test, levels for the static one. */
export const EfficiencyTestAnswerSchema = z
  .object({
    test: z.string(),
    edition: z.string().openapi({ description: "The edition whose sequences and weights were used." }),
    resolved: z
      .object({ rule: ResolvedRuleSchema, converter: ResolvedConverterSchema })
      .openapi("ResolvedEfficiencyTest", { description: "What was computed, every default filled in." }),
    rows: z.array(EfficiencyRowSchema).nullable().openapi({ description: "Null for the static test." }),
    levels: z.array(EfficiencyLevelSchema).nullable().openapi({ description: "Null for a dynamic test." }),
    efficiency: reportedOrNull("1", "Unweighted mean of the rows; null for the static test."),
    duration: reportedOrNull("s", "Of all rows; null for the static test."),
    europeanWeighted: reportedOrNull("1", "By the European weights; null for a dynamic test."),
    cecWeighted: reportedOrNull("1", "By the CEC weights; null for a dynamic test."),
    trace: RowTraceSchema.nullable().openapi({ description: "Null where no row was asked for." }),
    module: ModuleAnswerSchema,
    provenance: ProvenanceSchema,
  })
  .openapi("EfficiencyTestAnswer", { description: "A rule's MPPT efficiency by the standard's test." });
