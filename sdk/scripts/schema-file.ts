import type { OpenAPI3 } from "openapi-typescript";
import openapiTS, { astToString } from "openapi-typescript";
import ts from "typescript";
import type { ApiDocument, Node } from "./api-document.ts";

const SENT = "x-kneegap-sent-column";

/**
 * The body of `schema.ts`: the document's types by openapi-typescript, with `Column` in the place of the array schemas in
 * `sentColumns`. Marks those schemas in `document` on the way, since the type generator works on a copy.
 */
export async function schemaFile(document: ApiDocument, sentColumns: ReadonlySet<Node>): Promise<string> {
  for (const column of sentColumns) (column as Record<string, unknown>)[SENT] = true;
  const nodes = await openapiTS(document as unknown as OpenAPI3, {
    alphabetize: true,
    defaultNonNullable: false,
    rootTypes: true,
    rootTypesNoSchemaPrefix: true,
    silent: true,
    transform: (schema) => (SENT in schema ? columnType(schema.type) : undefined),
  });
  const used = sentColumns.size > 0 ? 'import type { Column } from "../columns.ts";\n\n' : "";
  return used + astToString(nodes);
}

function columnType(type: unknown): ts.TypeNode {
  const column = ts.factory.createTypeReferenceNode("Column");
  if (![type].flat().includes("null")) return column;
  return ts.factory.createUnionTypeNode([column, ts.factory.createLiteralTypeNode(ts.factory.createNull())]);
}
