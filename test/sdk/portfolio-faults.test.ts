import { setImmediate as nextTurn } from "node:timers/promises";
import { describe, expect, it } from "vitest";
import type { PortfolioSiteRequest } from "../../sdk/src/portfolio/portfolio-lines.ts";
import { clientOf } from "./fixtures/client-of.ts";
import type { FateCounts } from "./fixtures/faulty-proxy.ts";
import { startFaultyProxy } from "./fixtures/faulty-proxy.ts";
import { eighthsOf, startPortfolioServer } from "./fixtures/portfolio-server.ts";
import { seededRandom } from "./fixtures/seeded-random.ts";

const SITES = 300;
const SEEDS = 50;

/** Invented sites, some of which are refused, as a list or as a sequence that comes by and by. */
function sitesOf(seed: number): PortfolioSiteRequest[] {
  return Array.from({ length: SITES }, (_, index) => ({
    id: `${index % 37 === 5 ? "bad " : ""}stage ${index} of ${seed}`,
    count: 1 + (index % 4),
    ...(index % 3 === 0 ? { group: index % 2 === 0 ? "north" : "south" } : {}),
  }));
}

async function* byAndBy(sites: readonly PortfolioSiteRequest[]): AsyncGenerator<PortfolioSiteRequest> {
  for (const [index, site] of sites.entries()) {
    if (index % 10 === 0) await nextTurn();
    yield site;
  }
}

/** What "held" loses at the sites that are not refused, kWh: whole eighths, which doubles add up exactly. */
function lostByHeld(sites: readonly PortfolioSiteRequest[], group?: string): number {
  const counted = sites.filter((site) => !site.id.startsWith("bad") && (group === undefined || site.group === group));
  return counted.reduce((sum, { id, count }) => sum + eighthsOf(id)[1] * count!, 0) / 8;
}

describe("a portfolio behind a proxy that cuts at random bytes, delays, is busy and holds whole messages back", () => {
  it(`yields each of ${SITES} sites exactly once and adds them up right, over ${SEEDS} seeds`, async () => {
    const server = await startPortfolioServer();
    const fates: FateCounts = {};
    let requests = 0;
    try {
      for (let seed = 1; seed <= SEEDS; seed += 1) {
        const proxy = await startFaultyProxy(server.port, seededRandom(seed));
        const { client } = clientOf(proxy);
        const sites = sitesOf(seed);
        const run = client.portfolio(seed % 2 === 0 ? sites : byAndBy(sites), {
          attempts: 40,
          batchSites: 64 - (seed % 50),
          onProgress: (progress) => {
            if (progress.answered + progress.refused === SITES) requests += progress.requests;
          },
        });
        const ids: string[] = [];
        for await (const line of run) {
          expect(line.kind).toBe(line.id.startsWith("bad") ? "site-problem" : "result");
          ids.push(line.id);
        }
        expect(ids.sort()).toEqual(sites.map(({ id }) => id).sort());
        const totals = run.totals();
        expect(totals).toMatchObject({ sites: SITES, refused: 8, answered: SITES - 8, best: "climbed" });
        expect(totals.labels.find(({ label }) => label === "held")!.lost).toBe(lostByHeld(sites));
        expect(totals.groups.map(({ group, labels: [, { lost }] }) => [group, lost])).toEqual([
          ["north", lostByHeld(sites, "north")],
          ["south", lostByHeld(sites, "south")],
        ]);
        for (const [name, count] of Object.entries(proxy.fates)) fates[name] = (fates[name] ?? 0) + count;
        await client.close();
        await proxy.close();
      }
    } finally {
      await server.close();
    }
    expect(Object.keys(fates)).toHaveLength(6);
    expect(fates["cuts the answer"]).toBeGreaterThan(SEEDS);
    expect(requests).toBeGreaterThan(1.2 * SEEDS * (SITES / 64));
    if (process.env.SHOW) process.stdout.write(`${JSON.stringify({ fates, requests })}\n`);
    for (const { headers, sites } of server.asked) {
      expect(Number(headers["content-length"])).toBeGreaterThan(0);
      expect(headers).not.toHaveProperty("transfer-encoding");
      expect(sites.length).toBeLessThanOrEqual(64);
    }
  }, 60_000);
});
