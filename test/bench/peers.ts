import { execFileSync } from "node:child_process";
import { existsSync, mkdtempSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";

const FOLDER = new URL("../../../shared/peers/", import.meta.url).pathname;
let built: string | null = null;

/** Compiles a C peer once; null where there is no compiler or no source. */
export function buildPeer(name: string): string | null {
  const source = join(FOLDER, `${name}.c`);
  if (!existsSync(source)) return null;
  built ??= mkdtempSync(join(tmpdir(), "kneegap-peers-"));
  const binary = join(built, name);
  try {
    execFileSync("gcc", ["-O3", "-march=native", "-o", binary, source, "-lm"], { stdio: "ignore" });
    return binary;
  } catch {
    return null;
  }
}

/** What a peer prints, as numbers. */
export function runPeer(binary: string, ...args: string[]): number[] {
  return execFileSync(binary, args, { encoding: "utf8" }).trim().split(/\s+/).map(Number);
}

/** The Python peer, where an interpreter with numpy and scipy is present; null elsewhere. */
export function pythonPeer(): string | null {
  const script = join(FOLDER, "analyst.py");
  if (!existsSync(script)) return null;
  try {
    execFileSync("python3", ["-c", "import numpy, scipy.special"], { stdio: "ignore" });
    return script;
  } catch {
    return null;
  }
}

/** Milliseconds the Python peer took to read, compute and write. */
export function runPython(script: string, climate: string, result: string, method: string): number[] {
  return execFileSync("python3", [script, climate, result, method], { encoding: "utf8" })
    .trim()
    .split(/\s+/)
    .map(Number);
}
