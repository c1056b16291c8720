import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { diagnose } from "./fixtures/diagnose.ts";

const readme = readFileSync(new URL("../../sdk/README.md", import.meta.url), "utf8");

describe("the SDK's README", { timeout: 30_000 }, () => {
  it("shows a program that compiles against the SDK as it is", () => {
    const [, program] = /```ts\n(.*?)```/s.exec(readme)!;
    const local = program.replace('"@kneegap/sdk"', '"../index.ts"');
    expect(local).toContain("client.estimate(");
    expect(diagnose(new Map(), local)).toEqual([]);
    expect(diagnose(new Map(), local.replace("client.estimate(", "client.guess("))).not.toEqual([]);
  });
});
