import type {
  LostByCause,
  PortfolioCandidate,
  PortfolioLabelTotals,
  PortfolioResult,
  PortfolioWorstSite,
} from "../generated/schema.ts";
import type { MergedTotals } from "./portfolio-lines.ts";

/** What the totals need of a result. */
export type CountedResult = Pick<PortfolioResult, "id" | "count" | "group" | "baseline" | "results">;

const WORST_KEPT = 20;
/** Sums are kept in whole billionths of a kWh, as the service keeps its own: integers add up to the same in any order. */
const UNITS = 1e9;

/**
 * Adds up results as they are handed over, to what the service's own totals line would say of the same sites, whatever
 * their order and however they were spread over requests. Memory grows with labels and groups, not with sites.
 */
export class TotalsMerger {
  #answered = 0;
  #refused = 0;
  readonly #whole = new Map<string, Sums>();
  readonly #groups = new Map<string, Map<string, Sums>>();
  readonly #worst: PortfolioWorstSite[] = [];
  readonly #versions = new Set<string>();

  get answered(): number {
    return this.#answered;
  }

  get refused(): number {
    return this.#refused;
  }

  /** Counts a result. */
  add(result: CountedResult): void {
    this.#answered += 1;
    addTo(this.#whole, result);
    if (result.group !== null) {
      const group = this.#groups.get(result.group) ?? new Map<string, Sums>();
      this.#groups.set(result.group, group);
      addTo(group, result);
    }
    this.#keepWorst(result);
  }

  /** Counts a site that was refused. */
  refuse(): void {
    this.#refused += 1;
  }

  /** Notes the version of a service that answered. */
  seeVersion(version: string): void {
    this.#versions.add(version);
  }

  /** The totals of what was counted so far, new at each call. */
  totals(): MergedTotals {
    const labels = totalsOf(this.#whole);
    const everywhere = labels.filter(({ label }) => this.#whole.get(label)!.lines === this.#answered);
    const best = everywhere.reduce<PortfolioLabelTotals | null>(
      (most, next) => (most === null || next.delivered > most.delivered ? next : most),
      null,
    );
    return {
      sites: this.#answered + this.#refused,
      answered: this.#answered,
      refused: this.#refused,
      labels,
      groups: sortedByName(this.#groups).map(([group, sums]) => ({ group, labels: totalsOf(sums) })),
      best: best?.label ?? null,
      worst: this.#worst.map((site) => ({ ...site })),
      versions: [...this.#versions].sort(),
    };
  }

  #keepWorst({ id, count, baseline, results }: CountedResult): void {
    const held = results.find(({ label }) => label === baseline);
    if (held === undefined) return;
    const { available, lost } = held.energy;
    const lostFraction = available > 0 ? lost / available : null;
    this.#worst.push({ id, label: baseline, lost: lost * count, lostFraction });
    this.#worst.sort((a, b) => b.lost - a.lost || (a.id < b.id ? -1 : 1));
    if (this.#worst.length > WORST_KEPT) this.#worst.pop();
  }
}

/** Integer sums of one label: energies and causes by name. */
class Sums {
  lines = 0;
  sites = 0;
  readonly #figures = new Map<string, bigint>();
  readonly #causes = new Map<string, bigint>();

  add({ energy, regret, lostByCause }: PortfolioCandidate, count: number): void {
    this.lines += 1;
    this.sites += count;
    const { available, delivered, lost } = energy;
    for (const [name, value] of Object.entries({ available, delivered, lost, regret })) {
      addUnits(this.#figures, name, value, count);
    }
    for (const [cause, value] of Object.entries(lostByCause)) addUnits(this.#causes, cause, value, count);
  }

  /** kWh. */
  figure(name: "available" | "delivered" | "lost" | "regret"): number {
    return inKilowattHours(this.#figures.get(name)!);
  }

  get lostByCause(): LostByCause {
    const causes = Array.from(this.#causes, ([cause, units]) => [cause, inKilowattHours(units)]);
    return Object.fromEntries(causes) as LostByCause;
  }
}

function addUnits(sums: Map<string, bigint>, ...[name, kilowattHours, count]: [string, number, number]): void {
  sums.set(name, (sums.get(name) ?? 0n) + BigInt(Math.round(kilowattHours * UNITS)) * BigInt(count));
}

function inKilowattHours(units: bigint): number {
  return Number(units) / UNITS;
}

function addTo(labels: Map<string, Sums>, { results, count }: CountedResult): void {
  for (const candidate of results) {
    const sums = labels.get(candidate.label) ?? new Sums();
    labels.set(candidate.label, sums);
    sums.add(candidate, count);
  }
}

function totalsOf(labels: ReadonlyMap<string, Sums>): PortfolioLabelTotals[] {
  return sortedByName(labels).map(([label, sums]) => {
    const available = sums.figure("available");
    const lost = sums.figure("lost");
    return {
      label,
      sites: sums.sites,
      available,
      delivered: sums.figure("delivered"),
      lost,
      lostFraction: available > 0 ? lost / available : null,
      lostByCause: sums.lostByCause,
      regret: sums.figure("regret"),
    };
  });
}

/** By the code units of the names, as the service sorts. */
function sortedByName<Value>(map: ReadonlyMap<string, Value>): [string, Value][] {
  return [...map].sort(([a], [b]) => (a < b ? -1 : 1));
}
