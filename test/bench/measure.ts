/** One row of the table: ours against a peer, measured turn by turn in one run. */
export interface Row {
  id: string;
  work: string;
  peer: string;
  goal: string;
  /** Ours and the peer's, ms, one pair a round; null where the peer could not run. */
  pairs: { ours: number; peer: number | null }[];
}

/** Median of a list. */
export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[middle] : (sorted[middle - 1] + sorted[middle]) / 2;
}

/** Milliseconds of the best of `repetitions` calls: what the machine can do when nothing else disturbs it. */
export function best(repetitions: number, work: () => void): number {
  let least = Number.POSITIVE_INFINITY;
  for (let i = 0; i < repetitions; i++) {
    const start = performance.now();
    work();
    least = Math.min(least, performance.now() - start);
  }
  return least;
}

/** Runs ours and the peer in turn, `rounds` times. */
export function alternate(rounds: number, ours: () => number, peer: (() => number) | null): Row["pairs"] {
  return Array.from({ length: rounds }, () => ({ ours: ours(), peer: peer === null ? null : peer() }));
}

/** A row as text: the median ratio with its spread, or "not run". */
export function describeRow({ id, work, peer, goal, pairs }: Row): string {
  const ours = median(pairs.map((pair) => pair.ours));
  const ratios = pairs.flatMap((pair) => (pair.peer === null ? [] : [pair.ours / pair.peer]));
  const figure =
    ratios.length === 0
      ? "not run"
      : `${median(ratios).toFixed(3)}x (${Math.min(...ratios).toFixed(3)} to ${Math.max(...ratios).toFixed(3)})`;
  return `| ${id} | ${work} | ${peer} | ${goal} | ${figure} | ${ours.toFixed(2)} ms |`;
}
