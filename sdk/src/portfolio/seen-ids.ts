import { hash } from "node:crypto";

/** Four words of the id's digest, and the index + 1, which is 0 in an empty place. */
const WORDS = 5;
const FIRST_PLACES = 1024;
/** Beyond two thirds full, linear probing begins to run long. */
const FULLEST = 2 / 3;

/**
 * The ids of a portfolio, 30 to 60 bytes each whatever their length: 128 bits of SHA-256 in an open table. Two ids are
 * taken for one with a chance of n^2 / 2^129 (the birthday bound): 1e-27 for a million.
 */
export class SeenIds {
  #table = new Uint32Array(FIRST_PLACES * WORDS);
  #size = 0;
  readonly #words = new Uint32Array(WORDS - 1);

  /** Takes in an id at `index` (0 to 2^32 - 2). Returns null, or the index at which it was taken in before. */
  add(id: string, index: number): number | null {
    if (this.#size + 1 > (this.#table.length / WORDS) * FULLEST) this.#grow();
    const digest = hash("sha256", id, "buffer");
    const words = this.#words;
    for (let word = 0; word < words.length; word += 1) words[word] = digest.readUInt32LE(4 * word);
    const place = find(this.#table, words);
    if (this.#table[place + 4] !== 0) return this.#table[place + 4] - 1;
    this.#table.set(words, place);
    this.#table[place + 4] = index + 1;
    this.#size += 1;
    return null;
  }

  #grow(): void {
    const old = this.#table;
    this.#table = new Uint32Array(old.length * 2);
    for (let place = 0; place < old.length; place += WORDS) {
      if (old[place + 4] === 0) continue;
      const entry = old.subarray(place, place + WORDS);
      this.#table.set(entry, find(this.#table, entry));
    }
  }
}

/** Where an entry with these first four words stands in `table`, or the empty place where it belongs. */
function find(table: Uint32Array, words: Uint32Array): number {
  let place = (words[0] % (table.length / WORDS)) * WORDS;
  while (table[place + 4] !== 0) {
    if (table[place] === words[0] && table[place + 1] === words[1]) {
      if (table[place + 2] === words[2] && table[place + 3] === words[3]) return place;
    }
    place = (place + WORDS) % table.length;
  }
  return place;
}
