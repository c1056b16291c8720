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
  return at;
}

/** The alternatives of a union that no member tells apart (a number or a column, a word or an object); else none. */
function alternativesOf(schema: z.ZodType | undefined): readonly z.ZodType[] {
  return schema instanceof z.ZodUnion && !(schema instanceof z.ZodDiscriminatedUnion)
    ? (schema.options as z.ZodType[])
    : [];
}

/** Of alternatives the object where the value is one, else the first; any other schema itself. */
function chosen(schema: z.ZodType, value: unknown): z.ZodType {
  const alternatives = alternativesOf(schema);
  if (alternatives.length === 0) return schema;
  const isObject = typeof value === "object" && value !== null && !Array.isArray(value);
  return alternatives.find((option) => option instanceof z.ZodObject === isObject) ?? alternatives[0];
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

/** What a path of `value` meets, unions on the way chosen by what stands there; undefined where nothing does. */
function reach(schema: z.ZodType, path: Path, value: unknown): z.ZodType | undefined {
  let at: z.ZodType | undefined = bare(schema);
  for (const [depth, step] of path.entries()) {
    const here = valueAt(value, path.slice(0, depth));
    at = chosen(at, here);
    if (at instanceof z.ZodDiscriminatedUnion) at = optionFor(at, here);
    if (at instanceof z.ZodObject) at = at.shape[String(step)] as z.ZodType | undefined;
    else if (at instanceof z.ZodArray) at = at.element as z.ZodType;
    else return undefined;
    if (at === undefined) return undefined;
    at = bare(at);
  }
  return at;
}

/** The schema that a path of `value` meets, wrappers taken off, one of alternatives chosen; undefined where none does. */
export function schemaAt(schema: z.ZodType, path: Path, value: unknown): z.ZodType | undefined {
  const at = reach(schema, path, value);
  return at === undefined ? undefined : chosen(at, valueAt(value, path));
}

/** The alternatives at a path of `value`; none where there is no choice. */
export function alternativesAt(schema: z.ZodType, path: Path, value: unknown): readonly z.ZodType[] {
  return alternativesOf(reach(schema, path, value));
}

/** The kinds of a discriminated union at a path of `value` that know a member. */
export function kindsWith(member: string, schema: z.ZodType, path: Path, value: unknown): string[] {
  const at = schemaAt(schema, path, value);
  if (!(at instanceof z.ZodDiscriminatedUnion)) return [];
  return kindsOf(at).filter((_kind, index) => Object.hasOwn((at.options[index] as z.ZodObject).shape, member));
}

/** The members that may stand in the object at a path of `value`. */
export function membersAt(schema: z.ZodType, path: Path, value: unknown): string[] {
  let at = schemaAt(schema, path, value);
  if (at instanceof z.ZodDiscriminatedUnion) at = optionFor(at, valueAt(value, path));
  return at instanceof z.ZodObject ? Object.keys(at.shape) : [];
}
