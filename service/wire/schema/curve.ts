import { z } from "@hono/zod-openapi";
import { LostPowerByCauseSchema, ModuleAnswerSchema, ProvenanceSchema } from "./answer.ts";
import { ArraySchema } from "./array.ts";
import { reportedColumn } from "./column.ts";
import { ConverterSchema } from "./converter.ts";
import { ModuleSchema } from "./module.ts";
import { quantity, reported } from "./quantity.ts";
import { ResolvedRuleSchema, RuleSchema } from "./rule.ts";

/** The body of POST /v1/curves. */
export const CurveRequestSchema = z
  .strictObject({
    module: ModuleSchema,
    array: ArraySchema.optional(),
    converter: ConverterSchema.optional(),
    irradiance: quantity("W/m2", "Irradiance on the plane of the modules.", { minimum: 1, maximum: 2000 }),
    cellTemperature: quantity("degC", "Cell temperature.", { minimum: -90, maximum: 150 }),
    rules: z
      .array(RuleSchema)
      .max(24)
      .default([])
      .openapi({ description: "Rules whose place on the curve is wanted, at rest." }),
    points: quantity("1", "Points of the curve.", { minimum: 3, maximum: 2001, integer: true }).default(101),
  })
  .openapi("CurveRequest", { description: "One array in one weather." });

const CurvePointSchema = z
  .object({
    voltage: reported("V", "Voltage at the converter's terminals."),
    current: reported("A", "Current."),
    power: reported("W", "Power."),
  })
  .openapi("CurvePoint", { description: "A point of the curve." });

const RulePlaceSchema = z
  .object({
    rule: ResolvedRuleSchema,
    voltage: reported("V", "Mean voltage it holds at rest."),
    current: reported("A", "Mean current, interruptions counted."),
    power: reported("W", "Mean power delivered, interruptions counted."),
    lost: reported("W", "What it leaves of the maximum."),
    lostByCause: LostPowerByCauseSchema,
  })
  .openapi("RulePlace", { description: "Where a rule sits at rest." });

/** The answer of POST /v1/curves. */
export const CurveAnswerSchema = z
  .object({
    voltage: reportedColumn("V", "From 0 to open circuit, equally spaced."),
    current: reportedColumn("A", "Current at each voltage."),
    power: reportedColumn("W", "Power at each voltage."),
    peaks: z.array(CurvePointSchema).openapi({ description: "Every peak of the power curve, the highest first." }),
    shortCircuitCurrent: reported("A", "Current at 0 V, behind the wiring."),
    openCircuitVoltage: reported("V", "Voltage at no current."),
    places: z.array(RulePlaceSchema).openapi({ description: "One for each rule, in the order of the request." }),
    module: ModuleAnswerSchema,
    provenance: ProvenanceSchema,
  })
  .openapi("CurveAnswer", { description: "The I-V and P-V curve and where each rule sits on it." });
