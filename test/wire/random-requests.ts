import type { z } from "@hono/zod-openapi";
import fc from "fast-check";
import { RULES } from "../../service/core/rules/index.ts";
import type { RuleDefinition } from "../../service/core/rules/rule.ts";
import type { OperationName } from "../../service/wire/operations.ts";
import { ComparisonRequestSchema } from "../../service/wire/schema/comparison.ts";
import { CurveRequestSchema } from "../../service/wire/schema/curve.ts";
import { EfficiencyTestRequestSchema } from "../../service/wire/schema/efficiency-test.ts";
import { EstimateRequestSchema } from "../../service/wire/schema/estimate.ts";
import { ModuleFitRequestSchema } from "../../service/wire/schema/module-fit.ts";
import { TuningRequestSchema } from "../../service/wire/schema/tuning.ts";
import type { Json } from "./requests.ts";
import {
  comparisonRequest,
  curveRequest,
  efficiencyTestRequest,
  estimateRequest,
  horizontalClimate,
  measuredFitRequest,
  moduleFitRequest,
  sitesRequest,
  tuningRequest,
} from "./requests.ts";

const rules = RULES as unknown as readonly RuleDefinition[];

/** Values that are often wrong in one way or another. */
const odd = fc.oneof(
  fc.constantFrom<Json>(
    null,
    true,
    "",
    "datasheet",
    "single-diode",
    "perfect",
    "ambient",
    "noct",
    [],
    {},
    "EUR",
    "\u{1f600}".repeat(100),
    "\u{1f600}".repeat(101),
    "a\u0000",
    "2025-01-01T00:00Z",
    "2025-13-01T00:00:00Z",
    Number.POSITIVE_INFINITY,
  ),
  fc.double({ noNaN: true, min: -1e4, max: 1e4 }),
  fc.integer({ min: -3, max: 700 }),
  fc.array(fc.oneof(fc.double({ noNaN: true, min: -20, max: 2100 }), fc.constant(null)), { maxLength: 4 }),
);

/** Every place of a value, as path. */
function places(value: Json, path: string[] = []): string[][] {
  if (typeof value !== "object" || value === null) return [path];
  return [path, ...Object.keys(value).flatMap((name) => places(value[name], [...path, name]))];
}

/** One change: a place is set or dropped, or a member added beside it. */
export type Change = { at: number; how: "set" | "drop" | "add"; value: Json; name: string };

/** Up to three changes of a request. */
export const changes: fc.Arbitrary<Change[]> = fc.array(
  fc.record({
    at: fc.nat(),
    how: fc.constantFrom("set" as const, "set" as const, "drop" as const, "add" as const),
    value: odd,
    name: fc.constantFrom(
      "array",
      "converter",
      "mode",
      "traces",
      "label",
      "price",
      "fraction",
      "windSpeed",
      "model",
      "sensorError",
      "odd",
    ),
  }),
  { minLength: 0, maxLength: 3 },
);

/** A request with changes made to it. */
export function bend(request: Json, list: readonly Change[]): Json {
  for (const { at, how, value, name } of list) {
    const all = places(request).filter((path) => path.length > 0);
    if (all.length === 0) return request;
    const path = all[at % all.length];
    const parent = path.slice(0, -1).reduce((node, step) => node[step], request);
    if (how === "set") parent[path.at(-1)!] = value;
    else if (how === "add" && !Array.isArray(parent)) parent[name] = value;
    else if (Array.isArray(parent)) parent.splice(Number(path.at(-1)), 1);
    else delete parent[path.at(-1)!];
  }
  return request;
}

/** Every operation's request schema by its name in the document, and sound requests to start from. */
export const bases: Record<
  string,
  { operation: OperationName; answer: string; schema: z.ZodType; make: () => Json[] }
> = {
  EstimateRequest: {
    operation: "estimate",
    answer: "EstimateAnswer",
    schema: EstimateRequestSchema,
    make: () => [
      estimateRequest(3),
      ...rules.map(({ kind, parameters }) => ({ ...estimateRequest(2), rule: { kind, ...fillIn(parameters) } })),
      {
        ...estimateRequest(2),
        module: { kind: "test-generator", technology: "thin-film", maximumPower: 100, maximumPowerVoltage: 40 },
        converter: { trackingMaximumVoltage: 50, sensorError: { voltageGain: 0.01 } },
        array: { modulesInSeries: 2 },
      },
      {
        ...estimateRequest(2),
        module: {
          kind: "single-diode",
          cellsInSeries: 36,
          photocurrent: 5,
          saturationCurrent: 1e-9,
          seriesResistance: 0.2,
          shuntResistance: null,
          idealityVoltage: 1.2,
        },
        recordLowTemperature: -10,
      },
      { ...estimateRequest(2), climate: { ...horizontalClimate(2), gaps: { interpolateUpTo: 3600 } }, mode: "stepped" },
      { ...estimateRequest(2), climate: laggedClimate() },
    ],
  },
  ComparisonRequest: {
    operation: "compare",
    answer: "ComparisonAnswer",
    schema: ComparisonRequestSchema,
    make: () => [
      {
        ...comparisonRequest(2),
        baseline: "hold",
        energyValue: { currency: "EUR", perKilowattHour: 0.2 },
        converter: { maximumPower: null },
      },
    ],
  },
  TuningRequest: {
    operation: "tune",
    answer: "TuningAnswer",
    schema: TuningRequestSchema,
    make: () => [
      { ...tuningRequest(2), range: { from: 0.7, to: 0.9 }, points: 50, mode: "steady" },
      { ...sitesRequest(2), converter: { wakePower: 1 }, array: {} },
    ],
  },
  EfficiencyTestRequest: {
    operation: "testEfficiency",
    answer: "EfficiencyTestAnswer",
    schema: EfficiencyTestRequestSchema,
    make: () => [
      { ...efficiencyTestRequest(), cellTemperature: 40, converter: {}, traceSlope: null },
      {
        ...efficiencyTestRequest(),
        test: "start-up",
        temperatureLag: { rise: 30, timeConstant: 600 },
        traceSlope: 0.1,
      },
    ],
  },
  ModuleFitRequest: {
    operation: "fitModule",
    answer: "ModuleFitAnswer",
    schema: ModuleFitRequestSchema,
    make: () => [
      moduleFitRequest(),
      measuredFitRequest(),
      {
        module: { ...measuredFitRequest().module, photocurrentCoefficient: 0.05, bandgap: 1.4, bandgapCoefficient: 0 },
      },
    ],
  },
  CurveRequest: {
    operation: "curve",
    answer: "CurveAnswer",
    schema: CurveRequestSchema,
    make: () => [
      curveRequest(),
      { ...curveRequest(), rules: [{ kind: "battery-coupled", batteryVoltage: 26 }, { kind: "power-curve-scan" }] },
    ],
  },
};

/** A horizontal climate of two samples with every member that a climate can have. */
function laggedClimate(): Json {
  const climate = horizontalClimate(2);
  Object.assign(climate.irradiance, { directNormal: [500, 500], skyModel: "hay-davies" });
  Object.assign(climate.irradiance.site, { elevation: 20, albedo: 0.3 });
  Object.assign(climate.temperature, { windSpeed: [1, 2], model: { kind: "faiman" }, thermalLag: 300 });
  return { ...climate, timing: "instant", gaps: "skip" };
}

function fillIn(parameters: RuleDefinition["parameters"]): Json {
  const filled = Object.entries(parameters).map(([name, parameter]) => [
    name,
    parameter.type === "series" ? [20, null] : parameter.type === "number" ? parameter.maximum : parameter.default,
  ]);
  return Object.fromEntries(filled);
}
