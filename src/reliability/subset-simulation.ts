import { studentUpperQuantile } from "../numeric/student-t.ts";
import { fillNormals } from "../probability/streams.ts";
import { evaluationsOf } from "./design-points.ts";
import type { LimitStates } from "./limit-states.ts";
import { logarithmicInterval, type SamplingEstimate, type SamplingOrder } from "./sampling-estimate.ts";

export interface SubsetEstimate extends SamplingEstimate {
  /** Estimates of the independent runs. */
  readonly runs: readonly number[];
  /** Levels of each run: each is ten times as rare as the one before. */
  readonly levels: readonly number[];
}

const runsTogether = 8;
const mostRuns = 64;
const chainsPerLevel = 200;
const chainLength = 10;
/** Samples of one level. */
export const samplesPerLevel: number = chainsPerLevel * chainLength;
/** 1e-12: nothing below is a finding. */
const mostLevels = 12;
/** Acceptance that conditional sampling steers for. */
const wantedAcceptance = 0.44;

/**
 * Subset simulation of the system, on the least factor of safety, with 2000 samples a level and a tenth going on.
 *
 *   p = 0.1^m · P(F < 1 | level m)
 *
 * The error comes from at least 8 independent runs (the usual formula, from the correlation within chains, covers too seldom), and
 * runs are added eight at a time until the precision asked for is reached.
 *
 * @source S. K. Au and J. L. Beck (2001), Estimation of small failure probabilities in high dimensions by subset simulation,
 *   Probabilistic Eng. Mech. 16, 263–277; I. Papaioannou, W. Betz, K. Zwirglmaier and D. Straub (2015), MCMC algorithms for subset
 *   simulation, Probabilistic Eng. Mech. 41, 89–103 (conditional sampling with adapted correlation)
 */
export function subsetSimulation(states: LimitStates, order: SamplingOrder): SubsetEstimate {
  const before = evaluationsOf(states);
  const run = createSubsetRun(states, order.seed);
  const found: { readonly probability: number; readonly levels: number; readonly stalled: boolean }[] = [];
  for (;;) {
    for (let k = 0; k < runsTogether; k++) found.push(run(found.length));
    const spent = evaluationsOf(states) - before;
    const { probability, standardError } = momentsOf(found.map((one) => one.probability));
    const enough = order.precision > 0 && standardError <= order.precision * probability;
    const another = (spent / found.length) * runsTogether;
    if (enough || found.length >= mostRuns || spent + another > order.samples) break;
  }
  const runs = found.map(({ probability }) => probability);
  const { probability, standardError } = momentsOf(runs);
  const empty = runs.filter((one) => one === 0).length;
  const doubts: string[] = [];
  if (found.some(({ stalled }) => stalled))
    doubts.push("a level of subset simulation could not be parted from the next");
  if (empty > 0) doubts.push(`${empty} of ${runs.length} runs of subset simulation found no failure down to 1e-12`);
  return {
    method: "subset",
    probability,
    standardError,
    interval:
      probability > 0
        ? logarithmicInterval(probability, standardError, studentUpperQuantile(0.025, runs.length - 1))
        : [0, 1],
    intervalKind: `95 %, Student's t on the logarithm, from ${runs.length} independent runs`,
    evaluations: evaluationsOf(states) - before,
    doubts,
    runs,
    levels: found.map(({ levels }) => levels),
  };
}

/** Mean of independent estimates and its standard error. */
export function momentsOf(runs: readonly number[]): { readonly probability: number; readonly standardError: number } {
  const n = runs.length;
  const probability = runs.reduce((sum, p) => sum + p, 0) / n;
  const square = runs.reduce((sum, p) => sum + (p - probability) ** 2, 0);
  return { probability, standardError: Math.sqrt(square / (n - 1) / n) };
}

/** One run; its buffers serve all runs in turn. */
function createSubsetRun(
  states: LimitStates,
  seed: string,
): (run: number) => { readonly probability: number; readonly levels: number; readonly stalled: boolean } {
  const { dimension, keys } = states;
  const size = samplesPerLevel;
  const noise = keys.map(() => new Float64Array(size));
  let z = keys.map(() => new Float64Array(size));
  let next = keys.map(() => new Float64Array(size));
  let factor = new Float64Array(size);
  let nextFactor = new Float64Array(size);
  const trial = keys.map(() => new Float64Array(chainsPerLevel));
  const trialFactor = new Float64Array(chainsPerLevel);
  const leastFactor = createLeastFactor(states);
  const order = new Uint32Array(size);
  return (run) => {
    const draw = (level: number): void =>
      keys.forEach((key, j) => {
        fillNormals(seed, `subset simulation, run ${run}, level ${level}`, key, 0, noise[j], size);
      });
    draw(0);
    for (let j = 0; j < dimension; j++) z[j].set(noise[j]);
    leastFactor(z, size, factor);
    let probability = 1;
    let scale = 0.6;
    for (let level = 1; level <= mostLevels; level++) {
      for (let i = 0; i < size; i++) order[i] = i;
      order.sort((a, b) => factor[a] - factor[b]);
      const threshold = factor[order[chainsPerLevel - 1]];
      if (threshold < 1) return { probability: probability * failing(factor), levels: level, stalled: false };
      // ties (factors at their cap) count as they are
      let within = chainsPerLevel;
      while (within < size && factor[order[within]] <= threshold) within++;
      if (within === size) return { probability: 0, levels: level, stalled: true };
      probability *= within / size;
      draw(level);
      // of tied ones any will do: they lie in the order they were drawn in
      for (let c = 0; c < chainsPerLevel; c++) {
        const from = order[c];
        for (let j = 0; j < dimension; j++) next[j][c] = z[j][from];
        nextFactor[c] = factor[from];
      }
      for (let step = 1; step < chainLength; step++) {
        const now = (step - 1) * chainsPerLevel;
        const into = step * chainsPerLevel;
        const spread = Math.min(1, scale);
        const keep = Math.sqrt(1 - spread * spread);
        for (let j = 0; j < dimension; j++)
          for (let c = 0; c < chainsPerLevel; c++) trial[j][c] = keep * next[j][now + c] + spread * noise[j][into + c];
        leastFactor(trial, chainsPerLevel, trialFactor);
        let accepted = 0;
        for (let c = 0; c < chainsPerLevel; c++) {
          const good = trialFactor[c] <= threshold;
          if (good) accepted++;
          for (let j = 0; j < dimension; j++) next[j][into + c] = good ? trial[j][c] : next[j][now + c];
          nextFactor[into + c] = good ? trialFactor[c] : nextFactor[now + c];
        }
        scale = Math.min(1, scale * Math.exp((accepted / chainsPerLevel - wantedAcceptance) / Math.sqrt(step)));
      }
      [z, next] = [next, z];
      [factor, nextFactor] = [nextFactor, factor];
    }
    return { probability: probability * failing(factor), levels: mostLevels, stalled: false };
  };
}

function failing(factor: Float64Array): number {
  let count = 0;
  for (let i = 0; i < factor.length; i++) if (factor[i] < 1) count++;
  return count / factor.length;
}

/** The least factor of all limit states, for any number of samples. */
export function createLeastFactor(
  states: LimitStates,
): (z: readonly Float64Array[], n: number, out: Float64Array) => void {
  const { capacity, names } = states;
  const factors = names.map(() => new Float64Array(capacity));
  const marks = new Uint8Array(capacity);
  return (z, n, out) => {
    for (let start = 0; start < n; start += capacity) {
      const count = Math.min(capacity, n - start);
      const tile = start === 0 && count === n ? z : z.map((column) => column.subarray(start, start + count));
      states.evaluate(tile, count, factors, marks, false);
      out.set(factors[0].subarray(0, count), start);
      for (let k = 1; k < factors.length; k++)
        for (let i = 0; i < count; i++) if (factors[k][i] < out[start + i]) out[start + i] = factors[k][i];
    }
  };
}
