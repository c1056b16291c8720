import type { ComparisonRequest, ComparisonResult } from "./comparison.ts";
import { compare } from "./comparison.ts";
import type { LostByCause } from "./energy.ts";

/** One site of a portfolio: a comparison, how many times the site stands for itself, and the group it belongs to. */
export interface PortfolioSite extends ComparisonRequest {
  id: string;
  /** 1 or more. */
  count: number;
  group: string | null;
}

/** One candidate at one site. */
export interface SiteCandidate {
  label: string;
  /** kWh, of one site. */
  available: number;
  delivered: number;
  lost: number;
  lostByCause: LostByCause;
  /** Delivered less than the site's own best candidate, kWh, 0 or above. */
  regret: number;
}

/** What a site adds to the portfolio: all that the totals need of it. */
export interface SiteOutcome {
  id: string;
  count: number;
  group: string | null;
  baseline: string;
  candidates: SiteCandidate[];
}

/** Compares the candidates at one site. @throws StudyError for what physics refuses */
export function portfolioSite(site: PortfolioSite): { comparison: ComparisonResult; outcome: SiteOutcome } {
  const comparison = compare(site);
  const candidates = comparison.results.map(({ label, tracked, differenceToBest }): SiteCandidate => {
    const { available, delivered, lost } = tracked.energy;
    return { label, available, delivered, lost, lostByCause: tracked.lostByCause, regret: 0 - differenceToBest };
  });
  const { id, count, group } = site;
  return { comparison, outcome: { id, count, group, baseline: comparison.baseline, candidates } };
}
