import type { ApiDocument, Node } from "./api-document.ts";
import { resolve } from "./api-document.ts";

/** A body's media type and its schema, unresolved. */
export interface Content {
  readonly mediaType: string;
  readonly schema: unknown;
}

/** One operation of the document. */
export interface OperationEntry {
  readonly operationId: string;
  readonly method: string;
  readonly path: string;
  readonly summary: string;
  readonly description: string;
  readonly request: Content | null;
  readonly successes: readonly number[];
  readonly response: Content | null;
  /** The schemas of every answer, errors too. */
  readonly responseSchemas: readonly unknown[];
}

const LINES = "application/x-ndjson";
const METHODS = new Set(["get", "post", "put", "patch", "delete"]);
const NOT_METHODS = new Set(["summary", "description", "servers", "parameters"]);
const TAKEN_NAMES = new Set(["close", "constructor"]);

/**
 * Every operation of the document by ascending operationId. Throws Error, naming the operation, for what the SDK cannot
 * speak or name: no operationId, summary or description, an id that is no method name or comes twice, parameters other
 * than header fields, several media types, an optional body, no success status. Nothing is ever left out silently.
 */
export function listOperations(document: ApiDocument): OperationEntry[] {
  const entries: OperationEntry[] = [];
  for (const [path, item] of Object.entries(document.paths)) {
    for (const [method, operation] of Object.entries(item)) {
      if (NOT_METHODS.has(method) || method.startsWith("x-")) continue;
      const place = `${method.toUpperCase()} ${path}`;
      if (!METHODS.has(method)) throw new Error(`${place}: the SDK does not speak this`);
      refuseParameters(document, [item.parameters, (operation as Node).parameters], place);
      entries.push(readOperation(document, operation as Node, place));
    }
  }
  entries.sort((a, b) => (a.operationId < b.operationId ? -1 : 1));
  const twice = entries.find((entry, index) => entry.operationId === entries[index + 1]?.operationId);
  if (twice !== undefined) throw new Error(`the operationId ${twice.operationId} comes twice`);
  return entries;
}

/** Whether an operation's request is lines of JSON: too much for one value, so that a thin generated method would not do. */
export function takesLines({ request }: OperationEntry): boolean {
  return request?.mediaType === LINES;
}

function readOperation(document: ApiDocument, operation: Node, place: string): OperationEntry {
  const [method, path] = place.split(" ");
  const operationId = text(operation, "operationId", place);
  if (!/^[a-z][A-Za-z0-9]*$/.test(operationId) || TAKEN_NAMES.has(operationId)) {
    throw new Error(`${place}: ${operationId} cannot be a method's name`);
  }
  const responses = Object.entries(operation.responses ?? {}).map(
    ([status, value]) => [status, contentsOf(resolve(document, value))] as const,
  );
  const successes = responses.filter(([status]) => /^2\d\d$/.test(status));
  if (successes.length === 0) throw new Error(`${place}: no success status`);
  return {
    operationId,
    method,
    path,
    summary: text(operation, "summary", place),
    description: text(operation, "description", place),
    request: readRequest(document, operation.requestBody, place),
    successes: successes.map(([status]) => Number(status)),
    response: single(
      successes.flatMap(([, contents]) => contents),
      place,
    ),
    responseSchemas: responses.flatMap(([, contents]) => contents.map((content) => content.schema)),
  };
}

function readRequest(document: ApiDocument, requestBody: unknown, place: string): Content | null {
  if (requestBody === undefined) return null;
  const body = resolve(document, requestBody);
  if (body.required !== true) throw new Error(`${place}: its request body is not required`);
  return single(contentsOf(body), place);
}

function contentsOf(body: Node): Content[] {
  return Object.entries((body.content ?? {}) as Record<string, Node>).map(([mediaType, media]) => ({
    mediaType,
    schema: media.schema ?? {},
  }));
}

function single(contents: readonly Content[], place: string): Content | null {
  const [first, ...others] = contents;
  if (others.some((other) => JSON.stringify(other) !== JSON.stringify(first))) {
    throw new Error(`${place}: more than one media type or schema for a body`);
  }
  return first ?? null;
}

function text(operation: Node, name: string, place: string): string {
  const value = operation[name];
  if (typeof value === "string" && value.trim() !== "") return value.trim();
  throw new Error(`${place}: no ${name}`);
}

/** Header fields are the transport's business. */
function refuseParameters(document: ApiDocument, lists: readonly unknown[], place: string): void {
  for (const parameter of lists.flat()) {
    if (parameter === undefined) continue;
    const { name, in: where } = resolve(document, parameter);
    if (where !== "header") throw new Error(`${place}: the SDK does not speak the ${where} parameter ${name}`);
  }
}
