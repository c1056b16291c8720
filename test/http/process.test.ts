import type { ChildProcess } from "node:child_process";
import { spawn } from "node:child_process";
import { once } from "node:events";
import { connect } from "node:net";
import { setTimeout as sleep } from "node:timers/promises";
import { fileURLToPath } from "node:url";
import { afterEach, describe, expect, it } from "vitest";
import type { Json } from "../wire/requests.ts";
import { estimateRequest } from "../wire/requests.ts";

// `npm test` builds first: the service is tested as it is shipped.
const MAIN = fileURLToPath(new URL("../../dist/service/main.js", import.meta.url));
const children: ChildProcess[] = [];

interface Running {
  child: ChildProcess;
  url: string;
  port: number;
  output: () => string;
}

function start(environment: Record<string, string>): { child: ChildProcess; output: () => string } {
  const child = spawn(process.execPath, [MAIN], { env: { PATH: process.env["PATH"], ...environment } });
  children.push(child);
  let text = "";
  child.stdout.on("data", (piece) => {
    text += piece;
  });
  child.stderr.on("data", (piece) => {
    text += piece;
  });
  return { child, output: () => text };
}

async function ready(environment: Record<string, string> = {}): Promise<Running> {
  const { child, output } = start({ PORT: "0", THREADS: "1", DRAIN: "0.3", ...environment });
  for (let wait = 0; wait < 200 && !output().includes('"msg":"ready"'); wait++) await sleep(50);
  const port = Number(/"port":(\d+)/.exec(output())?.[1]);
  return { child, url: `http://127.0.0.1:${port}`, port, output };
}

/** What comes back for raw bytes, until the connection ends. */
async function raw(port: number, text: string): Promise<string> {
  const socket = connect(port, "127.0.0.1");
  let answer = "";
  socket.on("data", (piece) => {
    answer += piece;
  });
  socket.on("error", () => undefined);
  socket.write(text);
  await once(socket, "close");
  return answer;
}

/** An estimate that takes about a second: stepped at a tenth of a second. */
function slowRequest(): Json {
  const request = estimateRequest(24 * 60);
  request.rule = { kind: "incremental-conductance" };
  request.converter = { rippleAmplitude: 0.02 };
  request.traces = "none";
  request.mode = "steady";
  return request;
}

const send = (url: string, request: Json) =>
  fetch(`${url}/v1/estimates`, {
    method: "POST",
    body: JSON.stringify(request),
    headers: { "content-type": "application/json" },
  });

afterEach(async () => {
  for (const child of children.splice(0)) {
    if (child.exitCode !== null) continue;
    child.kill("SIGKILL");
    await once(child, "exit");
  }
});

describe("the process", () => {
  it("finishes what is in flight at SIGTERM, is no longer ready at once, and exits with 0", async () => {
    const { child, url, output } = await ready({ DRAIN: "1" });
    const answer = send(url, slowRequest());
    await sleep(200);
    const exit = once(child, "exit");
    child.kill("SIGTERM");
    await sleep(100);
    expect((await fetch(`${url}/health/ready`)).status).toBe(503);
    const live = await fetch(`${url}/health/live`);
    expect([live.status, live.headers.get("connection")]).toEqual([200, "close"]);
    // Requests that still come while balancers have not noticed are answered too.
    expect((await send(url, estimateRequest())).status).toBe(200);
    expect((await answer).status).toBe(200);
    expect(await exit).toEqual([0, null]);
    expect(output()).toContain('"msg":"stopped"');
  });

  it("closes at once and finishes where there is nothing to drain for", async () => {
    const { child, url } = await ready({ DRAIN: "0" });
    const answer = send(url, slowRequest());
    await sleep(200);
    const exit = once(child, "exit");
    child.kill("SIGTERM");
    expect((await answer).status).toBe(200);
    expect(await exit).toEqual([0, null]);
  });

  it("ends within its grace time where something never ends", async () => {
    const { child, port } = await ready({ DRAIN: "0", GRACE: "0.5" });
    const socket = connect(port, "127.0.0.1");
    socket.on("error", () => undefined);
    socket.write(
      "POST /v1/estimates HTTP/1.1\r\nhost: x\r\ncontent-type: application/json\r\ncontent-length: 100\r\n\r\n{",
    );
    await sleep(200);
    const exit = once(child, "exit");
    const before = performance.now();
    child.kill("SIGTERM");
    expect(await exit).toEqual([1, null]);
    expect(performance.now() - before).toBeLessThan(2500);
    socket.destroy();
  });

  it("answers what is no HTTP with a problem", async () => {
    const { port } = await ready();
    for (const [text, status, code] of [
      ["GARBAGE\r\n\r\n", 400, "malformed-request"],
      ["GET / HTTP/1.1\r\nhost: x\r\ncontent-length: -1\r\n\r\n", 400, "malformed-request"],
      [`GET / HTTP/1.1\r\nhost: x\r\nx-long: ${"a".repeat(20_000)}\r\n\r\n`, 431, "headers-too-large"],
    ] as const) {
      const answer = await raw(port, text);
      expect(answer).toMatch(new RegExp(`^HTTP/1\\.1 ${status} `));
      expect(answer).toContain("content-type: application/problem+json");
      const problem = JSON.parse(answer.split("\r\n\r\n")[1]);
      expect(problem).toMatchObject({ code, status });
      expect(answer).toContain(`x-request-id: ${problem.requestId}`);
    }
  });

  it("answers a body above the limit with 413, declared or chunked", async () => {
    const { url } = await ready({ KNEEGAP_MAX_BODY_BYTES: "100000" });
    const large = "x".repeat(3_000_000);
    const headers = { "content-type": "application/json" };
    const declared = await fetch(`${url}/v1/estimates`, { method: "POST", body: large, headers });
    expect(declared.status).toBe(413);
    const chunked = await fetch(`${url}/v1/estimates`, {
      method: "POST",
      body: new Blob([large]).stream(),
      headers,
      duplex: "half",
    } as RequestInit);
    expect(chunked.status).toBe(413);
    expect((await chunked.json()) as Json).toMatchObject({ code: "body-too-large" });
  });

  it("frees the thread of a client that left", async () => {
    const { url } = await ready();
    const leave = new AbortController();
    const request = slowRequest();
    request.climate.irradiance.values = Array(8000).fill(500);
    request.climate.temperature.values = Array(8000).fill(20);
    const left = fetch(`${url}/v1/estimates`, {
      method: "POST",
      body: JSON.stringify(request),
      headers: { "content-type": "application/json" },
      signal: leave.signal,
    });
    await sleep(300);
    leave.abort();
    await expect(left).rejects.toThrow();
    const before = performance.now();
    expect((await send(url, { ...estimateRequest(8760) })).status).toBe(200);
    expect(performance.now() - before).toBeLessThan(4000);
  });

  it("refuses to start open to the network without keys, and says what to do", async () => {
    const { child, output } = start({ HOST: "0.0.0.0", PORT: "0" });
    const [code] = await once(child, "exit");
    expect(code).not.toBe(0);
    expect(output()).toContain("KNEEGAP_ALLOW_ANONYMOUS=true");
  });
});
