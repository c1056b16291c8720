import { createHash } from "node:crypto";
import { EventEmitter, once } from "node:events";
import { gunzipSync, gzipSync } from "node:zlib";
import { describe, expect, it } from "vitest";
import { CEILINGS } from "../../service/wire/limits.ts";
import type { Json } from "../wire/requests.ts";
import { estimateRequest } from "../wire/requests.ts";
import type { Body } from "./an-app.ts";
import { anApp, post } from "./an-app.ts";

const body = JSON.stringify(estimateRequest());

/** The problem of an answer, which must be one in every respect. */
async function problemOf(answer: Response, status: number, code: string): Promise<Json> {
  expect(answer.status).toBe(status);
  expect(answer.headers.get("content-type")).toBe("application/problem+json");
  const problem: Json = await answer.json();
  expect(problem).toMatchObject({ type: `urn:kneegap:problem:${code}`, code, status });
  expect(Object.keys(problem)).toEqual([
    "type",
    "title",
    "status",
    "detail",
    "code",
    "requestId",
    "errorCount",
    "errors",
  ]);
  expect(answer.headers.get("x-request-id")).toBe(problem.requestId);
  return problem;
}

describe("the app", () => {
  const { app } = anApp();

  it("answers an estimate", async () => {
    const answer = await app.request("/v1/estimates", post(body));
    expect(answer.status).toBe(200);
    expect(answer.headers.get("content-type")).toBe("application/json");
    expect(((await answer.json()) as Json).energy.available).toBeGreaterThan(0);
  });

  it("names what to change in a wrong request", async () => {
    const wrong = JSON.stringify({ ...estimateRequest(), mode: "slow" });
    const problem = await problemOf(await app.request("/v1/estimates", post(wrong)), 422, "invalid-request");
    expect(problem.errors[0]).toMatchObject({
      pointer: "/mode",
      code: "not-one-of",
      expected: "one of: auto, steady, stepped",
    });
    expect(problem.errorCount).toBe(1);
  });

  it.each([
    ["/nowhere", 404, "not-found", null],
    ["/v1/nowhere", 404, "not-found", null],
    ["/v1/estimates", 405, "method-not-allowed", "POST"],
  ])("has nothing at GET %s: %i", async (path, status, code, allow) => {
    const answer = await app.request(path);
    await problemOf(answer, status, code);
    expect(answer.headers.get("allow")).toBe(allow);
  });

  it("answers 405 with the methods that fit to any other method", async () => {
    for (const method of ["POST", "PUT", "DELETE", "PATCH", "OPTIONS"]) {
      const answer = await app.request("/v1/rules", { method });
      await problemOf(answer, 405, "method-not-allowed");
      expect(answer.headers.get("allow")).toBe("GET, HEAD");
    }
    expect((await app.request("/v1/rules", { method: "HEAD" })).status).toBe(200);
  });

  it.each(["text/html", "application/xml, text/*;q=0.5", "application/json;q=0", "*/*;q=0"])(
    "refuses Accept: %s with 406",
    async (accept) => {
      await problemOf(await app.request("/v1/estimates", post(body, { accept })), 406, "not-acceptable");
    },
  );

  it.each(["application/json", "*/*", "text/html, application/*;q=0.1", ""])("admits Accept: %s", async (accept) => {
    expect((await app.request("/v1/estimates", post(body, { accept }))).status).toBe(200);
  });

  it.each(["text/plain", "application/x-www-form-urlencoded", "application/json; charset=latin1", "application/jsonx"])(
    "refuses a body of %s with 415",
    async (type) => {
      await problemOf(
        await app.request("/v1/estimates", post(body, { "content-type": type })),
        415,
        "unsupported-media-type",
      );
    },
  );

  it("admits a charset of UTF-8 and refuses other encodings than gzip", async () => {
    const typed = post(body, { "content-type": 'application/json; charset="UTF-8"' });
    expect((await app.request("/v1/estimates", typed)).status).toBe(200);
    const packed = post(body, { "content-encoding": "br" });
    await problemOf(await app.request("/v1/estimates", packed), 415, "unsupported-media-type");
  });

  it("refuses a POST without a body", async () => {
    const answer = await app.request("/v1/estimates", {
      method: "POST",
      headers: { "content-type": "application/json" },
    });
    await problemOf(answer, 400, "malformed-body");
  });

  it("keeps a harmless request id and replaces any other", async () => {
    const idOf = async (given: string) =>
      (await app.request("/health/live", { headers: { "x-request-id": given } })).headers.get("x-request-id");
    expect(await idOf("quote-17.B_2")).toBe("quote-17.B_2");
    for (const given of ["a b", "x".repeat(65), "é", "<script>"]) expect(await idOf(given)).toMatch(/^[0-9a-f-]{36}$/);
    expect(await idOf("x".repeat(64))).toBe("x".repeat(64));
  });

  it("sends security headers with everything and opens no door to other origins", async () => {
    for (const path of ["/health/live", "/nowhere", "/openapi.json", "/v1/estimates"]) {
      const { headers } = await app.request(path, { headers: { origin: "https://elsewhere.example" } });
      expect(headers.get("x-content-type-options")).toBe("nosniff");
      expect(headers.get("cache-control")).toBe("no-store");
      expect(headers.get("content-security-policy")).toContain("default-src 'none'");
      expect([...headers.keys()].filter((name) => name.startsWith("access-control"))).toEqual([]);
    }
  });

  it("tells the rules, the version and the limits in force", async () => {
    const lowered = anApp({ limits: { ...CEILINGS, samples: 100 } }).app;
    expect(((await (await app.request("/v1/rules")).json()) as Json).rules.length).toBeGreaterThan(5);
    const version: Json = await (await lowered.request("/version")).json();
    expect(version).toEqual({
      name: "kneegap",
      version: expect.stringMatching(/^\d+\.\d+\.\d+/),
      limits: { ...CEILINGS, samples: 100 },
    });
  });

  it("is live always, ready only when warm and not draining", async () => {
    for (const [state, status, code] of [
      ["warming", 503, "warming"],
      ["ready", 200, null],
      ["draining", 503, "draining"],
    ] as const) {
      const one = anApp({ state: () => state }).app;
      expect((await one.request("/health/live")).status).toBe(200);
      const ready = await one.request("/health/ready");
      expect(ready.status).toBe(status);
      if (code === null) continue;
      await problemOf(ready, 503, code);
      expect(Number(ready.headers.get("retry-after"))).toBeGreaterThan(0);
    }
  });

  it("asks clients to leave while it drains, and still answers them", async () => {
    const answer = await anApp({ state: () => "draining" }).app.request("/v1/estimates", post(body));
    expect(answer.status).toBe(200);
    expect(answer.headers.get("connection")).toBe("close");
  });
});

describe("gzip", () => {
  const { app } = anApp();

  it("bodies are understood, to the same answer", async () => {
    const plain = await (await app.request("/v1/estimates", post(body))).text();
    const packed = await app.request("/v1/estimates", post(gzipSync(body), { "content-encoding": "gzip" }));
    expect(await packed.text()).toBe(plain);
  });

  it("bodies that are cut, or none, are malformed", async () => {
    for (const broken of [gzipSync(body).subarray(0, 50), Buffer.from(body)]) {
      const answer = await app.request("/v1/estimates", post(broken as Body, { "content-encoding": "gzip" }));
      expect((await problemOf(answer, 400, "malformed-body")).detail).toContain("gzip");
    }
  });

  it("answers are sent where they are asked for and worth it", async () => {
    const plain = await (await app.request("/v1/estimates", post(body))).text();
    const answer = await app.request("/v1/estimates", post(body, { "accept-encoding": "br, gzip;q=0.5" }));
    expect(answer.headers.get("content-encoding")).toBe("gzip");
    expect(answer.headers.get("vary")).toContain("accept-encoding");
    expect(gunzipSync(Buffer.from(await answer.arrayBuffer())).toString()).toBe(plain);
    const refused = await app.request("/v1/estimates", post(body, { "accept-encoding": "gzip;q=0" }));
    expect(refused.headers.get("content-encoding")).toBeNull();
    const short = await app.request("/health/live", { headers: { "accept-encoding": "gzip" } });
    expect(short.headers.get("content-encoding")).toBeNull();
  });
});

describe("the body limit", () => {
  const limits = { ...CEILINGS, bodyBytes: Buffer.byteLength(body) };
  const { app } = anApp({ limits });

  /** A body of unknown length, in pieces. */
  const stream = (text: string) => ({
    ...post(new Blob([text]).stream() as unknown as Body),
    duplex: "half" as const,
  });

  it("admits a body of just that length and refuses one byte more", async () => {
    expect((await app.request("/v1/estimates", post(body))).status).toBe(200);
    const answer = await app.request("/v1/estimates", post(`${body} `));
    await problemOf(answer, 413, "body-too-large");
    expect(answer.headers.get("connection")).toBe("close");
  });

  it("holds where the length is not said beforehand", async () => {
    expect((await app.request("/v1/estimates", stream(body))).status).toBe(200);
    await problemOf(await app.request("/v1/estimates", stream(`${body} `)), 413, "body-too-large");
  });

  it("holds for what gzip unpacks to", async () => {
    const fits = post(gzipSync(body), { "content-encoding": "gzip" });
    expect((await app.request("/v1/estimates", fits)).status).toBe(200);
    const bomb = post(gzipSync(`${body}${" ".repeat(10_000_000)}`), { "content-encoding": "gzip" });
    await problemOf(await app.request("/v1/estimates", bomb), 413, "body-too-large");
  });

  it("holds for all bodies together, and is given back with each answer", async () => {
    const small = anApp({ heldBytes: Buffer.byteLength(body) + 10 });
    const gate = new EventEmitter();
    const slow = anApp({ heldBytes: Buffer.byteLength(body) + 10 }, async () => {
      await once(gate, "open");
      return { ok: true, bytes: new Uint8Array([123, 125]), contentType: "application/json" };
    });
    const first = slow.app.request("/v1/estimates", post(body));
    const second = await slow.app.request("/v1/estimates", post(body));
    await problemOf(second, 503, "overloaded");
    gate.emit("open");
    expect((await first).status).toBe(200);
    for (let round = 0; round < 3; round++)
      expect((await small.app.request("/v1/estimates", post(body))).status).toBe(200);
  });
});

describe("a slow sender", () => {
  /** A body that stops after its first piece. */
  const stalled = () =>
    new ReadableStream({
      start: (controller) => controller.enqueue(new TextEncoder().encode("{")),
    });

  /** A body that comes in drops. */
  const dripping = () =>
    new ReadableStream({
      pull: async (controller) => {
        await new Promise((resolve) => setTimeout(resolve, 20));
        controller.enqueue(new TextEncoder().encode(" "));
      },
    });

  it.each([
    ["pauses too long", stalled],
    ["takes too long as a whole", dripping],
  ])("that %s is answered 408", async (_how, source) => {
    const { app } = anApp({ idleTime: 50, uploadTime: 200 });
    const request = { ...post(source() as unknown as Body), duplex: "half" as const };
    await problemOf(await app.request("/v1/estimates", request), 408, "too-slow");
  });
});

describe("keys", () => {
  const secret = "correct-horse-battery";
  const digest = createHash("sha256").update(secret).digest();
  const { app, lines } = anApp({
    keys: [
      { name: "other", digest: Buffer.alloc(32) },
      { name: "quotes", digest },
    ],
  });
  const shown = (authorization: string) => ({ headers: { authorization } });

  it("guard everything under /v1 and nothing else", async () => {
    for (const path of ["/v1/rules", "/v1/estimates", "/v1/nowhere"]) {
      const answer = await app.request(path);
      await problemOf(answer, 401, "unauthorized");
      expect(answer.headers.get("www-authenticate")).toContain("Bearer");
    }
    for (const path of ["/health/live", "/health/ready", "/version", "/openapi.json"]) {
      expect((await app.request(path)).status).toBe(200);
    }
  });

  it("open with the right key only", async () => {
    expect((await app.request("/v1/rules", shown(`Bearer ${secret}`))).status).toBe(200);
    expect((await app.request("/v1/rules", shown(`bearer ${secret}`))).status).toBe(200);
    for (const wrong of [
      `Bearer ${secret}x`,
      "Bearer",
      `Basic ${secret}`,
      secret,
      `Bearer ${digest.toString("hex")}`,
    ]) {
      expect((await app.request("/v1/rules", shown(wrong))).status).toBe(401);
    }
  });

  it("are logged by name, never themselves", async () => {
    lines.length = 0;
    await app.request("/v1/rules", shown(`Bearer ${secret}`));
    await app.request("/v1/rules", shown("Bearer a-wrong-key-that-is-long"));
    expect(lines.map(({ values }) => values["key"])).toEqual(["quotes", null]);
    expect(JSON.stringify(lines)).not.toMatch(/correct-horse|wrong-key/);
  });
});

describe("the log", () => {
  it("has one line a request, without body, query or path as it was sent", async () => {
    const { app, lines } = anApp();
    await app.request("/v1/estimates?site=48.1374,11.5755", post(body, { "x-request-id": "abc" }));
    await app.request("/secret-path?token=1");
    expect(lines).toHaveLength(2);
    expect(lines[0].values).toMatchObject({
      requestId: "abc",
      method: "POST",
      route: "/v1/estimates",
      status: 200,
      key: null,
      problem: null,
    });
    expect(lines[1].values).toMatchObject({ status: 404, problem: "not-found" });
    expect(JSON.stringify(lines)).not.toMatch(/48\.1374|secret-path|token|38\.9/);
  });

  it("gets what the caller must not see of a defect", async () => {
    const { app, lines } = anApp({}, async () => {
      throw new Error("at /home/secret/file.ts");
    });
    const problem = await problemOf(await app.request("/v1/estimates", post(body)), 500, "internal");
    expect(JSON.stringify(problem)).not.toContain("secret");
    expect(lines.find(({ level }) => level === "error")?.values).toMatchObject({
      requestId: problem.requestId,
      error: "at /home/secret/file.ts",
    });
  });
});
