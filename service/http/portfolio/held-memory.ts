import type { BodyBudget } from "../body-budget.ts";

/** What one request holds of the budget that all share. */
export interface HeldMemory {
  /** False where there is no room: nothing was taken. */
  take(bytes: number): boolean;
  release(bytes: number): void;
  /** Gives back whatever is still held. */
  releaseAll(): void;
}

/** Nothing held yet of a budget. */
export function holdFrom(budget: BodyBudget): HeldMemory {
  let held = 0;
  const release = (bytes: number) => {
    const given = Math.min(bytes, held);
    held -= given;
    budget.release(given);
  };
  return {
    take(bytes) {
      if (!budget.take(bytes)) return false;
      held += bytes;
      return true;
    },
    release,
    releaseAll: () => release(held),
  };
}
