import { afterEach, describe, expect, it } from "vitest";
import type { Climate } from "../../sdk/src/generated/schema.ts";
import type { PortfolioSiteRequest } from "../../sdk/src/portfolio/portfolio-lines.ts";
import { problem } from "./fixtures/misbehaving-server.ts";
import type { AskedFor, Treatment } from "./fixtures/portfolio-server.ts";
import { answerTo, begin, problemOf, totals } from "./fixtures/portfolio-server.ts";
import { REQUEST } from "./fixtures/requests.ts";
import { openPortfolios, stages } from "./fixtures/run-portfolio.ts";

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
const climate: Climate = REQUEST.climate;

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
    const { lines, error, portfolio } = await run(stages(2));
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
    expect(await run(stages(2))).toMatchObject({ ids: ["stage 1", "stage 0"], error: null });
    expect(askedIds(server.asked)).toEqual([[0, 1], [0]]);
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
        yield* [...stages(10), site as PortfolioSiteRequest, ...stages(30).slice(11)];
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
      yield* stages(3);
      throw new Error("the folder is gone");
    }
    const { error, ids } = await run(sequence());
    expect(error).toEqual(new Error("the folder is gone"));
    expect(ids).toHaveLength(3);
  });

  it("because the defaults cannot be written are not begun", async () => {
    const { run, server } = await open();
    const { error } = await run(stages(3), { defaults: { recordLowTemperature: Number.NaN } });
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
    const { error, ids } = await run(stages(3), { signal: controller.signal, requestId: "night" });
    expect(error).toMatchObject({ name: "AbortedError", cause: "the night is over", requestId: "night" });
    expect(ids).toEqual(["stage 0"]);
    expect(server.asked).toHaveLength(1);
    await expect.poll(() => gone).toBe(true);
  });

  it("by the signal while the sequence keeps it waiting does not wait for the sequence", async () => {
    const { run } = await open();
    async function* never() {
      yield* stages(1);
      await new Promise(() => {});
    }
    const { error, ids } = await run(never(), { signal: AbortSignal.timeout(250) });
    expect(error).toMatchObject({ name: "AbortedError" });
    expect(ids).toEqual(["stage 0"]);
  });

  it("before it began sends nothing", async () => {
    const { run, server } = await open();
    const { error } = await run(stages(3), { signal: AbortSignal.abort() });
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
    const { error } = await run(stages(1), { signal: AbortSignal.timeout(50) });
    expect(error).toMatchObject({ name: "AbortedError" });
  });

  it("by closing the client gets what is under way, and then a ClosedError", async () => {
    const { client } = await open();
    const ids: string[] = [];
    const loop = async () => {
      for await (const { id } of client.portfolio(stages(50), { batchSites: 5, concurrency: 2 })) {
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
    expect((await run(stages(3), { onProgress })).error).toEqual(new Error("no screen"));
  });
});
