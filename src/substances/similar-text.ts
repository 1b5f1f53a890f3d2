/**
 * Optimal string alignment distance (insertion, deletion, substitution, transposition of neighbours), stopped early.
 * @returns the distance, or `limit + 1` when it is larger than `limit`.
 */
export function editDistance(a: string, b: string, limit: number): number {
  if (Math.abs(a.length - b.length) > limit) return limit + 1;
  let before = new Uint16Array(b.length + 1);
  let previous = Uint16Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i++) {
    const current = new Uint16Array(b.length + 1);
    current[0] = i;
    let best = i;
    for (let j = 1; j <= b.length; j++) {
      const same = a[i - 1] === b[j - 1];
      let cost = Math.min(previous[j - 1]! + (same ? 0 : 1), previous[j]! + 1, current[j - 1]! + 1);
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1]) cost = Math.min(cost, before[j - 2]! + 1);
      current[j] = cost;
      best = Math.min(best, cost);
    }
    if (best > limit) return limit + 1;
    before = previous;
    previous = current;
  }
  return previous[b.length]!;
}

/** The entries nearest to a text by edit distance, nearest first; ties in the given order. */
export function nearest(text: string, candidates: Iterable<string>, count: number): string[] {
  const limit = text.length <= 4 ? 1 : text.length <= 8 ? 2 : 3;
  const found: { candidate: string; distance: number }[] = [];
  for (const candidate of candidates) {
    const distance = editDistance(text, candidate, limit);
    if (distance <= limit) found.push({ candidate, distance });
  }
  return found
    .sort((a, b) => a.distance - b.distance)
    .slice(0, count)
    .map(({ candidate }) => candidate);
}
