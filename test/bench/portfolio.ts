import { spawn } from "node:child_process";
import { once } from "node:events";
import { readFileSync } from "node:fs";
import { request } from "node:http";
import { createInterface } from "node:readline";
import { setTimeout as sleep } from "node:timers/promises";
import { fileURLToPath } from "node:url";

// Peak memory is VmHWM of the service's process (Linux), a new process for each portfolio. Needs the build.

const MAIN = fileURLToPath(new URL("../../dist/service/main.js", import.meta.url));
const MODULE = {
  kind: "single-diode",
  cellsInSeries: 60,
  photocurrent: 9.5,
  saturationCurrent: 3e-10,
  seriesResistance: 0.25,
  shuntResistance: 400,
  idealityVoltage: 1.6186,
};

/** An hourly year, invented: a clear day's half sine, dimmer in winter, shifted by `site` so that no two are alike. */
function yearOf(site: number): object {
  const values = Array.from({ length: 8760 }, (_, hour) => {
    const season = 0.6 - 0.4 * Math.cos((2 * Math.PI * hour) / 8760);
    const light = Math.sin(((hour % 24) - 6) * (Math.PI / 12)) * (900 + (site % 97)) * season;
    return Math.max(0, Math.round(light * 10) / 10);
  });
  return {
    start: "2025-01-01T00:00:00Z",
    step: 3600,
    irradiance: { kind: "plane-of-array", values },
    temperature: { kind: "cell", values: values.map((light) => Math.round(5 + light / 40)) },
  };
}

const DEFAULTS = {
  kind: "defaults",
  module: MODULE,
  candidates: [
    { label: "one voltage", rule: { kind: "constant-voltage" } },
    { label: "a fraction", rule: { kind: "fractional-open-circuit-voltage" } },
    { label: "pulses", rule: { kind: "short-current-pulse" } },
    { label: "climbs", rule: { kind: "perturb-and-observe" } },
  ],
};

function* linesOf(sites: number, named: boolean): Generator<string> {
  yield JSON.stringify(DEFAULTS);
  if (named) yield JSON.stringify({ kind: "climate", name: "shared", climate: yearOf(0) });
  for (let site = 0; site < sites; site++) {
    const climate = named ? { kind: "named", name: "shared" } : yearOf(site);
    yield JSON.stringify({ kind: "site", id: `site ${site}`, climate });
  }
}

async function startService(): Promise<{ port: number; pid: number; stop: () => void }> {
  const child = spawn(process.execPath, [MAIN], { env: { PATH: process.env["PATH"], PORT: "0" } });
  const said = createInterface(child.stdout);
  let port = 0;
  for await (const line of said) {
    const { msg, port: listening } = JSON.parse(line) as { msg: string; port?: number };
    if (msg === "listening") port = listening!;
    if (msg === "ready") break;
  }
  child.stdout.resume();
  return { port, pid: child.pid!, stop: () => child.kill("SIGKILL") };
}

const peak = (pid: number) => Number(/VmHWM:\s+(\d+)/.exec(readFileSync(`/proc/${pid}/status`, "utf8"))![1]) / 1024;

/** Sends a portfolio and reads its answer meanwhile; resolves to the kinds of its lines, counted. */
async function send(port: number, lines: Iterable<string>): Promise<Record<string, number>> {
  const call = request({
    port,
    method: "POST",
    path: "/v1/portfolios",
    headers: { "content-type": "application/x-ndjson" },
  });
  const kinds: Record<string, number> = {};
  const read = once(call, "response").then(async ([answer]) => {
    for await (const line of createInterface(answer)) {
      if (line === "") continue;
      const kind = /^\{"kind":"([a-z-]+)"/.exec(line)![1];
      kinds[kind] = (kinds[kind] ?? 0) + 1;
    }
  });
  for (const line of lines) if (!call.write(`${line}\n`)) await once(call, "drain");
  call.end();
  await read;
  return kinds;
}

/** 95th percentile of what an estimate of an hourly year takes, ms. */
async function estimateTime(port: number, calls: number): Promise<number> {
  const body = JSON.stringify({ module: MODULE, rule: { kind: "constant-voltage" }, climate: yearOf(1) });
  const times: number[] = [];
  for (let call = 0; call < calls; call++) {
    const start = performance.now();
    const headers = { "content-type": "application/json" };
    const answer = await fetch(`http://127.0.0.1:${port}/v1/estimates`, { method: "POST", headers, body });
    await answer.arrayBuffer();
    times.push(performance.now() - start);
    await sleep(5);
  }
  return times.sort((a, b) => a - b)[Math.floor(0.95 * calls)];
}

const say = (text: string) => process.stdout.write(`${text}\n`);

/** Prints memory and speed of streamed portfolios, and what an estimate waits meanwhile. */
export async function measurePortfolios(): Promise<void> {
  for (const named of [false, true]) {
    for (const sites of [200, 2000]) {
      const { port, pid, stop } = await startService();
      const start = performance.now();
      const kinds = await send(port, linesOf(sites, named));
      const seconds = (performance.now() - start) / 1000;
      const climate = named ? "a named climate" : "climates of their own";
      say(
        `${sites} sites with ${climate}: ${seconds.toFixed(1)} s, peak ${peak(pid).toFixed(0)} MiB, ${JSON.stringify(kinds)}`,
      );
      stop();
    }
  }

  const { port, stop } = await startService();
  await estimateTime(port, 50);
  const idle = await estimateTime(port, 100);
  // Made beforehand, so that it is the service that is busy.
  const sent = send(port, [...linesOf(400, false)]);
  await sleep(500);
  const busy = await estimateTime(port, 100);
  say(
    `p95 of an estimate: ${idle.toFixed(1)} ms idle, ${busy.toFixed(1)} ms during a portfolio, ratio ${(busy / idle).toFixed(2)}`,
  );
  await sent;
  stop();
}
