import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { CEILINGS } from "../service/wire/limits.ts";
import { performOperation } from "../service/wire/operations.ts";

const README = readFileSync(new URL("../README.md", import.meta.url), "utf8");

/** The body of the README's curl line. */
function shownRequest(): string {
  const [, body] = /curl -s [^']*'content-type: application\/json' -d '([^']*)'/.exec(README)!;
  return body;
}

/** The numbers of the README's shortened answer, by the member they are shown under. */
function shownNumbers(): [string, number][] {
  const [, answer] = /```jsonc\n([\s\S]*?)```/.exec(README)!;
  return [...answer.matchAll(/"(\w+)": (-?[\d.]+(?:e-?\d+)?)(?=[,\s}])/g)].map(([, name, value]) => [
    name,
    Number(value),
  ]);
}

/** Six digits, as the README shows them. */
function shortened(value: number): number {
  return Number(value.toPrecision(6));
}

function answerTo(body: string): { text: string; ok: boolean } {
  const answer = performOperation("estimate", new TextEncoder().encode(body), CEILINGS);
  return answer.ok
    ? { ok: true, text: new TextDecoder().decode(answer.bytes) }
    : { ok: false, text: answer.problem.detail };
}

describe("the README", () => {
  it("shows the answer that its request really gets", () => {
    const { ok, text } = answerTo(shownRequest());
    expect(ok, text).toBe(true);
    const numbers = shownNumbers();
    expect(numbers.length).toBeGreaterThan(8);
    for (const [name, value] of numbers) {
      const given = [...text.matchAll(new RegExp(`"${name}":(-?[\\d.e-]+)`, "g"))].map(([, one]) =>
        shortened(Number(one)),
      );
      expect(given, name).toContain(value);
    }
  });

  it("shows the problem that a coefficient in the wrong unit really gets", () => {
    const { text } = answerTo(shownRequest().replace("-0.29", "-0.0029"));
    expect(README).toContain(text);
  });
});
