import { normalCdf, normalTailLimit } from "../numeric/normal.ts";
import { knowledgeCurve } from "./knowledge-curve.ts";
import type { KnowledgeLedger, KnownValues } from "./knowledge-ledger.ts";
import type { RuleStep } from "./signal-rule.ts";

export const signalCells = 160;
const reach = 6;

/** What may be seen of one variable, cut into cells, and how likely each is for a given K. */
export interface SignalCells {
  readonly cells: number;
  /** Ends of the cells, cells + 1 of them; the outermost are ±∞. */
  readonly edges: Float64Array;
  /** Sums over bins of K as sums over cells. */
  seen(bins: Float64Array): Float64Array;
  /** Chance that what is seen lies in a range, given K of one sample. */
  chanceOf(step: RuleStep, values: KnownValues, i: number): number;
  /** The same where K is normal; undefined where θ is not straight. */
  chanceUnderNormal(step: RuleStep, k: { readonly mean: number; readonly sd: number }): number | undefined;
}

/**
 * The mean result, with its exact likelihood: normal about θ(k) with standard deviation `sd`. Cells follow the spread of θ
 * and of the error together: some thirteenth of a standard deviation of the mean result, out to six. In the variable's own unit.
 */
export function signalCellsOf({ variable, middles }: KnowledgeLedger, sd: number): SignalCells {
  const curve = knowledgeCurve(variable);
  const edges = cellEdges(curve.at, middles, sd);
  const chance = cellChances(
    middles.map((k) => curve.at(k)),
    edges,
    sd,
  );
  return {
    cells: signalCells,
    edges,
    seen: (bins) => weighted(bins, chance),
    chanceOf: ({ from, to }, { theta }, i) => normalBetween((from - theta[i]) / sd, (to - theta[i]) / sd),
    chanceUnderNormal: ({ from, to }, k) => {
      if (curve.linear === undefined) return undefined;
      const mean = curve.linear.mean + curve.linear.slope * k.mean;
      const spread = Math.hypot(curve.linear.slope * k.sd, sd);
      return normalBetween((from - mean) / spread, (to - mean) / spread);
    },
  };
}

/** P(cell | K in bin), bins × cells, row-major: the mean result is normal about θ of the bin. */
export function cellChances(theta: Float64Array, edges: Float64Array, sd: number): Float64Array {
  const chance = new Float64Array(theta.length * signalCells);
  for (let b = 0; b < theta.length; b++) {
    let below = 0;
    for (let c = 0; c < signalCells; c++) {
      const distance = (edges[c + 1] - theta[b]) / sd;
      // a cell that the normal does not reach is left at nothing, one beyond it changes nothing
      const upTo = distance < -8 ? 0 : distance > 8 ? 1 : normalCdf(distance);
      chance[b * signalCells + c] = upTo - below;
      below = upTo;
    }
  }
  return chance;
}

/** Σ_b bins[b]·P(cell | b). */
function weighted(bins: Float64Array, chance: Float64Array): Float64Array {
  const sums = new Float64Array(signalCells);
  for (let b = 0; b < bins.length; b++) {
    const weight = bins[b];
    if (weight === 0) continue;
    const row = b * signalCells;
    for (let c = 0; c < signalCells; c++) sums[c] += weight * chance[row + c];
  }
  return sums;
}

/** x(g) = θ(middle + g·σ_K) + a·sd·g, a such that for a straight θ the steps are those of the mean result's own spread. */
export function cellEdges(theta: (k: number) => number, middles: Float64Array, sd: number): Float64Array {
  const bins = middles.length;
  const centre = 0.5 * (middles[0] + middles[bins - 1]);
  const unit = (middles[bins - 1] - middles[0]) / (16 - 16 / bins);
  const spread = 0.5 * Math.abs(theta(centre + unit) - theta(centre - unit));
  const widening = (Math.hypot(spread, sd) - spread) / sd;
  return Float64Array.from({ length: signalCells + 1 }, (_, c) => {
    if (c === 0) return Number.NEGATIVE_INFINITY;
    if (c === signalCells) return Number.POSITIVE_INFINITY;
    const g = -reach + (2 * reach * c) / signalCells;
    return theta(centre + g * unit) + widening * sd * g;
  });
}

/** K itself is seen: the limit of endless tests without a shared error. Cells are the bins, in the scale of K. */
export function perfectCells({ middles }: KnowledgeLedger): SignalCells {
  const bins = middles.length;
  const edges = Float64Array.from({ length: bins + 1 }, (_, b) => {
    if (b === 0) return Number.NEGATIVE_INFINITY;
    if (b === bins) return Number.POSITIVE_INFINITY;
    return 0.5 * (middles[b - 1] + middles[b]);
  });
  return {
    cells: bins,
    edges,
    seen: (sums) => sums,
    chanceOf: ({ from, to }, { k }, i) => (k[i] >= from && k[i] < to ? 1 : 0),
    chanceUnderNormal: ({ from, to }, { mean, sd }) => normalBetween((from - mean) / sd, (to - mean) / sd),
  };
}

/** Φ(to) − Φ(from), from the nearer tail; ±∞ allowed. */
export function normalBetween(from: number, to: number): number {
  if (from > 0) return upper(from) - upper(to);
  return upper(-to) - upper(-from);
}

/** 1 − Φ(z), quickly where it is nothing or all. */
function upper(z: number): number {
  return z > normalTailLimit ? 0 : z < -9 ? 1 : normalCdf(-z);
}
