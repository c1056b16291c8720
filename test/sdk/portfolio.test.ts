import { setTimeout as wait } from "node:timers/promises";
import { afterEach, describe, expect, it } from "vitest";
import type { Climate } from "../../sdk/src/generated/schema.ts";
import type { PortfolioProgress } from "../../sdk/src/portfolio/portfolio-options.ts";
import { answerTo, begin, totals } from "./fixtures/portfolio-server.ts";
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

/** A sequence that counts how far it was taken and whether it was let go. */
function counted(count: number) {
  const state = { taken: 0, closed: false };
  function* generate() {
    try {
      for (const site of stages(count)) {
        state.taken += 1;
        yield site;
      }
    } finally {
      state.closed = true;
    }
  }
  return { state, sites: generate() };
}

const climateOf = (values: number[] | Float64Array): Climate => ({
  ...REQUEST.climate,
  irradiance: { kind: "plane-of-array", values },
});

describe("a portfolio's requests", () => {
  it("hold at most 64 sites, with their length stated, the defaults first, and ids that go on", async () => {
    const { client, server } = await open();
    const candidates = [{ label: "held", rule: { kind: "constant-voltage" as const } }];
    const options = { defaults: { candidates }, requestId: "night-run", concurrency: 1 };
    for await (const _ of client.portfolio(stages(130), options));
    expect(server.asked.map((asked) => asked.sites.length)).toEqual([64, 64, 2]);
    expect(server.asked.map(({ headers }) => headers["x-request-id"])).toEqual([
      "night-run.1",
      "night-run.2",
      "night-run.3",
    ]);
    for (const { headers, bytes, lines } of server.asked) {
      expect(headers["content-length"]).toBe(String(bytes));
      expect(headers["content-type"]).toBe("application/x-ndjson");
      expect(headers.accept).toBe("application/x-ndjson, application/problem+json");
      expect(lines[0]).toEqual({ kind: "defaults", candidates });
    }
  });

  it("are filled to the bytes allowed, and a larger site goes alone", async () => {
    const { client, server } = await open();
    const large = { id: "large", climate: climateOf(Array.from({ length: 400 }, () => 100)) };
    const list = [...stages(40), large, ...stages(80).slice(40)];
    for await (const _ of client.portfolio(list, { batchBytes: 1000, concurrency: 1 }));
    expect(server.asked.flatMap((asked) => asked.sites.map(({ id }) => id))).toEqual(list.map(({ id }) => id));
    for (const { bytes, sites: held } of server.asked) {
      if (held[0].id === "large") expect(held).toHaveLength(1);
      else expect(bytes).toBeLessThan(1100);
    }
    expect(server.asked.length).toBeLessThan(12);
  });

  it("carry the named climates of their sites, each once and before them, and no others", async () => {
    const { client, server } = await open();
    const names = ["fjord", "lagoon", "desert lake"];
    const climates = Object.fromEntries(names.map((name, index) => [name, climateOf(Float64Array.of(index, 5))]));
    const list = stages(9).map((site, index) => {
      return { ...site, climate: { kind: "named" as const, name: names[Math.floor(index / 4)] } };
    });
    for await (const _ of client.portfolio(list, { climates, batchSites: 4, concurrency: 1 }));
    expect(
      server.asked.map(({ lines }) => lines.flatMap((line) => (line.kind === "climate" ? [line.name] : []))),
    ).toEqual(names.map((name) => [name]));
    expect(server.asked[2].lines[0]).toMatchObject({ climate: { irradiance: { values: [2, 5] } } });
  });

  it("carry the climate that the defaults name, unless a site has its own", async () => {
    const { client, server } = await open();
    const options = {
      defaults: { climate: { kind: "named" as const, name: "fjord" } },
      climates: { fjord: climateOf([1]) },
      batchSites: 1,
      concurrency: 1,
    };
    for await (const _ of client.portfolio([{ id: "a" }, { id: "b", climate: climateOf([2]) }], options));
    expect(server.asked.map(({ lines }) => lines.map(({ kind }) => kind))).toEqual([
      ["defaults", "climate", "site"],
      ["defaults", "site"],
    ]);
  });

  it("take typed columns, where NaN is a gap", async () => {
    const { client, server } = await open();
    const climate = climateOf(Float64Array.of(800, Number.NaN));
    for await (const _ of client.portfolio([{ id: "a", climate }]));
    expect(server.asked[0].sites[0]).toMatchObject({ climate: { irradiance: { values: [800, null] } } });
  });

  it("go out several at once, as many as asked for and no more", async () => {
    let now = 0;
    let most = 0;
    const { client } = await open(async () => {
      now += 1;
      most = Math.max(most, now);
      await wait(20);
      now -= 1;
      return false;
    });
    for await (const _ of client.portfolio(stages(90), { batchSites: 10, concurrency: 3 }));
    expect(most).toBe(3);
  });

  it("do not wait for 64 sites where the sequence keeps them waiting", async () => {
    const { client, server } = await open();
    let answered = () => {};
    const firstAnswer = new Promise<void>((resolve) => {
      answered = resolve;
    });
    async function* slow() {
      yield* stages(2);
      await firstAnswer;
      yield { id: "after the first answer" };
    }
    const ids: string[] = [];
    for await (const { id } of client.portfolio(slow())) {
      ids.push(id);
      answered();
    }
    expect(ids).toHaveLength(3);
    expect(server.asked.map((asked) => asked.sites.length)).toEqual([2, 1]);
  });

  it("are none at all for no sites", async () => {
    const { client, server } = await open();
    const run = client.portfolio([]);
    for await (const _ of run);
    expect(server.asked).toEqual([]);
    expect(run.totals()).toEqual({
      sites: 0,
      answered: 0,
      refused: 0,
      labels: [],
      groups: [],
      best: null,
      worst: [],
      versions: [],
    });
  });
});

describe("a portfolio's loop", () => {
  it("has each line as soon as it came, before the answer is whole", async () => {
    let go = () => {};
    const { client } = await open(async (response, asked) => {
      begin(response).write(`${JSON.stringify(answerTo(asked.sites[1]))}\n\n\n`);
      await new Promise<void>((resolve) => {
        go = resolve;
      });
      response.end(`${JSON.stringify(answerTo(asked.sites[0]))}\n${totals([])}`);
      return true;
    });
    const ids: string[] = [];
    for await (const { id } of client.portfolio(stages(2))) {
      ids.push(id);
      go();
    }
    expect(ids).toEqual(["stage 1", "stage 0"]);
  });

  it("takes no more sites ahead than its requests hold while the caller takes no results", async () => {
    const { client, server } = await open();
    const { state, sites: list } = counted(1000);
    let handed = 0;
    for await (const _ of client.portfolio(list, { batchSites: 16, concurrency: 2 })) {
      handed += 1;
      if (handed % 40 === 1) await wait(30);
      expect(state.taken - handed).toBeLessThanOrEqual(2 * 16);
    }
    expect(handed).toBe(1000);
    expect(server.asked.length).toBe(63);
  });

  it("sends nothing before it begins", async () => {
    const { client, server } = await open();
    const { state, sites: list } = counted(10);
    client.portfolio(list);
    await wait(20);
    expect(state.taken).toBe(0);
    expect(server.asked).toEqual([]);
  });

  it("when left lets the sequence go and ends what is under way", async () => {
    let gone = 0;
    const { client } = await open((response, asked, turn) => {
      response.on("close", () => {
        gone += 1;
      });
      if (turn === 1) return false;
      begin(response).write(`${JSON.stringify(answerTo(asked.sites[0]))}\n`);
      return true;
    });
    const { state, sites: list } = counted(100);
    const run = client.portfolio(list, { batchSites: 4, concurrency: 3 });
    for await (const line of run) if (line.id === "stage 0") break;
    expect(state).toMatchObject({ closed: true });
    expect(state.taken).toBeLessThanOrEqual(12);
    await expect.poll(() => gone).toBe(3);
  });

  it("can be had once", async () => {
    const { client } = await open();
    const run = client.portfolio(stages(1));
    for await (const _ of run);
    expect(() => run[Symbol.asyncIterator]()).toThrow(TypeError);
  });

  it("tells how far it is with every site", async () => {
    const { client } = await open();
    const seen: PortfolioProgress[] = [];
    const list = [{ id: "a" }, { id: "bad b" }, { id: "c" }];
    const options = { batchSites: 2, concurrency: 1, onProgress: (progress: PortfolioProgress) => seen.push(progress) };
    for await (const _ of client.portfolio(list, options));
    expect(seen).toEqual([
      { taken: 2, answered: 0, refused: 1, requests: 1 },
      { taken: 2, answered: 1, refused: 1, requests: 1 },
      { taken: 3, answered: 2, refused: 1, requests: 2 },
    ]);
  });

  it("has the version of every service that answered", async () => {
    const { client } = await open((response, asked, turn) => {
      begin(response).write(`${JSON.stringify(answerTo(asked.sites[0]))}\n`);
      response.end(totals([], turn === 1 ? "1.3.0" : "1.2.9"));
      return true;
    });
    const run = client.portfolio(stages(2), { batchSites: 1 });
    for await (const _ of run);
    expect(run.totals().versions).toEqual(["1.2.9", "1.3.0"]);
  });

  it("passes over kinds of lines that it does not know", async () => {
    const { client } = await open((response, asked) => {
      begin(response).end(`{"kind":"news"}\n${JSON.stringify(answerTo(asked.sites[0]))}\n${totals([])}`);
      return true;
    });
    for await (const line of client.portfolio(stages(1))) expect(line).toMatchObject({ kind: "result", id: "stage 0" });
  });
});

describe("a portfolio's options", () => {
  it.each([
    { concurrency: 0 },
    { concurrency: 65 },
    { batchSites: 65 },
    { batchSites: 1.5 },
    { batchBytes: 0 },
    { timeout: Number.NaN },
    { attempts: 0 },
  ])("%j is refused", async (options) => {
    const { client } = await open();
    expect(() => client.portfolio([], options)).toThrow(RangeError);
  });

  it.each(["", "two words", "x".repeat(55)])("the request id %j is refused", async (requestId) => {
    const { client } = await open();
    expect(() => client.portfolio([], { requestId })).toThrow(TypeError);
  });
});
