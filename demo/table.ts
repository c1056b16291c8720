import type { ComparisonAnswer } from "@kneegap/sdk";
import { BETTER, CANDIDATES } from "./compare-stage.ts";
import type { LandingStage } from "./landing-stages.ts";

/** One landing stage and its answer. */
export interface StageAnswer {
  stage: LandingStage;
  answer: ComparisonAnswer;
}

const CAUSE_WORDS: Record<string, string> = {
  voltageWindow: "voltage window",
  wrongPeak: "wrong peak",
  setPoint: "set point",
  heldSample: "held sample",
  regulation: "regulation",
  interruption: "interruption",
};

/** The table: a row a landing stage; available energy and what each rule loses, kWh a year; the largest cause. */
export function table(rows: readonly StageAnswer[]): string {
  const head = ["landing stage", "feeds", "available", ...CANDIDATES.map(({ label }) => label), "largest cause"];
  const body = rows.map(({ stage, answer }) => [
    stage.name,
    stage.feeds,
    answer.results[0].energy.available.toFixed(0),
    ...answer.results.map(({ energy }) => `${energy.lost.toFixed(1)} (${percent(energy.lostFraction)})`),
    largestCause(answer),
  ]);
  const widths = head.map((cell, k) => Math.max(cell.length, ...body.map((row) => row[k].length)));
  const line = (cells: string[]): string =>
    cells
      .map((cell, k) => (k < 2 || k === cells.length - 1 ? cell.padEnd(widths[k]) : cell.padStart(widths[k])))
      .join("  ")
      .trimEnd();
  return [line(head), widths.map((width) => "-".repeat(width)).join("  "), ...body.map(line)].join("\n");
}

/** Where the better converter is worth most, in words: the gain over the weakest fixed rule, best first. */
export function worth(rows: readonly StageAnswer[], count: number): string {
  const gains = rows.map(({ stage, answer }) => {
    const better = answer.results.find(({ label }) => label === BETTER)!;
    return { name: stage.name, gain: better.differenceToBaseline, worth: better.worthPerYear };
  });
  return gains
    .sort((a, b) => b.gain - a.gain)
    .slice(0, count)
    .map(
      ({ name, gain, worth }) =>
        `${name}: ${gain.toFixed(1)} kWh a year${worth === null ? "" : `, ${worth.toFixed(2)} EUR`}`,
    )
    .join("\n");
}

function percent(fraction: number | null): string {
  return fraction === null ? "-" : `${(100 * fraction).toFixed(1)} %`;
}

/** The largest cause of the rule that loses most. */
function largestCause(answer: ComparisonAnswer): string {
  const worst = answer.results.reduce((a, b) => (b.energy.lost > a.energy.lost ? b : a));
  const [cause] = Object.entries(worst.lostByCause).reduce((a, b) => (b[1] > a[1] ? b : a));
  return `${CAUSE_WORDS[cause]} (${worst.label})`;
}
