import type { Limits } from "../../service/wire/limits.ts";
import { CEILINGS } from "../../service/wire/limits.ts";
import type { OperationName } from "../../service/wire/operations.ts";
import { performOperation } from "../../service/wire/operations.ts";
import type { Problem } from "../../service/wire/problem.ts";

/** Plain JSON that a test may bend. */
// biome-ignore lint/suspicious/noExplicitAny: tests send what the types forbid.
export type Json = any;

/** An invented module of the size of a common one. */
export const MODULE = {
  kind: "datasheet",
  cellsInSeries: 60,
  shortCircuitCurrent: 9.91,
  openCircuitVoltage: 38.9,
  maximumPowerCurrent: 9.36,
  maximumPowerVoltage: 31.8,
  shortCircuitCurrentCoefficient: 0.05,
  openCircuitVoltageCoefficient: -0.29,
};

/** An invented climate of `samples` hours, day and night. */
export function climateOf(samples: number): Json {
  const hours = Array.from({ length: samples }, (_, k) => k % 24);
  const values = hours.map((hour) => Math.max(0, Math.round(9000 * Math.sin(((hour - 6) / 12) * Math.PI)) / 10));
  return {
    start: "2025-01-01T00:00:00+01:00",
    step: 3600,
    irradiance: { kind: "plane-of-array", values },
    temperature: { kind: "cell", values: values.map((value) => 5 + Math.round(value / 4) / 10) },
  };
}

/** The least that an estimate needs, new at each call. */
export function estimateRequest(samples = 24): Json {
  return structuredClone({ module: MODULE, rule: { kind: "constant-voltage" }, climate: climateOf(samples) });
}

/** The least that a comparison needs, new at each call. */
export function comparisonRequest(samples = 24): Json {
  return structuredClone({
    module: MODULE,
    candidates: [
      { label: "hold", rule: { kind: "constant-voltage", setVoltagePerModule: 27 } },
      { label: "climb", rule: { kind: "perturb-and-observe" } },
    ],
    climate: climateOf(samples),
  });
}

/** A request as body. */
export function bodyOf(request: unknown): Uint8Array {
  return new TextEncoder().encode(typeof request === "string" ? request : JSON.stringify(request));
}

/** The answer to a request that must succeed, and its text. */
export function answered(operation: OperationName, request: unknown): { answer: Json; text: string } {
  const given = performOperation(operation, bodyOf(request), CEILINGS);
  if (!given.ok) throw new Error(`refused: ${JSON.stringify(given)}`);
  const text = new TextDecoder().decode(given.bytes);
  return { answer: JSON.parse(text), text };
}

/** The problem of a request that must be refused. */
export function refused(operation: OperationName, request: unknown, limits: Limits = CEILINGS): Problem {
  const given = performOperation(operation, bodyOf(request), limits);
  if (given.ok) throw new Error("answered");
  return given.problem;
}
