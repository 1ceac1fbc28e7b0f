/** "Did you mean": the known word nearest to the one that was found. */

/**
 * Edit distance with swapped neighbours counted once (optimal string alignment).
 *
 * @source Damerau (1964), Comm. ACM 7(3), 171–176
 */
export function editDistance(a: string, b: string): number {
  let beforeLast: number[] = [];
  let last = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i++) {
    const row = [i];
    for (let j = 1; j <= b.length; j++) {
      const same = a[i - 1] === b[j - 1];
      row[j] = Math.min(last[j]! + 1, row[j - 1]! + 1, last[j - 1]! + (same ? 0 : 1));
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1])
        row[j] = Math.min(row[j]!, beforeLast[j - 2]! + 1);
    }
    beforeLast = last;
    last = row;
  }
  return last[b.length]!;
}

/** The nearest of the known words, or undefined where none is near: more than two in five letters would have to change. */
export function nearest(word: string, known: readonly string[]): string | undefined {
  if (word.length > 100) return undefined;
  const plain = word.toLowerCase().replace(/[\s-]/g, "_");
  let best: string | undefined;
  let least = Number.POSITIVE_INFINITY;
  for (const candidate of known) {
    const distance = editDistance(plain, candidate.toLowerCase());
    if (distance < least) {
      least = distance;
      best = candidate;
    }
  }
  return best !== undefined && least <= Math.max(1, Math.floor(0.4 * Math.max(word.length, 3))) ? best : undefined;
}

/** `did you mean "x"?`, or the list of what is allowed where nothing is near; undefined where there is nothing to say. */
export function didYouMean(word: string, known: readonly string[], otherwise?: string): string | undefined {
  const found = nearest(word, known);
  return found === undefined ? otherwise : `did you mean "${found}"?`;
}
