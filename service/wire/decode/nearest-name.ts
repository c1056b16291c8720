/** Letters to change, add or leave out to make one word of another (Levenshtein 1966), case ignored. */
function distance(from: string, to: string): number {
  let row = Array.from({ length: to.length + 1 }, (_, k) => k);
  for (let i = 0; i < from.length; i++) {
    const next = [i + 1];
    for (let k = 0; k < to.length; k++) {
      const change = row[k] + (from[i].toLowerCase() === to[k].toLowerCase() ? 0 : 1);
      next.push(Math.min(change, row[k + 1] + 1, next[k] + 1));
    }
    row = next;
  }
  return row[to.length];
}

/** The name out of `names` that was probably meant, or undefined where none is near; of equals the first. */
export function nearestName(given: string, names: readonly string[]): string | undefined {
  if (given.length > 64) return undefined;
  let best: string | undefined;
  let least = Math.max(2, Math.floor(given.length / 3)) + 1;
  for (const name of names) {
    const away = distance(given, name);
    if (away < least) [best, least] = [name, away];
  }
  return best;
}
