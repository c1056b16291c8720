import type { Columns } from "./find-columns.ts";
import type { OperationEntry } from "./list-operations.ts";
import { takesLines } from "./list-operations.ts";

/** The body of `operations.ts`: the table of all operations by operationId, and the names of those whose methods are written by hand. */
export function operationsFile(operations: readonly OperationEntry[], columns: Columns): string {
  const rows = operations.map((operation) => {
    const row = {
      operationId: operation.operationId,
      method: operation.method,
      path: operation.path,
      requestMediaType: operation.request?.mediaType ?? null,
      responseMediaType: operation.response?.mediaType ?? null,
      successStatuses: operation.successes,
      columns: columns.byOperation.get(operation.operationId)?.received ?? [],
    };
    const members = Object.entries(row).map(([name, value]) => `    ${name}: ${JSON.stringify(value)},`);
    return [`  ${operation.operationId}: {`, ...members, "  },"].join("\n");
  });
  const byHand = operations.filter(takesLines).map(({ operationId }) => JSON.stringify(operationId));
  return `import type { Operation } from "../operation.ts";

/** Every operation of the API document. */
export const operationTable = {
${rows.join("\n")}
} as const satisfies Record<string, Operation>;

/** The operations that take lines. Their methods are written by hand in \`kneegap.ts\`, which does not compile without them. */
export type OperationByHand = ${byHand.join(" | ") || "never"};
`;
}
