/** A stretch of a line with something to do there, and how likely it is to come there. */
export interface Range<Choice> {
  readonly from: number;
  readonly to: number;
  readonly chance: number;
  readonly choice: Choice;
}

/**
 * Neighbouring ranges of the same kind as one; a range less likely than `negligible` joins the likelier of its neighbours: it
 * is noise, or next to impossible, and not worth a line.
 */
export function mergeRanges<Choice>(
  ranges: readonly Range<Choice>[],
  same: (a: Choice, b: Choice) => boolean,
  negligible: number,
): Range<Choice>[] {
  let merged = joinEqual(ranges, same);
  while (merged.length > 1) {
    const weakest = merged.reduce((low, range, r) => (range.chance < merged[low].chance ? r : low), 0);
    if (merged[weakest].chance >= negligible) break;
    const [before, after] = [merged[weakest - 1], merged[weakest + 1]];
    const choice =
      after === undefined || (before !== undefined && before.chance >= after.chance) ? before.choice : after.choice;
    merged = joinEqual(
      merged.map((range, r) => (r === weakest ? { ...range, choice } : range)),
      same,
    );
  }
  return merged;
}

function joinEqual<Choice>(ranges: readonly Range<Choice>[], same: (a: Choice, b: Choice) => boolean): Range<Choice>[] {
  const joined: Range<Choice>[] = [];
  for (const range of ranges) {
    const last = joined.at(-1);
    if (last !== undefined && same(last.choice, range.choice))
      joined[joined.length - 1] = { ...last, to: range.to, chance: last.chance + range.chance };
    else joined.push(range);
  }
  return joined;
}
