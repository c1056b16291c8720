import type { z } from "@hono/zod-openapi";
import type { EfficiencyTestRequest, EfficiencyTestResult } from "../studies/efficiency-test.ts";
import { EDITION, testDuration, testEfficiency } from "../studies/efficiency-test.ts";
import { workOfSteady, workOfStepping } from "../studies/work.ts";
import { checkConverter, decodeConverter } from "./decode/converter.ts";
import { checkModule, decodeModule } from "./decode/module.ts";
import { decodeRule } from "./decode/rule.ts";
import { defineOperation } from "./define-operation.ts";
import { jsonText } from "./encode/byte-writer.ts";
import { encodeModule } from "./encode/module.ts";
import { model, moduleModels, provenanceOf, ruleModels } from "./encode/provenance.ts";
import { encodeConverter, encodeRule } from "./encode/resolved.ts";
import { EfficiencyTestRequestSchema } from "./schema/efficiency-test.ts";

type Raw = z.output<typeof EfficiencyTestRequestSchema>;

function decode(raw: Raw): EfficiencyTestRequest {
  const { test, cellTemperature, temperatureLag, traceSlope } = raw;
  return {
    module: decodeModule(raw.module),
    rule: decodeRule(raw.rule),
    converter: decodeConverter(raw.converter),
    test,
    cellTemperature,
    temperatureLag,
    traceSlope,
  };
}

function workOfTest({ test, rule, converter }: EfficiencyTestRequest): number {
  return test === "static" ? 8 * workOfSteady([rule], converter) : workOfStepping(rule, converter, testDuration(test));
}

/** Decimals of a row's course: mV and mW of the module. */
const TRACE_DECIMALS = 1e3;

const rounded = (column: Float64Array): number[] =>
  Array.from(column, (value) => Math.round(value * TRACE_DECIMALS) / TRACE_DECIMALS);

function encodeTrace(dynamic: EfficiencyTestResult["dynamic"]) {
  if (dynamic === null || dynamic.trace === null) return null;
  const { slope, step, irradiance, maximum, operating, ...extremes } = dynamic.trace;
  const points = ({ voltage, current, power }: typeof maximum) => ({
    voltage: rounded(voltage),
    current: rounded(current),
    power: rounded(power),
  });
  return {
    slope,
    step,
    irradiance: rounded(irradiance),
    maximumPower: points(maximum),
    operating: points(operating),
    leastVoltage: rounded(extremes.leastVoltage),
    mostVoltage: rounded(extremes.mostVoltage),
    leastPower: rounded(extremes.leastPower),
    mostPower: rounded(extremes.mostPower),
  };
}

function answer(request: EfficiencyTestRequest, raw: Raw): Uint8Array {
  const { built, rule, dynamic, static: atRest } = testEfficiency(request);
  const resolved = { rule: encodeRule(rule), converter: encodeConverter(request.converter) };
  const { traceSlope: _presentation, ...asked } = raw;
  const models = [...moduleModels(request.module), ...ruleModels([rule.kind]), model("efficiency-test", EDITION)];
  const body = {
    test: request.test,
    edition: EDITION,
    resolved,
    rows: dynamic?.rows ?? null,
    levels: atRest?.levels ?? null,
    efficiency: dynamic?.efficiency ?? null,
    duration: dynamic?.duration ?? null,
    europeanWeighted: atRest?.europeanWeighted ?? null,
    cecWeighted: atRest?.cecWeighted ?? null,
    trace: encodeTrace(dynamic),
    module: encodeModule(built, request.module),
    provenance: provenanceOf(models, { ...asked, ...resolved }),
  };
  return new TextEncoder().encode(jsonText(body));
}

/** POST /v1/efficiency-tests on bytes. */
export const efficiencyTestOperation = defineOperation({
  schema: EfficiencyTestRequestSchema,
  check: (raw) => [...checkModule(raw.module), ...checkConverter(raw.converter, "/converter")],
  decode,
  work: workOfTest,
  answer,
});
