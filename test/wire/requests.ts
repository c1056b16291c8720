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

/** The least that a datasheet fit needs, new at each call. */
export function moduleFitRequest(): Json {
  return structuredClone({ module: MODULE });
}

/** Six points of an invented lit cell, from beyond short circuit to near open circuit; new at each call. */
export function measuredFitRequest(): Json {
  return structuredClone({
    module: {
      kind: "measured-curve",
      cellsInSeries: 1,
      irradiance: 1000,
      cellTemperature: 33,
      voltage: [-0.2, 0, 0.2, 0.4, 0.5, 0.57],
      current: [0.764, 0.76, 0.757, 0.72, 0.55, 0.01],
    },
  });
}

/** The least that a curve with two rules on it needs, new at each call. */
export function curveRequest(): Json {
  const rules = [{ kind: "constant-voltage" }, { kind: "short-current-pulse" }];
  return structuredClone({ module: MODULE, irradiance: 800, cellTemperature: 45, rules, points: 5 });
}

/** The standard's test generator of crystalline silicon: 1000 W at 100 V nominally. */
export const GENERATOR = {
  kind: "test-generator",
  technology: "crystalline-silicon",
  maximumPower: 1000,
  maximumPowerVoltage: 100,
};

/** The least that a static efficiency test needs, new at each call. */
export function efficiencyTestRequest(): Json {
  return structuredClone({ module: GENERATOR, rule: { kind: "constant-voltage" }, test: "static" });
}

/** The least that a tuning of one site needs, new at each call. */
export function tuningRequest(samples = 24): Json {
  return structuredClone({
    module: MODULE,
    climate: climateOf(samples),
    rule: { kind: "fractional-open-circuit-voltage" },
    parameter: "fraction",
  });
}

/** A tuning of two sites that share the module, new at each call. */
export function sitesRequest(samples = 24): Json {
  const { climate, ...shared } = tuningRequest(samples);
  return {
    ...shared,
    sites: [
      { id: "Heron Bank", climate },
      { id: "Mud Flats", climate: climateOf(samples) },
    ],
  };
}

/** A climate of `samples` hours in horizontal components at an invented landing stage, from a morning on. */
export function horizontalClimate(samples: number): Json {
  const global = Array.from({ length: samples }, (_, k) => Math.max(0, 700 * Math.sin(((k % 24) / 12) * Math.PI)));
  return {
    start: "2025-06-01T06:00:00+00:00",
    step: 3600,
    irradiance: {
      kind: "horizontal",
      global,
      diffuse: global.map((value) => value / 3),
      site: { latitude: 51, longitude: 0, tilt: 30, azimuth: 180 },
    },
    temperature: { kind: "ambient", values: global.map(() => 15) },
  };
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
