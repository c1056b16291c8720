import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { readClimate } from "../../sdk/src/index.ts";
import { diagnose } from "./fixtures/diagnose.ts";

const readme = readFileSync(new URL("../../sdk/README.md", import.meta.url), "utf8");
const [, section] = /## Climates from CSV\n(.*?)\n## /s.exec(readme)!;

describe("the README's section on CSV", { timeout: 30_000 }, () => {
  it("shows a program that compiles", () => {
    const [, program] = /```ts\n(.*?)```/s.exec(section)!;
    const local = program.replace('"@kneegap/sdk"', '"../index.ts"');
    expect(local).toContain("readClimate(");
    expect(diagnose(new Map(), local)).toEqual([]);
    expect(diagnose(new Map(), local.replace("planeOfArray:", "planeOfAray:"))).not.toEqual([]);
  });

  it("lists headers and roles that are read as it says", async () => {
    const rows = [...section.matchAll(/^\| `([^`]+)` +\| `([^`]+)` +\|/gm)].map(([, header, role]) => ({
      header,
      role,
    }));
    expect(rows.length).toBe(8);
    const read = (roles: string[]) => {
      const named = rows.filter(({ role }) => roles.includes(role));
      const line = named.map(({ role }) => (role === "time" ? "2025-01-01T00:00Z" : "5"));
      const text = `${named.map(({ header }) => header).join()}\n${line.join()}\n`;
      return readClimate(text, { step: 60, site: {} });
    };
    const five = Float64Array.of(5);
    expect(await read(["time", "planeOfArray", "cellTemperature"])).toMatchObject({
      irradiance: { kind: "plane-of-array", values: five },
      temperature: { kind: "cell", values: five },
    });
    expect(await read(["time", "global", "directNormal", "diffuse", "ambientTemperature", "windSpeed"])).toMatchObject({
      irradiance: { kind: "horizontal", global: five, directNormal: five, diffuse: five, site: {} },
      temperature: { kind: "ambient", values: five, windSpeed: five },
    });
  });
});
