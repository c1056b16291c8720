import { mkdir, readFile, writeFile } from "node:fs/promises";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import { parseArgs } from "node:util";
import type { ApiDocument } from "./api-document.ts";
import { generateFiles } from "./generate-files.ts";

const { values } = parseArgs({
  options: {
    check: { type: "boolean", default: false },
    document: { type: "string", default: fileURLToPath(new URL("../../openapi/openapi.json", import.meta.url)) },
    out: { type: "string", default: fileURLToPath(new URL("../src/generated", import.meta.url)) },
  },
});

const files = await generateFiles(JSON.parse(await readFile(values.document, "utf8")) as ApiDocument);
if (values.check) await check(values.out, files);
else await write(values.out, files);

async function write(directory: string, texts: ReadonlyMap<string, string>): Promise<void> {
  await mkdir(directory, { recursive: true });
  for (const [name, text] of texts) await writeFile(join(directory, name), text);
  process.stdout.write(`wrote ${[...texts.keys()].join(", ")}\n`);
}

/** Fails, naming them, when files differ from what the document gives. */
async function check(directory: string, texts: ReadonlyMap<string, string>): Promise<void> {
  const stale: string[] = [];
  for (const [name, text] of texts) {
    const present = await readFile(join(directory, name), "utf8").catch(() => null);
    if (present !== text) stale.push(name);
  }
  if (stale.length === 0) return;
  process.stderr.write(`out of date with the API document: ${stale.join(", ")}; run the generate script of the sdk\n`);
  process.exitCode = 1;
}
