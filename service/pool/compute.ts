import type { Limits } from "../wire/limits.ts";
import type { Answer } from "../wire/operation.ts";
import type { OperationName } from "../wire/operations.ts";
import { OPERATIONS } from "../wire/operations.ts";
import type { Pool } from "./pool.ts";

/** Has an operation performed on a body, somewhere. The signal says that nobody waits any more. Never rejects. */
export type Compute = (operation: OperationName, body: Uint8Array, signal: AbortSignal) => Promise<Answer>;

/** Bodies up to this long are decoded on the calling thread, bytes. */
const INLINE_BODY = 32 * 1024;

/** Work up to this much is done there too: about 5 ms, in control periods of 250 ns. */
const INLINE_WORK = 20_000;

/** Small requests on the calling thread, all others in the pool: the bytes are the same either way. */
export function createCompute(pool: Pool, limits: Limits): Compute {
  return async (operation, body, signal) => {
    if (body.length <= INLINE_BODY) {
      const preparation = OPERATIONS[operation](body, limits);
      if (!preparation.ok) return preparation;
      if (preparation.prepared.work <= INLINE_WORK) return preparation.prepared.perform();
    }
    return pool.run({ operation, body, limits }, signal);
  };
}
