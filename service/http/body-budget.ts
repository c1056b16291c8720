/** Bytes that bodies may hold in memory at once, from their first byte until their answer. */
export interface BodyBudget {
  /** False where there is no room: nothing was taken. */
  take(bytes: number): boolean;
  release(bytes: number): void;
}

/** A budget of `limit` bytes. */
export function createBodyBudget(limit: number): BodyBudget {
  let held = 0;
  return {
    take(bytes) {
      if (held + bytes > limit) return false;
      held += bytes;
      return true;
    },
    release(bytes) {
      held -= bytes;
    },
  };
}
