import { writeFileSync } from "node:fs";
import { arch, cpus } from "node:os";
import { costAgainstLength, maximumPowerAgainstC, maximumPowerAgainstNumpy, steppingAgainstC } from "./kernels.ts";
import type { Row } from "./measure.ts";
import { describeRow } from "./measure.ts";
import { measurePortfolios } from "./portfolio.ts";
import { estimateAgainstAnalyst, horizontalAgainstPlane } from "./service.ts";

const PARTS: (() => Row[] | Promise<Row[]>)[] = [
  maximumPowerAgainstC,
  maximumPowerAgainstNumpy,
  steppingAgainstC,
  estimateAgainstAnalyst,
  costAgainstLength,
  horizontalAgainstPlane,
];

/** Prints the table of ratios; `--json` the figures; `--save` refreshes RESULTS.md beside this file; `--portfolio` measures portfolios instead. Never fails on a time. */
async function main(): Promise<void> {
  if (process.argv.includes("--portfolio")) return measurePortfolios();
  const rows: Row[] = [];
  const lines = [
    "| # | work | peer | goal | ours / peer (median, spread) | ours (median) |",
    "|---|---|---|---|---|---|",
  ];
  for (const part of PARTS) {
    for (const row of await part()) {
      rows.push(row);
      lines.push(describeRow(row));
    }
  }
  const machine = `${new Date().toISOString().slice(0, 10)}, Node ${process.version}, ${cpus().length} cores, ${arch()}`;
  if (process.argv.includes("--json")) process.stdout.write(`${JSON.stringify(rows)}\n`);
  else process.stdout.write(`${machine}\n${lines.join("\n")}\n`);
  if (!process.argv.includes("--save")) return;
  const text = `# Speed\n\nRatios measured side by side in one run, ours and the peer in turn; \`npm run bench -- --save\` refreshes this page.\n\n${machine}\n\n${lines.join("\n")}\n`;
  writeFileSync(new URL("RESULTS.md", import.meta.url), text);
}

await main();
