import { readFile } from "node:fs/promises";
import { Ajv2020 } from "ajv/dist/2020.js";
import { describe, expect, it } from "vitest";
import { OPERATIONS } from "../../service/wire/operations.ts";
import { PROBLEMS } from "../../service/wire/problem.ts";
import { VERSION } from "../../service/wire/version.ts";
import type { Json } from "../wire/requests.ts";
import { comparisonRequest, estimateRequest } from "../wire/requests.ts";
import { anApp, documentOf, post } from "./an-app.ts";

const document = await documentOf();
const ajv = new Ajv2020({ strict: false });
ajv.addSchema({ $id: "document", components: document.components });

const operations: [string, Json][] = Object.entries<Json>(document.paths).flatMap(([path, item]) =>
  Object.entries<Json>(item).map(([method, operation]): [string, Json] => [`${method} ${path}`, operation]),
);

/** Holds an answer against the schema that the document has for it. */
function conform(reference: string, value: unknown): void {
  const validate = ajv.getSchema(`document${reference}`)!;
  expect(validate(value), JSON.stringify(validate.errors)).toBe(true);
}

const withBody = operations.filter(([, operation]) => operation.requestBody !== undefined);

describe("the document", () => {
  it("is the one that is committed", async () => {
    const committed = await readFile(new URL("../../openapi/openapi.json", import.meta.url), "utf8");
    expect(JSON.parse(committed)).toEqual(document);
  });

  it("has the version of the package", async () => {
    const { version } = JSON.parse(await readFile(new URL("../../package.json", import.meta.url), "utf8"));
    expect([document.info.version, VERSION]).toEqual([version, version]);
  });

  it("names every operation and says what it does", () => {
    const others = ["document", "liveness", "portfolio", "readiness", "rules", "version"];
    const named = operations.map(([, operation]) => operation.operationId);
    expect(named.sort()).toEqual([...Object.keys(OPERATIONS), ...others].sort());
    for (const [, operation] of operations) {
      expect(operation.summary.length).toBeGreaterThan(10);
      expect(operation.description.length).toBeGreaterThan(20);
    }
  });

  it("lists every problem code, with its status, at some operation", () => {
    const listed = new Set<string>();
    for (const [, { responses }] of operations) {
      for (const [status, response] of Object.entries<Json>(responses)) {
        for (const code of response["x-problem-codes"] ?? []) {
          expect(PROBLEMS[code as keyof typeof PROBLEMS].status).toBe(Number(status));
          expect(response.description).toContain(code);
          listed.add(code);
        }
      }
    }
    const nowhere = Object.keys(PROBLEMS).filter((code) => !listed.has(code));
    // A path that is not of the document has no operation to list its code at.
    expect(nowhere).toEqual(["not-found"]);
    expect(Object.keys(document["x-problem-codes"])).toEqual(Object.keys(PROBLEMS));
  });

  it("requires every body and gives it one media type", () => {
    expect(withBody.length).toBeGreaterThan(1);
    for (const [, operation] of withBody) {
      expect(operation.requestBody.required).toBe(true);
      const type = operation.operationId === "portfolio" ? "application/x-ndjson" : "application/json";
      expect(Object.keys(operation.requestBody.content)).toEqual([type]);
    }
  });
});

describe("the examples of the document", () => {
  const withObject = withBody.filter(([, { operationId }]) => operationId !== "portfolio");

  it.each(withObject)("of %s are a request that is answered, and that answer", async (place, operation) => {
    const { app } = anApp();
    const { schema, example } = operation.requestBody.content["application/json"];
    conform(schema.$ref, example);
    const answer = await app.request(place.split(" ")[1], post(JSON.stringify(example)));
    expect(answer.status).toBe(200);
    const media = operation.responses[200].content["application/json"];
    const body = await answer.json();
    conform(media.schema.$ref, body);
    conform(media.schema.$ref, media.example);
    expect(media.example).toEqual(shortened(body));
  });

  it("of a portfolio are lines that are answered, and each line conforms", async () => {
    const { requestBody, responses } = document.paths["/v1/portfolios"].post;
    const media = requestBody.content["application/x-ndjson"];
    const given = media.example.split("\n").filter((line: string) => line !== "");
    for (const line of given) conform(lineSchema(media), JSON.parse(line));
    const headers = { "content-type": "application/x-ndjson" };
    const answer = await anApp().app.request("/v1/portfolios", post(media.example, headers));
    const lines: Json[] = (await answer.text())
      .split("\n")
      .filter((line) => line !== "")
      .map((line) => JSON.parse(line));
    for (const line of lines) conform(lineSchema(responses[200].content["application/x-ndjson"]), line);
    expect(lines.map(({ kind }) => kind)).toEqual(["result", "result", "totals"]);
  });

  it.each(operations.filter(([place]) => place.startsWith("get")))("of %s conform", async (place, operation) => {
    const { app } = anApp();
    const answer = await app.request(place.split(" ")[1]);
    expect(answer.status).toBe(200);
    const { schema, example } = operation.responses[200].content["application/json"];
    if (schema.$ref === undefined) return;
    conform(schema.$ref, await answer.json());
    if (example !== undefined) conform(schema.$ref, example);
  });

  it("promise no more than the answers have: every rule, module and trace conforms", async () => {
    const { app } = anApp();
    const { rules }: Json = await (await app.request("/v1/rules")).json();
    const modules = [
      {},
      { module: { kind: "test-generator", technology: "thin-film", maximumPower: 300, maximumPowerVoltage: 30 } },
    ];
    for (const { kind } of rules) {
      for (const more of modules) {
        for (const traces of ["full", "power", "causes", "none"]) {
          const rule = kind === "battery-coupled" ? { kind, batteryVoltage: 26 } : { kind };
          const answer = await app.request(
            "/v1/estimates",
            post(JSON.stringify({ ...estimateRequest(15), ...more, rule, traces })),
          );
          conform("#/components/schemas/EstimateAnswer", await answer.json());
        }
      }
    }
    const compared = await app.request("/v1/comparisons", post(JSON.stringify(comparisonRequest())));
    conform("#/components/schemas/ComparisonAnswer", await compared.json());
  });

  it("have problems of the documented form", async () => {
    const { app } = anApp();
    conform("#/components/schemas/Problem", await (await app.request("/v1/estimates", post("{"))).json());
    conform("#/components/schemas/Problem", await (await app.request("/v1/estimates", post("{}"))).json());
  });
});

/** Where the schema of a body's lines stands. */
function lineSchema(media: Json): string {
  expect(media.schema.type).toBe("string");
  return `#/components/schemas/${media.schema["x-line-schema"]}`;
}

function shortened(value: Json): Json {
  return JSON.parse(JSON.stringify(value), (_name, one) => {
    if (typeof one !== "number") return one;
    return Math.abs(one) < 1e-14 ? 0 : Number(one.toPrecision(6));
  });
}
