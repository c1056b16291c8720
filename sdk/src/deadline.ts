import { AbortedError } from "./errors/aborted-error.ts";
import type { CallContext } from "./errors/kneegap-error.ts";
import { TimeoutError } from "./errors/timeout-error.ts";

/** One call's end: its `signal` fires with a TimeoutError when `timeout` ms are over, or with an AbortedError when the caller's signal fires. */
export class Deadline {
  readonly #controller = new AbortController();
  readonly #release: () => void;
  readonly #end: number;

  /** `context` is asked when the signal fires, so that the error tells the attempts made by then. `release` must be called at the end. */
  constructor(timeout: number, callerSignal: AbortSignal | undefined, context: () => CallContext) {
    this.#end = performance.now() + timeout;
    const abort = () => this.#controller.abort(new AbortedError({ ...context(), cause: callerSignal?.reason }));
    const timer = setTimeout(() => this.#controller.abort(new TimeoutError(timeout, context())), timeout);
    if (callerSignal?.aborted) abort();
    callerSignal?.addEventListener("abort", abort, { once: true });
    this.#release = () => {
      clearTimeout(timer);
      callerSignal?.removeEventListener("abort", abort);
    };
  }

  get signal(): AbortSignal {
    return this.#controller.signal;
  }

  /** The time left, ms; 0 or less when it is over. */
  remaining(): number {
    return this.#end - performance.now();
  }

  /** Stops the timer and lets go of the caller's signal. */
  release(): void {
    this.#release();
  }
}
