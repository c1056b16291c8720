import { z } from "@hono/zod-openapi";

/** A path into a value: member names and indices. */
export type Path = readonly PropertyKey[];

/** A path as JSON pointer (RFC 6901). */
export function pointerOf(path: Path): string {
  return path.map((step) => `/${String(step).replaceAll("~", "~0").replaceAll("/", "~1")}`).join("");
}

/** What stands at a path of a value; undefined where nothing does. */
export function valueAt(value: unknown, path: Path): unknown {
  let at = value;
  for (const step of path) {
    if (typeof at !== "object" || at === null || !Object.hasOwn(at, step)) return undefined;
    at = (at as Record<PropertyKey, unknown>)[step];
  }
  return at;
}

/** A schema without the wrappers that make it optional, nullable or give it a default. */
function bare(schema: z.ZodType): z.ZodType {
  let at = schema;
  while (at instanceof z.ZodOptional || at instanceof z.ZodNullable || at instanceof z.ZodDefault) {
    at = at.unwrap() as z.ZodType;
  }
  // A number or a column: what is asked of it here is asked of the number.
  return at instanceof z.ZodUnion && !(at instanceof z.ZodDiscriminatedUnion) ? (at.options[0] as z.ZodType) : at;
}

/** The kinds a discriminated union knows; none for any other schema. */
export function kindsOf(schema: z.ZodType | undefined): string[] {
  if (!(schema instanceof z.ZodDiscriminatedUnion)) return [];
  return (schema.options as z.ZodObject[]).map((option) => String((option.shape["kind"] as z.ZodLiteral).value));
}

function optionFor(schema: z.ZodDiscriminatedUnion, value: unknown): z.ZodType | undefined {
  const index = kindsOf(schema).indexOf(String(valueAt(value, ["kind"])));
  return schema.options[index] as z.ZodType | undefined;
}

/** The schema that a path of `value` meets, wrappers taken off and unions chosen by `kind`; undefined where none does. */
export function schemaAt(schema: z.ZodType, path: Path, value: unknown): z.ZodType | undefined {
  let at: z.ZodType | undefined = bare(schema);
  for (const [depth, step] of path.entries()) {
    if (at instanceof z.ZodDiscriminatedUnion) at = optionFor(at, valueAt(value, path.slice(0, depth)));
    if (at instanceof z.ZodObject) at = at.shape[String(step)] as z.ZodType | undefined;
    else if (at instanceof z.ZodArray) at = at.element as z.ZodType;
    else return undefined;
    if (at === undefined) return undefined;
    at = bare(at);
  }
  return at;
}

/** The members that may stand in the object at a path of `value`. */
export function membersAt(schema: z.ZodType, path: Path, value: unknown): string[] {
  let at = schemaAt(schema, path, value);
  if (at instanceof z.ZodDiscriminatedUnion) at = optionFor(at, valueAt(value, path));
  return at instanceof z.ZodObject ? Object.keys(at.shape) : [];
}
