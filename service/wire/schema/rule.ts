import { z } from "@hono/zod-openapi";
import type { RuleKind } from "../../core/rules/index.ts";
import { RULES } from "../../core/rules/index.ts";
import type { NumberParameter, Parameter, RuleDefinition, SeriesParameter } from "../../core/rules/rule.ts";
import type { RawColumn } from "./column.ts";
import { column } from "./column.ts";
import { quantity, reported, withUnit } from "./quantity.ts";

/** A rule of a request: its kind and the settings that were given. */
export type RawRule = { kind: RuleKind } & Record<string, number | boolean | string | RawColumn | undefined>;

type RuleObject = z.ZodObject<{ kind: z.ZodLiteral<RuleKind> } & Record<string, z.ZodType>>;

/** "constant-voltage" as "ConstantVoltage". */
function schemaName(kind: string): string {
  return kind.replace(/(^|-)(.)/g, (_match, _dash, letter: string) => letter.toUpperCase());
}

/** What a parameter says of itself in the document, without its unit. */
function sentenceOf(parameter: Parameter): string {
  const usual =
    parameter.type === "number" && parameter.usual !== undefined
      ? ` Usual: ${parameter.usual[0]} to ${parameter.usual[1]}.`
      : "";
  const derived =
    parameter.type === "number" && typeof parameter.default === "object" ? ` Default: ${parameter.default.as}.` : "";
  return `${parameter.description}${usual}${derived} Source: ${parameter.source}.`;
}

function numberSchema(parameter: NumberParameter): z.ZodType {
  const schema = quantity(parameter.unit, sentenceOf(parameter), parameter);
  return typeof parameter.default === "number" ? schema.default(parameter.default) : schema.optional();
}

/** A number, or a column of one number a sample. */
function seriesSchema(parameter: SeriesParameter): z.ZodType {
  const { unit, minimum, maximum } = parameter;
  const single = quantity(unit, "One value for all samples.", { minimum, maximum });
  return z
    .union([single, column(unit, "One value a sample.", { minimum, maximum })])
    .openapi({ description: withUnit(unit, sentenceOf(parameter)) });
}

function settingSchema(parameter: Parameter): z.ZodType {
  const description = sentenceOf(parameter);
  switch (parameter.type) {
    case "number":
      return numberSchema(parameter);
    case "flag":
      return z.boolean().default(parameter.default).openapi({ description });
    case "choice":
      return z.enum(parameter.choices).default(parameter.default).openapi({ description });
    case "series":
      return seriesSchema(parameter);
  }
}

function resolvedSchema(parameter: Parameter): z.ZodType {
  switch (parameter.type) {
    case "number":
      return reported(parameter.unit, parameter.description);
    case "flag":
      return z.boolean().openapi({ description: parameter.description });
    case "choice":
      return z.string().openapi({ description: parameter.description });
    case "series":
      return z
        .number()
        .nullable()
        .openapi({
          description: withUnit(parameter.unit, `${parameter.description} Null where one value a sample was sent.`),
        });
  }
}

function shapeOf(rule: RuleDefinition, schemaOf: (parameter: Parameter) => z.ZodType) {
  const settings = Object.entries(rule.parameters).map(([name, parameter]) => [name, schemaOf(parameter)]);
  return { kind: z.literal(rule.kind as RuleKind), ...Object.fromEntries(settings) };
}

const definitions = RULES as unknown as readonly RuleDefinition[];

const requested = definitions.map((rule) =>
  z
    .strictObject(shapeOf(rule, settingSchema))
    .openapi(`${schemaName(rule.kind)}Rule`, { title: rule.title, description: rule.description }),
) as unknown as [RuleObject, ...RuleObject[]];

const resolved = definitions.map((rule) =>
  z
    .object(shapeOf(rule, resolvedSchema))
    .openapi(`Resolved${schemaName(rule.kind)}Rule`, { description: `${rule.title}, every default filled in.` }),
) as unknown as [RuleObject, ...RuleObject[]];

/** A tracking rule with its settings, derived from the rule table. */
export const RuleSchema = z
  .discriminatedUnion("kind", requested)
  .openapi("Rule", { description: "How the converter decides the array voltage, with the rule's settings." });

/** A tracking rule as it was computed. */
export const ResolvedRuleSchema = z
  .discriminatedUnion("kind", resolved)
  .openapi("ResolvedRule", { description: "The rule as it was computed, every default filled in." });
