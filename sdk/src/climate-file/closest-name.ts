/**
 * The member of `names` fewest single-character edits away from `name` (V. I. Levenshtein, Soviet Physics Doklady 10
 * (1966) 707, from memory), or null when none is within `furthest` edits. Ties go to the earlier. O(length^2) a name, so
 * names longer than 80 characters are not compared.
 */
export function closestName<N extends string>(name: string, names: readonly N[], furthest: number): N | null {
  let best: N | null = null;
  let bestDistance = furthest + 1;
  for (const candidate of names) {
    if (Math.abs(candidate.length - name.length) >= bestDistance || name.length > 80) continue;
    const distance = editDistance(name, candidate);
    if (distance < bestDistance) {
      best = candidate;
      bestDistance = distance;
    }
  }
  return best;
}

function editDistance(a: string, b: string): number {
  let previous = Array.from({ length: b.length + 1 }, (_, column) => column);
  for (let row = 1; row <= a.length; row += 1) {
    const current = [row];
    for (let column = 1; column <= b.length; column += 1) {
      const replaced = previous[column - 1] + (a[row - 1] === b[column - 1] ? 0 : 1);
      current.push(Math.min(replaced, previous[column] + 1, current[column - 1] + 1));
    }
    previous = current;
  }
  return previous[b.length];
}
