import type { Limits } from "../wire/limits.ts";
import type { OperationName } from "../wire/operations.ts";

/** What a worker is asked to do; the body's buffer is moved to it. */
export interface Job {
  operation: OperationName;
  body: Uint8Array;
  limits: Limits;
}
