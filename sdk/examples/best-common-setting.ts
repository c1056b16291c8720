// One setting for every site: the fraction of the open-circuit voltage that loses least over all of them, and what each
// site loses by not having its own.
//
//   npx tsx sdk/examples/best-common-setting.ts http://127.0.0.1:8080

import { fileURLToPath } from "node:url";
import type { TuningAnswer } from "@kneegap/sdk";
import { Kneegap, readClimate } from "@kneegap/sdk";
import type { LandingStage } from "./saltmarsh-ferries.ts";
import { climateFile, MODULE, STAGES } from "./saltmarsh-ferries.ts";

/** Tunes the fraction over landing stages, 100 at the most. */
export async function bestCommonFraction(client: Kneegap, stages: readonly LandingStage[]): Promise<TuningAnswer> {
  const sites = await Promise.all(
    stages.map(async (stage) => ({ id: stage.name, climate: await readClimate(climateFile(stage)) })),
  );
  return client.tune({
    module: MODULE,
    array: { modulesInSeries: 3, stringsInParallel: 1 },
    sites,
    rule: { kind: "fractional-open-circuit-voltage" },
    parameter: "fraction",
    range: { from: 0.7, to: 0.95 },
  });
}

/** The answer in words: the setting, then a line for each site, the one that loses most by it first. */
export function describeSetting({ parameter, today, optimum, flatRange, sites }: TuningAnswer): string {
  const range = `from ${flatRange.from.toFixed(3)} to ${flatRange.to.toFixed(3)} it hardly matters`;
  const lines = [...sites]
    .sort((a, b) => b.regret - a.regret)
    .map(
      ({ id, optimum: own, regret }) => `${id}: its own ${own.value.toFixed(4)} would save ${regret.toFixed(2)} kWh`,
    );
  return [
    `${parameter} ${optimum.value.toFixed(4)} loses ${optimum.lost.toFixed(1)} kWh; ${range}`,
    `today's ${today.value.toFixed(4)} loses ${today.lost.toFixed(1)} kWh`,
    ...lines,
  ].join("\n");
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const [baseUrl = "http://127.0.0.1:8080"] = process.argv.slice(2);
  const client = new Kneegap({ baseUrl, apiKey: process.env["KNEEGAP_API_KEY"] });
  try {
    process.stdout.write(`${describeSetting(await bestCommonFraction(client, STAGES))}\n`);
  } finally {
    await client.close();
  }
}
