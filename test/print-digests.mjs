// Prints a digest of what the built service answers to a set of requests: the same on any Node version, or CI says so.
// Run: node test/print-digests.mjs, after a build.
import { createHash } from "node:crypto";
import { readFileSync } from "node:fs";
import { OPERATIONS } from "../dist/service/wire/operations.js";

const LIMITS = { bodyBytes: 6e7, samples: 600_000, candidates: 24, controlPeriods: 2e8, computeSeconds: 50 };
const document = JSON.parse(readFileSync(new URL("../openapi/openapi.json", import.meta.url), "utf8"));

const examples = Object.values(document.paths)
  .flatMap((path) => Object.values(path))
  .flatMap((operation) => {
    const example = operation.requestBody?.content["application/json"]?.example;
    return example === undefined ? [] : [{ name: operation.operationId, request: example }];
  });

/** Three days of invented minutes for every rule, stepped: the long way through the numbers. */
const { request: estimate } = examples.find(({ name }) => name === "estimate");
const minutes = Array.from({ length: 4320 }, (_, i) => i);
const light = minutes.map((i) =>
  Math.max(0, Math.round(900 * Math.sin(((i % 1440) / 720 - 0.5) * Math.PI) * (0.6 + 0.4 * Math.cos(i * i)))),
);
const stepped = Object.values(document.components.schemas.Rule.discriminator.mapping).map((ref) => {
  const kind =
    document.components.schemas[ref.split("/").at(-1)].properties.kind.const ??
    document.components.schemas[ref.split("/").at(-1)].properties.kind.enum[0];
  const rule = kind === "battery-coupled" ? { kind, batteryVoltage: 26 } : { kind };
  const climate = {
    start: "2025-06-01T00:00:00Z",
    step: 60,
    irradiance: { kind: "plane-of-array", values: light },
    temperature: { kind: "ambient", values: minutes.map((i) => 15 + (i % 7)) },
  };
  return {
    name: "estimate",
    label: `estimate, ${kind}, stepped`,
    request: { ...estimate, rule, climate, mode: "stepped" },
  };
});

for (const { name, label = name, request } of [...examples, ...stepped]) {
  const preparation = OPERATIONS[name](new TextEncoder().encode(JSON.stringify(request)), LIMITS);
  const answer = preparation.ok ? preparation.prepared.perform() : preparation;
  if (!answer.ok) throw new Error(`${label}: ${answer.problem.detail}`);
  process.stdout.write(`${createHash("sha256").update(answer.bytes).digest("hex")} ${label}\n`);
}
