import { createServer } from "node:net";
import { afterEach, describe, expect, it } from "vitest";
import { AbortedError } from "../../sdk/src/errors/aborted-error.ts";
import { ConnectionError } from "../../sdk/src/errors/connection-error.ts";
import { KneegapError } from "../../sdk/src/errors/kneegap-error.ts";
import { ProblemError } from "../../sdk/src/errors/problem-error.ts";
import { ProtocolError } from "../../sdk/src/errors/protocol-error.ts";
import { RateLimitedError } from "../../sdk/src/errors/rate-limited-error.ts";
import { RequestProblemError } from "../../sdk/src/errors/request-problem-error.ts";
import { ServerProblemError } from "../../sdk/src/errors/server-problem-error.ts";
import { TimeoutError } from "../../sdk/src/errors/timeout-error.ts";
import { UnavailableError } from "../../sdk/src/errors/unavailable-error.ts";
import { clientOf } from "./fixtures/client-of.ts";
import type { Behaviour } from "./fixtures/misbehaving-server.ts";
import { hangUp, json, problem, raw, silence, startServer } from "./fixtures/misbehaving-server.ts";
import { REQUEST } from "./fixtures/requests.ts";

const opened: { close(): Promise<void> }[] = [];
afterEach(async () => {
  for (const item of opened.splice(0)) await item.close();
});

async function open(behaviours: Behaviour[], options?: Parameters<typeof clientOf>[1]) {
  const server = await startServer(...behaviours);
  const { client, waits } = clientOf(server, options);
  opened.push(client, server);
  return { server, client, waits };
}

/** What `call` was rejected with. */
async function failure(call: Promise<unknown>): Promise<KneegapError> {
  const error = await call.then(
    () => null,
    (reason: unknown) => reason,
  );
  expect(error).toBeInstanceOf(KneegapError);
  return error as KneegapError;
}

describe("an error status", () => {
  it.each([
    [400, RequestProblemError],
    [401, RequestProblemError],
    [422, RequestProblemError],
    [408, UnavailableError],
    [429, RateLimitedError],
    [500, ServerProblemError],
    [501, ServerProblemError],
    [502, UnavailableError],
    [503, UnavailableError],
    [504, UnavailableError],
  ] as const)("%i is thrown as its family's error and carries the problem", async (status, Family) => {
    const { client } = await open([problem(status, "some-code", { "x-request-id": "from-the-header" })]);
    const error = await failure(client.liveness());
    expect(error).toBeInstanceOf(Family);
    expect(error).toBeInstanceOf(ProblemError);
    expect(error).toMatchObject({ name: Family.name, status, problem: { code: "some-code", status } });
    expect(error.requestId).toBe("from-the-header");
  });

  it("says in its message where the request is wrong", async () => {
    const errors = [{ pointer: "/module/openCircuitVoltageCoefficient", code: "x", detail: "did you mean -0.29?" }];
    const { client } = await open([problem(422, "out-of-range", {}, { errors })]);
    const error = await failure(client.estimate(REQUEST));
    expect(error.message).toContain("422 out-of-range: The out-of-range detail.");
    expect(error.message).toContain("/module/openCircuitVoltageCoefficient: did you mean -0.29?");
  });

  it("from a proxy, without a problem document, has a null problem where it may be retried", async () => {
    const { client } = await open([raw("busy", 503, { "content-type": "text/html", "retry-after": "1" })]);
    expect(await failure(client.liveness())).toMatchObject({
      name: "UnavailableError",
      problem: null,
      retryAfter: 1000,
    });
  });

  it.each([
    ["an HTML page", 404, "<h1>nothing here</h1>", "text/html"],
    ["a problem without its members", 422, "{}", "application/problem+json"],
    ["a problem that does not parse", 500, '{"code":', "application/problem+json"],
    ["a redirection", 302, "", "text/plain"],
  ])("with %s is a ProtocolError", async (_, status, body, type) => {
    const { client, server } = await open([raw(body, status, { "content-type": type, location: "/elsewhere" })]);
    expect(await failure(client.liveness())).toMatchObject({ name: "ProtocolError", status });
    expect(server.seen).toHaveLength(1);
  });
});

describe("a success that is not what the document says", () => {
  it.each([
    ["another media type", raw("<p>fine</p>", 200, { "content-type": "text/html" })],
    ["no media type", raw("{}", 200)],
    ["truncated JSON", raw('{"status": "li', 200, { "content-type": "application/json" })],
    ["an empty body", raw("", 200, { "content-type": "application/json" })],
    ["an undocumented status", json({}, 204)],
  ])("with %s is a ProtocolError and is not retried", async (_, behaviour) => {
    const { client, server } = await open([behaviour]);
    expect(await failure(client.liveness())).toBeInstanceOf(ProtocolError);
    expect(server.seen).toHaveLength(1);
  });

  it("in bytes that are not UTF-8 is a ProtocolError", async () => {
    const latin: Behaviour = (response) => {
      response.writeHead(200, { "content-type": "application/json" }).end(Buffer.from([0x22, 0xe9, 0x22]));
    };
    const { client } = await open([latin]);
    expect((await failure(client.liveness())).message).toContain("UTF-8");
  });

  it("that is no HTTP at all is a ProtocolError", async () => {
    const server = createServer((socket) =>
      socket
        .on("error", () => {})
        .resume()
        .end("SSH-2.0-hello\r\n\r\n"),
    );
    await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
    const { port } = server.address() as { port: number };
    const { client } = clientOf({ url: `http://127.0.0.1:${port}` });
    opened.push(client);
    expect(await failure(client.liveness())).toMatchObject({ name: "ProtocolError", status: null });
    await new Promise((resolve) => server.close(resolve));
  });

  it("is taken with parameters and capitals in its media type", async () => {
    const { client } = await open([
      raw('{"status":"live"}', 200, { "content-type": "Application/JSON; charset=utf-8" }),
    ]);
    expect(await client.liveness()).toEqual({ status: "live" });
  });
});

describe("an answer past the bound", () => {
  const endless: Behaviour = (response) => {
    response.writeHead(200, { "content-type": "application/json" });
    const timer = setInterval(() => response.write("x".repeat(4096)), 1);
    response.on("close", () => clearInterval(timer));
  };
  it.each([
    ["stated by its length", raw("x".repeat(20_000), 200, { "content-type": "application/json" })],
    ["sent without end", endless],
    ["of an error", raw("x".repeat(20_000), 503, { "content-type": "text/plain" })],
  ])("%s is given up and its connection closed", async (_, behaviour) => {
    const { client, server } = await open([behaviour, json({ status: "live" })], { maximumAnswerBytes: 10_000 });
    expect(await failure(client.liveness())).toMatchObject({ name: "AnswerTooLargeError", maximumAnswerBytes: 10_000 });
    expect(server.seen).toHaveLength(1);
    expect(await client.liveness()).toEqual({ status: "live" });
  });

  it("is not met by an answer of exactly that size", async () => {
    const text = JSON.stringify({ status: "x".repeat(87) });
    const { client } = await open([raw(text, 200, { "content-type": "application/json" })], {
      maximumAnswerBytes: 100,
    });
    expect(text).toHaveLength(100);
    expect(await client.liveness()).toEqual(JSON.parse(text));
  });
});

describe("a service out of reach", () => {
  it("is a ConnectionError with the socket's error as its cause", async () => {
    const server = await startServer(silence);
    await server.close();
    const { client, waits } = clientOf(server);
    opened.push(client);
    const error = await failure(client.liveness({ requestId: "lost" }));
    expect(error).toBeInstanceOf(ConnectionError);
    expect(error).toMatchObject({ attempts: 8, requestId: "lost", cause: { code: "ECONNREFUSED" } });
    expect(waits).toHaveLength(7);
  });
});

describe("a call's timeout", () => {
  it("ends a call that is not answered", async () => {
    const { client } = await open([silence]);
    const error = await failure(client.liveness({ timeout: 50 }));
    expect(error).toBeInstanceOf(TimeoutError);
    expect(error).toMatchObject({ timeout: 50, attempts: 1 });
  });

  it("ends a call whose answer trickles", async () => {
    const trickle: Behaviour = (response) => {
      response.writeHead(200, { "content-type": "application/json" });
      const timer = setInterval(() => response.write(" "), 5);
      response.on("close", () => clearInterval(timer));
    };
    const { client } = await open([trickle]);
    expect(await failure(client.liveness({ timeout: 60 }))).toBeInstanceOf(TimeoutError);
  });

  it("covers all attempts together", async () => {
    const slowFailure: Behaviour = (response) =>
      setTimeout(() => problem(503, "queue-full")(response, response.req), 40);
    const { client, server } = await open([slowFailure], { retry: { attempts: 100, baseDelay: 0 } });
    const started = performance.now();
    expect(await failure(client.liveness({ timeout: 150 }))).toBeInstanceOf(TimeoutError);
    expect(performance.now() - started).toBeLessThan(1000);
    expect(server.seen.length).toBeGreaterThan(1);
    expect(server.seen.length).toBeLessThan(6);
  });

  it("ends a wait between attempts that the timer overslept", async () => {
    const sleep = (_: number, signal: AbortSignal) =>
      new Promise<void>((_resolve, reject) => signal.addEventListener("abort", () => reject(new Error("woken"))));
    const { client } = await open([hangUp], { timeout: 80, retry: { sleep, baseDelay: 1 } });
    expect(await failure(client.liveness())).toBeInstanceOf(TimeoutError);
  });
});

describe("a caller's signal", () => {
  it("ends a call under way, with its reason as the cause, and lets the service know", async () => {
    const controller = new AbortController();
    let gone = false;
    const watch: Behaviour = (response) => {
      response.on("close", () => {
        gone = true;
      });
      controller.abort("the user left");
    };
    const { client } = await open([watch]);
    const error = await failure(client.liveness({ signal: controller.signal }));
    expect(error).toBeInstanceOf(AbortedError);
    expect(error).toMatchObject({ cause: "the user left", attempts: 1 });
    await expect.poll(() => gone).toBe(true);
  });

  it("that has fired already lets nothing out", async () => {
    const { client, server } = await open([silence]);
    const error = await failure(client.liveness({ signal: AbortSignal.abort("too late") }));
    expect(error).toMatchObject({ name: "AbortedError", attempts: 0, cause: "too late" });
    expect(server.seen).toEqual([]);
  });

  it("ends the wait between two attempts", async () => {
    const controller = new AbortController();
    const server = await startServer(hangUp);
    const { client } = clientOf(server, { retry: { sleep: undefined, baseDelay: 60_000, random: () => 0.9 } });
    opened.push(client, server);
    setTimeout(() => controller.abort(), 50);
    expect(await failure(client.liveness({ signal: controller.signal }))).toBeInstanceOf(AbortedError);
  });

  it("is let go of when the call ends", async () => {
    const { client } = await open([json({})]);
    const { signal } = new AbortController();
    let listening = 0;
    const add = signal.addEventListener.bind(signal);
    const remove = signal.removeEventListener.bind(signal);
    signal.addEventListener = (...listener: Parameters<typeof add>) => {
      listening += 1;
      add(...listener);
    };
    signal.removeEventListener = (...listener: Parameters<typeof remove>) => {
      listening -= 1;
      remove(...listener);
    };
    await client.liveness({ signal });
    expect(listening).toBe(0);
  });
});
