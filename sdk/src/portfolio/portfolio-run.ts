import type { ColumnKind } from "../columns.ts";
import type { MergedTotals, PortfolioLine, PortfolioSiteRequest } from "./portfolio-lines.ts";

/** Sites as the caller has them. */
export type PortfolioSites = Iterable<PortfolioSiteRequest> | AsyncIterable<PortfolioSiteRequest>;

/**
 * A portfolio under way: loop over it with `for await` for what became of each site, as sites are done; `totals()` says
 * what those handed over come to. Nothing is sent before the loop begins, and leaving the loop ends what is under way.
 */
export interface PortfolioRun<C extends ColumnKind = "plain"> extends AsyncIterable<PortfolioLine<C>> {
  /** What the sites that were handed over so far come to; after the loop, all of them. New at each call. */
  totals(): MergedTotals;
  /** Begins the loop, which can be had once: throws TypeError after that. */
  [Symbol.asyncIterator](): AsyncGenerator<PortfolioLine<C>, void, undefined>;
}
