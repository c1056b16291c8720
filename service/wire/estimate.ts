import type { z } from "@hono/zod-openapi";
import { sampleCount } from "../climate/climate-series.ts";
import type { EstimateRequest } from "../studies/estimate.ts";
import { estimate } from "../studies/estimate.ts";
import { workOf } from "../studies/work.ts";
import { checkClimate, decodeClimate } from "./decode/climate.ts";
import { checkConverter, decodeConverter } from "./decode/converter.ts";
import { checkModule, decodeModule } from "./decode/module.ts";
import { decodeRule } from "./decode/rule.ts";
import { defineOperation } from "./define-operation.ts";
import { byteWriter, jsonText, written } from "./encode/byte-writer.ts";
import { encodeCaution } from "./encode/caution.ts";
import { encodeModule } from "./encode/module.ts";
import { digestClimate, encodeProvenance } from "./encode/provenance.ts";
import { encodeConverter, encodeRule } from "./encode/resolved.ts";
import { writeTraces } from "./encode/traces.ts";
import { ArraySchema } from "./schema/array.ts";
import { EstimateRequestSchema } from "./schema/estimate.ts";

type Raw = z.output<typeof EstimateRequestSchema>;

function decode(raw: Raw): EstimateRequest {
  return {
    module: decodeModule(raw.module),
    array: raw.array ?? ArraySchema.parse({}),
    climate: decodeClimate(raw.climate),
    mode: raw.mode,
    candidate: { rule: decodeRule(raw.rule), converter: decodeConverter(raw.converter), pointer: "/rule" },
    traces: raw.traces,
    traceDecimals: raw.traceDecimals,
    recordLowTemperature: raw.recordLowTemperature,
  };
}

/** Bytes of a trace value with its comma, about. */
const TRACE_VALUE = 9;

function answer(request: EstimateRequest, raw: Raw): Uint8Array {
  const { run, cautions } = estimate(request);
  const [{ rule, converter, energy, lostByCause, months, irradianceClasses }] = run.tracked;
  const shown = { array: request.array, converter: encodeConverter(converter), rule: encodeRule(rule) };
  const resolved = { ...shown, mode: run.mode, modeReason: run.modeReason };
  const digested = {
    module: raw.module,
    array: request.array,
    converter: shown.converter,
    rule: { kind: rule.kind, ...rule.settings },
    climate: digestClimate(request.climate),
    mode: run.mode,
    recordLowTemperature: request.recordLowTemperature,
  };
  const view = { traces: raw.traces, decimals: raw.traceDecimals, start: raw.climate.start, step: raw.climate.step };
  const writer = byteWriter(16_384 + (raw.traces === "none" ? 0 : 6 * TRACE_VALUE * sampleCount(request.climate)));
  const head = { resolved, energy, lostByCause, months, irradianceClasses, coverage: run.coverage };
  const provenance = encodeProvenance(request, run, digested);
  const tail = { module: encodeModule(run.built, request.module), cautions: cautions.map(encodeCaution), provenance };
  writer.text(`${jsonText(head).slice(0, -1)},"traces":`);
  writeTraces(writer, run, view);
  writer.text(`,${jsonText(tail).slice(1)}`);
  return written(writer);
}

/** POST /v1/estimates on bytes. */
export const estimateOperation = defineOperation({
  schema: EstimateRequestSchema,
  check: (raw, limits) => [
    ...checkModule(raw.module),
    ...checkConverter(raw.converter, "/converter"),
    ...checkClimate(raw.climate, limits),
  ],
  decode,
  work: ({ candidate, mode, climate }) => workOf(climate, mode, [candidate]),
  answer,
});
