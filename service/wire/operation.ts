import type { Limits } from "./limits.ts";
import type { Problem } from "./problem.ts";

/** Why there is no answer; `fault` is what a defect leaves for the log alone. */
export interface Refusal {
  ok: false;
  problem: Problem;
  fault?: string;
}

/** What comes back from an operation: bytes to send, or why not. Plain data, so that it crosses threads whole. */
export type Answer = { ok: true; bytes: Uint8Array; contentType: string } | Refusal;

/** A request that was understood: how much work it is, and the work itself. */
export interface Prepared {
  /** In control periods, or as much work in another form. */
  work: number;
  perform: () => Answer;
}

/** What decoding makes of a body. */
export type Preparation = { ok: true; prepared: Prepared } | { ok: false; problem: Problem };

/** One operation: a pure function on bytes, in two halves so that its work is known before it starts. */
export type Operation = (body: Uint8Array, limits: Limits) => Preparation;
