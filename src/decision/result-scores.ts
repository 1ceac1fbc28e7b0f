import { fillNormals, streamBlock } from "../probability/streams.ts";
import { formSd } from "./decision-problem.ts";
import { knowledgeCurve } from "./knowledge-curve.ts";
import type { KnowledgeLedger, KnownValues } from "./knowledge-ledger.ts";
import { cellChances, cellEdges, signalCells } from "./signal-cells.ts";

/**
 * A mean result read as an observation of K with a normal error: y = K − mean + noise. Exact where θ is straight; otherwise
 * y is the posterior mean of K, stretched so that it varies as such an observation would.
 */
export interface ResultScore {
  readonly ledger: KnowledgeLedger;
  /** Standard deviation of the mean result about θ. */
  readonly sd: number;
  /** Variance of the error of y. */
  readonly noise: number;
  /** y of a mean result. */
  of(result: number): number;
}

export function resultScore(ledger: KnowledgeLedger, sd: number): ResultScore {
  const { variable } = ledger;
  const { offset } = variable.known;
  const { linear } = knowledgeCurve(variable);
  if (linear !== undefined) {
    const { mean, slope } = linear;
    return { ledger, sd, noise: (sd / slope) ** 2, of: (result) => (result - mean) / slope - offset };
  }
  const prior = formSd(variable.known) ** 2;
  const { edges, means, variance } = posteriorMeans(ledger, sd);
  const share = Math.min(Math.max(variance / prior, 1e-6), 1 - 1e-9);
  const last = means.length - 1;
  return {
    ledger,
    sd,
    noise: (prior * (1 - share)) / share,
    of(result) {
      let [low, high] = [0, last];
      while (low < high) {
        const middle = (low + high) >> 1;
        if (edges[middle + 1] <= result) low = middle + 1;
        else high = middle;
      }
      const inside = low > 0 && low < last ? (result - edges[low]) / (edges[low + 1] - edges[low]) : 0.5;
      const beside = inside < 0.5 ? Math.max(low - 1, 0) : Math.min(low + 1, last);
      const mean = means[low] + Math.abs(inside - 0.5) * (means[beside] - means[low]);
      return (mean - offset) / share;
    },
  };
}

/** E[K | result in cell] for every cell, and the variance of this mean over cells. */
function posteriorMeans(
  ledger: KnowledgeLedger,
  sd: number,
): { edges: Float64Array; means: Float64Array; variance: number } {
  const { middles, variable } = ledger;
  const { at } = knowledgeCurve(variable);
  const cells = signalCells;
  const edges = cellEdges(at, middles, sd);
  const chance = cellChances(middles.map(at), edges, sd);
  const belief = ledger.belief.reduce((sum, part) => sum.map((value, b) => value + part[b]));
  const means = new Float64Array(cells);
  const total = new Float64Array(cells);
  for (let b = 0; b < middles.length; b++)
    for (let c = 0; c < cells; c++) {
      const weight = belief[b] * chance[b * cells + c];
      total[c] += weight;
      means[c] += weight * middles[b];
    }
  let [mean, square] = [0, 0];
  for (let c = 0; c < cells; c++) {
    means[c] = total[c] > 0 ? means[c] / total[c] : Number.NaN;
    if (!(total[c] > 0)) continue;
    mean += total[c] * means[c];
    square += total[c] * means[c] ** 2;
  }
  for (let c = 1; c < cells; c++) if (Number.isNaN(means[c])) means[c] = means[c - 1];
  for (let c = cells - 2; c >= 0; c--) if (Number.isNaN(means[c])) means[c] = means[c + 1];
  return { edges, means, variance: square - mean * mean };
}

/**
 * Mean results drawn for samples with known θ, and their scores: `draws` of each, sample by sample. The errors belong to
 * `key`, so more tests on the same variable move each result a little and change no other.
 */
export function drawScores(
  score: ResultScore,
  values: KnownValues,
  draws: number,
  noise: { readonly seed: string; readonly purpose: string; readonly key: string },
): Float64Array {
  const { theta } = values;
  const errors = new Float64Array(theta.length * draws);
  for (let from = 0; from < errors.length; from += streamBlock) {
    const count = Math.min(streamBlock, errors.length - from);
    const part = errors.subarray(from, from + count);
    fillNormals(noise.seed, noise.purpose, noise.key, from / streamBlock, part, count);
  }
  for (let i = 0; i < theta.length; i++)
    for (let d = 0; d < draws; d++) {
      const at = i * draws + d;
      errors[at] = score.of(theta[i] + score.sd * errors[at]);
    }
  return errors;
}
