// What a better converter is worth at one site.
//
//   npx tsx sdk/examples/quote-one-site.ts http://127.0.0.1:8080 climates/Heron\ Bank.csv

import { createReadStream } from "node:fs";
import { fileURLToPath } from "node:url";
import type { ComparisonAnswer } from "@kneegap/sdk";
import { ClimateFileError, Kneegap, RequestProblemError, readClimate } from "@kneegap/sdk";
import { CANDIDATES, MODULE } from "./saltmarsh-ferries.ts";

/** Compares the candidates over the climate of a file, the first of them being what stands there today. */
export async function quoteSite(client: Kneegap, climateFile: string): Promise<ComparisonAnswer> {
  return client.compare({
    module: MODULE,
    array: { modulesInSeries: 3, stringsInParallel: 1 },
    converter: { inputVoltageRating: 150 },
    candidates: CANDIDATES,
    baseline: CANDIDATES[0].label,
    climate: await readClimate(createReadStream(climateFile)),
    energyValue: { currency: "EUR", perKilowattHour: 0.25 },
    recordLowTemperature: -18,
  });
}

/** The quote in words: a line for each candidate, then every caution. */
export function describeQuote({ results, cautions }: ComparisonAnswer): string {
  const lines = results.map(({ label, energy, lostByCause, worthPerYear, payback }) => {
    const [cause, lost] = Object.entries(lostByCause).reduce((most, next) => (next[1] > most[1] ? next : most));
    const reason = lost > 0 ? `, most of it by ${cause}` : "";
    const worth = worthPerYear === null ? "" : `, worth ${worthPerYear.toFixed(2)} EUR a year more`;
    const years = payback === null ? "" : `, paid back in ${payback.toFixed(1)} years`;
    return `${label}: loses ${energy.lost.toFixed(1)} of ${energy.available.toFixed(1)} kWh${reason}${worth}${years}`;
  });
  return [...lines, ...cautions.map(({ severity, detail }) => `${severity}: ${detail}`)].join("\n");
}

async function main(baseUrl: string, climateFile: string): Promise<void> {
  const client = new Kneegap({ baseUrl, apiKey: process.env["KNEEGAP_API_KEY"] });
  try {
    process.stdout.write(`${describeQuote(await quoteSite(client, climateFile))}\n`);
  } catch (error) {
    if (!(error instanceof ClimateFileError || error instanceof RequestProblemError)) throw error;
    process.stderr.write(`${error.message}\n`);
    process.exitCode = 1;
  } finally {
    await client.close();
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const [baseUrl = "http://127.0.0.1:8080", climateFile = "climates/Heron Bank.csv"] = process.argv.slice(2);
  await main(baseUrl, climateFile);
}
