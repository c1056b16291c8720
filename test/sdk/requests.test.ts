import { readFileSync } from "node:fs";
import { afterEach, describe, expect, it } from "vitest";
import { clientOf } from "./fixtures/client-of.ts";
import type { Behaviour } from "./fixtures/misbehaving-server.ts";
import { json, startServer } from "./fixtures/misbehaving-server.ts";
import { REQUEST } from "./fixtures/requests.ts";

const { version } = JSON.parse(readFileSync(new URL("../../sdk/package.json", import.meta.url), "utf8"));

const opened: { close(): Promise<void> }[] = [];
afterEach(async () => {
  for (const item of opened.splice(0)) await item.close();
});

async function open(behaviour: Behaviour, options?: Parameters<typeof clientOf>[1]) {
  const server = await startServer(behaviour);
  const { client } = clientOf(server, options);
  opened.push(client, server);
  return { server, client };
}

describe("a request", () => {
  it("carries the key, the SDK's name and version, a request id and the media types", async () => {
    const { client, server } = await open(json({}), { apiKey: "secret-key", userAgent: "quotes/2.1" });
    await client.estimate(REQUEST);
    const [{ method, url, headers, body }] = server.seen;
    expect([method, url]).toEqual(["POST", "/v1/estimates"]);
    expect(headers.authorization).toBe("Bearer secret-key");
    expect(headers["user-agent"]).toBe(`quotes/2.1 kneegap-sdk/${version} node/${process.versions.node}`);
    expect(headers["x-request-id"]).toMatch(/^[0-9a-f-]{36}$/);
    expect(headers["content-type"]).toBe("application/json");
    expect(headers.accept).toBe("application/json, application/problem+json");
    expect(headers["content-length"]).toBe(String(Buffer.byteLength(body)));
  });

  it("without a body or a key sends neither", async () => {
    const { client, server } = await open(json({}));
    await client.rules();
    const [{ method, headers, body }] = server.seen;
    expect([method, body]).toEqual(["GET", ""]);
    expect(headers).not.toHaveProperty("content-type");
    expect(headers).not.toHaveProperty("authorization");
  });

  it("goes below the base URL's path", async () => {
    const server = await startServer(json({}));
    const { client } = clientOf({ url: `${server.url}/pv/gap/` });
    opened.push(client, server);
    await client.version();
    expect(server.seen[0].url).toBe("/pv/gap/version");
  });

  it.each(["", "two words", "a/b", "x".repeat(65), "é"])("with the request id %j is refused", async (requestId) => {
    const { client, server } = await open(json({}));
    await expect(client.version({ requestId })).rejects.toThrow(TypeError);
    expect(server.seen).toEqual([]);
  });

  it.each([
    { timeout: 0 },
    { timeout: Number.NaN },
    { timeout: Number.POSITIVE_INFINITY },
    { attempts: 0 },
    { attempts: 1.5 },
  ])("with %j is refused", async (options) => {
    const { client, server } = await open(json({}));
    await expect(client.version(options)).rejects.toThrow(RangeError);
    expect(server.seen).toEqual([]);
  });

  it("uses one connection for calls one after the other and no more than allowed for many at once", async () => {
    const later: Behaviour = (response, request) => setTimeout(() => json({})(response, request), 5);
    const { client, server } = await open(later, { connections: 3 });
    await client.version();
    // undici takes a connection up again one turn of the event loop after its answer.
    await new Promise((resolve) => setImmediate(resolve));
    await client.version();
    expect(server.connections()).toBe(1);
    await Promise.all(Array.from({ length: 20 }, () => client.version()));
    expect(server.seen).toHaveLength(22);
    expect(server.connections()).toBe(3);
  });
});

describe("a closed client", () => {
  it("has let the calls under way finish, retries included, and refuses new ones", async () => {
    let turn = 0;
    const failFirst: Behaviour = (response, request) =>
      setTimeout(() => {
        turn += 1;
        if (turn === 1) response.socket?.destroy();
        else json({ status: "live" })(response, request);
      }, 20);
    const { client, server } = await open(failFirst);
    const underWay = client.liveness();
    const closing = client.close();
    await expect(client.liveness({ requestId: "after" })).rejects.toMatchObject({
      name: "ClosedError",
      requestId: "after",
      attempts: 0,
    });
    await closing;
    expect(await underWay).toEqual({ status: "live" });
    expect(server.seen).toHaveLength(2);
  });

  it("may be closed twice, and by its disposer", async () => {
    const { client } = await open(json({}));
    await client[Symbol.asyncDispose]();
    expect(client.close()).toBe(client.close());
    await client.close();
  });
});
