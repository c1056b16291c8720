/** Ends a request that falls silent: its `signal` fires when `silence` ms pass without `refresh()`, or with the caller's. */
export class SilenceWatch {
  readonly #controller = new AbortController();
  readonly #timer: NodeJS.Timeout;
  readonly #release: () => void;

  /** `release` must be called at the end. */
  constructor(silence: number, callerSignal: AbortSignal) {
    const abort = () => this.#controller.abort(callerSignal.reason);
    if (callerSignal.aborted) abort();
    callerSignal.addEventListener("abort", abort, { once: true });
    this.#timer = setTimeout(() => this.#controller.abort(new Error(`nothing came for ${silence} ms`)), silence);
    this.#release = () => callerSignal.removeEventListener("abort", abort);
  }

  get signal(): AbortSignal {
    return this.#controller.signal;
  }

  /** Begins the silence anew. */
  refresh(): void {
    this.#timer.refresh();
  }

  /** Stops the timer and lets go of the caller's signal. */
  release(): void {
    clearTimeout(this.#timer);
    this.#release();
  }
}
