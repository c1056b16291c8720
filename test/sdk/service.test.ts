import { readFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import type { RunningService } from "../../demo/service-process.ts";
import { startService } from "../../demo/service-process.ts";
import { operationTable } from "../../sdk/src/generated/operations.ts";
import { Kneegap, RequestProblemError } from "../../sdk/src/index.ts";

// `npm test` builds first: client and service meet as they are shipped.
const MAIN = fileURLToPath(new URL("../../dist/service/main.js", import.meta.url));
const DOCUMENT = JSON.parse(readFileSync(new URL("../../openapi/openapi.json", import.meta.url), "utf8"));

type Call = (body?: unknown) => Promise<unknown>;

/** The document's example request and answer of an operation, where it has them. */
function exampleOf(method: string, path: string): { request: unknown; answer: unknown } | null {
  const operation = DOCUMENT.paths[path][method.toLowerCase()];
  const request = operation.requestBody?.content["application/json"]?.example;
  return request === undefined
    ? null
    : { request, answer: operation.responses[200].content["application/json"].example };
}

/** Six digits of every number, as the document shortens its examples. */
function shortened(value: unknown): unknown {
  return JSON.parse(JSON.stringify(value), (_name, member: unknown) => {
    if (typeof member !== "number") return member;
    return Math.abs(member) < 1e-14 ? 0 : Number(member.toPrecision(6));
  });
}

describe("the client against the service it was generated for", () => {
  let service: RunningService;
  let client: Kneegap;
  beforeAll(async () => {
    service = await startService(MAIN);
    client = new Kneegap({ baseUrl: service.baseUrl });
  }, 40_000);
  afterAll(async () => {
    await client.close();
    await service.stop();
  });

  const examples = Object.values(operationTable).flatMap(({ operationId, method, path }) => {
    const example = exampleOf(method, path);
    return example === null ? [] : [{ operationId, ...example }];
  });

  it("has an example of every study", () => {
    const studies = ["compare", "curve", "estimate", "fitModule", "testEfficiency", "tune"];
    expect(examples.map(({ operationId }) => operationId)).toEqual(expect.arrayContaining(studies));
  });

  it.each(examples)("answers the document's example of $operationId as the document says", async (example) => {
    const call = (client[example.operationId as keyof Kneegap] as Call).bind(client);
    expect(shortened(await call(example.request))).toEqual(example.answer);
  });

  it("takes typed columns and gives the answer of plain ones", async () => {
    const request = exampleOf("POST", "/v1/estimates")!.request as Parameters<Kneegap["estimate"]>[0];
    const { irradiance, temperature } = request.climate;
    if (irradiance.kind !== "plane-of-array") throw new Error("the example has plane-of-array irradiance");
    const typed = await client.estimate({
      ...request,
      climate: {
        ...request.climate,
        irradiance: { ...irradiance, values: Float64Array.from(irradiance.values as number[]) },
        temperature: { ...temperature, values: Float64Array.from(temperature.values as number[]) },
      },
    });
    const plain = await client.estimate(request);
    expect(typed).toEqual(plain);
  });

  it("throws the service's problem with what to change", async () => {
    const request = structuredClone(exampleOf("POST", "/v1/estimates")!.request) as Parameters<Kneegap["estimate"]>[0];
    (request.module as { openCircuitVoltageCoefficient: number }).openCircuitVoltageCoefficient = -0.0029;
    const error = await client.estimate(request).catch((reason: unknown) => reason);
    expect(error).toBeInstanceOf(RequestProblemError);
    const { problem } = error as RequestProblemError;
    expect(problem?.code).toBe("invalid-request");
    expect(problem?.errors?.[0]).toMatchObject({
      pointer: "/module/openCircuitVoltageCoefficient",
      detail: expect.stringContaining("Did you mean -0.29 %/K"),
    });
  });

  it("reads the catalogue, the version and the health", async () => {
    const { rules } = await client.rules();
    expect(rules.map(({ kind }) => kind)).toContain("short-current-pulse");
    expect(await client.version()).toMatchObject({ version: DOCUMENT.info.version });
    expect(await client.readiness()).toMatchObject({ status: expect.any(String) });
  });
});
