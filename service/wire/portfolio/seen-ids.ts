import { hash } from "node:crypto";

/** 32-bit words of a digest that are kept. */
const WORDS = 4;
const MOST_FILLED = 0.75;

/**
 * The ids of a portfolio, 128 bits of SHA-256 each: 21 to 64 bytes an id, however long it is. Two ids of one digest would
 * count as one: for 100,000 ids the chance is below 2e-29 (birthday bound n^2/2^129), and nobody can make such a pair.
 */
export class SeenIds {
  private slots = new Uint32Array(WORDS * 1024);
  private count = 0;

  /** Notes an id; false where it was noted before. */
  add(id: string): boolean {
    // UTF-16, since UTF-8 would make one of all lone surrogates.
    const digest = new Uint32Array(WORDS);
    const bytes = hash("sha256", Buffer.from(id, "utf16le"), "buffer");
    for (let word = 0; word < WORDS; word++) digest[word] = bytes.readUInt32LE(4 * word);
    // A slot that is all zeros is free.
    digest[0] |= 1;
    if (!place(this.slots, digest)) return false;
    if (++this.count > (MOST_FILLED * this.slots.length) / WORDS) this.grow();
    return true;
  }

  /** Bytes that the ids take. */
  get bytes(): number {
    return this.slots.byteLength;
  }

  private grow(): void {
    const larger = new Uint32Array(2 * this.slots.length);
    for (let at = 0; at < this.slots.length; at += WORDS) {
      if (this.slots[at] !== 0) place(larger, this.slots.subarray(at, at + WORDS));
    }
    this.slots = larger;
  }
}

/** Puts a digest into the first free slot from its own on; false where it is there already. */
function place(slots: Uint32Array, digest: Uint32Array): boolean {
  const count = slots.length / WORDS;
  for (let probe = 0, slot = digest[1] % count; probe < count; probe++, slot = (slot + 1) % count) {
    const at = slot * WORDS;
    if (slots[at] === 0) {
      slots.set(digest, at);
      return true;
    }
    if (digest.every((word, index) => slots[at + index] === word)) return false;
  }
  throw new RangeError("no slot is free");
}
