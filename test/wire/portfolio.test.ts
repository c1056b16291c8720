import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { CEILINGS } from "../../service/wire/limits.ts";
import type { Errand } from "../../service/wire/portfolio/portfolio.ts";
import { PortfolioEnd } from "../../service/wire/portfolio/portfolio-end.ts";
import { aPortfolio, CANDIDATES, defaultsLine, siteLine, workOff } from "./portfolio-requests.ts";
import type { Json } from "./requests.ts";
import { answered, climateOf, MODULE } from "./requests.ts";

const ofKind = (lines: readonly Json[], kind: string) => lines.filter((line) => line.kind === kind);
const named = (name: string) => ({ kind: "named", name });

/** The problem with which working off the lines ends. */
function endOf(lines: readonly Json[], portfolio = aPortfolio()): Json {
  try {
    workOff(lines, portfolio);
  } catch (error) {
    if (error instanceof PortfolioEnd) return error.problem;
    throw error;
  }
  throw new Error("it did not end");
}

describe("a site of a portfolio", () => {
  it("has the figures that a comparison of its own gives", () => {
    const own = siteLine("a", { baseline: "climb", array: { modulesInSeries: 3 }, recordLowTemperature: -12 });
    const [result] = workOff([defaultsLine({ energyValue: { currency: "EUR", perKilowattHour: 0.2 } }), own]);
    const { kind: _kind, id: _id, ...parts } = own;
    const { answer } = answered("compare", {
      module: MODULE,
      candidates: CANDIDATES,
      energyValue: { currency: "EUR", perKilowattHour: 0.2 },
      ...parts,
    });
    expect(result.results.map(({ regret: _regret, ...rest }: Json) => rest)).toEqual(
      answer.results.map(({ worthReason: _reason, ...rest }: Json) => rest),
    );
    expect(result.cautions).toEqual(answer.cautions);
    expect([result.baseline, result.mode, result.coverage]).toEqual(["climb", answer.resolved.mode, answer.coverage]);
    expect(result.worthReason).toBe(answer.results[0].worthReason);
  });

  it("takes its own member whole in place of the default, and its converter for candidates without one", () => {
    const tight = { trackingMinimumVoltage: 33, trackingMaximumVoltage: 60 };
    const loose = { maximumPower: 100 };
    const ownConverter = structuredClone(CANDIDATES);
    ownConverter[0].converter = {};
    const defaults = defaultsLine({ converter: tight, candidates: ownConverter, count: 4, group: "north" });
    const lines = workOff([defaults, siteLine("with defaults"), siteLine("own", { converter: loose, count: 1 })]);
    const { kind: _kind, id: _id, ...site } = siteLine("x");
    for (const [index, converter] of [tight, loose].entries()) {
      const { answer } = answered("compare", { module: MODULE, candidates: ownConverter, converter, ...site });
      const energies = (of: Json) => of.map(({ energy }: Json) => energy);
      expect(energies(lines[index].results)).toEqual(energies(answer.results));
    }
    expect(lines.map(({ count, group }) => [count, group]).slice(0, 2)).toEqual([
      [4, "north"],
      [1, "north"],
    ]);
    // The window of the defaults must be gone with them: a merge of members would have kept it.
    expect(lines[1].results[2].lostByCause.voltageWindow).toBe(0);
    expect(lines[0].results[2].lostByCause.voltageWindow).toBeGreaterThan(0);
  });

  it("needs a module, candidates and a climate from somewhere", () => {
    const [problem] = ofKind(workOff([siteLine("a", { climate: undefined })]), "site-problem");
    expect(problem.problem.errors.map(({ pointer, code }: Json) => [pointer, code])).toEqual([
      ["/module", "missing"],
      ["/candidates", "missing"],
      ["/climate", "missing"],
    ]);
  });

  it("is refused with line and pointer where it is wrong, and the others are answered", () => {
    const wrongs: [Json, string, string][] = [
      [
        siteLine("vmp", { module: { ...MODULE, maximumPowerVoltage: 40 } }),
        "/module/maximumPowerVoltage",
        "not-below-its-limit",
      ],
      [siteLine("sheet", { module: { ...MODULE, maximumPowerVoltage: 38.8 } }), "/module", "inconsistent-datasheet"],
      [siteLine("member", { modul: MODULE }), "/modul", "unknown-member"],
      [siteLine("base", { baseline: "hodl" }), "/baseline", "unknown-baseline"],
      [siteLine("count", { count: 0 }), "/count", "out-of-range"],
      [siteLine("group", { group: "" }), "/group", "wrong-format"],
      [
        siteLine("gap", { climate: { ...climateOf(2), irradiance: { kind: "plane-of-array", values: [1, null] } } }),
        "/climate/irradiance/values/1",
        "missing-samples",
      ],
      [siteLine("name", { climate: named("nowhere") }), "/climate/name", "unknown-climate"],
      [siteLine("one", { candidates: CANDIDATES.slice(0, 1) }), "/candidates", "too-few"],
      [siteLine("twice", { candidates: [CANDIDATES[0], CANDIDATES[0]] }), "/candidates/1/label", "label-taken"],
    ];
    const good = ["first", "last"].map((id) => siteLine(id));
    const lines = workOff([defaultsLine(), good[0], ...wrongs.map(([line]) => line), good[1]]);
    expect(ofKind(lines, "result").map(({ id }) => id)).toEqual(["first", "last"]);
    for (const [index, [line, pointer, code]] of wrongs.entries()) {
      const told = lines.find(({ kind, id }) => kind === "site-problem" && id === line.id);
      expect(told.line).toBe(index + 3);
      expect(told.problem.errors, line.id).toContainEqual(expect.objectContaining({ pointer, code }));
    }
    expect(lines.at(-1)).toMatchObject({ kind: "totals", sites: 12, answered: 2, refused: 10 });
  });

  it("is refused without an id where its line has none that will do", () => {
    const lines = workOff([
      defaultsLine(),
      "{",
      '{"kind":"site","id":"a","climate":',
      { kind: "site", id: 7 },
      { kind: "site", id: "a\u0000" },
      { kind: "sit", id: "b" },
      [],
    ]);
    const told = ofKind(lines, "site-problem").map(({ id, line, problem }) => [id, line, problem.code]);
    expect(told).toEqual([
      [null, 2, "malformed-body"],
      ["a", 3, "malformed-body"],
      [null, 4, "invalid-request"],
      [null, 5, "invalid-request"],
      ["b", 6, "invalid-request"],
      [null, 7, "invalid-request"],
    ]);
  });

  it("is answered once: its id again is a problem, whatever became of the first", () => {
    const lines = workOff([defaultsLine(), siteLine("a"), siteLine("b", { count: 0 }), siteLine("a"), siteLine("b")]);
    expect(ofKind(lines, "result").map(({ id }) => id)).toEqual(["a"]);
    const taken = ofKind(lines, "site-problem").filter(({ line }) => line > 3);
    expect(taken.map(({ id, line, problem }) => [id, line, problem.errors[0].code])).toEqual([
      ["a", 4, "id-taken"],
      ["b", 5, "id-taken"],
    ]);
  });

  it("that compares a candidate with itself finds no difference, no regret and no loss of rank", () => {
    const twins = ["one", "two", "three"].map((label) => ({ label, rule: { kind: "perturb-and-observe" } }));
    const [result] = workOff([defaultsLine({ candidates: twins }), siteLine("a")]);
    for (const { rank, differenceToBaseline, differenceToBest, regret } of result.results) {
      expect([rank, differenceToBaseline, differenceToBest, regret]).toEqual([1, 0, 0, 0]);
    }
  });

  it("is refused before it starts where it is more work than may be", () => {
    const limits = { ...CEILINGS, controlPeriods: 1000 };
    const lines = workOff([defaultsLine(), siteLine("a", { mode: "stepped" })], aPortfolio({ limits }));
    expect(lines[0].problem.code).toBe("too-much-work");
  });
});

describe("the regret of a site", () => {
  it("is 0 or above, and 0 for its best", () => {
    const lines = workOff([defaultsLine(), ...[0.2, 0.6, 1.1].map((scale) => siteLine(`${scale}`, {}, scale))]);
    for (const { results } of ofKind(lines, "result")) {
      for (const { rank, regret } of results) {
        expect(regret).toBeGreaterThanOrEqual(0);
        expect(regret === 0).toBe(rank === 1);
      }
    }
  });
});

describe("a named climate", () => {
  const line = (name: string, climate: Json = climateOf(24)) => ({ kind: "climate", name, climate });

  it("gives the very figures that it gives in a site", () => {
    const site = { kind: "site", climate: named("x") };
    const lines = workOff([
      defaultsLine(),
      line("x"),
      { ...site, id: "named" },
      siteLine("own", { climate: climateOf(24) }),
    ]);
    expect(lines[0].results).toEqual(lines[1].results);
    expect(lines[0].cautions).toEqual(lines[1].cautions);
  });

  it("can be the default, and a site's own climate goes before it", () => {
    const lines = workOff([
      defaultsLine({ climate: named("x") }),
      { kind: "site", id: "too early" },
      line("x"),
      line("y", climateOf(48)),
      { kind: "site", id: "default" },
      { kind: "site", id: "other", climate: named("y") },
      siteLine("own", {}, 1, 7),
    ]);
    expect(lines.map(({ id }) => id)).toEqual(["too early", "default", "other", "own", undefined]);
    expect(lines[0].problem.errors[0]).toMatchObject({ pointer: "/climate/name", code: "unknown-climate" });
    expect(lines.slice(1, 4).map(({ coverage }) => coverage.samples)).toEqual([24, 48, 7]);
  });

  it("that is refused tells why once, does not count as a site, and refuses who names it", () => {
    const bad = climateOf(2);
    bad.temperature.values.pop();
    const lines = workOff([defaultsLine(), line("x", bad), { kind: "site", id: "a", climate: named("x") }]);
    expect(lines[0]).toMatchObject({ kind: "site-problem", id: null, line: 2 });
    expect(lines[0].problem.errors[0].pointer).toBe("/climate/temperature/values");
    expect(lines[1]).toMatchObject({ kind: "site-problem", id: "a", line: 3 });
    expect(lines[2]).toMatchObject({ sites: 1, answered: 0, refused: 1 });
  });

  it("keeps its first meaning when it is given twice", () => {
    const lines = workOff([
      defaultsLine(),
      line("x"),
      line("x", climateOf(48)),
      { kind: "site", id: "a", climate: named("x") },
    ]);
    expect(lines[0]).toMatchObject({ id: null, line: 3, problem: { errors: [{ code: "name-taken" }] } });
    expect(lines[1].coverage.samples).toBe(24);
  });

  it("may be given so often and so long, and is held in memory that must be free", () => {
    const limits = { ...CEILINGS, namedClimates: 2, namedClimateBytes: 4000 };
    const three = ["x", "y", "z"].map((name) => line(name));
    expect(endOf(three, aPortfolio({ limits })).code).toBe("too-much-work");
    expect(endOf([line("x", climateOf(700))], aPortfolio({ limits })).code).toBe("body-too-large");
    expect(endOf([line("x")], aPortfolio({ hold: (bytes) => bytes < 24 * 8 * 2 })).code).toBe("overloaded");
  });
});

describe("the first line", () => {
  it.each<[string, Json, string, string]>([
    ["has an unknown member", defaultsLine({ modul: 1 }), "invalid-request", "/modul"],
    [
      "has a wrong module",
      defaultsLine({ module: { ...MODULE, maximumPowerVoltage: 40 } }),
      "invalid-request",
      "/module/maximumPowerVoltage",
    ],
    [
      "has a module of no circuit",
      defaultsLine({ module: { ...MODULE, maximumPowerVoltage: 38.8 } }),
      "invalid-request",
      "/module",
    ],
    [
      "has a climate with gaps",
      defaultsLine({ climate: { ...climateOf(2), irradiance: { kind: "plane-of-array", values: [1, null] } } }),
      "invalid-request",
      "/climate/irradiance/values/1",
    ],
    ["has a baseline of no candidate", defaultsLine({ baseline: "hodl" }), "invalid-request", "/baseline"],
    ["is of an unknown kind", { kind: "default" }, "invalid-request", "/kind"],
    ["is of no kind", { module: MODULE }, "invalid-request", "/kind"],
  ])("ends everything where it %s", (_what, line, code, pointer) => {
    const problem = endOf([line, siteLine("a")]);
    expect(problem.code).toBe(code);
    expect(problem.errors[0].pointer).toBe(pointer);
  });

  it("ends everything where it is no JSON", () => {
    expect(endOf(["not JSON"]).code).toBe("malformed-body");
  });

  it("alone may hold defaults: what follows others would not know which hold", () => {
    const problem = endOf([siteLine("a"), defaultsLine()]);
    expect(problem.errors[0]).toMatchObject({ pointer: "/kind", code: "defaults-not-first" });
  });

  it("may be a site that is wrong, which is no worse than any other", () => {
    const lines = workOff([siteLine("a", { count: 0 }), siteLine("b", { module: MODULE, candidates: CANDIDATES })]);
    expect(lines.map(({ kind }) => kind)).toEqual(["site-problem", "result", "totals"]);
  });
});

describe("the answers to a portfolio", () => {
  it("are the same, line by line and in the totals, in whatever order its sites are done", () => {
    const lines = [
      defaultsLine(),
      ...Array.from({ length: 12 }, (_, k) =>
        siteLine(`site ${k % 11}`, { count: 1 + k, ...(k % 3 === 0 ? {} : { group: `g${k % 3}` }) }, 0.1 + 0.07 * k),
      ),
      siteLine("bad", { count: -1 }),
    ];
    const texts = (written: Json[]) => written.map((line) => JSON.stringify(line));
    const straight = texts(workOff(lines));
    fc.assert(
      fc.property(fc.infiniteStream(fc.nat()), (numbers) => {
        const shuffled = (errands: Errand[]) =>
          errands
            .map((errand) => [numbers.next().value, errand] as const)
            .sort(([a], [b]) => a - b)
            .map(([, errand]) => errand);
        const written = texts(workOff(lines, aPortfolio(), shuffled));
        expect(written.at(-1)).toBe(straight.at(-1));
        expect([...written].sort()).toEqual([...straight].sort());
      }),
      { numRuns: 15, seed: 2 },
    );
  });

  it("end where the totals would grow without bound", () => {
    const labels = (site: number) => [0, 1].map((k) => ({ label: `${site} ${k}`, rule: { kind: "constant-voltage" } }));
    const many = Array.from({ length: 12_501 }, (_, site) => site);
    const portfolio = aPortfolio();
    portfolio.take({ number: 1, bytes: new TextEncoder().encode(JSON.stringify(siteLine("first"))) });
    let problem: Json = null;
    for (const site of many) {
      const line = siteLine(`site ${site}`, { module: MODULE, candidates: labels(site) }, 1, 1);
      const errand = portfolio.take({
        number: site + 2,
        bytes: new TextEncoder().encode(JSON.stringify(line)),
      }) as Errand<"site">;
      try {
        errand.settle({ ok: true, bytes: new Uint8Array(0), outcome: outcomeOf(site) });
      } catch (error) {
        problem = [site, (error as PortfolioEnd).problem.code];
        break;
      }
    }
    // 25,000 rows are two labels of 12,500 sites.
    expect(problem).toEqual([12_500, "too-much-work"]);
  });

  it("end at the limit of sites", () => {
    const limits = { ...CEILINGS, sites: 2 };
    const lines = [defaultsLine(), siteLine("a"), siteLine("b")];
    expect(workOff(lines, aPortfolio({ limits })).at(-1).answered).toBe(2);
    expect(endOf([...lines, siteLine("c")], aPortfolio({ limits })).code).toBe("too-much-work");
  });
});

function outcomeOf(site: number) {
  const lostByCause = { voltageWindow: 0, wrongPeak: 0, setPoint: 0, heldSample: 0, regulation: 0, interruption: 0 };
  const candidates = [0, 1].map((k) => ({
    label: `${site} ${k}`,
    available: 1,
    delivered: 1,
    lost: 0,
    lostByCause,
    regret: 0,
  }));
  return { id: `site ${site}`, count: 1, group: null, baseline: `${site} 0`, candidates };
}
