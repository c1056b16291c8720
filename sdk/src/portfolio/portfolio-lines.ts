import type { ColumnKind, Received } from "../columns.ts";
import type {
  PortfolioDefaults,
  PortfolioResult,
  PortfolioSite,
  PortfolioSiteProblem,
  PortfolioTotals,
  Problem,
} from "../generated/schema.ts";

/** What the sites of a portfolio share: candidates, baseline, and whatever else a site leaves out. */
export type PortfolioDefaultsRequest = Omit<PortfolioDefaults, "kind">;

/** One site: an id of its own, and what it does not have from the defaults. */
export type PortfolioSiteRequest = Omit<PortfolioSite, "kind">;

/** A site that was refused, and why. */
export interface PortfolioRefusal extends Pick<PortfolioSiteProblem, "kind" | "problem"> {
  readonly id: string;
  /** What is wrong with the climate that the site names, where that was refused. */
  readonly climateProblem?: Problem;
}

/** What became of a site. */
export type PortfolioLine<C extends ColumnKind = "plain"> = Received<PortfolioResult, C> | PortfolioRefusal;

/** What the sites come to that were handed over. */
export interface MergedTotals extends Omit<PortfolioTotals, "kind" | "version"> {
  /** The versions of the services that computed the answers, in the order of their names; one, unless an update went on. */
  readonly versions: string[];
}
