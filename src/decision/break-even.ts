import type { DecisionBasis } from "./decision-basis.ts";

/** Where, along a scale, the best option gives way to another. */
export interface TippingPoint {
  readonly at: number;
  readonly standardError: number;
  /** Places of the options: below the point, and above it. */
  readonly below: number;
  readonly above: number;
}

/** An option as a line over a multiple of the failure cost: price + multiple·failureCost. */
export interface CostLine {
  readonly price: number;
  /** Expected cost of failure at multiple 1. */
  readonly failureCost: number;
}

/** The options that are best somewhere as the failure cost grows from nothing, and where they change: a lower envelope. */
export function costEnvelope(lines: readonly CostLine[]): readonly Omit<TippingPoint, "standardError">[] {
  const points: Omit<TippingPoint, "standardError">[] = [];
  const cheaper = (a: number, b: number): boolean =>
    lines[a].price < lines[b].price ||
    (lines[a].price === lines[b].price && lines[a].failureCost < lines[b].failureCost);
  let here = lines.reduce((best, _, o) => (cheaper(o, best) ? o : best), 0);
  for (;;) {
    let next = -1;
    let at = Number.POSITIVE_INFINITY;
    lines.forEach((line, o) => {
      const saved = lines[here].failureCost - line.failureCost;
      if (!(saved > 0)) return;
      const crossing = (line.price - lines[here].price) / saved;
      if (crossing < at || (crossing === at && next >= 0 && line.failureCost < lines[next].failureCost)) {
        at = crossing;
        next = o;
      }
    });
    if (next < 0) return points;
    points.push({ at, below: here, above: next });
    here = next;
  }
}

/**
 * Multiples of the failure cost at which the decision tips; 1 is the cost as given. Options that are closed today are left
 * out.
 */
export function failureCostTippingPoints({ problem, outcomes }: DecisionBasis): readonly TippingPoint[] {
  const open = outcomes.map((_, o) => o).filter((o) => outcomes[o].open);
  const lines = open.map((o) => ({
    price: problem.options[o].cost,
    failureCost: outcomes[o].expectedCost.value - problem.options[o].cost,
  }));
  return costEnvelope(lines).map(({ at, below, above }) => {
    const saved = lines[below].failureCost - lines[above].failureCost;
    const error = Math.hypot(
      outcomes[open[below]].expectedCost.standardError,
      outcomes[open[above]].expectedCost.standardError,
    );
    return { at, standardError: (at * error) / saved, below: open[below], above: open[above] };
  });
}

export interface TargetRange {
  /** Greatest acceptable probabilities from `from` (included) up to `to`. */
  readonly from: number;
  readonly to: number;
  /** The option of least expected cost among those that meet such a target; absent where none does. */
  readonly option?: number;
}

/**
 * Which option is best for which target, if the target must be met: from the strictest to none. An option that stays open
 * whatever the target may be counts for all of them where the study says that the target must be met.
 */
export function targetTippingPoints({ problem, outcomes }: DecisionBasis): readonly TargetRange[] {
  const always = problem.options.map((option) => problem.mustMeetTarget && option.alwaysOpen);
  const bounds = [...new Set([0, ...outcomes.map((outcome) => outcome.probability.value)])].sort((a, b) => a - b);
  const ranges: { from: number; to: number; option?: number }[] = [];
  bounds.forEach((from, b) => {
    const open = outcomes.map((_, o) => o).filter((o) => always[o] || outcomes[o].probability.value <= from);
    const option = open.reduce<number | undefined>(
      (best, o) =>
        best === undefined || outcomes[o].expectedCost.value < outcomes[best].expectedCost.value ? o : best,
      undefined,
    );
    const last = ranges.at(-1);
    const to = bounds[b + 1] ?? 1;
    if (last !== undefined && last.option === option) last.to = to;
    else ranges.push({ from, to, ...(option === undefined ? {} : { option }) });
  });
  return ranges;
}
