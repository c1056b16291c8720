import { execFileSync } from "node:child_process";
import { mkdtemp, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";

const SDK = fileURLToPath(new URL("..", import.meta.url));
const COMPILER = fileURLToPath(new URL("../../node_modules/typescript/bin/tsc", import.meta.url));

const TYPED_PROGRAM = `import { Kneegap, KneegapError, type Column } from "@kneegap/sdk";
const values: Column = Float64Array.of(0, 500, Number.NaN);
const client = new Kneegap({ baseUrl: "http://127.0.0.1:9", columns: "typed" });
client.close().then(() => console.info(values.length, typeof KneegapError, "closed"));
`;
const COMPILER_OPTIONS = {
  strict: true,
  target: "ES2022",
  module: "NodeNext",
  moduleResolution: "NodeNext",
  skipLibCheck: false,
  types: [],
};

/** Installs the packed SDK in two empty projects, one ESM and one CJS, then type-checks (its declarations too, without node's) and runs a program in each. */
const packed = JSON.parse(run(SDK, "npm", ["pack", "--json", "--pack-destination", tmpdir()])) as {
  filename: string;
}[];
const archive = join(tmpdir(), packed[0].filename);
try {
  for (const type of ["module", "commonjs"] as const) await checkProject(type, archive);
} finally {
  await rm(archive, { force: true });
}

async function checkProject(type: "module" | "commonjs", tarball: string): Promise<void> {
  const project = await mkdtemp(join(tmpdir(), "kneegap-install-"));
  try {
    await writeFile(join(project, "package.json"), JSON.stringify({ name: "empty", private: true, type }));
    await writeFile(join(project, "main.ts"), TYPED_PROGRAM);
    await writeFile(join(project, "tsconfig.json"), JSON.stringify({ compilerOptions: COMPILER_OPTIONS }));
    run(project, "npm", ["install", "--no-audit", "--no-fund", "--prefer-offline", tarball]);
    run(project, process.execPath, [COMPILER]);
    const printed = run(project, process.execPath, ["main.js"]).trim();
    if (printed !== "3 function closed") throw new Error(`the ${type} project printed ${printed}`);
    process.stdout.write(`${type}: installs, type-checks and runs\n`);
  } finally {
    await rm(project, { recursive: true, force: true });
  }
}

function run(directory: string, command: string, parameters: readonly string[]): string {
  return execFileSync(command, parameters, { cwd: directory, encoding: "utf8", stdio: ["ignore", "pipe", "inherit"] });
}
