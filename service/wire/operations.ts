import { comparisonOperation } from "./comparison.ts";
import { curveOperation } from "./curve.ts";
import { failure } from "./define-operation.ts";
import { efficiencyTestOperation } from "./efficiency-test.ts";
import { estimateOperation } from "./estimate.ts";
import type { Limits } from "./limits.ts";
import { moduleFitOperation } from "./module-fit.ts";
import type { Answer, Operation } from "./operation.ts";
import { tuningOperation } from "./tuning.ts";

/** Every operation on bytes, by its name in the document: the one place to add one. */
export const OPERATIONS = {
  estimate: estimateOperation,
  compare: comparisonOperation,
  tune: tuningOperation,
  testEfficiency: efficiencyTestOperation,
  fitModule: moduleFitOperation,
  curve: curveOperation,
} as const satisfies Record<string, Operation>;

export type OperationName = keyof typeof OPERATIONS;

/** Performs an operation on a body, whatever its work: what a worker does. Never throws. */
export function performOperation(name: OperationName, body: Uint8Array, limits: Limits): Answer {
  try {
    const preparation = OPERATIONS[name](body, limits);
    return preparation.ok ? preparation.prepared.perform() : preparation;
  } catch (error) {
    return failure(error);
  }
}
