import { appendFile, mkdtemp, readFile, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { Kneegap } from "@kneegap/sdk";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { bestCommonFraction, describeSetting } from "../../sdk/examples/best-common-setting.ts";
import { runNight } from "../../sdk/examples/nightly-batch.ts";
import { progressLine } from "../../sdk/examples/progress-line.ts";
import { describeQuote, quoteSite } from "../../sdk/examples/quote-one-site.ts";
import { CANDIDATES, STAGES, writeClimates } from "../../sdk/examples/saltmarsh-ferries.ts";
import type { RunningService } from "./fixtures/running-service.ts";
import { startBuiltService } from "./fixtures/running-service.ts";

let service: RunningService;
let client: Kneegap;
let folder: string;

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), "kneegap-examples-"));
  await writeClimates(folder);
  service = await startBuiltService();
  client = new Kneegap({ baseUrl: service.url });
}, 90_000);

afterAll(async () => {
  await client.close();
  await service.close();
  await rm(folder, { recursive: true });
});

const linesOf = async (file: string) =>
  (await readFile(file, "utf8"))
    .trimEnd()
    .split("\n")
    .map((line) => JSON.parse(line) as { kind: string; id: string });

describe("the examples, against the built service", { timeout: 60_000 }, () => {
  it("quote one site: what each rule loses and why, its worth and the cautions", async () => {
    const quote = await quoteSite(client, join(folder, "Heron Bank.csv"));
    expect(quote.results.map(({ label }) => label)).toEqual(CANDIDATES.map(({ label }) => label));
    for (const { energy, lostByCause, worthPerYear, differenceToBaseline } of quote.results) {
      const causes = Object.values(lostByCause).reduce((sum, lost) => sum + lost, 0);
      expect(causes).toBeCloseTo(energy.lost, 6);
      expect(energy.delivered + energy.lost).toBeCloseTo(energy.available, 6);
      expect(worthPerYear).toBeCloseTo(0.25 * differenceToBaseline, 6);
    }
    const text = describeQuote(quote).split("\n");
    expect(text[0]).toMatch(/^holds a voltage: loses [\d.]+ of [\d.]+ kWh, most of it by setPoint, worth 0\.00 EUR/);
    expect(text).toHaveLength(quote.results.length + quote.cautions.length);
    expect(quote.cautions.length).toBeGreaterThan(0);
  });

  it("run a night that is stopped, goes on where it was, and names the file that is wrong", async () => {
    const results = join(folder, "results.ndjson");
    await writeFile(join(folder, "Broken.csv"), "time,plane of array irradiance [W/m2]\nnoon,5\n");
    const controller = new AbortController();
    const stopped = runNight(client, folder, results, {
      signal: controller.signal,
      onProgress: (done) => {
        if (done === 3) controller.abort();
      },
    });
    await expect(stopped).rejects.toMatchObject({ name: "AbortedError" });
    const first = await linesOf(results);
    expect(first.length).toBeGreaterThanOrEqual(3);
    const answered = first.filter(({ kind }) => kind === "result").length;
    expect(answered).toBeLessThan(STAGES.length);
    await appendFile(results, '{"kind":"result","id":"Fjordh');

    const seen: [number, number][] = [];
    const night = await runNight(client, folder, results, { onProgress: (...at) => seen.push(at) });
    expect(night).toEqual({ before: answered, answered: STAGES.length - answered, refused: 1 });
    expect(seen.at(-1)).toEqual([STAGES.length + 1, STAGES.length + 1]);
    const all = await linesOf(results);
    expect(
      all
        .filter(({ kind }) => kind === "result")
        .map(({ id }) => id)
        .sort(),
    ).toEqual(STAGES.map(({ name }) => name).sort());
    const faulty = all.filter(({ kind }) => kind === "file-problem");
    expect(faulty.map(({ id }) => id)).toEqual(["Broken", "Broken"]);
    expect(faulty[0]).toMatchObject({ line: 1, reason: expect.stringContaining("temperature") });

    expect(await runNight(client, folder, results)).toEqual({ before: STAGES.length, answered: 0, refused: 1 });
  });

  it("find the best common setting, which no site's own does worse than", async () => {
    const answer = await bestCommonFraction(client, STAGES.slice(0, 3));
    expect(answer.sites.map(({ id }) => id)).toEqual(STAGES.slice(0, 3).map(({ name }) => name));
    expect(answer.optimum.lost).toBeLessThanOrEqual(answer.today.lost);
    for (const { regret, optimum, atCommon } of answer.sites) {
      expect(regret).toBeGreaterThanOrEqual(0);
      expect(optimum.lost).toBeLessThanOrEqual(atCommon.lost);
    }
    const own = answer.sites.reduce((sum, { optimum }) => sum + optimum.lost, 0);
    expect(own).toBeLessThanOrEqual(answer.optimum.lost);
    expect(describeSetting(answer).split("\n")).toHaveLength(2 + 3);
  });
});

describe("the progress line", () => {
  const drawn = (isTTY: boolean) => {
    const texts: string[] = [];
    const draw = progressLine({ isTTY, write: (text) => texts.push(text) });
    for (let done = 1; done <= 40; done += 1) draw(done, 40);
    return texts;
  };

  it("draws a bar over itself on a terminal and ends it with a line break", () => {
    const texts = drawn(true);
    expect(texts).toHaveLength(41);
    expect(texts[19]).toBe(`\r\x1b[2K${"█".repeat(15)}${"░".repeat(15)} 20 of 40`);
    expect(texts.at(-1)).toBe("\n");
  });

  it("writes a line for every tenth elsewhere", () => {
    expect(drawn(false)).toEqual([4, 8, 12, 16, 20, 24, 28, 32, 36, 40].map((done) => `${done} of 40\n`));
  });
});
