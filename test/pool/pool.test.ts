import { fileURLToPath } from "node:url";
import { afterEach, describe, expect, it } from "vitest";
import type { Pool, PoolSettings } from "../../service/pool/pool.ts";
import { createPool } from "../../service/pool/pool.ts";
import { CEILINGS } from "../../service/wire/limits.ts";
import type { Answer } from "../../service/wire/operation.ts";

const pools: Pool[] = [];
const lost: string[] = [];

function hostilePool(settings: Partial<PoolSettings> = {}): Pool {
  const pool = createPool({
    workerFile: fileURLToPath(new URL("fixtures/hostile-worker.mjs", import.meta.url)),
    threads: 2,
    queue: 8,
    timeLimit: 10_000,
    memory: 64,
    onWorkerLost: (reason) => lost.push(reason),
    ...settings,
  });
  pools.push(pool);
  return pool;
}

const never = new AbortController().signal;

function ask(pool: Pool, deed: string, signal: AbortSignal = never): Promise<Answer> {
  return pool.run({ operation: "estimate", body: new TextEncoder().encode(deed), limits: CEILINGS }, signal);
}

const codeOf = (answer: Answer) => (answer.ok ? "ok" : answer.problem.code);

afterEach(async () => {
  await Promise.all(pools.splice(0).map((pool) => pool.close()));
});

describe("the pool", () => {
  it.each(["die", "throw", "hoard"])(
    "answers worker-lost to the one request whose worker must %s, and all others",
    async (deed) => {
      const pool = hostilePool();
      await pool.warm();
      const answers = await Promise.all(["rest", deed, "answer", "rest", "answer"].map((one) => ask(pool, one)));
      expect(answers.map(codeOf)).toEqual(["ok", "worker-lost", "ok", "ok", "ok"]);
    },
  );

  it("still answers after more workers died than it has threads", async () => {
    const pool = hostilePool();
    for (let round = 0; round < 6; round++) expect(codeOf(await ask(pool, "die"))).toBe("worker-lost");
    expect(await Promise.all([ask(pool, "answer"), ask(pool, "answer")])).toMatchObject([{ ok: true }, { ok: true }]);
  });

  it("stops a job at the limit of time and says so", async () => {
    const pool = hostilePool({ timeLimit: 200 });
    const [stopped, other] = await Promise.all([ask(pool, "spin"), ask(pool, "answer")]);
    expect([codeOf(stopped), codeOf(other)]).toEqual(["time-limit-exceeded", "ok"]);
    expect(codeOf(await ask(pool, "answer"))).toBe("ok");
  });

  it("holds as many waiting jobs as its queue, refuses one more, and answers the others in order", async () => {
    const pool = hostilePool({ threads: 1, queue: 2 });
    const order: number[] = [];
    const asked = [0, 1, 2, 3].map(async (index) => {
      const answer = await ask(pool, index === 0 ? "rest" : "answer");
      order.push(index);
      return codeOf(answer);
    });
    expect(await Promise.all(asked)).toEqual(["ok", "ok", "ok", "overloaded"]);
    expect(order).toEqual([3, 0, 1, 2]);
  });

  it("frees the thread of a caller that left", async () => {
    const pool = hostilePool({ threads: 1 });
    await pool.warm();
    const caller = new AbortController();
    const spinning = ask(pool, "spin", caller.signal);
    const waiting = ask(pool, "answer");
    caller.abort();
    expect((await spinning).ok).toBe(false);
    expect(codeOf(await waiting)).toBe("ok");
  });

  it("drops a waiting job whose caller left, and lets a short running one end", async () => {
    const pool = hostilePool({ threads: 1, queue: 1 });
    const [first, second] = [new AbortController(), new AbortController()];
    const running = ask(pool, "rest", first.signal);
    const dropped = ask(pool, "die", second.signal);
    second.abort();
    expect((await dropped).ok).toBe(false);
    const waiting = ask(pool, "answer");
    expect([codeOf(await running), codeOf(await waiting)]).toEqual(["ok", "ok"]);
  });

  it("refuses what waits when it is closed", async () => {
    const pool = hostilePool({ threads: 1 });
    const running = ask(pool, "rest");
    const waiting = ask(pool, "answer");
    await pool.close();
    expect(codeOf(await waiting)).toBe("draining");
    expect((await running).ok).toBe(false);
  });
});
