import type { Limits } from "../wire/limits.ts";
import type { OperationName } from "../wire/operations.ts";
import type { Step } from "../wire/portfolio/step.ts";

/** An operation that a worker is asked to perform; the body's buffer is moved to it. */
export interface Job {
  operation: OperationName;
  body: Uint8Array;
  limits: Limits;
}

/** Whatever a worker may be asked; null asks only whether it is loaded. */
export type Task = Job | Step | null;
