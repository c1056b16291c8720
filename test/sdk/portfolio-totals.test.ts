import { describe, expect, it } from "vitest";
import type { PortfolioCandidate } from "../../sdk/src/generated/schema.ts";
import type { CountedResult } from "../../sdk/src/portfolio/merge-totals.ts";
import { TotalsMerger } from "../../sdk/src/portfolio/merge-totals.ts";
import type { SiteOutcome } from "../../service/studies/portfolio.ts";
import { PortfolioTotals } from "../../service/studies/portfolio-totals.ts";
import { seededRandom } from "./fixtures/seeded-random.ts";

const CAUSES = ["voltageWindow", "wrongPeak", "setPoint", "heldSample", "regulation", "interruption"] as const;

/** Invented results with figures of every size, some of whose candidates and groups are not everywhere. */
function results(count: number, random: () => number): CountedResult[] {
  return Array.from({ length: count }, (_, index) => ({
    id: `stage ${index}`,
    count: 1 + Math.floor(random() * 1000),
    group: index % 3 === 0 ? null : `group ${index % 5}`,
    baseline: "held",
    results: ["held", "climbed", ...(index % 2 === 0 ? ["pulsed"] : [])].map((label) => candidate(label, random)),
  }));
}

function candidate(label: string, random: () => number): PortfolioCandidate {
  const available = 10 ** (6 * random() - 2);
  const lostByCause = Object.fromEntries(CAUSES.map((cause) => [cause, available * random() * 0.1]));
  const lost = Object.values(lostByCause).reduce((sum, value) => sum + value, 0);
  const energy = { available, delivered: available - lost, lost };
  return { label, energy, lostByCause, regret: random() } as unknown as PortfolioCandidate;
}

function shuffled<T>(values: readonly T[], random: () => number): T[] {
  const keyed = values.map((value) => [random(), value] as const);
  return keyed.sort(([a], [b]) => a - b).map(([, value]) => value);
}

function merged(list: readonly CountedResult[]) {
  const merger = new TotalsMerger();
  for (const result of list) merger.add(result);
  return merger.totals();
}

describe("merged totals", () => {
  it("are the same, bit for bit, in any order", () => {
    const random = seededRandom(6);
    const list = results(300, random);
    const totals = merged(list);
    for (let turn = 0; turn < 20; turn += 1) expect(merged(shuffled(list, random))).toEqual(totals);
    expect(totals.best).not.toBeNull();
    expect(totals.worst).toHaveLength(20);
  });

  it("are those of the service over the same sites", () => {
    const list = results(300, seededRandom(7));
    const service = new PortfolioTotals();
    const merger = new TotalsMerger();
    for (const result of list) {
      const candidates = result.results.map(({ label, energy, lostByCause, regret }) => {
        const { available, delivered, lost } = energy;
        return { label, available, delivered, lost, lostByCause, regret };
      });
      service.add({ ...result, candidates } as unknown as SiteOutcome);
      merger.add(result);
    }
    service.refuse();
    merger.refuse();
    const { versions, ...totals } = merger.totals();
    expect(totals).toEqual(service.summary());
    expect(versions).toEqual([]);
  });

  it("add up a thousand million small sites without losing one", () => {
    // 1e-9 kWh each, half of a million sites' worth at 0.1 kWh: doubles added one by one would round.
    const merger = new TotalsMerger();
    const one = (available: number, count: number): CountedResult => {
      const energy = { available, delivered: available, lost: 0, clipped: 0, lostFraction: 0 };
      const lostByCause = Object.fromEntries(CAUSES.map((cause) => [cause, 0]));
      const only = { label: "held", energy, lostByCause, regret: 0 } as unknown as PortfolioCandidate;
      return { id: String(count), count, group: null, baseline: "held", results: [only] };
    };
    for (let turn = 0; turn < 1000; turn += 1) merger.add(one(1e-9, 1_000_000));
    for (let turn = 0; turn < 1000; turn += 1) merger.add(one(0.1, 1));
    expect(merger.totals().labels[0]).toMatchObject({ available: 101, delivered: 101, sites: 1_000_001_000 });
  });

  it("name no best candidate where none is everywhere, and keep those apart that are not", () => {
    const [first, second] = results(2, seededRandom(8));
    const totals = merged([
      { ...first, results: first.results.slice(0, 1) },
      { ...second, results: second.results.slice(1, 2) },
    ]);
    expect(totals.best).toBeNull();
    expect(totals.labels.map(({ label, sites }) => [label, sites])).toEqual([
      ["climbed", second.count],
      ["held", first.count],
    ]);
  });
});
