import type { ApiDocument } from "./api-document.ts";
import { clientFile } from "./client-file.ts";
import { findColumns } from "./find-columns.ts";
import { listOperations } from "./list-operations.ts";
import { modelsFile } from "./models-file.ts";
import { operationsFile } from "./operations-file.ts";
import { schemaFile } from "./schema-file.ts";

const FIRST_LINE = "// generated from openapi/openapi.json by sdk/scripts/generate.ts: do not edit\n";

/**
 * The generated files, name to text, of an OpenAPI 3.1 document, which is left as it is. The same document gives the same
 * text. Throws Error for what the SDK cannot speak, see {@link listOperations} and {@link findColumns}.
 */
export async function generateFiles(document: ApiDocument): Promise<Map<string, string>> {
  // Not structuredClone: it would keep one object used in two places one, and a column is told by its object.
  const copy = JSON.parse(JSON.stringify(document)) as ApiDocument;
  const operations = listOperations(copy);
  const columns = findColumns(copy, operations);
  const schemas = await schemaFile(copy, columns.sent);
  return new Map([
    ["models.ts", FIRST_LINE + modelsFile(schemas)],
    ["schema.ts", FIRST_LINE + schemas],
    ["operations.ts", FIRST_LINE + operationsFile(operations, columns)],
    ["client.ts", FIRST_LINE + clientFile(operations, columns, schemas)],
  ]);
}
