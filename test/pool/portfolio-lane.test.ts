import { fileURLToPath } from "node:url";
import { afterEach, describe, expect, it } from "vitest";
import type { Pool } from "../../service/pool/pool.ts";
import { createPool, stepsAtOnce } from "../../service/pool/pool.ts";
import { CEILINGS } from "../../service/wire/limits.ts";

const pools: Pool[] = [];
const never = () => new AbortController().signal;

async function hostilePool(threads: number): Promise<Pool> {
  const pool = createPool({
    workerFile: fileURLToPath(new URL("fixtures/hostile-worker.mjs", import.meta.url)),
    threads,
    queue: 8,
    timeLimit: 10_000,
    memory: 64,
    onWorkerLost: () => undefined,
  });
  pools.push(pool);
  await pool.warm();
  return pool;
}

const body = (deed: string) => new TextEncoder().encode(deed);
const single = (pool: Pool, deed: string) =>
  pool.run({ operation: "estimate", body: body(deed), limits: CEILINGS }, never());
const step = (pool: Pool, deed: string, signal = never()) =>
  pool.runStep({ step: "climate", body: body(deed), limits: CEILINGS, given: null }, signal);

afterEach(async () => {
  await Promise.all(pools.splice(0).map((pool) => pool.close()));
});

describe("the lane of portfolios", () => {
  it("may have all threads but one, and one at least", () => {
    expect([1, 2, 3, 8].map(stepsAtOnce)).toEqual([1, 1, 2, 7]);
  });

  it("leaves a thread to single jobs, however many steps wait", async () => {
    const pool = await hostilePool(2);
    const order: string[] = [];
    const steps = ["rest", "rest", "rest"].map(async (deed) => {
      await step(pool, deed);
      order.push("step");
    });
    for (let job = 0; job < 3; job++) {
      await single(pool, "answer");
      order.push("single");
    }
    await Promise.all(steps);
    expect(order).toEqual(["single", "single", "single", "step", "step", "step"]);
  });

  it("lets waiting single jobs go first where there is one thread", async () => {
    const pool = await hostilePool(1);
    const order: string[] = [];
    const note = (name: string) => () => order.push(name);
    await Promise.all([
      step(pool, "rest").then(note("step 1")),
      step(pool, "answer").then(note("step 2")),
      single(pool, "answer").then(note("single 1")),
      single(pool, "answer").then(note("single 2")),
    ]);
    expect(order).toEqual(["step 1", "single 1", "single 2", "step 2"]);
  });

  it("takes more steps than single jobs may wait, and answers them in their order", async () => {
    const pool = await hostilePool(2);
    const order: number[] = [];
    await Promise.all(
      Array.from({ length: 30 }, async (_, index) => {
        expect((await step(pool, "answer")).ok).toBe(true);
        order.push(index);
      }),
    );
    expect(order).toEqual(Array.from({ length: 30 }, (_, index) => index));
  });

  it("gives its thread back when a worker dies or a client leaves", async () => {
    const pool = await hostilePool(2);
    for (let round = 0; round < 3; round++) {
      const answer = await step(pool, "die");
      expect(answer.ok ? "ok" : answer.problem.code).toBe("worker-lost");
    }
    const leave = new AbortController();
    const spinning = step(pool, "spin", leave.signal);
    const waiting = step(pool, "answer");
    leave.abort();
    expect((await spinning).ok).toBe(false);
    expect((await waiting).ok).toBe(true);
  });

  it("drops a step that waits when its client leaves, and refuses all when the pool closes", async () => {
    const pool = await hostilePool(1);
    const leave = new AbortController();
    const running = step(pool, "rest");
    const dropped = step(pool, "die", leave.signal);
    const waiting = step(pool, "answer");
    leave.abort();
    expect((await dropped).ok).toBe(false);
    await pool.close();
    const refused = await waiting;
    expect(refused.ok ? "ok" : refused.problem.code).toBe("draining");
    expect((await running).ok).toBe(false);
  });
});
