import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { CAUSES } from "../../service/core/tracking/causes.ts";
import type { LostByCause } from "../../service/studies/energy.ts";
import type { SiteCandidate, SiteOutcome } from "../../service/studies/portfolio.ts";
import { PortfolioTotals } from "../../service/studies/portfolio-totals.ts";

const energy = fc.double({ min: 0, max: 1e6, noNaN: true });

const candidate = (label: string) =>
  fc
    .tuple(energy, fc.double({ min: 0, max: 1, noNaN: true }), energy)
    .map(([available, share, regret]): SiteCandidate => {
      const lost = available * share;
      const lostByCause = Object.fromEntries(CAUSES.map((cause, k) => [cause, k === 2 ? lost : 0])) as LostByCause;
      return { label, available, delivered: available - lost, lost, lostByCause, regret };
    });

const outcomes = fc
  .array(
    fc.record({
      count: fc.integer({ min: 1, max: 1_000_000 }),
      group: fc.constantFrom(null, "north", "south", "__proto__"),
      candidates: fc.tuple(candidate("a"), candidate("b"), candidate("constructor")),
      kept: fc.integer({ min: 1, max: 3 }),
    }),
    { minLength: 1, maxLength: 60 },
  )
  .map((sites) =>
    sites.map(({ count, group, candidates, kept }, index): SiteOutcome => {
      return { id: `site ${index}`, count, group, baseline: "a", candidates: candidates.slice(0, kept) };
    }),
  );

function totalsOf(sites: readonly SiteOutcome[]) {
  const totals = new PortfolioTotals();
  for (const site of sites) totals.add(site);
  return totals;
}

describe("a portfolio's totals", () => {
  it("are the same to the last bit in whatever order the sites are done", () => {
    fc.assert(
      fc.property(
        outcomes.chain((sites) =>
          fc.record({
            sites: fc.constant(sites),
            order: fc.shuffledSubarray(sites, { minLength: sites.length, maxLength: sites.length }),
          }),
        ),
        ({ sites, order }) => {
          expect(JSON.stringify(totalsOf(order).summary())).toBe(JSON.stringify(totalsOf(sites).summary()));
        },
      ),
      { numRuns: 300, seed: 6 },
    );
  });

  it("are plain sums, each site times its count, to a billionth of a kWh a site", () => {
    fc.assert(
      fc.property(outcomes, (sites) => {
        const summary = totalsOf(sites).summary();
        for (const { label, ...row } of summary.labels) {
          const having = sites.flatMap(({ count, candidates }) =>
            candidates.filter((one) => one.label === label).map((one) => ({ count, one })),
          );
          const times = having.reduce((sum, { count }) => sum + count, 0);
          expect(row.sites).toBe(times);
          for (const figure of ["available", "delivered", "lost", "regret"] as const) {
            const sum = having.reduce((total, { count, one }) => total + count * one[figure], 0);
            // Half a unit of 1e-9 kWh a site, and what doubles lose over so many of them.
            expect(Math.abs(row[figure] - sum)).toBeLessThanOrEqual(0.5e-9 * times + 1e-12 * sum);
          }
        }
      }),
      { numRuns: 200, seed: 7 },
    );
  });

  it("name as worst the twenty sites that lose most under their baseline", () => {
    fc.assert(
      fc.property(outcomes, (sites) => {
        const losses = sites.map(({ count, candidates }) => count * candidates[0].lost);
        const { worst } = totalsOf(sites).summary();
        expect(worst.map(({ lost }) => lost)).toEqual(losses.sort((a, b) => b - a).slice(0, 20));
      }),
      { numRuns: 200, seed: 8 },
    );
  });

  it("have as many rows as labels in the whole and in each group", () => {
    fc.assert(
      fc.property(outcomes, (sites) => {
        const totals = totalsOf(sites);
        const { labels, groups } = totals.summary();
        expect(totals.rows).toBe(labels.length + groups.reduce((sum, group) => sum + group.labels.length, 0));
      }),
      { numRuns: 50, seed: 9 },
    );
  });
});
