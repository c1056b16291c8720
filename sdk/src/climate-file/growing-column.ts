const FIRST_CAPACITY = 1024;

/** A column of doubles whose final length is not known yet. Memory at most twice its values, for a moment three times. */
export class GrowingColumn {
  #values = new Float64Array(FIRST_CAPACITY);
  #length = 0;

  /** Adds one value; NaN is a missing one. */
  push(value: number): void {
    if (this.#length === this.#values.length) this.#grow(this.#length + 1);
    this.#values[this.#length] = value;
    this.#length += 1;
  }

  /** Adds `count` missing values. */
  pushMissing(count: number): void {
    const end = this.#length + count;
    if (end > this.#values.length) this.#grow(end);
    this.#values.fill(Number.NaN, this.#length, end);
    this.#length = end;
  }

  /** The values, shape [number of pushes], in an array of their own; empty when there are none. */
  toArray(): Float64Array {
    return this.#values.slice(0, this.#length);
  }

  #grow(least: number): void {
    const larger = new Float64Array(Math.max(least, 2 * this.#values.length));
    larger.set(this.#values);
    this.#values = larger;
  }
}
