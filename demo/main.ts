import { Kneegap } from "@kneegap/sdk";
import { compareStage, MODULE } from "./compare-stage.ts";
import { LANDING_STAGES } from "./landing-stages.ts";
import { startService } from "./service-process.ts";
import type { StageAnswer } from "./table.ts";
import { table, worth } from "./table.ts";

const say = (text: string): void => void process.stdout.write(`${text}\n`);

/** Starts the service, compares four rules at eleven invented landing stages through the SDK, prints, stops. */
async function demo(): Promise<void> {
  const started = performance.now();
  say("Saltmarsh Ferries, an invented cooperative: which landing stages deserve a better converter?");
  say("Eleven invented sites from a fjord to a desert lake, an invented hourly year each.\n");
  const service = await startService();
  const client = new Kneegap({ baseUrl: service.baseUrl });
  try {
    const rows: StageAnswer[] = [];
    for (const [index, stage] of LANDING_STAGES.entries()) {
      progress(`${index + 1} of ${LANDING_STAGES.length}: ${stage.name}`);
      rows.push({ stage, answer: await compareStage(client, stage, index + 1) });
    }
    progress("");
    say("Energy a year that the roof could give, and what each rule leaves of it, kWh:\n");
    say(table(rows));
    say(`\nA better converter (perturb & observe in place of constant voltage) is worth most at:\n${worth(rows, 3)}`);
    const cautions = new Map(rows.flatMap(({ answer }) => answer.cautions.map((caution) => [caution.code, caution])));
    say("\nCautions that came with the answers (each with the figures of the last site that raised it):");
    for (const { severity, detail } of cautions.values()) say(`- ${severity}: ${detail}`);
  } finally {
    await client.close();
    await service.stop();
  }
  say(
    `\nDone in ${((performance.now() - started) / 1000).toFixed(1)} s. Now try it yourself: npm start, then in another shell\n`,
  );
  say(curlLine());
}

function progress(text: string): void {
  if (process.stdout.isTTY) process.stdout.write(`\r\x1b[2K${text}`);
  else if (text !== "") say(text);
}

function curlLine(): string {
  const request = {
    module: MODULE,
    rule: { kind: "fractional-open-circuit-voltage" },
    climate: {
      start: "2025-06-01T10:00:00+01:00",
      step: 3600,
      irradiance: { kind: "plane-of-array", values: [420, 610, 780] },
      temperature: { kind: "cell", values: [31, 38, 45] },
    },
  };
  return `curl -s http://127.0.0.1:8080/v1/estimates -H 'content-type: application/json' -d '${JSON.stringify(request)}'`;
}

await demo();
