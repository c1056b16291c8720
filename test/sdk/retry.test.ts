import { describe, expect, it } from "vitest";
import { resolveOptions } from "../../sdk/src/client-options.ts";
import { ConnectionError } from "../../sdk/src/errors/connection-error.ts";
import { retryDelay } from "../../sdk/src/retry.ts";

const DEFAULTS = resolveOptions({ baseUrl: "http://localhost" }).retry;
const LOST = new ConnectionError({ requestId: "a", attempts: 1 });

/** Mulberry32, T. Ettinger, public domain (from memory); only has to be even and repeatable. */
function seeded(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
}

function totalWait(random: () => number): number {
  const retry = { ...DEFAULTS, random };
  let total = 0;
  for (let attempt = 1; attempt < retry.attempts; attempt += 1) {
    total += retryDelay(LOST, attempt, retry);
  }
  return total;
}

describe("the default retries", () => {
  it("outlast the two seconds a balancer needs to notice a lost replica in 99.9 % of calls", () => {
    // Design (scale): client retries must outlast detection, about 2 s. An independent simulation gives 99.95 %.
    const random = seeded(20250601);
    const totals = Array.from({ length: 20_000 }, () => totalWait(random));
    expect(totals.filter((total) => total > 2000).length / totals.length).toBeGreaterThan(0.999);
  });

  it("never wait longer in all than the bounds add up to", () => {
    // 250 + 500 + 1000 + 2000 + 4000 + 5000 + 5000, by hand.
    expect(totalWait(() => 1 - 2 ** -53)).toBeLessThan(17_750.001);
    expect(totalWait(() => 0)).toBe(0);
  });
});
