import type { Cause } from "../core/tracking/causes.ts";
import { CAUSES } from "../core/tracking/causes.ts";
import type { LostByCause } from "./energy.ts";
import type { SiteCandidate, SiteOutcome } from "./portfolio.ts";

/** One candidate over many sites, kWh, each site times its count. */
export interface LabelTotals {
  label: string;
  /** Sites that had this candidate, each times its count. */
  sites: number;
  available: number;
  delivered: number;
  lost: number;
  lostFraction: number | null;
  lostByCause: LostByCause;
  /** Lost by using this candidate everywhere instead of each site's own best. */
  regret: number;
}

/** One of the sites that lose most under their baseline. */
export interface WorstSite {
  id: string;
  label: string;
  /** kWh, times the site's count. */
  lost: number;
  lostFraction: number | null;
}

/** What a portfolio comes to. */
export interface PortfolioSummary {
  /** Lines that named a site; those answered; those refused. */
  sites: number;
  answered: number;
  refused: number;
  labels: LabelTotals[];
  /** By group, in the order of their names; sites without a group are only in the whole. */
  groups: { group: string; labels: LabelTotals[] }[];
  /** The candidate that delivers most over all sites that had it everywhere; null when none was at every site. */
  best: string | null;
  /** At most 20, the largest loss first. */
  worst: WorstSite[];
}

const WORST_KEPT = 20;
/** Sums are kept in whole billionths of a kWh: integers add up to the same total in any order. */
const UNITS = 1e9;
const FIGURES = ["available", "delivered", "lost", "regret"] as const;

/**
 * Adds up sites as they are done. The totals do not depend on the order, nor on how sites are spread over several
 * totals that are merged; memory grows with labels and groups, not with sites.
 */
export class PortfolioTotals {
  private answered = 0;
  private refused = 0;
  private readonly whole = new Map<string, Sums>();
  private readonly groups = new Map<string, Map<string, Sums>>();
  private readonly worst: WorstSite[] = [];

  add(outcome: SiteOutcome): void {
    this.answered++;
    addTo(this.whole, outcome);
    if (outcome.group !== null) {
      const group = this.groups.get(outcome.group) ?? new Map<string, Sums>();
      this.groups.set(outcome.group, group);
      addTo(group, outcome);
    }
    this.keepWorst(outcome);
  }

  refuse(): void {
    this.refused++;
  }

  /** Rows that the summary will have: one a label, and one a label in each group. */
  get rows(): number {
    let rows = this.whole.size;
    for (const labels of this.groups.values()) rows += labels.size;
    return rows;
  }

  /** Sites so far. */
  get counts(): { answered: number; refused: number } {
    return { answered: this.answered, refused: this.refused };
  }

  private keepWorst({ id, count, baseline, candidates }: SiteOutcome): void {
    const held = candidates.find(({ label }) => label === baseline)!;
    const lostFraction = held.available > 0 ? held.lost / held.available : null;
    this.worst.push({ id, label: baseline, lost: held.lost * count, lostFraction });
    this.worst.sort((a, b) => b.lost - a.lost || (a.id < b.id ? -1 : 1));
    if (this.worst.length > WORST_KEPT) this.worst.pop();
  }

  summary(): PortfolioSummary {
    const labels = totalsOf(this.whole);
    const everywhere = labels.filter(({ label }) => this.whole.get(label)!.lines === this.answered);
    const best = everywhere.reduce<LabelTotals | null>(
      (a, b) => (a === null || b.delivered > a.delivered ? b : a),
      null,
    );
    return {
      sites: this.answered + this.refused,
      answered: this.answered,
      refused: this.refused,
      labels,
      groups: [...this.groups]
        .sort(([a], [b]) => (a < b ? -1 : 1))
        .map(([group, sums]) => ({ group, labels: totalsOf(sums) })),
      best: best?.label ?? null,
      worst: this.worst.map((site) => ({ ...site })),
    };
  }
}

/** Integer sums of one label. */
class Sums {
  lines = 0;
  sites = 0;
  readonly figures: Record<(typeof FIGURES)[number], bigint> = { available: 0n, delivered: 0n, lost: 0n, regret: 0n };
  readonly causes = Object.fromEntries(CAUSES.map((cause) => [cause, 0n])) as Record<Cause, bigint>;

  add(candidate: SiteCandidate, count: number): void {
    this.lines++;
    this.sites += count;
    for (const figure of FIGURES) this.figures[figure] += inUnits(candidate[figure], count);
    for (const cause of CAUSES) this.causes[cause] += inUnits(candidate.lostByCause[cause], count);
  }
}

function inUnits(kilowattHours: number, count: number): bigint {
  return BigInt(Math.round(kilowattHours * UNITS)) * BigInt(count);
}

function inKilowattHours(units: bigint): number {
  return Number(units) / UNITS;
}

function addTo(labels: Map<string, Sums>, { candidates, count }: SiteOutcome): void {
  for (const candidate of candidates) {
    const sums = labels.get(candidate.label) ?? new Sums();
    labels.set(candidate.label, sums);
    sums.add(candidate, count);
  }
}

/** In the order of the labels' names, so that completion order leaves no trace. */
function totalsOf(labels: Map<string, Sums>): LabelTotals[] {
  return [...labels]
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([label, { sites, figures, causes }]) => {
      const available = inKilowattHours(figures.available);
      const lost = inKilowattHours(figures.lost);
      const lostByCause = Object.fromEntries(CAUSES.map((cause) => [cause, inKilowattHours(causes[cause])]));
      return {
        label,
        sites,
        available,
        delivered: inKilowattHours(figures.delivered),
        lost,
        lostFraction: available > 0 ? lost / available : null,
        lostByCause: lostByCause as LostByCause,
        regret: inKilowattHours(figures.regret),
      };
    });
}
