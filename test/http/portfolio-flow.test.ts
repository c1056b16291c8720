import { setTimeout as sleep } from "node:timers/promises";
import { describe, expect, it } from "vitest";
import type { PerformStep, PortfolioService } from "../../service/http/services.ts";
import { performStep } from "../../service/wire/portfolio/perform-step.ts";
import type { StepAnswer } from "../../service/wire/portfolio/step.ts";
import { problem } from "../../service/wire/problem.ts";
import { defaultsLine, linesIn, ndjson, siteLine } from "../wire/portfolio-requests.ts";
import type { Json } from "../wire/requests.ts";
import type { Body, LogLine } from "./an-app.ts";
import { anApp, inlinePortfolio, post } from "./an-app.ts";

const LINES = { "content-type": "application/x-ndjson" };

/** A sender of defaults and then `sites` sites that are made when they are asked for; `end`: whether it then ends. */
function sender(sites: number, end = true) {
  const state = { sent: 0, cancelled: false };
  const body = new ReadableStream<Uint8Array>({
    start: (controller) => controller.enqueue(new TextEncoder().encode(ndjson([defaultsLine()]))),
    pull: (controller) => {
      if (state.sent < sites) {
        controller.enqueue(new TextEncoder().encode(ndjson([siteLine(`${state.sent++}`)])));
      } else if (end) controller.close();
    },
    cancel: () => {
      state.cancelled = true;
    },
  });
  return { state, body: body as unknown as Body };
}

async function asked(
  body: Body,
  service: Partial<PortfolioService>,
): Promise<{ answer: Response; log: LogLine[]; cause: () => unknown }> {
  const { app, lines: log } = anApp({ portfolio: { ...inlinePortfolio, ...service } });
  const answer = await app.request("/v1/portfolios", { ...post(body, LINES), duplex: "half" } as RequestInit);
  const cause = () => log.find(({ message }) => message === "portfolio")?.values["cause"];
  return { answer, log, cause };
}

/** Performs sites when told to; defaults at once. */
function gate() {
  const waiting: (() => void)[] = [];
  const signals: AbortSignal[] = [];
  const perform: PerformStep = async (step, signal) => {
    if (step.step === "site") {
      signals.push(signal);
      await new Promise<void>((resolve) => waiting.push(resolve));
    }
    return performStep(step);
  };
  return { perform, waiting, signals };
}

/** Waits until `value` has not changed for a while. */
async function settled(value: () => number): Promise<number> {
  for (let last = -1; last !== value(); await sleep(60)) last = value();
  return value();
}

const SITES = 1500;

describe("a reader who does not keep up", () => {
  it("stops the reading of sites, and gets them all when it goes on", async () => {
    const { state, body } = sender(SITES);
    const { answer } = await asked(body, { stallTime: 60_000 });
    const ahead = await settled(() => state.sent);
    // 64 KiB of answers of more than 3 KB each, and what streams of 16 to 64 KiB hold of lines of 300 bytes.
    expect(ahead).toBeGreaterThan(10);
    expect(ahead).toBeLessThan(600);
    const lines = linesIn(await answer.text());
    expect(lines.at(-1)).toMatchObject({ kind: "totals", answered: SITES });
    expect(new Set(lines.map(({ id }) => id)).size).toBe(SITES + 1);
  });

  it("is given up after the stall time, and the sender is told to stop", async () => {
    const { state, body } = sender(SITES);
    const { answer, cause } = await asked(body, { stallTime: 150 });
    await sleep(500);
    expect(cause()).toBe("too-slow");
    expect(state.cancelled).toBe(true);
    const lines = linesIn(await answer.text());
    expect(lines.at(-1)).toMatchObject({ kind: "aborted", problem: { code: "too-slow" } });
    expect(lines.filter(({ kind }) => kind === "totals")).toEqual([]);
  });

  it("is not given up while it takes something now and then", async () => {
    const { body } = sender(150);
    const { answer } = await asked(body, { stallTime: 400 });
    const reader = answer.body!.getReader();
    let text = "";
    for (let turn = 0; ; turn++) {
      const { done, value } = await reader.read();
      if (done) break;
      text += new TextDecoder().decode(value);
      if (turn % 10 === 0) await sleep(120);
    }
    expect(linesIn(text).at(-1)).toMatchObject({ kind: "totals", answered: 150 });
  });
});

describe("sites that are being computed", () => {
  it("are no more than may be at once, and reading stops meanwhile", async () => {
    const { state, body } = sender(SITES);
    const { perform, waiting } = gate();
    const { answer } = await asked(body, { perform, stepsAtOnce: 3, stallTime: 60_000 });
    expect(await settled(() => state.sent)).toBeLessThan(600);
    expect(waiting).toHaveLength(3);
    waiting[1]();
    await settled(() => waiting.length);
    expect(waiting).toHaveLength(4);
    await answer.body!.cancel();
  });

  it("are answered as they are done", async () => {
    const { body } = sender(3);
    const { perform, waiting } = gate();
    const { answer } = await asked(body, { perform, stepsAtOnce: 3 });
    await settled(() => waiting.length);
    for (const index of [2, 0, 1]) {
      waiting[index]();
      await sleep(10);
    }
    expect(linesIn(await answer.text()).map(({ id, kind }) => id ?? kind)).toEqual(["2", "0", "1", "totals"]);
  });

  it("may take longer than the stall time, and empty lines are sent meanwhile", async () => {
    const { body } = sender(1);
    const { perform, waiting } = gate();
    const { answer } = await asked(body, { perform, stallTime: 60, silence: 30 });
    await sleep(400);
    waiting[0]();
    const text = await answer.text();
    expect(linesIn(text).map(({ kind }) => kind)).toEqual(["result", "totals"]);
    expect(text.indexOf("{")).toBeGreaterThan(5);
    expect(text.slice(0, text.indexOf("{"))).toMatch(/^\n+$/);
  });
});

describe("a client who leaves", () => {
  it("stops the computing and the upload, and no site is begun any more", async () => {
    const { state, body } = sender(SITES);
    const { perform, waiting, signals } = gate();
    const { answer, cause } = await asked(body, { perform });
    await settled(() => waiting.length);
    await answer.body!.cancel();
    expect(signals.map(({ aborted }) => aborted)).toEqual([true, true]);
    for (const resume of waiting) resume();
    await sleep(50);
    expect([signals.length, state.cancelled, cause()]).toEqual([2, true, "left"]);
  });
});

describe("a sender who stalls", () => {
  it("before the first line ends is answered 408", async () => {
    const { body } = sender(0, false);
    const { answer } = await asked(
      new ReadableStream({ start: (controller) => controller.enqueue(new Uint8Array([0x7b])) }) as unknown as Body,
      { stallTime: 80 },
    );
    expect([answer.status, ((await answer.json()) as Json).code]).toEqual([408, "too-slow"]);
    await (body as ReadableStream).cancel();
  });

  it("later gets the results of what it sent, and no totals", async () => {
    const { body } = sender(2, false);
    const { answer, cause } = await asked(body, { stallTime: 80 });
    const lines = linesIn(await answer.text());
    expect(lines.map(({ kind }) => kind)).toEqual(["result", "result", "aborted"]);
    expect(lines[2].problem).toMatchObject({ code: "too-slow", status: 408 });
    expect(cause()).toBe("too-slow");
  });
});

describe("a step that fails", () => {
  const failing =
    (at: string, how: Awaited<ReturnType<PerformStep>>): PerformStep =>
    async (step) => {
      const text = step.step === "site" ? new TextDecoder().decode(step.body) : "";
      return text.includes(`"id":"${at}"`) ? (how as StepAnswer as never) : performStep(step);
    };

  it("for its site alone is that site's problem", async () => {
    const lost = { ok: false as const, problem: problem("worker-lost", "The worker died.") };
    const { answer } = await asked(sender(4).body, { perform: failing("1", lost) });
    const lines = linesIn(await answer.text());
    expect(lines.find(({ id }) => id === "1")).toMatchObject({
      line: 3,
      problem: { code: "worker-lost", status: 500 },
    });
    expect(lines.at(-1)).toMatchObject({ kind: "totals", answered: 3, refused: 1 });
  });

  it("because the service stops ends the portfolio", async () => {
    const stopping = { ok: false as const, problem: problem("draining", "Not begun.") };
    const { answer } = await asked(sender(SITES).body, { perform: failing("5", stopping) });
    const lines = linesIn(await answer.text());
    expect(lines.at(-1)).toMatchObject({ kind: "aborted", problem: { code: "draining", status: 503 } });
    expect(lines.length).toBeLessThan(10);
  });

  it("by a defect tells the log why, and the caller only the request id", async () => {
    const fault = { ok: false as const, problem: problem("internal", "Failed."), fault: "at /home/secret" };
    const { answer, log } = await asked(sender(2).body, { perform: failing("0", fault) });
    const text = await answer.text();
    expect(text).not.toContain("secret");
    expect(linesIn(text).at(-1)).toMatchObject({ kind: "totals", answered: 1, refused: 1 });
    expect(log.find(({ level }) => level === "error")?.values).toMatchObject({ fault: "at /home/secret" });
  });

  it("by throwing ends the portfolio without leaking", async () => {
    const perform: PerformStep = async (step) => {
      if (step.step === "site") throw new Error("at /home/secret");
      return performStep(step);
    };
    const { answer, log } = await asked(sender(5).body, { perform });
    const text = await answer.text();
    expect(text).not.toContain("secret");
    expect(linesIn(text)).toMatchObject([{ kind: "aborted", problem: { code: "internal" } }]);
    expect(log.some(({ level, values }) => level === "error" && String(values["fault"]).includes("secret"))).toBe(true);
  });
});
