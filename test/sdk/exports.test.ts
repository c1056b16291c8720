import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { operationTable } from "../../sdk/src/generated/operations.ts";
import * as sdk from "../../sdk/src/index.ts";

const source = (path: string) => readFileSync(new URL(`../../sdk/${path}`, import.meta.url), "utf8");

describe("the SDK's exports", () => {
  it("name every schema of the API document", () => {
    const schemas = [...source("src/generated/schema.ts").matchAll(/^export type (\w+) = components\['schemas'\]/gm)];
    expect(source("src/index.ts")).toContain('export type * from "./generated/models.ts";');
    const [, list] = /export type \{([^}]*)\} from "\.\/schema\.ts"/.exec(source("src/generated/models.ts"))!;
    const exported = list.split(",").map((name) => name.trim());
    expect(exported.filter((name) => name !== "")).toEqual(schemas.map(([, name]) => name).sort());
  });

  it("give a method to every operation", () => {
    const client = new sdk.Kneegap({ baseUrl: "http://localhost" });
    for (const operationId of Object.keys(operationTable)) {
      expect(client[operationId as keyof typeof client]).toBeTypeOf("function");
    }
    expect(Object.keys(operationTable)).toContain("estimate");
  });

  it("hold the package's version", () => {
    expect(sdk.SDK_VERSION).toBe(JSON.parse(source("package.json")).version);
  });
});
