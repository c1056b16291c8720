import { readFile, writeFile } from "node:fs/promises";
import { parseArgs } from "node:util";
import { createApp } from "../service/http/app.ts";
import { CEILINGS } from "../service/wire/limits.ts";
import { problem } from "../service/wire/problem.ts";

const FILE = new URL("openapi.json", import.meta.url);

/** The document as the service serves it, laid out to be read and compared. */
async function documentOf(): Promise<string> {
  const refuse = async () => ({ ok: false as const, problem: problem("draining", "Nothing is computed here.") });
  const app = createApp(refuse, {
    limits: CEILINGS,
    keys: [],
    state: () => "ready",
    log: { info: () => undefined, error: () => undefined },
    idleTime: 1000,
    uploadTime: 1000,
    heldBytes: 0,
    portfolio: { perform: refuse, stepsAtOnce: 1, most: 1, stallTime: 1000, silence: 1000 },
  });
  const answer = await app.request("/openapi.json");
  return `${JSON.stringify(await answer.json(), null, 2)}\n`;
}

const { values } = parseArgs({ options: { check: { type: "boolean", default: false } } });
const text = await documentOf();
if (!values.check) {
  await writeFile(FILE, text);
  process.stdout.write("wrote openapi/openapi.json\n");
} else if ((await readFile(FILE, "utf8").catch(() => "")) !== text) {
  process.stderr.write("openapi/openapi.json is not what the routes say: run npm run generate\n");
  process.exitCode = 1;
}
