import { afterEach, describe, expect, it } from "vitest";
import type { Kneegap } from "../../sdk/src/kneegap.ts";
import { clientOf } from "./fixtures/client-of.ts";
import type { Behaviour, MisbehavingServer } from "./fixtures/misbehaving-server.ts";
import { endMidway, hangUp, json, problem, raw, resetMidway, startServer } from "./fixtures/misbehaving-server.ts";
import { REQUEST } from "./fixtures/requests.ts";

// The expected counts and waits are the contract's: retried are connection errors, 408, 429, 502, 503 and 504, never
// `worker-lost` or `too-much-work`; waits are random * min(5000, 250 * 2^n), here with random = 1/2, or Retry-After.

const opened: { close(): Promise<void> }[] = [];
afterEach(async () => {
  for (const item of opened.splice(0)) await item.close();
});

async function open(behaviours: Behaviour[], options?: Parameters<typeof clientOf>[1]) {
  const server = await startServer(...behaviours);
  const { client, waits } = clientOf(server, options);
  opened.push(client, server);
  return { server, client, waits } as { server: MisbehavingServer; client: Kneegap; waits: number[] };
}

describe("a call that fails for the moment", () => {
  it.each([408, 429, 502, 503, 504])("is sent again after %i and then succeeds", async (status) => {
    const { client, server } = await open([problem(status, "later"), json({ status: "live" })]);
    expect(await client.liveness()).toEqual({ status: "live" });
    expect(server.seen).toHaveLength(2);
  });

  it.each([
    ["hangs up", hangUp],
    ["resets midway through its answer", resetMidway],
    ["ends midway through a chunked answer, as a replica killed while draining does", endMidway],
  ])("is sent again when the service %s", async (_, behaviour) => {
    const { client, server, waits } = await open([behaviour, behaviour, json({ status: "live" })]);
    expect(await client.liveness()).toEqual({ status: "live" });
    expect(server.seen).toHaveLength(3);
    expect(waits).toEqual([125, 250]);
  });

  it("is sent again after a gateway's answer without a problem document", async () => {
    const page = raw("<h1>Bad Gateway</h1>", 502, { "content-type": "text/html" });
    const { client, server } = await open([page, json({ status: "live" })]);
    await client.liveness();
    expect(server.seen).toHaveLength(2);
  });

  it("is sent 8 times at the most, with waits that double up to 5 s", async () => {
    const { client, server, waits } = await open([problem(503, "queue-full")]);
    await expect(client.liveness()).rejects.toMatchObject({ name: "UnavailableError", attempts: 8 });
    expect(server.seen).toHaveLength(8);
    expect(waits).toEqual([125, 250, 500, 1000, 2000, 2500, 2500]);
  });

  it("carries the same request id and body each time", async () => {
    const { client, server } = await open([problem(503, "queue-full"), json({})]);
    await client.estimate(REQUEST, { requestId: "night-run.7" });
    expect(server.seen.map((request) => request.headers["x-request-id"])).toEqual(["night-run.7", "night-run.7"]);
    expect(server.seen[1].body).toBe(server.seen[0].body);
    expect(JSON.parse(server.seen[0].body)).toEqual(REQUEST);
  });

  it("is sent once when attempts is 1", async () => {
    const { client, server } = await open([problem(503, "draining")]);
    await expect(client.liveness({ attempts: 1 })).rejects.toMatchObject({ attempts: 1 });
    expect(server.seen).toHaveLength(1);
  });
});

describe("a call that fails for good", () => {
  it.each([400, 401, 404, 405, 406, 413, 415, 422, 500])("is sent once when answered %i", async (status) => {
    const { client, server } = await open([problem(status, "final")]);
    await expect(client.liveness()).rejects.toMatchObject({ status, attempts: 1 });
    expect(server.seen).toHaveLength(1);
  });

  it.each(["worker-lost", "too-much-work"])("is sent once for the code %s, even with 503", async (code) => {
    const { client, server } = await open([problem(503, code, { "retry-after": "0" })]);
    await expect(client.liveness()).rejects.toMatchObject({ problem: { code } });
    expect(server.seen).toHaveLength(1);
  });
});

describe("a call told when to come back", () => {
  it("waits the seconds of Retry-After, and a jitter below the base delay more", async () => {
    const { client, waits } = await open([problem(503, "queue-full", { "retry-after": "3" }), json({})]);
    await client.liveness();
    expect(waits).toEqual([3000 + 125]);
  });

  it("waits until the date of Retry-After, by the service's own clock", async () => {
    const headers = { date: "Sun, 06 Nov 1994 08:49:37 GMT", "retry-after": "Sun, 06 Nov 1994 08:49:41 GMT" };
    const { client, waits } = await open([problem(429, "rate-limited", headers), json({})]);
    await client.liveness();
    expect(waits).toEqual([4000 + 125]);
  });

  it("fails at once with the problem when the wait would pass its timeout", async () => {
    const { client, server, waits } = await open([problem(429, "rate-limited", { "retry-after": "3600" })]);
    await expect(client.liveness()).rejects.toMatchObject({ name: "RateLimitedError", retryAfter: 3_600_000 });
    expect(server.seen).toHaveLength(1);
    expect(waits).toEqual([]);
  });
});

describe("a POST on a connection the service has closed", () => {
  it("is sent again on a new one", async () => {
    const { client, server } = await open([json({}), hangUp, json({ energy: "second" })], { connections: 1 });
    await client.estimate(REQUEST);
    expect(await client.estimate(REQUEST)).toEqual({ energy: "second" });
    expect(server.seen.map((request) => request.turn)).toEqual([1, 2, 1]);
    expect(server.connections()).toBe(2);
  });
});
