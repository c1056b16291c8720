import { setTimeout as wait } from "node:timers/promises";
import { afterEach, describe, expect, it } from "vitest";
import { KneegapError } from "../../sdk/src/errors/kneegap-error.ts";
import { problem, raw } from "./fixtures/misbehaving-server.ts";
import type { AskedFor, Treatment } from "./fixtures/portfolio-server.ts";
import { answerTo, answerWell, begin, problemOf, totals } from "./fixtures/portfolio-server.ts";
import { openPortfolios, stages } from "./fixtures/run-portfolio.ts";

// The expected behaviour is the contract's: retried are connection errors, cut answers, 408, 429, 502, 503 and 504,
// never `worker-lost`; waits are random * min(5000, 250 * 2^n), here with random = 1/2, or Retry-After.

const opened: { close(): Promise<void> }[] = [];
afterEach(async () => {
  for (const item of opened.splice(0)) await item.close();
});

async function open(...parameters: Parameters<typeof openPortfolios>) {
  const bench = await openPortfolios(...parameters);
  opened.push(bench);
  return bench;
}

const line = (value: unknown) => `${JSON.stringify(value)}\n`;
const askedIds = (asked: AskedFor[]) => asked.map((request) => request.sites.map(({ id }) => Number(id.slice(6))));

describe("an answer that is cut", () => {
  it.each([
    ["by the connection", (end: Parameters<Treatment>[0]) => end.socket!.destroy()],
    ["but ends well", (end: Parameters<Treatment>[0]) => end.end()],
    ["inside a line", (end: Parameters<Treatment>[0]) => end.end('{"kind":"totals"')],
  ])("%s has only the sites that it left open sent again", async (_, cut) => {
    const { run, server, waits } = await open((response, asked, turn) => {
      if (turn > 1) return false;
      begin(response).write(line(answerTo(asked.sites[2])) + line(answerTo(asked.sites[0])), () => {
        setTimeout(cut, 10, response);
      });
      return true;
    });
    const { ids, error, portfolio } = await run(stages(4));
    expect(error).toBeNull();
    expect(ids).toEqual(["stage 2", "stage 0", "stage 3", "stage 1"]);
    expect(askedIds(server.asked)).toEqual([
      [0, 1, 2, 3],
      [1, 3],
    ]);
    expect(waits).toEqual([125]);
    expect(portfolio.totals()).toMatchObject({ sites: 4, answered: 4 });
  });

  it("after its last site has nothing sent again", async () => {
    const { run, server } = await open((response, asked) => {
      begin(response).end(asked.sites.map((site) => line(answerTo(site))).join(""));
      return true;
    });
    expect(await run(stages(3))).toMatchObject({ ids: ["stage 0", "stage 1", "stage 2"], error: null });
    expect(server.asked).toHaveLength(1);
  });

  it("again and again without a site answered is asked for in halves, and given up after 8 times", async () => {
    const { run, server } = await open((response) => {
      begin(response).end();
      return true;
    });
    const { error, ids } = await run(stages(64));
    expect(error).toMatchObject({ name: "ConnectionError", attempts: 8 });
    expect(ids).toEqual([]);
    expect(server.asked.map((asked) => asked.sites.length)).toEqual([64, 32, 16, 8, 4, 2, 1, 1]);
  });

  it("again and again, but with a site answered each time, is never given up", async () => {
    const { run, server } = await open((response, asked) => {
      begin(response).end(line(answerTo(asked.sites[0])));
      return true;
    });
    const { error, ids } = await run(stages(30), { attempts: 2 });
    expect(error).toBeNull();
    expect(ids).toEqual(stages(30).map(({ id }) => id));
    expect(server.asked).toHaveLength(30);
  });

  it("by silence is asked for in halves, so that a proxy that holds answers back lets them through", async () => {
    const { run, server } = await open(async (response, asked) => {
      await wait(10 + 20 * asked.sites.length);
      answerWell(response, asked);
      return true;
    });
    const { error, ids } = await run(stages(32), { timeout: 250 });
    expect(error).toBeNull();
    expect(ids).toHaveLength(32);
    const [first, second, ...others] = server.asked.map((asked) => asked.sites.length);
    expect([first, second]).toEqual([32, 16]);
    expect(Math.max(...others)).toBeLessThanOrEqual(8);
  });
});

describe("a proxy without room for a whole request", () => {
  const roomy =
    (room: number): Treatment =>
    (response, asked) => {
      if (asked.bytes <= room) return false;
      raw("<h1>Request Entity Too Large</h1>", 413, { "content-type": "text/html" })(response, response.req);
      return true;
    };

  it("has the requests made smaller, those that follow too", async () => {
    const { run, server, waits } = await open(roomy(1000));
    const { error, ids } = await run(stages(400), { concurrency: 1 });
    expect(error).toBeNull();
    expect(new Set(ids).size).toBe(400);
    expect(waits).toEqual([]);
    const refused = server.asked.map(({ bytes }) => bytes > 1000);
    expect(refused.lastIndexOf(true)).toBeLessThan(3);
    expect(server.asked.length).toBeLessThan(30);
  });

  it("for one site ends the loop", async () => {
    const { run, server } = await open(roomy(1));
    expect((await run(stages(4))).error).toMatchObject({ name: "ProtocolError", status: 413 });
    expect(server.asked.map((asked) => asked.sites.length)).toEqual([4, 2, 1]);
  });
});

describe("a service that is busy", () => {
  it("is asked for the same sites again, after the time that it names", async () => {
    const { run, server, waits } = await open((response, _, turn) => {
      if (turn > 2) return false;
      problem(503, "overloaded", { "retry-after": "2" })(response, response.req);
      return true;
    });
    expect((await run(stages(8))).error).toBeNull();
    expect(server.asked.map((asked) => asked.sites.length)).toEqual([8, 8, 8]);
    expect(waits).toEqual([2125, 2125]);
  });

  it("is not given up as long as it answers other requests", async () => {
    const answering = new Set<string>();
    const { run } = await open(
      async (response, asked) => {
        const id = String(asked.headers["x-request-id"]);
        if (answering.size > 0) {
          problem(503, "overloaded")(response, response.req);
          return true;
        }
        answering.add(id);
        begin(response);
        for (const site of asked.sites) {
          response.write(line(answerTo(site)));
          await wait(10);
        }
        response.end(totals([]));
        answering.delete(id);
        return true;
      },
      { retry: { sleep: () => wait(11) } },
    );
    const { error, ids } = await run(stages(40), { batchSites: 10, attempts: 3 });
    expect(error).toBeNull();
    expect(ids).toHaveLength(40);
  });

  it("for longer than the timeout ends the loop", async () => {
    const { run, waits } = await open((response) => {
      problem(503, "draining", { "retry-after": "3600" })(response, response.req);
      return true;
    });
    expect((await run(stages(1))).error).toMatchObject({ name: "UnavailableError", retryAfter: 3_600_000 });
    expect(waits).toEqual([]);
  });
});

describe("an answer that is aborted", () => {
  it("because the service shuts down has what it left open sent again", async () => {
    const { run, server } = await open((response, asked, turn) => {
      if (turn > 1) return false;
      const aborted = { kind: "aborted", line: 1, problem: problemOf(503, "draining") };
      begin(response).end(line(answerTo(asked.sites[1])) + line(aborted));
      return true;
    });
    expect((await run(stages(3))).error).toBeNull();
    expect(askedIds(server.asked)).toEqual([
      [0, 1, 2],
      [0, 2],
    ]);
  });

  it.each([
    [500, "internal", "ServerProblemError"],
    [500, "worker-lost", "ServerProblemError"],
    [422, "too-many-sites", "RequestProblemError"],
  ])("with %i %s ends the loop, after what it answered", async (status, code, name) => {
    const { run, server } = await open((response, asked) => {
      const aborted = { kind: "aborted", line: 1, problem: problemOf(status, code) };
      begin(response).end(line(answerTo(asked.sites[1])) + line(aborted));
      return true;
    });
    const { error, ids } = await run(stages(3));
    expect(error).toBeInstanceOf(KneegapError);
    expect(error).toMatchObject({ name, problem: { code }, requestId: "of-the-service", attempts: 1 });
    expect(ids).toEqual(["stage 1"]);
    expect(server.asked).toHaveLength(1);
  });
});

describe("a request that is refused", () => {
  it.each([
    [422, "RequestProblemError"],
    [401, "RequestProblemError"],
    [500, "ServerProblemError"],
  ])("with %i ends the loop, after what is under way", async (status, name) => {
    const { run, server } = await open(async (response, _, turn) => {
      if (turn !== 2) {
        await wait(30);
        return false;
      }
      problem(status, "some-code")(response, response.req);
      return true;
    });
    const { error, ids } = await run(stages(50), { batchSites: 5, concurrency: 3 });
    expect(error).toMatchObject({ name, status, problem: { code: "some-code" } });
    expect(ids).toHaveLength(10);
    expect(server.asked).toHaveLength(3);
  });

  it.each<[string, string, string]>([
    ["another media type", "text/html", "<h1>welcome</h1>"],
    ["a line that is no JSON", "application/x-ndjson", "kind: result\n"],
    ["text that is not UTF-8", "application/x-ndjson", "\xff\n"],
    ["a site not asked for", "application/x-ndjson", line(answerTo({ id: "another" }))],
    ["a site twice", "application/x-ndjson", line(answerTo({ id: "stage 0" })).repeat(2)],
    ["its totals too early", "application/x-ndjson", totals([])],
    [
      "a result without figures",
      "application/x-ndjson",
      `{"kind":"result","id":"stage 0","results":[{}]}\n${totals([])}`,
    ],
    ["an aborted line without a problem", "application/x-ndjson", '{"kind":"aborted"}\n'],
  ])("in a language of its own, %s, is a ProtocolError and not sent again", async (_, type, text) => {
    const { run, server } = await open((response) => {
      response.writeHead(200, { "content-type": type }).end(Buffer.from(text, "latin1"));
      return true;
    });
    expect((await run(stages(2))).error).toMatchObject({ name: "ProtocolError" });
    expect(server.asked).toHaveLength(1);
  });

  it("with more than the client reads is an AnswerTooLargeError", async () => {
    const { run } = await open(undefined, { maximumAnswerBytes: 5000 });
    expect((await run(stages(20))).error).toMatchObject({ name: "AnswerTooLargeError", maximumAnswerBytes: 5000 });
  });

  it("by a gateway without a problem document is sent again", async () => {
    const { run, server } = await open((response, _, turn) => {
      if (turn > 1) return false;
      raw("<h1>Bad Gateway</h1>", 502, { "content-type": "text/html" })(response, response.req);
      return true;
    });
    expect((await run(stages(2))).error).toBeNull();
    expect(server.asked.length).toBeGreaterThan(1);
  });
});
