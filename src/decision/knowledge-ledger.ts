import { normalCdf, normalTailLimit } from "../numeric/normal.ts";
import type { DecisionBasis } from "./decision-basis.ts";
import { applyForm, type BeliefVariable, formSd, isGaussian } from "./decision-problem.ts";
import { knowledgeCurve } from "./knowledge-curve.ts";

/** Bins of K, from 8 standard deviations below its mean to 8 above; the outermost are open. */
export const knowledgeBins = 200;
const reach = 8;
const width = (2 * reach) / knowledgeBins;

/** All that bears on learning about one variable: beliefs and expected failure costs, binned by its knowledge part. */
export interface KnowledgeLedger {
  readonly variable: BeliefVariable;
  /** Middles of the bins, in the scale of K. */
  readonly middles: Float64Array;
  /** By fold. */
  readonly belief: readonly Float64Array[];
  /** By fold and option. */
  readonly loss: readonly (readonly Float64Array[])[];
  readonly failure: readonly (readonly Float64Array[])[];
  /** Mean and standard deviation of K where beliefs are normal; otherwise they are known by samples alone. */
  readonly normal?: { readonly mean: number; readonly sd: number };
  /** K and θ of each failing sample, and of each sample of the beliefs. */
  readonly failures: KnownValues;
  readonly beliefs: KnownValues;
}

export interface KnownValues {
  readonly k: Float64Array;
  readonly theta: Float64Array;
}

export function knowledgeLedger(basis: DecisionBasis, variable: BeliefVariable): KnowledgeLedger {
  const { failures, beliefs, problem } = basis;
  const { offset } = variable.known;
  const sd = formSd(variable.known);
  const curve = knowledgeCurve(variable);
  const isNormal = isGaussian(problem);
  const valuesIn = ({ count, z }: typeof failures | typeof beliefs): KnownValues => {
    const k = new Float64Array(count);
    applyForm(variable.known, z, count, k);
    const theta = new Float64Array(count);
    for (let i = 0; i < count; i++) theta[i] = curve.at(k[i]);
    return { k, theta };
  };
  const binsOf = ({ k }: KnownValues): Uint8Array => {
    const bins = new Uint8Array(k.length);
    for (let i = 0; i < k.length; i++) {
      const place = Math.floor(((k[i] - offset) / sd + reach) / width);
      bins[i] = place < 0 ? 0 : place >= knowledgeBins ? knowledgeBins - 1 : place;
    }
    return bins;
  };
  const failing = valuesIn(failures);
  const failureBins = binsOf(failing);
  const believed = valuesIn(beliefs);
  const byFold = (weigh: (add: (fold: number, place: number, value: number) => void) => void): Float64Array[] => {
    const sums = Array.from({ length: failures.folds }, () => new Float64Array(knowledgeBins));
    weigh((fold, place, value) => {
      sums[fold][place] += value;
    });
    return sums;
  };
  const ofFailures = (values: readonly Float64Array[]): Float64Array[][] => {
    const byOption = values.map((value) =>
      byFold((add) => {
        for (let i = 0; i < failures.count; i++)
          if (value[i] !== 0) add(failures.fold[i], failureBins[i], failures.weight[i] * value[i]);
      }),
    );
    return Array.from({ length: failures.folds }, (_, f) => byOption.map((sums) => sums[f]));
  };
  return {
    variable,
    middles: Float64Array.from({ length: knowledgeBins }, (_, b) => offset + sd * (-reach + (b + 0.5) * width)),
    belief: byFold((add) => {
      if (isNormal) {
        for (let f = 0; f < failures.folds; f++)
          for (let b = 0; b < knowledgeBins; b++) add(f, b, normalBin(b) / failures.folds);
        return;
      }
      const bins = binsOf(believed);
      for (let j = 0; j < beliefs.count; j++) add(beliefs.fold[j], bins[j], beliefs.weight[j]);
    }),
    loss: ofFailures(failures.cost),
    failure: ofFailures(failures.failure),
    ...(isNormal ? { normal: { mean: offset, sd } } : {}),
    failures: failing,
    beliefs: believed,
  };
}

/** Chance of bin b for a standard normal; from the nearer tail, so that far bins keep their digits. */
function normalBin(b: number): number {
  const from = b === 0 ? -normalTailLimit : -reach + b * width;
  const to = b === knowledgeBins - 1 ? normalTailLimit : -reach + (b + 1) * width;
  return from >= 0 ? normalCdf(-from) - normalCdf(-to) : normalCdf(to) - normalCdf(from);
}
