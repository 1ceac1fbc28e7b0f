import { clopperPearson } from "../numeric/clopper-pearson.ts";
import type { JointSpace } from "../probability/marginal.ts";
import { fillNormals, streamBlock } from "../probability/streams.ts";
import { evaluationsOf, findDesignPoints } from "./design-points.ts";
import { importanceSampling } from "./importance-sampling.ts";
import type { LimitStates } from "./limit-states.ts";
import type { SamplingEstimate, SamplingOrder } from "./sampling-estimate.ts";

/** Samples of the first look: failures that are common are counted, not searched for. */
const look = 2048;
/** From this many failures in the look on, plain sampling is good enough for a curve. */
const common = 80;

/**
 * Probability that any limit state fails, at the least cost: counted where failures are common, sampled around the design points
 * elsewhere. For curves and searches over many walls; with one seed all walls see the same draws, so the curve is smooth.
 *
 * Tables serve all of it, the search too: sampling needs to know about where a design point lies, not its last digits.
 */
export function estimateProbability(states: LimitStates, space: JointSpace, order: SamplingOrder): SamplingEstimate {
  const before = evaluationsOf(states);
  const failures = countPlain(states, order.seed, look);
  if (failures >= common) return plainOf(failures, look, evaluationsOf(states) - before);
  const search = findDesignPoints(fromTables(states), space, order.seed);
  const points = search.states.flatMap((state) => state.points);
  if (points.length > 0) return importanceSampling(states, space, points, order, evaluationsOf(states) - before);
  return plainOf(failures, look, evaluationsOf(states) - before);
}

/** The same limit states, never evaluated exactly. */
function fromTables(states: LimitStates): LimitStates {
  return {
    ...states,
    evaluations: states.evaluations,
    evaluate: (z, n, factors, marks) => states.evaluate(z, n, factors, marks, false),
  };
}

function plainOf(failures: number, samples: number, evaluations: number): SamplingEstimate {
  const probability = failures / samples;
  return {
    method: "plain",
    probability,
    standardError: Math.sqrt((probability * (1 - probability)) / samples),
    interval: clopperPearson(failures, samples),
    intervalKind: "95 %, Clopper–Pearson",
    evaluations,
    doubts: failures === 0 ? ["no failure was found"] : [],
  };
}

function countPlain(states: LimitStates, seed: string, samples: number): number {
  const { capacity, names, keys } = states;
  const z = keys.map((key) => {
    const column = new Float64Array(Math.min(samples, streamBlock));
    fillNormals(seed, "first look", key, 0, column, column.length);
    return column;
  });
  const factors = names.map(() => new Float64Array(capacity));
  const marks = new Uint8Array(capacity);
  let failures = 0;
  for (let start = 0; start < samples; start += capacity) {
    const n = Math.min(capacity, samples - start);
    states.evaluate(
      z.map((column) => column.subarray(start, start + n)),
      n,
      factors,
      marks,
      false,
    );
    for (let i = 0; i < n; i++) if (factors.some((column) => column[i] < 1)) failures++;
  }
  return failures;
}
