import { CEILINGS } from "../wire/limits.ts";
import type { OperationName } from "../wire/operations.ts";
import { performOperation } from "../wire/operations.ts";

/** An invented module, of the size of a common one. */
const MODULE = {
  kind: "datasheet",
  cellsInSeries: 60,
  shortCircuitCurrent: 9.91,
  openCircuitVoltage: 38.9,
  maximumPowerCurrent: 9.36,
  maximumPowerVoltage: 31.8,
  shortCircuitCurrentCoefficient: 0.05,
  openCircuitVoltageCoefficient: -0.29,
};

/** An invented spring day at a landing stage of the Saltmarsh Ferries, every third hour. */
const CLIMATE = {
  start: "2025-04-12T00:00:00+02:00",
  step: 10_800,
  irradiance: { kind: "plane-of-array", values: [0, 0, 120, 560, 810, 470, 60, 0] },
  temperature: { kind: "ambient", values: [4.1, 3.6, 7.2, 11.8, 14.9, 14.1, 9.3, 6] },
};

/** The request example of `estimate`. */
export const ESTIMATE_EXAMPLE = { module: MODULE, rule: { kind: "fractional-open-circuit-voltage" }, climate: CLIMATE };

/** The request example of `compare`. */
export const COMPARISON_EXAMPLE = {
  module: MODULE,
  array: { modulesInSeries: 2 },
  candidates: [
    { label: "one voltage", rule: { kind: "constant-voltage", setVoltagePerModule: 29 }, price: 120 },
    { label: "climbs", rule: { kind: "perturb-and-observe", stepFraction: 0.005 }, price: 180 },
  ],
  baseline: "one voltage",
  climate: CLIMATE,
  energyValue: { currency: "EUR", perKilowattHour: 0.24 },
};

/** The request example of `fitModule`. */
export const MODULE_FIT_EXAMPLE = { module: MODULE };

/** The request example of `curve`. */
export const CURVE_EXAMPLE = {
  module: MODULE,
  irradiance: 800,
  cellTemperature: 45,
  points: 9,
  rules: [{ kind: "constant-voltage" }, { kind: "short-current-pulse" }],
};

/** The request example of `testEfficiency`. */
export const EFFICIENCY_TEST_EXAMPLE = {
  module: {
    kind: "test-generator",
    technology: "crystalline-silicon",
    maximumPower: 1000,
    maximumPowerVoltage: 100,
  },
  rule: { kind: "fractional-open-circuit-voltage", fraction: 0.8 },
  test: "static",
};

/** The request example of `tune`. */
export const TUNING_EXAMPLE = {
  module: MODULE,
  climate: CLIMATE,
  rule: { kind: "fractional-open-circuit-voltage" },
  parameter: "fraction",
  range: { from: 0.7, to: 0.9 },
};

/** The request example of `portfolio`: lines. */
export const PORTFOLIO_EXAMPLE = [
  { kind: "defaults", module: MODULE, candidates: COMPARISON_EXAMPLE.candidates, baseline: "one voltage" },
  { kind: "climate", name: "south shore", climate: CLIMATE },
  { kind: "site", id: "Heron Bank", climate: { kind: "named", name: "south shore" } },
  { kind: "site", id: "Old Groyne", climate: { kind: "named", name: "south shore" }, count: 3, group: "groynes" },
]
  .map((line) => `${JSON.stringify(line)}\n`)
  .join("");

/**
 * What the service answers to an example, its numbers shortened to six digits so that the document reads well and does
 * not change with the last bits. Throws Error for an example that is refused.
 */
export function exampleAnswer(operation: OperationName, request: object): unknown {
  const answer = performOperation(operation, new TextEncoder().encode(JSON.stringify(request)), CEILINGS);
  if (!answer.ok) throw new Error(`the example of ${operation} is refused: ${answer.problem.detail}`);
  return JSON.parse(new TextDecoder().decode(answer.bytes), (_name, value: unknown) =>
    typeof value === "number" ? shortened(value) : value,
  );
}

/** Six digits; what is only rounding left over becomes 0. */
function shortened(value: number): number {
  return Math.abs(value) < 1e-14 ? 0 : Number(value.toPrecision(6));
}
