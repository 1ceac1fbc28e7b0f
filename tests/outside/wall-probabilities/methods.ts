import type { Model } from "../../../src/model.ts";
import { plainSampling } from "../../../src/reliability/best-estimate.ts";
import { findDesignPoints } from "../../../src/reliability/design-points.ts";
import { directionalSampling } from "../../../src/reliability/directional.ts";
import { failureCentres, mixtureOf, wholeMove } from "../../../src/reliability/failure-mixture.ts";
import { importanceSampling } from "../../../src/reliability/importance-sampling.ts";
import { latinHypercube } from "../../../src/reliability/latin-hypercube.ts";
import type { SamplingEstimate, SamplingMethod, SamplingOrder } from "../../../src/reliability/sampling-estimate.ts";
import { sobolSampling } from "../../../src/reliability/sobol-sampling.ts";
import { subsetSimulation } from "../../../src/reliability/subset-simulation.ts";
import { type WeightedEstimate, weightedRun } from "../../../src/reliability/weighted-run.ts";

/** Importance sampling with its own search and pilot, all counted. */
export function importanceOf({ states, space }: Model, order: SamplingOrder): SamplingEstimate {
  const search = findDesignPoints(states, space, order.seed);
  const points = search.states.flatMap((state) => state.points);
  return importanceSampling(states, space, points, order, search.evaluations);
}

/** Every sampling method as the program runs it, its search and its stop rule on. */
export const methods: Readonly<Record<SamplingMethod, (model: Model, order: SamplingOrder) => SamplingEstimate>> = {
  plain: ({ states }, order) => plainSampling(states, order),
  latin_hypercube: ({ states }, order) => latinHypercube(states, order),
  sobol: ({ states }, order) => sobolSampling(states, order),
  importance: importanceOf,
  subset: ({ states }, order) => subsetSimulation(states, order),
  directional: ({ states }, order) => directionalSampling(states, order),
};

/** What the runs of the coverage are asked for. */
export const coverageOrder = (seed: number): SamplingOrder => ({
  seed: `coverage ${seed}`,
  precision: 0.15,
  samples: 100_000,
});

/** A sharp value: weighted samples around the design points, in independent runs of 200 000 whose scatter gives the error. */
export function sharpValue({ states, space }: Model, runs: number): WeightedEstimate {
  const points = findDesignPoints(states, space, "sharp").states.flatMap((state) => state.points);
  const parts = mixtureOf(failureCentres(points), wholeMove);
  const found = Array.from(
    { length: runs },
    (_, run) =>
      weightedRun(states, parts, { seed: `sharp ${run}`, purpose: "reference", samples: 200_000 }).system.probability,
  );
  const probability = found.reduce((sum, p) => sum + p, 0) / runs;
  const square = found.reduce((sum, p) => sum + (p - probability) ** 2, 0);
  return { probability, standardError: Math.sqrt(square / (runs - 1) / runs) };
}

/** Failures among plain samples, in independent runs of a million. */
export function countedFailures({ states }: Model, millions: number): number {
  let failures = 0;
  for (let run = 0; run < millions; run++)
    failures += Math.round(
      1e6 * plainSampling(states, { seed: `counted ${run}`, precision: 0, samples: 1e6 }).probability,
    );
  return failures;
}

/** What the runs at small probabilities are asked for: a coefficient of variation of 5 %. */
export const rareOrder = (seed: string): SamplingOrder => ({ seed, precision: 0.05, samples: 1_000_000 });
