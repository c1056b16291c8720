import type { ComparisonResult } from "../../studies/comparison.ts";
import type { PortfolioSite } from "../../studies/portfolio.ts";
import type { PortfolioSummary } from "../../studies/portfolio-totals.ts";
import { VERSION } from "../version.ts";
import { jsonText } from "./byte-writer.ts";
import { encodeCaution } from "./caution.ts";

const encoder = new TextEncoder();

/** A line of NDJSON: JSON text and a line break. */
export function encodeLine(line: object): Uint8Array {
  return encoder.encode(`${jsonText(line)}\n`);
}

/** The result line of a site. */
export function encodeResultLine({ id, count, group }: PortfolioSite, comparison: ComparisonResult): Uint8Array {
  const { run, baseline, results, cautions } = comparison;
  return encodeLine({
    kind: "result",
    id,
    count,
    group,
    baseline,
    mode: run.mode,
    results: results.map(({ label, rank, tracked, differenceToBaseline, differenceToBest, worthPerYear, payback }) => ({
      label,
      rank,
      energy: tracked.energy,
      lostByCause: tracked.lostByCause,
      differenceToBaseline,
      differenceToBest,
      regret: 0 - differenceToBest,
      worthPerYear,
      payback,
    })),
    worthReason: results[0].worthReason,
    coverage: run.coverage,
    cautions: cautions.map(encodeCaution),
  });
}

/** The last line of a portfolio that was worked on to its end. */
export function encodeTotalsLine(summary: PortfolioSummary): Uint8Array {
  return encodeLine({ kind: "totals", version: VERSION, ...summary });
}
