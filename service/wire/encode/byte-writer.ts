const encoder = new TextEncoder();

/** Bytes that grow as they are written. `bytes` may be replaced by `ensure`. */
export interface ByteWriter {
  bytes: Uint8Array;
  /** How many are written. */
  length: number;
  /** Makes room for `more` bytes. */
  ensure(more: number): void;
  /** Writes text in UTF-8. */
  text(text: string): void;
}

/** A writer with room for `capacity` bytes at first. */
export function byteWriter(capacity: number): ByteWriter {
  return {
    bytes: new Uint8Array(capacity),
    length: 0,
    ensure(more) {
      if (this.length + more <= this.bytes.length) return;
      const larger = new Uint8Array(Math.max(this.bytes.length * 2, this.length + more));
      larger.set(this.bytes.subarray(0, this.length));
      this.bytes = larger;
    },
    text(text) {
      this.ensure(text.length * 3);
      this.length += encoder.encodeInto(text, this.bytes.subarray(this.length)).written;
    },
  };
}

/** What is written so far, without copying. */
export function written(writer: ByteWriter): Uint8Array {
  return writer.bytes.subarray(0, writer.length);
}

/** JSON text of plain data; throws RangeError, naming the member, for NaN and Infinity, which JSON.stringify would make null. */
export function jsonText(value: unknown): string {
  return JSON.stringify(value, (name, member: unknown) => {
    if (typeof member !== "number" || Number.isFinite(member)) return member;
    throw new RangeError(`a result is not finite: ${name}`);
  });
}
