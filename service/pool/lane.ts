/** A queue of jobs that wait for a thread, bounded in number and in bytes. */
export interface Lane<Entry extends { bytes: number }> {
  /** How many wait. */
  readonly length: number;
  /** False where the lane is full: the entry was not taken. */
  add(entry: Entry): boolean;
  /** The one that waits longest; undefined where none does. */
  next(): Entry | undefined;
  /** Takes an entry out of the line; without effect where it is not in it. */
  remove(entry: Entry): void;
}

/** An empty lane for at most `most` entries of at most `mostBytes` bytes together. First come, first served. */
export function createLane<Entry extends { bytes: number }>(most: number, mostBytes: number): Lane<Entry> {
  // A set keeps its order and forgets one of its members at once.
  const waiting = new Set<Entry>();
  let bytes = 0;
  const forget = (entry: Entry) => {
    if (waiting.delete(entry)) bytes -= entry.bytes;
  };
  return {
    get length() {
      return waiting.size;
    },
    add(entry) {
      if (waiting.size >= most || bytes + entry.bytes > mostBytes) return false;
      waiting.add(entry);
      bytes += entry.bytes;
      return true;
    },
    next() {
      const [first] = waiting;
      if (first !== undefined) forget(first);
      return first;
    },
    remove: forget,
  };
}
