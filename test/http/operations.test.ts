import { gzipSync } from "node:zlib";
import { describe, expect, it } from "vitest";
import { CEILINGS } from "../../service/wire/limits.ts";
import type { OperationName } from "../../service/wire/operations.ts";
import { OPERATIONS } from "../../service/wire/operations.ts";
import type { Json } from "../wire/requests.ts";
import {
  answered,
  comparisonRequest,
  curveRequest,
  efficiencyTestRequest,
  estimateRequest,
  moduleFitRequest,
  tuningRequest,
} from "../wire/requests.ts";
import { anApp, post } from "./an-app.ts";

/** Every operation on one body: where it is, and a request that is answered. */
const ROUTES: [OperationName, string, () => Json][] = [
  ["estimate", "/v1/estimates", estimateRequest],
  ["compare", "/v1/comparisons", comparisonRequest],
  ["tune", "/v1/tunings", tuningRequest],
  ["testEfficiency", "/v1/efficiency-tests", efficiencyTestRequest],
  ["fitModule", "/v1/module-fits", moduleFitRequest],
  ["curve", "/v1/curves", curveRequest],
];

const { app } = anApp();

async function refusal(answer: Response, status: number, code: string): Promise<Json> {
  expect(answer.status).toBe(status);
  expect(answer.headers.get("content-type")).toBe("application/problem+json");
  const problem: Json = await answer.json();
  expect(problem.code).toBe(code);
  expect(problem.detail.length).toBeGreaterThan(15);
  return problem;
}

describe("every operation", () => {
  it("is among the routes tried here", () => {
    expect(ROUTES.map(([name]) => name).sort()).toEqual(Object.keys(OPERATIONS).sort());
  });
});

describe.each(ROUTES)("%s at POST %s", (name, path, make) => {
  const body = JSON.stringify(make());

  it("answers the very bytes of its operation, plain and from gzip", async () => {
    const { text } = answered(name, make());
    const plain = await app.request(path, post(body));
    expect(plain.status).toBe(200);
    expect(await plain.text()).toBe(text);
    const packed = await app.request(path, post(gzipSync(body), { "content-encoding": "gzip" }));
    expect(await packed.text()).toBe(text);
  });

  it("names what is wrong, where, with 422", async () => {
    const problem = await refusal(
      await app.request(path, post(JSON.stringify({ ...make(), odd: 1 }))),
      422,
      "invalid-request",
    );
    expect(problem.errors[0]).toMatchObject({ pointer: "/odd", code: "unknown-member" });
    expect(problem.detail).toMatch(/^\/odd: /);
  });

  it.each([
    ["another type", body, { "content-type": "text/csv" }, 415, "unsupported-media-type"],
    ["latin1", body, { "content-type": "application/json; charset=latin1" }, 415, "unsupported-media-type"],
    ["another packing", body, { "content-encoding": "br" }, 415, "unsupported-media-type"],
    ["no gzip", body, { "content-encoding": "gzip" }, 400, "malformed-body"],
    ["nothing", "", {}, 400, "malformed-body"],
    ["half a body", body.slice(0, body.length / 2), {}, 400, "malformed-body"],
    ["NaN", body.replace(/\d+(?=[,}])/, "NaN"), {}, 400, "malformed-body"],
    ["33 brackets", "[".repeat(33), {}, 400, "malformed-body"],
    ["bytes that are no UTF-8", new Uint8Array([0x7b, 0xff, 0x7d]), {}, 400, "malformed-body"],
  ] as const)("refuses a body of %s", async (_what, sent, headers, status, code) => {
    await refusal(await app.request(path, post(sent as never, headers as Record<string, string>)), status, code);
  });

  it("refuses a body longer than the limit in force", async () => {
    const limits = { ...CEILINGS, bodyBytes: body.length };
    const small = anApp({ limits }).app;
    expect((await small.request(path, post(body))).status).toBe(200);
    const problem = await refusal(await small.request(path, post(`${body} `)), 413, "body-too-large");
    expect(problem.detail).toContain(`${body.length} bytes`);
  });

  it("takes POST alone and answers in JSON alone", async () => {
    const got = await app.request(path);
    await refusal(got, 405, "method-not-allowed");
    expect(got.headers.get("allow")).toBe("POST");
    await refusal(await app.request(path, post(body, { accept: "text/csv" })), 406, "not-acceptable");
  });

  it("asks for a key where there is one", async () => {
    const guarded = anApp({ keys: [{ name: "quotes", digest: Buffer.alloc(32) }] }).app;
    await refusal(await guarded.request(path, post(body)), 401, "unauthorized");
  });
});
