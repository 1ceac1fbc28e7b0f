import { fillNormals } from "../probability/streams.ts";
import { createSurvivalMargin } from "./after-survival.ts";
import { type DecisionProblem, isGaussian } from "./decision-problem.ts";
import { blocksOf, placeStrata, type SamplePlan } from "./failure-sample.ts";
import { mixtureWeight, type Stratum } from "./mixture.ts";
import { type Estimate, type StratifiedSample, stratifiedSum } from "./stratified-sample.ts";

/**
 * What is believed, failure or not: the denominators of everything conditional. Weights are φ/h times the likelihood; where
 * the wall did not survive what it has survived, a sample is left out.
 */
export interface BeliefSample extends StratifiedSample {
  readonly drawn: number;
  /** Mean likelihood, the chance of the survivals where there are no results; exactly 1 without evidence left to weigh. */
  readonly chance: Estimate;
  readonly evaluations: number;
}

/** Samples of what is believed; only rules and prices hang on them, or the posterior where there is evidence to weigh. */
export const beliefSampleSize = 32_768;

export function drawBeliefs(problem: DecisionProblem, strata: readonly Stratum[], plan: SamplePlan): BeliefSample {
  const { keys, survivals } = problem;
  const dimension = keys.length;
  const capacity = Math.min(512, ...survivals.map((states) => states.capacity));
  const { blocks, perBlock, sizes } = blocksOf(strata, plan.samples);
  const drawn = perBlock * blocks;
  const weightOf = mixtureWeight(strata, sizes);
  const margin = createSurvivalMargin(survivals);
  const columns = keys.map(() => new Float64Array(perBlock));
  const z = keys.map(() => new Float64Array(drawn));
  const weight = new Float64Array(drawn);
  const fold = new Uint8Array(drawn);
  const pair = new Uint32Array(drawn);
  const [least, likelihood] = [new Float64Array(capacity), new Float64Array(capacity)];
  const point = new Float64Array(dimension);
  let count = 0;
  for (let block = 0; block < blocks; block++) {
    keys.forEach((key, j) => {
      fillNormals(plan.seed, plan.purpose, key, block, columns[j], perBlock);
    });
    placeStrata(strata, sizes, columns, block, blocks);
    for (let start = 0; start < perBlock; start += capacity) {
      const n = Math.min(capacity, perBlock - start);
      const tile = columns.map((column) => column.subarray(start, start + n));
      if (survivals.length > 0) margin(tile, n, least, false);
      likelihood.fill(1, 0, n);
      problem.likelihood?.(tile, n, likelihood);
      for (let i = 0; i < n; i++) {
        if (survivals.length > 0 && least[i] < 1) continue;
        for (let j = 0; j < dimension; j++) {
          point[j] = tile[j][i];
          z[j][count] = point[j];
        }
        weight[count] = (weightOf(point) * likelihood[i]) / drawn;
        pair[count] = (block * perBlock + start + i) >> 1;
        fold[count] = pair[count] % plan.folds;
        count++;
      }
    }
  }
  const sample = {
    count,
    z: z.map((column) => column.subarray(0, count)),
    weight: weight.subarray(0, count),
    pair: pair.subarray(0, count),
    fold: fold.subarray(0, count),
    folds: plan.folds,
  };
  const chance = isGaussian(problem)
    ? { value: 1, standardError: 0 }
    : stratifiedSum(sample, new Float64Array(count).fill(1));
  return { ...sample, drawn, chance, evaluations: drawn * survivals.length };
}
