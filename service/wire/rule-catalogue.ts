import { RULES } from "../core/rules/index.ts";
import type { Parameter, RuleDefinition } from "../core/rules/rule.ts";

/** The rule table as plain data, in its own order: the answer of GET /v1/rules. */
export function ruleCatalogue() {
  const rules = RULES as unknown as readonly RuleDefinition[];
  return {
    rules: rules.map(({ kind, title, description, interrupts, sources, parameters }) => ({
      kind,
      title,
      description,
      interrupts,
      sources: [...sources],
      parameters: Object.entries(parameters).map(([name, parameter]) => entryOf(name, parameter)),
    })),
  };
}

function entryOf(name: string, parameter: Parameter) {
  const numeric = parameter.type === "number" || parameter.type === "series" ? parameter : null;
  const number = parameter.type === "number" ? parameter : null;
  const given = parameter.type === "series" ? null : parameter.default;
  const derived = typeof given === "object" ? given : null;
  return {
    name,
    type: parameter.type,
    unit: numeric?.unit ?? null,
    description: parameter.description,
    required: parameter.type === "series",
    default: derived === null ? (given as number | boolean | string | null) : null,
    derivedDefault: derived?.as ?? null,
    minimum: numeric?.minimum ?? null,
    exclusiveMinimum: number?.exclusiveMinimum ?? null,
    maximum: numeric?.maximum ?? null,
    integer: number?.integer ?? false,
    choices: parameter.type === "choice" ? [...parameter.choices] : null,
    usual: number?.usual === undefined ? null : { from: number.usual[0], to: number.usual[1] },
    source: parameter.source,
  };
}
