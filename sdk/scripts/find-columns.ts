import type { ApiDocument, Node } from "./api-document.ts";
import { resolve } from "./api-document.ts";
import type { OperationEntry } from "./list-operations.ts";

/** Where one operation's columns are. */
export interface OperationColumns {
  /** Whether a schema with columns is used by the request and by an answer alike, so that its type is the received one. */
  readonly sharedWithAnswers: boolean;
  /** The places of the columns of a success. */
  readonly received: readonly (readonly string[])[];
}

/** The columns of a document: arrays whose items are numbers or null. */
export interface Columns {
  /** The array schemas met in requests alone. */
  readonly sent: ReadonlySet<Node>;
  readonly byOperation: ReadonlyMap<string, OperationColumns>;
}

/**
 * Finds the columns that `operations` send and receive. Throws Error for a schema marked `x-column` that is no array of
 * numbers, for an answer that contains itself, and for a place that holds a column in one variant and another array in the next.
 */
export function findColumns(document: ApiDocument, operations: readonly OperationEntry[]): Columns {
  const received = new Set<Node>();
  for (const { responseSchemas } of operations)
    for (const schema of responseSchemas) collect(document, schema, received);
  const sent = new Set<Node>();
  const byOperation = new Map<string, OperationColumns>();
  for (const { operationId, request, response } of operations) {
    const reached = new Set<Node>();
    if (request !== null) collect(document, request.schema, reached);
    const columns = [...reached].filter((schema) => isColumn(document, schema));
    for (const column of columns) if (!received.has(column)) sent.add(column);
    byOperation.set(operationId, {
      sharedWithAnswers: columns.some((column) => received.has(column)),
      received: response === null ? [] : columnPaths(document, response.schema),
    });
  }
  return { sent, byOperation };
}

/** Every schema that `schema` reaches, each once. */
function collect(document: ApiDocument, schema: unknown, reached: Set<Node>): void {
  const node = resolve(document, schema);
  if (reached.has(node)) return;
  reached.add(node);
  for (const [, child] of children(document, node)) collect(document, child, reached);
}

function columnPaths(document: ApiDocument, schema: unknown): string[][] {
  const columns = new Map<string, string[]>();
  const others = new Set<string>();
  const walk = (value: unknown, path: string[], above: readonly Node[]): void => {
    const node = resolve(document, value);
    const place = JSON.stringify(path);
    if (above.includes(node)) throw new Error(`the answer's schema contains itself at ${place}`);
    if (isColumn(document, node)) columns.set(place, path);
    else if (typeNames(node).includes("array")) others.add(place);
    for (const [step, child] of children(document, node)) {
      walk(child, step === null ? path : [...path, step], [...above, node]);
    }
  };
  walk(schema, [], []);
  for (const place of columns.keys()) {
    if (others.has(place)) throw new Error(`${place} is a column in one variant and another array in the next`);
  }
  return [...columns.values()];
}

/** The schemas directly below, with the step that leads there: a member's name, "*" for elements and unnamed members, null for a variant of the same value. Tuples are left out: their types stay as they are. */
function children(document: ApiDocument, node: Node): [string | null, unknown][] {
  const below: [string | null, unknown][] = Object.entries((node.properties ?? {}) as Node);
  const many = [node.items, node.additionalProperties, ...Object.values((node.patternProperties ?? {}) as Node)];
  if (node.prefixItems === undefined) {
    for (const child of many) if (typeof child === "object" && child !== null) below.push(["*", child]);
  }
  for (const key of ["allOf", "anyOf", "oneOf"]) {
    for (const child of (node[key] ?? []) as unknown[]) below.push([null, child]);
  }
  const lines = node["x-line-schema"];
  if (typeof lines === "string") below.push([null, resolve(document, lineSchema(lines))]);
  return below;
}

/** The schema of one line of an NDJSON body: a component's name or a reference to it. */
function lineSchema(name: string): Node {
  return { $ref: name.startsWith("#/") ? name : `#/components/schemas/${name}` };
}

function isColumn(document: ApiDocument, node: Node): boolean {
  const column = typeNames(node).includes("array") && node.prefixItems === undefined && isNumeric(document, node.items);
  if (node["x-column"] === true && !column)
    throw new Error(`marked x-column, but no array of numbers: ${JSON.stringify(node)}`);
  return column;
}

/** Whether a schema admits numbers, and nothing but numbers and null. */
function isNumeric(document: ApiDocument, schema: unknown): boolean {
  if (schema === undefined || typeof schema === "boolean") return false;
  const kinds = valueKinds(document, resolve(document, schema));
  return kinds.includes("number") && kinds.every((kind) => kind === "number" || kind === "null");
}

function valueKinds(document: ApiDocument, node: Node): string[] {
  const values = "const" in node ? [node.const] : (node.enum as unknown[] | undefined);
  if (values !== undefined) return values.map((value) => (value === null ? "null" : typeof value));
  const variants = (node.anyOf ?? node.oneOf) as unknown[] | undefined;
  if (variants !== undefined) return variants.flatMap((variant) => valueKinds(document, resolve(document, variant)));
  const types = typeNames(node);
  return types.length === 0 ? ["anything"] : types.map((type) => (type === "integer" ? "number" : type));
}

function typeNames(node: Node): string[] {
  return [node.type ?? []].flat() as string[];
}
