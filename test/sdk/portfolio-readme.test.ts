import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { resolveOptions } from "../../sdk/src/client-options.ts";
import { resolvePortfolio } from "../../sdk/src/portfolio/portfolio-options.ts";
import { diagnose } from "./fixtures/diagnose.ts";

const readme = readFileSync(new URL("../../sdk/README.md", import.meta.url), "utf8");
const [, section] = /## Portfolios\n(.*?)\n## /s.exec(readme)!;

describe("the README's section on portfolios", { timeout: 30_000 }, () => {
  it("shows a program that compiles", () => {
    const [, program] = /```ts\n(.*?)```/s.exec(section)!;
    const local = program.replace('"@kneegap/sdk"', '"../index.ts"');
    expect(local).toContain("client.portfolio(");
    expect(diagnose(new Map(), local)).toEqual([]);
    expect(diagnose(new Map(), local.replace("results[0]", "result[0]"))).not.toEqual([]);
  });

  it("names every option with its default", () => {
    const client = resolveOptions({ baseUrl: "http://localhost" });
    const settings = resolvePortfolio({}, client);
    const rows = [...section.matchAll(/^\| (`[^|]+`) +\| ([^|]+?) +\|/gm)];
    const named = rows.flatMap(([, names]) => [...names.matchAll(/`(\w+)`/g)].map(([, name]) => name));
    expect(named.sort()).toEqual(Object.keys(settings).sort());
    const defaultOf = (name: string) => rows.find(([, names]) => names.includes(`\`${name}\``))![2];
    expect(defaultOf("concurrency")).toBe(String(settings.concurrency));
    expect(defaultOf("batchSites")).toBe(String(settings.batchSites));
    expect(defaultOf("batchBytes")).toBe(`${settings.batchBytes / 2 ** 20} MiB`);
    expect([settings.timeout, settings.attempts]).toEqual([client.timeout, client.retry.attempts]);
  });
});
