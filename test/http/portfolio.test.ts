import { gzipSync } from "node:zlib";
import { describe, expect, it } from "vitest";
import { CAUSES } from "../../service/core/tracking/causes.ts";
import { CEILINGS } from "../../service/wire/limits.ts";
import { defaultsLine, linesIn, ndjson, siteLine } from "../wire/portfolio-requests.ts";
import type { Json } from "../wire/requests.ts";
import { climateOf } from "../wire/requests.ts";
import type { Body } from "./an-app.ts";
import { anApp, inlinePortfolio, post } from "./an-app.ts";

const LINES = { "content-type": "application/x-ndjson" };

/** A body in pieces of `size` bytes. */
function inPieces(text: string | Uint8Array, size: number): Body {
  const bytes = Buffer.from(text as string);
  let from = 0;
  return new ReadableStream<Uint8Array>({
    pull(controller) {
      if (from >= bytes.length) return controller.close();
      controller.enqueue(new Uint8Array(bytes.subarray(from, from + size)));
      from += size;
    },
  }) as unknown as Body;
}

async function sent(body: Body, settings: Parameters<typeof anApp>[0] = {}, headers = {}): Promise<Response> {
  const streamed = body instanceof ReadableStream ? { duplex: "half" as const } : {};
  return anApp(settings).app.request("/v1/portfolios", { ...post(body, { ...LINES, ...headers }), ...streamed });
}

async function answered(body: Body, settings: Parameters<typeof anApp>[0] = {}, headers = {}): Promise<Json[]> {
  const answer = await sent(body, settings, headers);
  expect([answer.status, answer.headers.get("content-type")]).toEqual([200, "application/x-ndjson"]);
  return linesIn(await answer.text());
}

describe("a portfolio of 2,000 sites and four candidates", () => {
  it("is answered with each id once, bad lines among them, and totals that are the sums of its lines", async () => {
    const ids = Array.from({ length: 2000 }, (_, k) => `site ${k}`);
    const sites = ids.map((id, k) => {
      if (k % 100 === 7) return { kind: "site", id, climate: 3 };
      return siteLine(
        id,
        { count: 1 + (k % 5), ...(k % 2 === 0 ? { group: `g${k % 3}` } : {}) },
        0.3 + (k % 89) / 100,
        4,
      );
    });
    const lines = await answered(inPieces(ndjson([defaultsLine(), ...sites]), 50_000));
    const results = lines.filter(({ kind }) => kind === "result");
    const problems = lines.filter(({ kind }) => kind === "site-problem");
    expect([...results, ...problems].map(({ id }) => id).sort()).toEqual([...ids].sort());
    expect(problems.map(({ id, line }) => [id, line])).toEqual(
      ids.flatMap((id, k) => (k % 100 === 7 ? [[id, k + 2]] : [])),
    );
    const totals = lines.at(-1);
    expect(totals).toMatchObject({ kind: "totals", sites: 2000, answered: 1980, refused: 20, best: "all" });
    for (const { label, ...row } of totals.labels) expectSums(row, results, label);
    expect(totals.groups.map(({ group }: Json) => group)).toEqual(["g0", "g1", "g2"]);
    for (const { group, labels } of totals.groups) {
      const members = results.filter((line) => line.group === group);
      for (const { label, ...row } of labels) expectSums(row, members, label);
    }
    const losses = results.map(({ id, count, results: [hold] }) => ({ id, lost: count * hold.energy.lost }));
    losses.sort((a, b) => b.lost - a.lost || (a.id < b.id ? -1 : 1));
    expect(totals.worst.map(({ id }: Json) => id)).toEqual(losses.slice(0, 20).map(({ id }) => id));
  });
});

/** Holds a row of the totals against sums over result lines: a billionth of a kWh is lost a site at most. */
function expectSums(row: Json, results: readonly Json[], label: string): void {
  const of = (figure: (one: Json) => number) =>
    results.reduce((sum, line) => sum + line.count * figure(line.results.find((one: Json) => one.label === label)), 0);
  const digits = 5;
  expect(row.sites).toBe(of(() => 1));
  expect(row.available).toBeCloseTo(
    of(({ energy }) => energy.available),
    digits,
  );
  expect(row.delivered).toBeCloseTo(
    of(({ energy }) => energy.delivered),
    digits,
  );
  expect(row.lost).toBeCloseTo(
    of(({ energy }) => energy.lost),
    digits,
  );
  expect(row.regret).toBeCloseTo(
    of(({ regret }) => regret),
    digits,
  );
  for (const cause of CAUSES)
    expect(row.lostByCause[cause]).toBeCloseTo(
      of((one) => one.lostByCause[cause]),
      digits,
    );
}

describe("the body of a portfolio", () => {
  const text = ndjson([defaultsLine(), siteLine("a"), siteLine("b")]);
  const idsOf = (lines: Json[]) => lines.map(({ id }) => id);

  it("may come in pieces of any size, packed or not, with empty lines and without the last line break", async () => {
    const loose = `\n\r\n${text.replaceAll("\n", "\r\n\n").trimEnd()}`;
    for (const size of [1, 7, 1e6]) {
      expect(idsOf(await answered(inPieces(loose, size)))).toEqual(["a", "b", undefined]);
      const packed = inPieces(gzipSync(text), size);
      expect(idsOf(await answered(packed, {}, { "content-encoding": "gzip" }))).toEqual(["a", "b", undefined]);
    }
  });

  it("may be empty: the totals of nothing", async () => {
    for (const body of ["", "\n\n", ndjson([defaultsLine()])]) {
      const lines = await answered(body);
      expect(lines).toEqual([expect.objectContaining({ kind: "totals", sites: 0, labels: [], best: null, worst: [] })]);
    }
    const without = await anApp().app.request("/v1/portfolios", { method: "POST", headers: LINES });
    expect(linesIn(await without.text())).toHaveLength(1);
  });

  it("has line numbers that count empty lines", async () => {
    const lines = await answered(`\n${ndjson([defaultsLine()])}\n\n{\n`);
    expect(lines[0]).toMatchObject({ kind: "site-problem", line: 5 });
  });

  it("must be application/x-ndjson, plain or gzip, and its reader must take lines", async () => {
    for (const [headers, status, code] of [
      [{ "content-type": "application/json" }, 415, "unsupported-media-type"],
      [{ "content-encoding": "br" }, 415, "unsupported-media-type"],
      [{ accept: "application/json" }, 406, "not-acceptable"],
    ] as const) {
      const answer = await sent(text, {}, headers);
      expect([answer.status, ((await answer.json()) as Json).code]).toEqual([status, code]);
    }
    for (const accept of ["application/x-ndjson", "*/*", "application/x-ndjson, application/problem+json"]) {
      expect((await sent(text, {}, { accept })).status).toBe(200);
    }
    const other = await anApp().app.request("/v1/comparisons", post("{}", { accept: "application/x-ndjson" }));
    expect(other.status).toBe(406);
  });

  it("that ends inside its gzip stream has no totals", async () => {
    const packed = gzipSync(ndjson([defaultsLine(), ...Array.from({ length: 300 }, (_, k) => siteLine(`${k}`))]));
    const lines = await answered(packed.subarray(0, packed.length - 200), {}, { "content-encoding": "gzip" });
    expect(lines.at(-1)).toMatchObject({ kind: "aborted", problem: { code: "malformed-body", status: 400 } });
    expect(lines.filter(({ kind }) => kind === "totals")).toEqual([]);
  });

  it("that breaks off has no totals, and what came before it is answered", async () => {
    let turn = 0;
    const body = new ReadableStream<Uint8Array>({
      async pull(controller) {
        if (turn++ === 0) return controller.enqueue(new TextEncoder().encode(`${text}{"kind":`));
        await new Promise((resolve) => setTimeout(resolve, 100));
        controller.error(new Error("cut"));
      },
    });
    const lines = await answered(body as unknown as Body);
    expect(lines.map(({ kind, id }) => id ?? kind)).toEqual(["a", "b", "aborted"]);
  });
});

describe("a wrong first line", () => {
  it.each<[string, string, number, string]>([
    ["wrong defaults", ndjson([defaultsLine({ mode: "slow" }), siteLine("a")]), 422, "invalid-request"],
    ["no JSON", "site,climate\n", 400, "malformed-body"],
    ["an object of no kind", "{}\n", 422, "invalid-request"],
    ["a line that is too long", `${"x".repeat(40_000)}\n`, 413, "body-too-large"],
  ])("refuses the request: %s", async (_what, body, status, code) => {
    const answer = await sent(body, { limits: { ...CEILINGS, lineBytes: 20_000 } });
    const problem: Json = await answer.json();
    expect([answer.status, problem.code, answer.headers.get("connection")]).toEqual([status, code, "close"]);
    expect(answer.headers.get("content-type")).toBe("application/problem+json");
    expect(answer.headers.get("x-request-id")).toBe(problem.requestId);
  });
});

describe("a line that is too long", () => {
  const limits = { ...CEILINGS, lineBytes: 3000, bodyBytes: 100_000 };

  it("is passed over, and the others are answered", async () => {
    const long = siteLine("long", {}, 1, 5000);
    const body = ndjson([defaultsLine(), siteLine("a"), long, siteLine("b")]);
    for (const size of [100, 1e6]) {
      const lines = await answered(inPieces(body, size), { limits });
      expect(lines.map(({ kind, id, line }) => [kind, id, line])).toContainEqual(["site-problem", null, 3]);
      expect(lines.find(({ line }) => line === 3).problem).toMatchObject({ code: "body-too-large", status: 413 });
      expect(lines.at(-1)).toMatchObject({ sites: 3, answered: 2, refused: 1 });
    }
  });

  it("is admitted at just the limit", async () => {
    const line = JSON.stringify(siteLine("a"));
    const at = (length: number) => ({ ...limits, lineBytes: length });
    const body = ndjson([defaultsLine(), line.replace("}", `${" ".repeat(2000)}}`)]);
    const length = line.length + 2000;
    expect((await answered(body, { limits: at(length) })).at(-1).answered).toBe(1);
    expect((await answered(body, { limits: at(length - 1) })).at(-1).answered).toBe(0);
  });

  it("ends the portfolio where it has no end itself", async () => {
    const lines = await answered(inPieces(`${ndjson([defaultsLine(), siteLine("a")])}${" ".repeat(200_000)}`, 30_000), {
      limits,
    });
    expect(lines.map(({ kind }) => kind)).toEqual(["result", "aborted"]);
  });
});

describe("what portfolios hold", () => {
  const text = ndjson([defaultsLine(), siteLine("a")]);

  it("is given back with each answer, refusal and broken body", async () => {
    const { app } = anApp({ heldBytes: 40_000 });
    const request = (body: Body) => app.request("/v1/portfolios", post(body, LINES));
    for (let round = 0; round < 30; round++) {
      expect((await request(text)).status).toBe(200);
      expect((await request("{}\n")).status).toBe(422);
      const cut = await request(`${text}{`);
      expect(linesIn(await cut.text()).at(-1).kind).toBe("totals");
    }
  });

  it("is bounded for all together: what has no room ends", async () => {
    const lines = await answered(ndjson([defaultsLine(), siteLine("a"), siteLine("b", {}, 1, 3000)]), {
      heldBytes: 20_000,
    });
    expect(lines.at(-1)).toMatchObject({ kind: "aborted", problem: { code: "overloaded", status: 503 } });
  });

  it("lets only so many be answered at once", async () => {
    const { app } = anApp({ portfolio: { ...inlinePortfolio, most: 1 } });
    const open = new ReadableStream({ start: (controller) => controller.enqueue(new TextEncoder().encode(text)) });
    const first = await app.request("/v1/portfolios", {
      ...post(open as unknown as Body, LINES),
      duplex: "half",
    } as RequestInit);
    const second = await app.request("/v1/portfolios", post(text, LINES));
    expect([second.status, second.headers.get("retry-after")]).toEqual([503, "1"]);
    await first.body!.cancel();
    await new Promise((resolve) => setTimeout(resolve, 20));
    expect((await app.request("/v1/portfolios", post(text, LINES))).status).toBe(200);
  });
});

describe("the log of a portfolio", () => {
  it("counts its sites and names none of them", async () => {
    const { app, lines } = anApp();
    const body = ndjson([defaultsLine(), siteLine("Heron Bank"), { kind: "site", id: "Old Groyne" }]);
    await (await app.request("/v1/portfolios", post(body, { ...LINES, "x-request-id": "abc" }))).text();
    expect(lines.find(({ message }) => message === "portfolio")?.values).toEqual({
      requestId: "abc",
      sites: 2,
      answered: 1,
      refused: 1,
      cause: null,
    });
    expect(JSON.stringify(lines)).not.toMatch(/Heron|Groyne|38\.9/);
  });
});

describe("a named climate", () => {
  it("is sent once for all sites that name it", async () => {
    const sites = Array.from({ length: 50 }, (_, k) => ({
      kind: "site",
      id: `${k}`,
      climate: { kind: "named", name: "x" },
      count: k + 1,
    }));
    const lines = await answered(
      ndjson([defaultsLine(), { kind: "climate", name: "x", climate: climateOf(24) }, ...sites]),
    );
    expect(lines.filter(({ kind }) => kind === "result")).toHaveLength(50);
    expect(lines.at(-1).labels[0].sites).toBe((50 * 51) / 2);
  });
});
