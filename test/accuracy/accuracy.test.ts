import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { CHECKS, FINDINGS } from "./all-checks.ts";
import { differenceOf, figuresOf } from "./check.ts";
import { resultsMarkdown } from "./results.ts";

describe.each([...new Set(CHECKS.map(({ topic }) => topic))])("%s", (topic) => {
  const checks = CHECKS.filter((check) => check.topic === topic).map((check) => [check.title, check] as const);

  it.each(checks)("%s: every figure is within its tolerance", (_title, check) => {
    const figures = figuresOf(check);
    expect(figures.length).toBeGreaterThan(0);
    for (const figure of figures) {
      expect([figure.expected, figure.ours, figure.tolerance].every(Number.isFinite), figure.name).toBe(true);
      expect(figure.tolerance, figure.name).toBeGreaterThan(0);
      expect(differenceOf(figure), `${figure.name}: ${figure.ours} for ${figure.expected}`).toBeLessThanOrEqual(
        figure.tolerance,
      );
    }
  });
});

describe("the accuracy table", () => {
  it("names no check twice and gives each a source", () => {
    const names = CHECKS.map(({ topic, title }) => `${topic}: ${title}`);
    expect(new Set(names).size).toBe(names.length);
    for (const { source } of [...CHECKS, ...FINDINGS]) expect(source).toMatch(/\S/);
  });

  it("reads the same when the last bits of ours differ, as they may between machines", () => {
    const text = resultsMarkdown(CHECKS, []);
    for (const nudge of [1 + 1e-14, 1 - 1e-14]) {
      const nudged = CHECKS.map((check) => ({
        ...check,
        figures: () => figuresOf(check).map((figure) => ({ ...figure, ours: figure.ours * nudge })),
      }));
      expect(resultsMarkdown(nudged, [])).toBe(text);
    }
  });

  it("stands in RESULTS.md as the figures are now; if not, refresh it with `npm run accuracy`", () => {
    const committed = readFileSync(new URL("RESULTS.md", import.meta.url), "utf8");
    expect(committed).toBe(resultsMarkdown(CHECKS, FINDINGS));
  });
});
