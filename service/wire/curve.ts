import type { z } from "@hono/zod-openapi";
import type { CurveRequest } from "../studies/curve.ts";
import { curve } from "../studies/curve.ts";
import { workOfSteady } from "../studies/work.ts";
import { checkConverter, decodeConverter } from "./decode/converter.ts";
import { checkModule, decodeModule } from "./decode/module.ts";
import { decodeRule } from "./decode/rule.ts";
import { defineOperation } from "./define-operation.ts";
import { jsonText } from "./encode/byte-writer.ts";
import { encodeModule } from "./encode/module.ts";
import { moduleModels, provenanceOf, ruleModels } from "./encode/provenance.ts";
import { encodeRule } from "./encode/resolved.ts";
import { ArraySchema } from "./schema/array.ts";
import { CurveRequestSchema } from "./schema/curve.ts";

type Raw = z.output<typeof CurveRequestSchema>;

function decode(raw: Raw): CurveRequest {
  return {
    module: decodeModule(raw.module),
    array: raw.array ?? ArraySchema.parse({}),
    converter: decodeConverter(raw.converter),
    irradiance: raw.irradiance,
    cellTemperature: raw.cellTemperature,
    rules: raw.rules.map(decodeRule),
    points: raw.points,
  };
}

function answer(request: CurveRequest, raw: Raw): Uint8Array {
  const { built, voltage, current, power, places, ...figures } = curve(request);
  const kinds = request.rules.map(({ kind }) => kind);
  const body = {
    voltage: [...voltage],
    current: [...current],
    power: [...power],
    ...figures,
    places: places.map(({ rule, ...place }) => ({ rule: encodeRule(rule), ...place })),
    module: encodeModule(built, request.module),
    provenance: provenanceOf([...moduleModels(request.module), ...ruleModels(kinds)], raw),
  };
  return new TextEncoder().encode(jsonText(body));
}

/** POST /v1/curves on bytes. */
export const curveOperation = defineOperation({
  schema: CurveRequestSchema,
  check: (raw) => [...checkModule(raw.module), ...checkConverter(raw.converter, "/converter")],
  decode,
  work: ({ points, rules, converter }) => points + workOfSteady(rules, converter),
  answer,
});
