import { isJson, isText } from "../src/media-type.ts";
import type { Columns } from "./find-columns.ts";
import type { Content, OperationEntry } from "./list-operations.ts";
import { takesLines } from "./list-operations.ts";

const WIDTH = 112;

/** The body of `client.ts`: a class with one documented method for each operation but those that take lines, see {@link takesLines}. `schemas` is the text of `schema.ts`, where the types' names are looked up. */
export function clientFile(operations: readonly OperationEntry[], columns: Columns, schemas: string): string {
  const names = new Set<string>();
  const typeOf = (operation: OperationEntry, side: "requestBody" | "response", content: Content): string => {
    const name = rootType(content.schema, schemas) ?? "operations";
    names.add(name);
    return name === "operations" ? inlineType(operation, side, content) : name;
  };
  const thin = operations.filter((operation) => !takesLines(operation));
  const methods = thin.map((operation) => method(operation, columns, typeOf)).join("\n\n");
  const columnTypes = ["ColumnKind", "Received", "Sent"].filter(
    (name) => name === "ColumnKind" || methods.includes(`${name}<`),
  );
  return `import type { ${columnTypes.join(", ")} } from "../columns.ts";
import type { CallOptions, RequestFunction } from "../operation.ts";
import { operationTable } from "./operations.ts";
import type { ${[...names].sort().join(", ")} } from "./schema.ts";

/** The operations of the service, one method each; those that take lines are in \`kneegap.ts\`. \`C\` says how columns arrive. */
export class Operations<C extends ColumnKind> {
  readonly #request: RequestFunction;

  constructor(request: RequestFunction) {
    this.#request = request;
  }

${methods}
}
`;
}

type TypeOf = (operation: OperationEntry, side: "requestBody" | "response", content: Content) => string;

function method(operation: OperationEntry, columns: Columns, typeOf: TypeOf): string {
  const { operationId, request, response } = operation;
  const answer = answerType(operation, response, typeOf);
  const shared = columns.byOperation.get(operationId)?.sharedWithAnswers === true;
  const parameters = ["options?: CallOptions"];
  if (request !== null) {
    const type = isJson(request.mediaType) ? typeOf(operation, "requestBody", request) : "string | Uint8Array";
    parameters.unshift(`request: ${shared && isJson(request.mediaType) ? `Sent<${type}>` : type}`);
  }
  const body = request === null ? "undefined" : "request";
  return `${comment(operation)}
  ${operationId}(${parameters.join(", ")}): Promise<${answer}> {
    return this.#request(operationTable.${operationId}, ${body}, options) as Promise<${answer}>;
  }`;
}

function answerType(operation: OperationEntry, response: Content | null, typeOf: TypeOf): string {
  if (response === null) return "void";
  if (isJson(response.mediaType)) return `Received<${typeOf(operation, "response", response)}, C>`;
  return isText(response.mediaType) ? "string" : "Uint8Array";
}

/** The name under which the type generator exports a component's schema, when it has one. */
function rootType(schema: unknown, schemas: string): string | null {
  const reference = (schema as { $ref?: string }).$ref ?? "";
  const name = /^#\/components\/schemas\/([A-Za-z_$][\w$]*)$/.exec(reference)?.[1];
  return name !== undefined && schemas.includes(`export type ${name} = `) ? name : null;
}

function inlineType(
  { operationId, successes }: OperationEntry,
  side: "requestBody" | "response",
  content: Content,
): string {
  const place = side === "requestBody" ? `["requestBody"]` : `["responses"][${successes[0]}]`;
  return `operations[${JSON.stringify(operationId)}]${place}["content"][${JSON.stringify(content.mediaType)}]`;
}

function comment({ summary, description, method: verb, path }: OperationEntry): string {
  const paragraphs = [summary, ...description.split(/\n\s*\n/), `\`${verb} ${path}\``];
  const lines = paragraphs.flatMap((paragraph, index) => [...(index === 0 ? [] : [""]), ...wrap(paragraph)]);
  return ["  /**", ...lines.map((line) => `   * ${line}`.trimEnd()), "   */"].join("\n");
}

function wrap(paragraph: string): string[] {
  const lines: string[] = [];
  for (const word of paragraph.replaceAll("*/", "*\\/").split(/\s+/)) {
    const last = lines.at(-1);
    if (last !== undefined && last.length + word.length < WIDTH) lines[lines.length - 1] = `${last} ${word}`;
    else lines.push(word);
  }
  return lines;
}
