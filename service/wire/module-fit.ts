import type { z } from "@hono/zod-openapi";
import type { ModuleFitRequest, ModuleFitResult } from "../studies/module-fit.ts";
import { fitModule } from "../studies/module-fit.ts";
import { checkMeasuredCurve } from "./decode/measured-curve.ts";
import { checkModule, decodeModule } from "./decode/module.ts";
import { defineOperation } from "./define-operation.ts";
import { jsonText } from "./encode/byte-writer.ts";
import { encodeCircuit } from "./encode/module.ts";
import { model, provenanceOf } from "./encode/provenance.ts";
import type { Flaw } from "./problem.ts";
import { ModuleFitRequestSchema } from "./schema/module-fit.ts";

type Raw = z.output<typeof ModuleFitRequestSchema>;

/** A fit by search is as much work as this, in control periods: about 0.1 s. */
const WORK = 400_000;

function check({ module }: Raw): Flaw[] {
  return module.kind === "datasheet" ? checkModule(module) : checkMeasuredCurve(module);
}

function decode({ module }: Raw): ModuleFitRequest {
  if (module.kind === "datasheet") {
    const choice = decodeModule(module);
    if (choice.kind === "datasheet") return { module: choice };
  }
  const curve = module as Extract<Raw["module"], { kind: "measured-curve" }>;
  return {
    module: {
      ...curve,
      voltage: Float64Array.from(curve.voltage),
      current: Float64Array.from(curve.current),
      photocurrentCoefficient: curve.photocurrentCoefficient / 100,
    },
  };
}

const MEASURED = model(
  "measured-curve-fit",
  "Marquardt, J. SIAM 11 (1963) 431-441, on the exact current error of the single-diode circuit",
);
const DATASHEET = model(
  "datasheet-fit",
  "De Soto, Klein & Beckman, Solar Energy 80 (2006) 78-88 (from memory), its five conditions",
);

function answer(request: ModuleFitRequest, raw: Raw): Uint8Array {
  const result = fitModule(request);
  const { fit, misfits, rootMeanSquareError, standard } = result;
  const body = {
    fit,
    circuit: encodeCircuit(result.parameters, result.cellsInSeries),
    misfits,
    measured: encodeMeasured(result.measured),
    rootMeanSquareError,
    standard: {
      ...standard,
      openCircuitVoltageCoefficient: (100 * standard.openCircuitVoltageCoefficient) / standard.openCircuitVoltage,
    },
    provenance: provenanceOf([fit === "measured" ? MEASURED : DATASHEET], raw),
  };
  return new TextEncoder().encode(jsonText(body));
}

function encodeMeasured(circuit: ModuleFitResult["measured"]) {
  if (circuit === null) return null;
  const { photocurrent, saturationCurrent, seriesResistance, shuntConductance, idealityVoltage } = circuit;
  const shuntResistance = shuntConductance === 0 ? null : 1 / shuntConductance;
  return { photocurrent, saturationCurrent, seriesResistance, shuntResistance, idealityVoltage };
}

/** POST /v1/module-fits on bytes. */
export const moduleFitOperation = defineOperation({
  schema: ModuleFitRequestSchema,
  check,
  decode,
  work: () => WORK,
  answer,
});
