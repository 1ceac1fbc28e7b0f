/**
 * Importance sampling on the wall with ten unknowns at one failure in a million and in a hundred million: evaluations, error, time;
 * and on the wall whose drains work or are blocked: both design points of bearing, and the estimate. By hand, from the top folder:
 *
 *   npx esbuild tests/outside/wall-probabilities/rare.ts --bundle --platform=node --format=esm --packages=external \
 *     | node --input-type=module - 100 tests/outside/wall-probabilities/rare.json
 *
 * Times are of the processor, search and pilot and run together, once the program is warm; beside them stands the time that a
 * million plain samples of the same wall take.
 */
import { writeFileSync } from "node:fs";
import { plainSampling } from "../../../src/reliability/best-estimate.ts";
import { findDesignPoints } from "../../../src/reliability/design-points.ts";
import { importanceSampling } from "../../../src/reliability/importance-sampling.ts";
import { importanceOf, rareOrder, sharpValue } from "./methods.ts";
import { drainsWall, modelOf, rareWalls } from "./walls.ts";

const seeds = Number(process.argv[2]);
const target = process.argv[3];

const processorSeconds = (work: () => void): number => {
  const before = process.cpuUsage();
  work();
  const { user, system } = process.cpuUsage(before);
  return (user + system) / 1e6;
};
const part = (values: readonly number[], share: number): number =>
  [...values].sort((a, b) => a - b)[Math.ceil(share * values.length) - 1];
const summary = (values: readonly number[]) => ({
  median: part(values, 0.5),
  of99in100: part(values, 0.99),
  largest: part(values, 1),
});

const cost = rareWalls.map((wall) => {
  const model = modelOf(wall);
  const truth = sharpValue(model, 10);
  for (let seed = 0; seed < 20; seed++) importanceOf(model, rareOrder(`warm ${seed}`));
  const found = Array.from({ length: seeds }, (_, seed) => {
    let estimate = { probability: 0, standardError: 0, evaluations: 0 };
    const seconds = processorSeconds(() => {
      estimate = importanceOf(model, rareOrder(`rare ${seed}`));
    });
    return { ...estimate, seconds };
  });
  const plain = processorSeconds(() => plainSampling(model.states, { seed: "plain", precision: 0, samples: 1e6 }));
  return {
    wall,
    unknowns: model.space.unknowns.length,
    truth,
    seeds,
    evaluations: summary(found.map(({ evaluations }) => evaluations)),
    coefficientOfVariation: summary(found.map(({ probability, standardError }) => standardError / probability)),
    seconds: summary(found.map(({ seconds }) => seconds)),
    secondsOfAMillionPlainSamples: plain,
    farthestInStandardErrors: Math.max(
      ...found.map(({ probability, standardError }) => Math.abs(probability - truth.probability) / standardError),
    ),
    first: found
      .slice(0, 2)
      .map(({ probability, standardError, evaluations }) => ({ probability, standardError, evaluations })),
  };
});

const model = modelOf(drainsWall);
const { states, space } = model;
const truth = sharpValue(model, 10);
const bearing = states.names.indexOf("bearing");
const drains = Array.from({ length: seeds }, (_, seed) => {
  const search = findDesignPoints(states, space, `drains ${seed}`);
  const points = search.states.flatMap((state) => state.points);
  const found = importanceSampling(states, space, points, rareOrder(`drains ${seed}`), search.evaluations);
  return {
    indices: search.states[bearing].points.map(({ reliabilityIndex }) => reliabilityIndex),
    apart: (found.probability - truth.probability) / found.standardError,
  };
});
const nearest = (place: number): readonly number[] => drains.map(({ indices }) => indices[place] ?? Number.NaN);
writeFileSync(
  target,
  `${JSON.stringify(
    {
      cost,
      drains: {
        wall: drainsWall,
        truth,
        seeds,
        withBothPoints: drains.filter(({ indices }) => indices.length >= 2).length,
        first: { least: Math.min(...nearest(0)), most: Math.max(...nearest(0)) },
        second: { least: Math.min(...nearest(1)), most: Math.max(...nearest(1)) },
        farthestInStandardErrors: Math.max(...drains.map(({ apart }) => Math.abs(apart))),
        covered: drains.filter(({ apart }) => Math.abs(apart) < 1.96).length,
      },
    },
    null,
    2,
  )}\n`,
);
