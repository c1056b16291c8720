/** The parts of an OpenAPI 3.1 document that the generator reads. */
export interface ApiDocument {
  readonly openapi: string;
  readonly info: { readonly title: string; readonly version: string };
  readonly paths: Readonly<Record<string, Readonly<Record<string, unknown>>>>;
  readonly components?: Readonly<Record<string, Readonly<Record<string, unknown>>>>;
}

/** An object of the document that may be a schema or any other thing one can refer to. */
export type Node = Readonly<Record<string, unknown>>;

/** `value` itself, or what its `$ref` names inside `document`, followed at most 32 times. Throws Error for a reference that leads nowhere or out of the document. */
export function resolve(document: ApiDocument, value: unknown): Node {
  let node = value;
  for (let step = 0; step < 32; step += 1) {
    if (typeof node !== "object" || node === null) throw new Error(`not an object: ${JSON.stringify(node)}`);
    if (!("$ref" in node)) return node as Node;
    node = follow(document, String(node.$ref));
  }
  throw new Error(`references go in a circle: ${JSON.stringify(value)}`);
}

/** RFC 6901 inside a URI fragment. */
function follow(document: ApiDocument, reference: string): unknown {
  if (!reference.startsWith("#/")) throw new Error(`${reference} points out of the document`);
  let node: unknown = document;
  for (const token of reference.slice(2).split("/")) {
    const key = decodeURIComponent(token).replaceAll("~1", "/").replaceAll("~0", "~");
    node = typeof node === "object" && node !== null ? (node as Node)[key] : undefined;
  }
  if (node === undefined) throw new Error(`${reference} leads nowhere`);
  return node;
}
