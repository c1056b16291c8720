import { z } from "@hono/zod-openapi";
import { reported } from "./quantity.ts";

const VaryingUnit = "that of the parameter";

const RangeSchema = z
  .object({ from: reported(VaryingUnit, "Lower end."), to: reported(VaryingUnit, "Upper end.") })
  .openapi("UsualRange", { description: "What is usual in the field." });

const ParameterSchema = z
  .object({
    name: z.string().openapi({ description: "The member's name in a request." }),
    type: z.string().openapi({ description: "number, flag, choice, or series (a number or one a sample)." }),
    unit: z.string().nullable().openapi({ description: "Null for flags and choices." }),
    description: z.string(),
    required: z.boolean().openapi({ description: "True where there is no default." }),
    default: z
      .union([reported(VaryingUnit, "A number."), z.boolean(), z.string()])
      .nullable()
      .openapi({ description: "Null where it is derived or where there is none." }),
    derivedDefault: z
      .string()
      .nullable()
      .openapi({ description: "In words, where the default follows from the array." }),
    minimum: z
      .number()
      .nullable()
      .openapi({ description: `Unit: ${VaryingUnit}.` }),
    exclusiveMinimum: z
      .number()
      .nullable()
      .openapi({ description: `Must be above this. Unit: ${VaryingUnit}.` }),
    maximum: z
      .number()
      .nullable()
      .openapi({ description: `Unit: ${VaryingUnit}.` }),
    integer: z.boolean().openapi({ description: "True where only whole numbers will do." }),
    choices: z.array(z.string()).nullable(),
    usual: RangeSchema.nullable(),
    source: z.string().openapi({ description: "Where default and usual range come from." }),
  })
  .openapi("RuleParameter", { description: "One setting of a rule." });

/** The answer of GET /v1/rules. */
export const RuleCatalogueSchema = z
  .object({
    rules: z.array(
      z
        .object({
          kind: z.string(),
          title: z.string(),
          description: z.string(),
          interrupts: z
            .string()
            .openapi({ description: "What interrupts the power: nothing, open-circuit, short-circuit or sweep." }),
          sources: z.array(z.string()),
          parameters: z.array(ParameterSchema),
        })
        .openapi("RuleDescription", { description: "One tracking rule." }),
    ),
  })
  .openapi("RuleCatalogue", { description: "Every tracking rule with its parameters." });
