import type { z } from "@hono/zod-openapi";
import type { ComparisonRequest } from "../studies/comparison.ts";
import { compare } from "../studies/comparison.ts";
import { workOf } from "../studies/work.ts";
import { checkCandidates, decodeCandidate } from "./decode/candidate.ts";
import { checkClimate, decodeClimate } from "./decode/climate.ts";
import { checkConverter } from "./decode/converter.ts";
import { checkModule, decodeModule } from "./decode/module.ts";
import { defineOperation } from "./define-operation.ts";
import { jsonText } from "./encode/byte-writer.ts";
import { encodeCaution } from "./encode/caution.ts";
import { encodeModule } from "./encode/module.ts";
import { digestClimate, encodeProvenance } from "./encode/provenance.ts";
import { encodeConverter, encodeRule } from "./encode/resolved.ts";
import type { Limits } from "./limits.ts";
import type { Flaw } from "./problem.ts";
import { ArraySchema } from "./schema/array.ts";
import { ComparisonRequestSchema } from "./schema/comparison.ts";

type Raw = z.output<typeof ComparisonRequestSchema>;

function check(raw: Raw, limits: Limits): Flaw[] {
  return [
    ...checkModule(raw.module),
    ...checkConverter(raw.converter, "/converter"),
    ...checkCandidates(raw.candidates, raw.baseline, limits),
    ...checkClimate(raw.climate, limits),
  ];
}

function decode(raw: Raw): ComparisonRequest {
  return {
    module: decodeModule(raw.module),
    array: raw.array ?? ArraySchema.parse({}),
    climate: decodeClimate(raw.climate),
    mode: raw.mode,
    candidates: raw.candidates.map((candidate, index) => decodeCandidate(candidate, index, raw.converter)),
    baseline: raw.baseline ?? null,
    energyValue: raw.energyValue ?? null,
    recordLowTemperature: raw.recordLowTemperature,
  };
}

function answer(request: ComparisonRequest, raw: Raw): Uint8Array {
  const { run, baseline, results, cautions } = compare(request);
  const { array, energyValue } = request;
  const candidates = request.candidates.map(({ label, price }, index) => {
    const { rule, converter } = run.tracked[index];
    return { label, rule: encodeRule(rule), converter: encodeConverter(converter), price };
  });
  const resolved = { array, candidates, baseline, energyValue, mode: run.mode, modeReason: run.modeReason };
  const digested = {
    module: raw.module,
    array,
    candidates: candidates.map((candidate, index) => {
      const { kind, settings } = run.tracked[index].rule;
      return { ...candidate, rule: { kind, ...settings } };
    }),
    baseline,
    climate: digestClimate(request.climate),
    mode: run.mode,
    energyValue,
    recordLowTemperature: request.recordLowTemperature,
  };
  const shown = results.map(({ label, rank, tracked, ...figures }) => {
    return { label, rank, energy: tracked.energy, lostByCause: tracked.lostByCause, ...figures };
  });
  const module = encodeModule(run.built, request.module);
  const provenance = encodeProvenance(request, run, digested);
  const body = {
    resolved,
    results: shown,
    coverage: run.coverage,
    module,
    cautions: cautions.map(encodeCaution),
    provenance,
  };
  return new TextEncoder().encode(jsonText(body));
}

/** POST /v1/comparisons on bytes. */
export const comparisonOperation = defineOperation({
  schema: ComparisonRequestSchema,
  check,
  decode,
  work: ({ candidates, mode, climate }) => workOf(climate, mode, candidates),
  answer,
});
