/** The body of `models.ts`: every schema of the document by its name, so that none is left out of the package's exports. */
export function modelsFile(schemas: string): string {
  const names = [...schemas.matchAll(/^export type (\w+) = components\['schemas'\]/gm)].map(([, name]) => name);
  return `export type {\n${names.map((name) => `  ${name},\n`).join("")}} from "./schema.ts";\n`;
}
