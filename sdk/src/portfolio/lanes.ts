import type { BatchSource, OpenSite } from "./batch-source.ts";

/** A batch that is answered, or was and is not taken yet. */
interface Lane {
  answered: boolean;
  waiting: number;
}

/** How batches are answered. */
export interface LanesPort<Line> {
  readonly source: Pick<BatchSource, "next">;
  /** Answers the n-th batch (counted from 1) and hands a line over for each of its sites. */
  readonly answer: (batch: readonly OpenSite[], number: number, onLine: (line: Line) => void) => Promise<void>;
  /** The most batches that are answered or wait to be taken at once. */
  readonly concurrency: number;
  readonly signal: AbortSignal;
}

/**
 * Answers batches, several at once, and hands their lines over as they come. A batch keeps its lane until its last line
 * was taken: no more than `concurrency` batches are ever taken from the source ahead of who takes the lines.
 */
export class Lanes<Line> {
  readonly #port: LanesPort<Line>;
  readonly #lanes = new Set<Lane>();
  readonly #lines: { readonly line: Line; readonly lane: Lane }[] = [];
  #batches = 0;
  #taking = false;
  #exhausted = false;
  #failure: { readonly error: unknown } | null = null;
  #wake: () => void = () => {};

  constructor(port: LanesPort<Line>) {
    this.#port = port;
  }

  /**
   * The next line; null when all are taken. After a failure no batch is begun, but those under way are answered and
   * taken before it is thrown. Throws the signal's reason as soon as it fires.
   */
  async next(): Promise<{ readonly line: Line } | null> {
    for (;;) {
      this.#port.signal.throwIfAborted();
      this.#fill();
      const next = this.#lines.shift();
      if (next !== undefined) {
        next.lane.waiting -= 1;
        this.#release(next.lane);
        return next;
      }
      if (this.#lanes.size === 0) {
        if (this.#failure !== null) throw this.#failure.error;
        if (this.#exhausted) return null;
      }
      await this.#change();
    }
  }

  async #change(): Promise<void> {
    const { signal } = this.#port;
    await new Promise<void>((resolve) => {
      this.#wake = resolve;
      signal.addEventListener("abort", this.#wake, { once: true });
    });
    signal.removeEventListener("abort", this.#wake);
  }

  /** Takes a batch when a lane is free, and goes on by itself until none is. */
  #fill(): void {
    const full = this.#lanes.size >= this.#port.concurrency;
    if (full || this.#taking || this.#exhausted || this.#failure !== null || this.#port.signal.aborted) return;
    this.#taking = true;
    this.#port.source
      .next()
      .then(
        (batch) => this.#begin(batch),
        (error: unknown) => this.#fail(error),
      )
      .finally(() => {
        this.#taking = false;
        this.#fill();
        this.#wake();
      });
  }

  #begin(batch: readonly OpenSite[] | null): void {
    if (batch === null) this.#exhausted = true;
    if (batch === null || this.#failure !== null || this.#port.signal.aborted) return;
    const lane: Lane = { answered: false, waiting: 0 };
    this.#lanes.add(lane);
    this.#batches += 1;
    const onLine = (line: Line) => {
      lane.waiting += 1;
      this.#lines.push({ line, lane });
      this.#wake();
    };
    this.#port
      .answer(batch, this.#batches, onLine)
      .catch((error: unknown) => this.#fail(error))
      .finally(() => {
        lane.answered = true;
        this.#release(lane);
        this.#wake();
      });
  }

  #fail(error: unknown): void {
    this.#failure ??= { error };
  }

  #release(lane: Lane): void {
    if (lane.answered && lane.waiting === 0) this.#lanes.delete(lane);
  }
}
