import { execFile } from "node:child_process";
import { mkdtemp, readFile, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import { promisify } from "node:util";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import type { ApiDocument } from "../../sdk/scripts/api-document.ts";
import { generateFiles } from "../../sdk/scripts/generate-files.ts";
import { diagnose } from "./fixtures/diagnose.ts";
import { standInDocument } from "./fixtures/stand-in-document.ts";
import { lineOperation } from "./fixtures/stand-in-portfolio.ts";

const ROOT = fileURLToPath(new URL("../..", import.meta.url));
const GENERATE = join(ROOT, "sdk/scripts/generate.ts");

const answer = (schema: object, mediaType = "application/json") => ({
  200: { description: "ok", content: { [mediaType]: { schema } } },
});
const described = (operationId: string, members: object) => ({
  operationId,
  summary: `${operationId} in short.`,
  description: `${operationId} at length, with a */ in it.`,
  ...members,
});

const PROGRAM = `import { Kneegap } from "../kneegap.ts";
export const client = new Kneegap({ baseUrl: "http://localhost" });
export const typed = new Kneegap({ baseUrl: "http://localhost", columns: "typed" });
`;

describe("generateFiles", { timeout: 30_000 }, () => {
  it("names itself on the first line of each file and gives the same text each time", async () => {
    const files = await generateFiles(standInDocument());
    expect([...files.keys()]).toEqual(["models.ts", "schema.ts", "operations.ts", "client.ts"]);
    for (const text of files.values()) expect(text.split("\n", 1)[0]).toContain("generated");
    expect(await generateFiles(standInDocument())).toEqual(files);
  });

  it("leaves the document as it was", async () => {
    const document = standInDocument();
    await generateFiles(document);
    expect(document).toEqual(standInDocument());
  });

  it("puts an operation added to the document into all its files", async () => {
    const document = standInDocument();
    document.paths["/v1/curves"] = {
      post: described("curve", { responses: answer({ type: "string" }, "image/svg+xml") }),
    };
    const files = await generateFiles(document);
    expect(files.get("schema.ts")).toMatch(/^ {4}curve: \{/m);
    expect(files.get("operations.ts")).toContain('path: "/v1/curves"');
    expect(files.get("client.ts")).toContain("curve(options?: CallOptions): Promise<string>");
    expect(files.get("client.ts")).toContain("   * curve in short.");
    expect(diagnose(files, `${PROGRAM}export const svg: Promise<string> = client.curve();`)).toEqual([]);
  });

  it("gives types that take typed columns in requests and give plain or typed ones in answers", async () => {
    const files = await generateFiles(standInDocument());
    const program = (values: string) => `${PROGRAM}import type { Datasheet, Temperature } from "./schema.ts";
      declare const module: Datasheet;
      declare const temperature: Temperature;
      const irradiance = { kind: "plane-of-array" as const, values: ${values} };
      const request = { module, rule: { kind: "" }, climate: { start: "", step: 1, irradiance, temperature } };
      export const plain: Promise<(number | null)[] | undefined> =
        client.estimate(request).then((answer) => answer.traces?.operating.power);
      export const column: Promise<Float64Array | undefined> =
        typed.estimate(request).then((answer) => answer.traces?.operating.power);`;
    expect(diagnose(files, program("new Float64Array(3)"))).toEqual([]);
    expect(diagnose(files, program("new Float32Array(3)"))).toEqual([]);
    expect(diagnose(files, program("[1, null]"))).toEqual([]);
    expect(diagnose(files, program('["1"]')).length).toBeGreaterThan(0);
  });

  it("lets what one operation answers be sent to another, typed columns too", async () => {
    const document = standInDocument();
    document.components.schemas.FigureRequest = {
      type: "object",
      properties: { result: { $ref: "#/components/schemas/EstimateResponse" } },
      required: ["result"],
    };
    const content = { "application/json": { schema: { $ref: "#/components/schemas/FigureRequest" } } };
    document.paths["/v1/figures"] = {
      post: described("figure", {
        requestBody: { required: true, content },
        responses: answer({ type: "string" }, "image/svg+xml"),
      }),
    };
    const program = `${PROGRAM}import type { EstimateRequest } from "./schema.ts";
      export async function draw(request: EstimateRequest): Promise<string[]> {
        return [
          await client.figure({ result: await client.estimate(request) }),
          await typed.figure({ result: await typed.estimate(request) }),
        ];
      }`;
    expect(diagnose(await generateFiles(document), program)).toEqual([]);
  });

  it("leaves the method of an operation that takes lines to the hand, and does not let it be forgotten", async () => {
    const files = await generateFiles(standInDocument());
    expect(files.get("client.ts")).not.toContain("portfolio");
    expect(files.get("operations.ts")).toContain('export type OperationByHand = "portfolio";');
    expect(diagnose(files, `${PROGRAM}export const run = client.portfolio([{ id: "Heron Bank" }]);`)).toEqual([]);
    const document = standInDocument();
    document.paths["/v1/surveys"] = { post: lineOperation("survey", "EstimateRequest", "EstimateResponse") };
    const more = await generateFiles(document);
    const operations = more.get("operations.ts")!;
    expect(operations).toContain('export type OperationByHand = "portfolio" | "survey";');
    const row = operations.slice(operations.indexOf("  survey: {"));
    expect(row).toContain('requestMediaType: "application/x-ndjson"');
    expect(row).toContain('columns: [["traces","maximumPower","voltage"]');
    expect(diagnose(more, PROGRAM)).toEqual([expect.stringMatching(/'Kneegap<C>' incorrectly implements.*'survey'/s)]);
  });

  it("lists where the columns of an answer stand, through references, lists, maps and variants", async () => {
    const document = standInDocument();
    const numbers = { type: "array", items: { anyOf: [{ type: "integer" }, { type: "null" }] } };
    const schema = {
      oneOf: [
        { type: "object", properties: { traces: { $ref: "#/components/schemas/Trace" } } },
        { type: "object", properties: { byLabel: { type: "object", additionalProperties: numbers } } },
        { type: "object", properties: { rows: { type: "array", items: { allOf: [{ properties: { x: numbers } }] } } } },
        { type: "object", properties: { site: { type: "array", prefixItems: [{ type: "number" }] } } },
      ],
    };
    document.paths["/v1/x"] = { get: described("variants", { responses: answer(schema) }) };
    const operations = (await generateFiles(document)).get("operations.ts")!;
    const row = operations.slice(operations.indexOf("  variants: {"));
    const paths = /columns: (.*),\n/.exec(row)![1];
    expect(JSON.parse(paths)).toEqual([
      ["traces", "voltage"],
      ["traces", "current"],
      ["traces", "power"],
      ["byLabel", "*"],
      ["rows", "*", "x"],
    ]);
  });

  const responses = answer({ type: "object" });
  it.each<[string, object, RegExp]>([
    ["without an operationId", { summary: "a", description: "b", responses }, /GET \/v1\/x: no operationId/],
    ["without a description", { operationId: "x", summary: "a", responses }, /no description/],
    ["whose id is no method's name", described("get-x", { responses }), /cannot be a method's name/],
    ["whose id is the client's own", described("close", { responses }), /cannot be a method's name/],
    ["whose id another has", described("estimate", { responses }), /comes twice/],
    ["with a query", described("x", { responses, parameters: [{ name: "q", in: "query" }] }), /query parameter q/],
    ["with an optional body", described("x", { responses, requestBody: { content: {} } }), /not required/],
    ["without a success", described("x", { responses: { 500: { description: "no" } } }), /no success status/],
    [
      "with two media types",
      described("x", { responses: { 200: { content: { "text/plain": {}, "application/json": {} } } } }),
      /more than one media type/,
    ],
    [
      "with a marked column of strings",
      described("x", { responses: answer({ type: "array", items: { type: "string" }, "x-column": true }) }),
      /marked x-column/,
    ],
    [
      "with a column that is another array in a variant",
      described("x", {
        responses: answer({
          anyOf: [
            { type: "array", items: { type: "number" } },
            { type: "array", items: { type: "string" } },
          ],
        }),
      }),
      /another array/,
    ],
    [
      "with a reference to nothing",
      described("x", { responses: answer({ $ref: "#/components/schemas/No" }) }),
      /nowhere/,
    ],
  ])("refuses an operation %s instead of leaving it out", async (_, operation, message) => {
    const document: ApiDocument = standInDocument();
    const paths = { ...document.paths, "/v1/x": { get: operation } };
    await expect(generateFiles({ ...document, paths })).rejects.toThrow(message);
  });
});

describe("the generate script", () => {
  let directory: string;
  beforeEach(async () => {
    directory = await mkdtemp(join(tmpdir(), "kneegap-generate-"));
    await writeFile(join(directory, "document.json"), JSON.stringify(standInDocument()));
  });
  afterEach(() => rm(directory, { recursive: true }));

  const generate = (...more: string[]) =>
    promisify(execFile)(
      process.execPath,
      [...["--import", "tsx", GENERATE, "--document", join(directory, "document.json"), "--out", directory], ...more],
      { cwd: ROOT },
    ).then(
      () => ({ code: 0, stderr: "" }),
      (error: { code: number; stderr: string }) => error,
    );

  it("writes files that --check accepts until the document or a file changes", async () => {
    expect(await generate()).toMatchObject({ code: 0 });
    expect(await generate("--check")).toMatchObject({ code: 0 });
    const client = join(directory, "client.ts");
    await writeFile(client, (await readFile(client, "utf8")).replace("compare(", "compared("));
    expect(await generate("--check")).toMatchObject({ code: 1, stderr: expect.stringMatching(/: client\.ts;/) });
    const document = standInDocument();
    document.paths["/v1/curves"] = { get: described("curve", { responses: answer({ type: "object" }) }) };
    await writeFile(join(directory, "document.json"), JSON.stringify(document));
    const drift = await generate("--check");
    expect(drift).toMatchObject({ code: 1, stderr: expect.stringContaining("schema.ts, operations.ts, client.ts") });
  }, 30_000);
});
