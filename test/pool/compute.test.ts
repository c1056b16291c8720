import { fileURLToPath } from "node:url";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { createCompute } from "../../service/pool/compute.ts";
import type { Job } from "../../service/pool/job.ts";
import type { Pool } from "../../service/pool/pool.ts";
import { createPool } from "../../service/pool/pool.ts";
import { CEILINGS } from "../../service/wire/limits.ts";
import type { Answer } from "../../service/wire/operation.ts";
import type { OperationName } from "../../service/wire/operations.ts";
import { performOperation } from "../../service/wire/operations.ts";
import type { Json } from "../wire/requests.ts";
import { bodyOf, comparisonRequest, estimateRequest } from "../wire/requests.ts";

const never = new AbortController().signal;
const jobs: Job[] = [];
let pool: Pool;

/** The real pool, with a note of what reaches it. */
const noted: Pool = {
  run: (job, signal) => {
    jobs.push({ ...job, body: job.body.slice() });
    return pool.run(job, signal);
  },
  runStep: (step, signal) => pool.runStep(step, signal),
  warm: () => pool.warm(),
  close: () => pool.close(),
};
const compute = createCompute(noted, CEILINGS);

beforeAll(async () => {
  pool = createPool({
    // `npm test` builds first: the worker is tested as it is shipped.
    workerFile: fileURLToPath(new URL("../../dist/service/pool/worker.js", import.meta.url)),
    threads: 1,
    queue: 8,
    timeLimit: 20_000,
    memory: 512,
    onWorkerLost: (reason) => {
      throw new Error(reason);
    },
  });
  await pool.warm();
});

afterAll(() => pool.close());

function text(answer: Answer): string {
  return answer.ok ? new TextDecoder().decode(answer.bytes) : JSON.stringify(answer.problem);
}

async function throughPool(operation: OperationName, request: Json): Promise<string> {
  return text(await pool.run({ operation, body: bodyOf(request), limits: CEILINGS }, never));
}

describe("computing", () => {
  it.each<[string, OperationName, Json]>([
    ["an estimate", "estimate", estimateRequest(48)],
    ["a long estimate", "estimate", estimateRequest(8760)],
    ["a comparison", "compare", comparisonRequest(48)],
    ["a wrong request", "estimate", { ...estimateRequest(), rule: { kind: "constant-votage" } }],
    [
      "what physics refuses",
      "estimate",
      { ...estimateRequest(), module: { ...estimateRequest().module, maximumPowerVoltage: 38.8 } },
    ],
  ])("gives the same bytes for %s on the calling thread and in the pool", async (_what, operation, request) => {
    const here = text(performOperation(operation, bodyOf(request), CEILINGS));
    expect(await throughPool(operation, request)).toBe(here);
  });

  it("keeps small requests on the calling thread and sends large ones to the pool", async () => {
    jobs.length = 0;
    expect((await compute("estimate", bodyOf(estimateRequest(24)), never)).ok).toBe(true);
    expect(jobs).toHaveLength(0);
    expect((await compute("estimate", bodyOf(estimateRequest(8760)), never)).ok).toBe(true);
    expect(jobs).toHaveLength(1);
  });

  it("sends a small body that is much work to the pool too", async () => {
    jobs.length = 0;
    const request = { ...estimateRequest(1000), rule: { kind: "incremental-conductance" }, traces: "none" };
    const body = bodyOf(request);
    expect(body.length).toBeLessThan(32 * 1024);
    expect((await compute("estimate", body, never)).ok).toBe(true);
    expect(jobs).toHaveLength(1);
  });

  it("moves the body of a large request instead of copying it", async () => {
    const body = bodyOf(estimateRequest(8760)).slice();
    await compute("estimate", body, never);
    expect(body.byteLength).toBe(0);
  });
});
