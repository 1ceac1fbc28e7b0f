/**
 * How often the 95 % interval of every sampling method holds the true probability, on five walls. By hand, from the top folder:
 *
 *   npx esbuild tests/outside/wall-probabilities/coverage.ts --bundle --platform=node --format=esm --packages=external \
 *     | node --input-type=module - 1000 tests/outside/wall-probabilities/coverage.json
 *
 * Works through all walls and methods a hundred seeds at a time and writes the file anew after each hundred; subset simulation and
 * directional sampling, which cost most, run with every third seed. A third argument is the first seed, so that parts can run side by
 * side (coverage-parts.ts adds them up); a fourth, 1 or 2, runs the dear methods alone on another third of the seeds.
 */
import { writeFileSync } from "node:fs";
import type { SamplingMethod } from "../../../src/reliability/sampling-estimate.ts";
import { countedFailures, coverageOrder, methods, sharpValue } from "./methods.ts";
import { fiveWalls, modelOf } from "./walls.ts";

const seeds = Number(process.argv[2]);
const target = process.argv[3];
const first = Number(process.argv[4] ?? 0);
/** Of the seeds of dear methods: 0 with all others, 1 or 2 by themselves. */
const third = Number(process.argv[5] ?? 0);
const millions = 3;
/** Runs of these are dear: every third seed alone. */
const dear: readonly string[] = ["subset", "directional"];

const rows = fiveWalls.map((wall) => {
  const model = modelOf(wall);
  const truth = sharpValue(model, 10);
  const failures = countedFailures(model, millions);
  console.error(wall.kind, truth.probability, truth.standardError, failures);
  const wanted = Object.keys(methods).filter((method) => third === 0 || dear.includes(method));
  const tallies = wanted.map((method) => ({
    method: method as SamplingMethod,
    seeds: 0,
    covered: 0,
    tooLow: 0,
    tooHigh: 0,
    doubted: 0,
    sum: 0,
    evaluations: 0,
    first: [] as { probability: number; standardError: number }[],
  }));
  return { wall, model, truth, counted: { samples: millions * 1e6, failures }, tallies };
});

for (let from = first; from < seeds; from += 100) {
  for (const { model, truth, tallies } of rows)
    for (const tally of tallies)
      for (let seed = from; seed < Math.min(seeds, from + 100); seed++) {
        if (dear.includes(tally.method) && seed % 3 !== third) continue;
        const found = methods[tally.method](model, coverageOrder(seed));
        const [low, high] = found.interval;
        tally.seeds++;
        if (high < truth.probability) tally.tooLow++;
        else if (low > truth.probability) tally.tooHigh++;
        else tally.covered++;
        if (found.doubts.length > 0) tally.doubted++;
        tally.sum += found.probability;
        tally.evaluations += found.evaluations;
        if (seed < 3) tally.first.push({ probability: found.probability, standardError: found.standardError });
      }
  const result = rows.map(({ wall, truth, counted, tallies }) => ({
    wall,
    truth,
    counted,
    methods: tallies.map(({ sum, evaluations, seeds: done, ...rest }) => ({
      ...rest,
      seeds: done,
      meanOverTruth: sum / done / truth.probability,
      meanEvaluations: Math.round(evaluations / done),
    })),
  }));
  writeFileSync(target, `${JSON.stringify(result, null, 2)}\n`);
  console.error(from + 100, "seeds");
}
