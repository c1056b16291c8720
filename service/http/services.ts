import type { Compute } from "../pool/compute.ts";
import type { Limits } from "../wire/limits.ts";
import type { BodyBudget } from "./body-budget.ts";

/** What the service says of itself: `warming` until the workers are warm, `draining` once it was told to stop. */
export type ServiceState = "warming" | "ready" | "draining";

/** A key that opens `/v1/*`, as its SHA-256. */
export interface Key {
  name: string;
  digest: Uint8Array;
}

/** Where the log goes: a subset of pino's. */
export interface Log {
  info(values: object, message: string): void;
  error(values: object, message: string): void;
}

/** How the app is set up. */
export interface AppSettings {
  limits: Limits;
  /** None: everyone may ask. */
  keys: readonly Key[];
  state: () => ServiceState;
  log: Log;
  /** A body may pause this long between two of its pieces, ms. */
  idleTime: number;
  /** A body must have come whole after this, ms. */
  uploadTime: number;
  /** All bodies together hold at most this, from their first byte until their answer, bytes. */
  heldBytes: number;
}

/** What the routes work with. */
export interface Services extends AppSettings {
  compute: Compute;
  budget: BodyBudget;
}
