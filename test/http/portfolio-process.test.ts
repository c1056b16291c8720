import type { ChildProcess } from "node:child_process";
import { spawn } from "node:child_process";
import { once } from "node:events";
import type { ClientRequest, IncomingMessage } from "node:http";
import { request } from "node:http";
import { createInterface } from "node:readline";
import { setTimeout as sleep } from "node:timers/promises";
import { fileURLToPath } from "node:url";
import { afterEach, describe, expect, it } from "vitest";
import { defaultsLine, ndjson, siteLine } from "../wire/portfolio-requests.ts";
import type { Json } from "../wire/requests.ts";
import { climateOf, estimateRequest } from "../wire/requests.ts";

// `npm test` builds first: the service is tested as it is shipped.
const MAIN = fileURLToPath(new URL("../../dist/service/main.js", import.meta.url));
const children: ChildProcess[] = [];

interface Running {
  child: ChildProcess;
  port: number;
  log: Json[];
}

async function start(threads: number): Promise<Running> {
  const environment = { PATH: process.env["PATH"], PORT: "0", THREADS: String(threads), DRAIN: "0" };
  const child = spawn(process.execPath, [MAIN], { env: environment });
  children.push(child);
  const log: Json[] = [];
  const lines = createInterface(child.stdout!);
  const ready = new Promise<void>((resolve) => {
    lines.on("line", (line) => {
      log.push(JSON.parse(line));
      if (log.at(-1).msg === "ready") resolve();
    });
  });
  await ready;
  return { child, port: log.find(({ msg }) => msg === "listening").port, log };
}

/** A portfolio on its way: write lines, read lines. */
function open(port: number): { call: ClientRequest; answer: Promise<IncomingMessage> } {
  const headers = { "content-type": "application/x-ndjson" };
  const call = request({ port, method: "POST", path: "/v1/portfolios", headers });
  call.on("error", () => undefined);
  const answer = once(call, "response").then(([message]) => {
    message.on("error", () => undefined);
    return message as IncomingMessage;
  });
  return { call, answer };
}

/** A site that takes a few tenths of a second: a climbing rule's orbits under ripple. */
const slowSite = (id: string, samples = 300) =>
  siteLine(id, {
    climate: climateOf(samples),
    candidates: ["one", "two"].map((label) => ({ label, rule: { kind: "incremental-conductance" } })),
    converter: { rippleAmplitude: 0.02 },
    mode: "steady",
  });

const estimate = (port: number) =>
  fetch(`http://127.0.0.1:${port}/v1/estimates`, {
    method: "POST",
    // Too long to be computed on the service's main thread.
    body: JSON.stringify({ ...estimateRequest(8760), traces: "none" }),
    headers: { "content-type": "application/json" },
  });

afterEach(async () => {
  for (const child of children.splice(0)) {
    if (child.exitCode !== null) continue;
    child.kill("SIGKILL");
    await once(child, "exit");
  }
});

describe("a portfolio that fills the pool", () => {
  it.each([1, 2])(
    "lets single requests go before its sites, with %i threads",
    async (threads) => {
      const { port } = await start(threads);
      const { call, answer } = open(port);
      call.end(ndjson([defaultsLine(), ...Array.from({ length: 10 }, (_, k) => slowSite(`${k}`))]));
      const order: string[] = [];
      let singles: Promise<void> | undefined;
      for await (const line of createInterface(await answer)) {
        if (line === "") continue;
        order.push(JSON.parse(line).kind);
        singles ??= (async () => {
          for (let turn = 0; turn < 3; turn++) {
            expect((await estimate(port)).status).toBe(200);
            order.push("single");
          }
        })();
      }
      await singles;
      expect(order.filter((kind) => kind === "result")).toHaveLength(10);
      // In the lane of the sites the first would have waited for none, the second for one more, and so on; here each waits
      // for the site that runs at the most.
      expect(order.indexOf("single")).toBeLessThanOrEqual(3);
      expect(order.lastIndexOf("single")).toBeLessThan(order.indexOf("totals"));
    },
    40_000,
  );
});

describe("a client who cuts the connection", () => {
  it("stops the work, and the thread is free again", async () => {
    const { port, log } = await start(1);
    const { call, answer } = open(port);
    for (let site = 0; site < 30; site++) call.write(ndjson([site === 0 ? defaultsLine() : slowSite(`${site}`, 8000)]));
    await answer;
    await sleep(300);
    call.destroy();
    const before = performance.now();
    expect((await estimate(port)).status).toBe(200);
    // One such site takes seconds; all of them a minute.
    expect(performance.now() - before).toBeLessThan(4000);
    for (let wait = 0; wait < 40 && !log.some(({ msg }) => msg === "portfolio"); wait++) await sleep(50);
    expect(log.find(({ msg }) => msg === "portfolio")).toMatchObject({ answered: 0 });
  });
});

describe("a service that is told to stop", () => {
  it("finishes the portfolio in flight and exits with 0", async () => {
    const { child, port } = await start(2);
    const { call, answer } = open(port);
    call.write(ndjson([defaultsLine(), siteLine("a")]));
    const kinds: string[] = [];
    const exit = once(child, "exit");
    for await (const line of createInterface(await answer)) {
      if (line === "") continue;
      kinds.push(JSON.parse(line).kind);
      if (kinds.length > 1) continue;
      child.kill("SIGTERM");
      await sleep(100);
      call.end(ndjson([siteLine("b")]));
    }
    expect(kinds).toEqual(["result", "result", "totals"]);
    expect(await exit).toEqual([0, null]);
  });
});
