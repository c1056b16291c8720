import type { Compute } from "../pool/compute.ts";
import type { Limits } from "../wire/limits.ts";
import type { Step, StepAnswer, StepName } from "../wire/portfolio/step.ts";
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

/** Has a step of a portfolio performed, somewhere. The signal says that nobody waits any more. Never rejects. */
export type PerformStep = <Name extends StepName>(step: Step<Name>, signal: AbortSignal) => Promise<StepAnswer<Name>>;

/** How portfolios are answered. Times in ms. */
export interface PortfolioService {
  perform: PerformStep;
  /** Steps of one portfolio at once; no further line is read meanwhile. */
  stepsAtOnce: number;
  /** Portfolios answered at once; one more is refused. */
  most: number;
  /** One in which no byte moves either way for this long, and nothing is computed, is ended. */
  stallTime: number;
  /** After so long without a line an empty one is sent. */
  silence: number;
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
  portfolio: PortfolioService;
}

/** What the routes work with. */
export interface Services extends AppSettings {
  compute: Compute;
  budget: BodyBudget;
}
