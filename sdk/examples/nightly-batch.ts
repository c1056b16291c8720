// Every climate file of a folder as a site, by night: results go to a file of lines as they come, and a run that was
// stopped goes on where it was.
//
//   npx tsx sdk/examples/nightly-batch.ts http://127.0.0.1:8080 climates results.ndjson

import { createReadStream } from "node:fs";
import type { FileHandle } from "node:fs/promises";
import { open, readdir } from "node:fs/promises";
import { basename, join } from "node:path";
import { fileURLToPath } from "node:url";
import type { PortfolioLine, PortfolioSiteRequest } from "@kneegap/sdk";
import { ClimateFileError, Kneegap, KneegapError, readClimate } from "@kneegap/sdk";
import { progressLine } from "./progress-line.ts";
import { CANDIDATES, MODULE } from "./saltmarsh-ferries.ts";

/** What a night came to. */
export interface Night {
  /** Sites with a result in the file from an earlier run. */
  readonly before: number;
  readonly answered: number;
  /** Sites that the service refused, and files that could not be read; the next run tries them again. */
  readonly refused: number;
}

/** A file that could not be read, and where and why. */
interface FileProblem extends Pick<ClimateFileError, "line" | "column" | "reason"> {
  readonly kind: "file-problem";
  readonly id: string;
}

type DoneLine = PortfolioLine | FileProblem;

/** How a night is run. */
export interface NightOptions {
  readonly signal?: AbortSignal;
  /** Called whenever a site is done; `done` and `total` count those of earlier runs too. */
  readonly onProgress?: (done: number, total: number) => void;
}

/**
 * Sends each `*.csv` of `folder` that has no result in `resultFile` yet as a site by the file's name, and appends a line
 * for each: `result`, `site-problem`, or `file-problem` where the file cannot be read. However the run ends, the file
 * holds whole lines of what was done.
 */
export async function runNight(
  client: Kneegap,
  folder: string,
  resultFile: string,
  { signal, onProgress = () => {} }: NightOptions = {},
): Promise<Night> {
  const files = (await readdir(folder)).filter((name) => name.endsWith(".csv")).sort();
  const results = await open(resultFile, "a+");
  try {
    const done = await resume(results);
    const left = files.filter((name) => !done.has(siteOf(name)));
    const counts = { before: files.length - left.length, answered: 0, refused: 0 };
    let written = Promise.resolve();
    // Results and faulty files come from two sides; one line is to be whole before the next begins.
    const write = (line: DoneLine) => {
      written = written.then(async () => {
        await results.appendFile(`${JSON.stringify(line)}\n`);
        counts[line.kind === "result" ? "answered" : "refused"] += 1;
        onProgress(counts.before + counts.answered + counts.refused, files.length);
      });
      return written;
    };
    const sites = readSites(folder, left, write);
    const shared = { module: MODULE, candidates: CANDIDATES, array: { modulesInSeries: 3, stringsInParallel: 1 } };
    for await (const line of client.portfolio(sites, { defaults: shared, signal })) await write(line);
    return counts;
  } finally {
    await results.close();
  }
}

/** One file after the other, only as fast as the portfolio asks for them. */
async function* readSites(
  folder: string,
  files: readonly string[],
  write: (line: DoneLine) => Promise<void>,
): AsyncGenerator<PortfolioSiteRequest> {
  for (const file of files) {
    const id = siteOf(file);
    try {
      yield { id, climate: await readClimate(createReadStream(join(folder, file))) };
    } catch (error) {
      if (!(error instanceof ClimateFileError)) throw error;
      const { line, column, reason } = error;
      await write({ kind: "file-problem", id, line, column, reason });
    }
  }
}

/** The sites with a result in the file; a last line that was cut when a run was stopped is taken off. */
async function resume(results: FileHandle): Promise<Set<string>> {
  const done = new Set<string>();
  let whole = 0;
  const { size } = await results.stat();
  for await (const text of results.readLines({ start: 0, autoClose: false })) {
    const end = whole + Buffer.byteLength(text) + 1;
    if (end > size) break;
    whole = end;
    const { kind, id } = JSON.parse(text) as DoneLine;
    if (kind === "result") done.add(id);
  }
  await results.truncate(whole);
  return done;
}

function siteOf(file: string): string {
  return basename(file, ".csv");
}

async function main(baseUrl: string, folder: string, resultFile: string): Promise<void> {
  const client = new Kneegap({ baseUrl, apiKey: process.env["KNEEGAP_API_KEY"] });
  const controller = new AbortController();
  process.once("SIGINT", () => controller.abort());
  const onProgress = progressLine(process.stderr);
  try {
    const night = await runNight(client, folder, resultFile, { signal: controller.signal, onProgress });
    process.stdout.write(`${JSON.stringify(night)}\n`);
  } catch (error) {
    if (!(error instanceof KneegapError)) throw error;
    process.stderr.write(`\n${error.message} What was done is in ${resultFile}; run this again to go on.\n`);
    process.exitCode = 1;
  } finally {
    await client.close();
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const [baseUrl = "http://127.0.0.1:8080", folder = "climates", resultFile = "results.ndjson"] = process.argv.slice(2);
  await main(baseUrl, folder, resultFile);
}
