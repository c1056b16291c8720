import { setTimeout as wait } from "node:timers/promises";
import { afterEach, describe, expect, it } from "vitest";
import { KneegapError } from "../../sdk/src/errors/kneegap-error.ts";
import type { Climate } from "../../sdk/src/generated/schema.ts";
import type { PortfolioLine, PortfolioSiteRequest } from "../../sdk/src/portfolio/portfolio-lines.ts";
import type { PortfolioOptions } from "../../sdk/src/portfolio/portfolio-options.ts";
import type { PortfolioSites } from "../../sdk/src/portfolio/portfolio-run.ts";
import { clientOf } from "./fixtures/client-of.ts";
import { problem, raw } from "./fixtures/misbehaving-server.ts";
import type { AskedFor, Treatment } from "./fixtures/portfolio-server.ts";
import { answerTo, answerWell, begin, problemOf, startPortfolioServer, totals } from "./fixtures/portfolio-server.ts";
import { REQUEST } from "./fixtures/requests.ts";

// The expected behaviour is the contract's: retried are connection errors, cut answers, 408, 429, 502, 503 and 504,
// never `worker-lost`; waits are random * min(5000, 250 * 2^n), here with random = 1/2, or Retry-After.

const opened: { close(): Promise<void> }[] = [];
afterEach(async () => {
  for (const item of opened.splice(0)) await item.close();
});

async function open(treat?: Treatment, options?: Parameters<typeof clientOf>[1]) {
  const server = await startPortfolioServer(treat);
  const { client, waits } = clientOf(server, options);
  opened.push(client, server);
  /** The lines of a portfolio, and what it threw. */
  const run = async (sites: PortfolioSites, given?: PortfolioOptions) => {
    const lines: PortfolioLine[] = [];
    const portfolio = client.portfolio(sites, given);
    try {
      for await (const line of portfolio) lines.push(line);
    } catch (error) {
      return { lines, ids: lines.map(({ id }) => id), error, portfolio };
    }
    return { lines, ids: lines.map(({ id }) => id), error: null, portfolio };
  };
  return { server, client, waits, run };
}

const sites = (count: number): PortfolioSiteRequest[] =>
  Array.from({ length: count }, (_, index) => ({ id: `stage ${index}` }));
const askedIds = (asked: AskedFor[]) => asked.map((request) => request.sites.map(({ id }) => Number(id.slice(6))));
const line = (value: unknown) => `${JSON.stringify(value)}\n`;
const climate: Climate = REQUEST.climate;

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
    const { ids, error, portfolio } = await run(sites(4));
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
    expect(await run(sites(3))).toMatchObject({ ids: ["stage 0", "stage 1", "stage 2"], error: null });
    expect(server.asked).toHaveLength(1);
  });

  it("again and again without a site answered is asked for in halves, and given up after 8 times", async () => {
    const { run, server } = await open((response) => {
      begin(response).end();
      return true;
    });
    const { error, ids } = await run(sites(64));
    expect(error).toMatchObject({ name: "ConnectionError", attempts: 8 });
    expect(ids).toEqual([]);
    expect(server.asked.map((asked) => asked.sites.length)).toEqual([64, 32, 16, 8, 4, 2, 1, 1]);
  });

  it("again and again, but with a site answered each time, is never given up", async () => {
    const { run, server } = await open((response, asked) => {
      begin(response).end(line(answerTo(asked.sites[0])));
      return true;
    });
    const { error, ids } = await run(sites(30), { attempts: 2 });
    expect(error).toBeNull();
    expect(ids).toEqual(sites(30).map(({ id }) => id));
    expect(server.asked).toHaveLength(30);
  });

  it("by silence is asked for in halves, so that a proxy that holds answers back lets them through", async () => {
    const { run, server } = await open(async (response, asked) => {
      await wait(10 + 20 * asked.sites.length);
      answerWell(response, asked);
      return true;
    });
    const { error, ids } = await run(sites(32), { timeout: 250 });
    expect(error).toBeNull();
    expect(ids).toHaveLength(32);
    const [first, second, ...others] = server.asked.map((asked) => asked.sites.length);
    expect([first, second]).toEqual([32, 16]);
    expect(Math.max(...others)).toBeLessThanOrEqual(8);
  });
});

describe("a service that is busy", () => {
  it("is asked for the same sites again, after the time that it names", async () => {
    const { run, server, waits } = await open((response, _, turn) => {
      if (turn > 2) return false;
      problem(503, "overloaded", { "retry-after": "2" })(response, response.req);
      return true;
    });
    expect((await run(sites(8))).error).toBeNull();
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
    const { error, ids } = await run(sites(40), { batchSites: 10, attempts: 3 });
    expect(error).toBeNull();
    expect(ids).toHaveLength(40);
  });

  it("for longer than the timeout ends the loop", async () => {
    const { run, waits } = await open((response) => {
      problem(503, "draining", { "retry-after": "3600" })(response, response.req);
      return true;
    });
    expect((await run(sites(1))).error).toMatchObject({ name: "UnavailableError", retryAfter: 3_600_000 });
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
    expect((await run(sites(3))).error).toBeNull();
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
    const { error, ids } = await run(sites(3));
    expect(error).toBeInstanceOf(KneegapError);
    expect(error).toMatchObject({ name, problem: { code }, requestId: "of-the-service", attempts: 1 });
    expect(ids).toEqual(["stage 1"]);
    expect(server.asked).toHaveLength(1);
  });
});

describe("a site's problem", () => {
  const answerWith =
    (problemLine: (asked: AskedFor) => object): Treatment =>
    (response, asked) => {
      const [first, ...others] = asked.sites;
      void first;
      const answers = others.map((site) => line(answerTo(site))).join("");
      begin(response).end(line(problemLine(asked)) + answers + totals([]));
      return true;
    };

  it("is handed over and not sent again, where it killed a worker too", async () => {
    const lost = problemOf(500, "worker-lost");
    const { run, server } = await open(
      answerWith(() => ({ kind: "site-problem", id: "stage 0", line: 1, problem: lost })),
    );
    const { lines, error, portfolio } = await run(sites(2));
    expect(error).toBeNull();
    expect(lines[0]).toEqual({ kind: "site-problem", id: "stage 0", problem: lost });
    expect(portfolio.totals()).toMatchObject({ sites: 2, answered: 1, refused: 1 });
    expect(server.asked).toHaveLength(1);
  });

  it("without an id belongs to the site of its line", async () => {
    const refused = problemOf(422, "line-too-long");
    const { run } = await open(
      answerWith((asked) => {
        const at = asked.lines.findIndex((sent) => sent.kind === "site") + 1;
        return { kind: "site-problem", id: null, line: at, problem: refused };
      }),
    );
    const named = { kind: "named" as const, name: "fjord" };
    const options = { defaults: {}, climates: { fjord: climate } };
    const { lines } = await run([{ id: "a", climate: named }, { id: "b" }], options);
    expect(lines[0]).toEqual({ kind: "site-problem", id: "a", problem: refused });
  });

  it("tells what is wrong with the climate that the site names", async () => {
    const [ofClimate, ofSite] = [problemOf(422, "invalid-request"), problemOf(422, "invalid-request")];
    ofClimate.detail = "The sun does not shine at night.";
    const { run } = await open((response, asked) => {
      expect(asked.lines.map(({ kind }) => kind)).toEqual(["climate", "site", "site"]);
      const climateLine = { kind: "site-problem", id: null, line: 1, problem: ofClimate };
      const siteLine = { kind: "site-problem", id: "a", line: 2, problem: ofSite };
      begin(response).end(line(climateLine) + line(siteLine) + line(answerTo(asked.sites[1])) + totals([]));
      return true;
    });
    const list = [{ id: "a", climate: { kind: "named" as const, name: "fjord" } }, { id: "b" }];
    const { lines, portfolio } = await run(list, { climates: { fjord: climate } });
    expect(lines[0]).toEqual({ kind: "site-problem", id: "a", problem: ofSite, climateProblem: ofClimate });
    expect(lines[1]).toMatchObject({ kind: "result", id: "b" });
    expect(portfolio.totals()).toMatchObject({ sites: 2, refused: 1 });
  });

  it("that will pass has the site sent again", async () => {
    const { run, server } = await open((response, asked, turn) => {
      if (turn > 1) return false;
      const busy = { kind: "site-problem", id: "stage 0", line: 1, problem: problemOf(503, "draining") };
      begin(response).end(line(busy) + line(answerTo(asked.sites[1])) + totals([]));
      return true;
    });
    expect(await run(sites(2))).toMatchObject({ ids: ["stage 1", "stage 0"], error: null });
    expect(askedIds(server.asked)).toEqual([[0, 1], [0]]);
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
    const { error, ids } = await run(sites(50), { batchSites: 5, concurrency: 3 });
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
    expect((await run(sites(2))).error).toMatchObject({ name: "ProtocolError" });
    expect(server.asked).toHaveLength(1);
  });

  it("with more than the client reads is an AnswerTooLargeError", async () => {
    const { run } = await open(undefined, { maximumAnswerBytes: 5000 });
    expect((await run(sites(20))).error).toMatchObject({ name: "AnswerTooLargeError", maximumAnswerBytes: 5000 });
  });

  it("by a gateway without a problem document is sent again", async () => {
    const { run, server } = await open((response, _, turn) => {
      if (turn > 1) return false;
      raw("<h1>Bad Gateway</h1>", 502, { "content-type": "text/html" })(response, response.req);
      return true;
    });
    expect((await run(sites(2))).error).toBeNull();
    expect(server.asked.length).toBeGreaterThan(1);
  });
});

describe("sites that cannot be sent", () => {
  const infinite: Climate = { ...climate, temperature: { kind: "cell", values: Float64Array.of(1, Infinity) } };

  it.each<[string, unknown, string | null, RegExp]>([
    ["an id that came before", { id: "stage 3" }, "stage 3", /at 10, "stage 3", has the id of the site at 3/],
    ["no id", {}, null, /at 10 has no id/],
    ["a number for an id", { id: 7 }, null, /no id, or one that is no text/],
    ["nothing at all", null, null, /no id/],
    [
      "a climate not given",
      { id: "x", climate: { kind: "named", name: "toString" } },
      "x",
      /names the climate "toString"/,
    ],
    ["what JSON cannot carry", { id: "x", climate: infinite }, "x", /\/climate\/temperature\/values\/1 is Infinity/],
    ["a named climate that JSON cannot carry", { id: "x", climate: { kind: "named", name: "far" } }, "x", /Infinity/],
  ])("with %s end the loop after those before them", async (_, site, id, message) => {
    const { run, server } = await open();
    let closed = false;
    function* sequence() {
      try {
        yield* [...sites(10), site as PortfolioSiteRequest, ...sites(30).slice(11)];
      } finally {
        closed = true;
      }
    }
    const { error, ids } = await run(sequence(), { climates: { far: infinite } });
    expect(error).toMatchObject({ name: "SiteInputError", index: 10, id });
    expect((error as Error).message).toMatch(message);
    expect(ids).toHaveLength(10);
    expect(server.asked).toHaveLength(1);
    expect(closed).toBe(true);
  });

  it("because their sequence fails let those before them be answered first", async () => {
    const { run } = await open();
    async function* sequence() {
      yield* sites(3);
      throw new Error("the folder is gone");
    }
    const { error, ids } = await run(sequence());
    expect(error).toEqual(new Error("the folder is gone"));
    expect(ids).toHaveLength(3);
  });

  it("because the defaults cannot be written are not begun", async () => {
    const { run, server } = await open();
    const { error } = await run(sites(3), { defaults: { recordLowTemperature: Number.NaN } });
    expect(error).toMatchObject({ name: "EncodingError", pointer: "/recordLowTemperature" });
    expect(server.asked).toEqual([]);
  });
});

describe("a caller who ends a portfolio", () => {
  it("by the signal frees the service at once and gets the reason", async () => {
    const controller = new AbortController();
    let gone = false;
    const { run, server } = await open((response, asked) => {
      response.on("close", () => {
        gone = true;
      });
      begin(response).write(line(answerTo(asked.sites[0])));
      setTimeout(() => controller.abort("the night is over"), 20);
      return true;
    });
    const { error, ids } = await run(sites(3), { signal: controller.signal, requestId: "night" });
    expect(error).toMatchObject({ name: "AbortedError", cause: "the night is over", requestId: "night" });
    expect(ids).toEqual(["stage 0"]);
    expect(server.asked).toHaveLength(1);
    await expect.poll(() => gone).toBe(true);
  });

  it("by the signal while the sequence keeps it waiting does not wait for the sequence", async () => {
    const { run } = await open();
    async function* never() {
      yield* sites(1);
      await new Promise(() => {});
    }
    const { error, ids } = await run(never(), { signal: AbortSignal.timeout(250) });
    expect(error).toMatchObject({ name: "AbortedError" });
    expect(ids).toEqual(["stage 0"]);
  });

  it("before it began sends nothing", async () => {
    const { run, server } = await open();
    const { error } = await run(sites(3), { signal: AbortSignal.abort() });
    expect(error).toMatchObject({ name: "AbortedError" });
    expect(server.asked).toEqual([]);
  });

  it("during a wait between requests need not wait", async () => {
    const { run } = await open(
      (response) => {
        problem(503, "draining")(response, response.req);
        return true;
      },
      { retry: { sleep: undefined, baseDelay: 60_000 } },
    );
    const { error } = await run(sites(1), { signal: AbortSignal.timeout(50) });
    expect(error).toMatchObject({ name: "AbortedError" });
  });

  it("by closing the client gets what is under way, and then a ClosedError", async () => {
    const { client } = await open();
    const ids: string[] = [];
    const loop = async () => {
      for await (const { id } of client.portfolio(sites(50), { batchSites: 5, concurrency: 2 })) {
        ids.push(id);
        if (ids.length === 1) void client.close();
      }
    };
    await expect(loop()).rejects.toMatchObject({ name: "ClosedError" });
    expect(ids.length % 5).toBe(0);
    expect(ids.length).toBeGreaterThanOrEqual(5);
  });

  it("by a progress callback that throws gets what it threw", async () => {
    const { run } = await open();
    const onProgress = () => {
      throw new Error("no screen");
    };
    expect((await run(sites(3), { onProgress })).error).toEqual(new Error("no screen"));
  });
});
