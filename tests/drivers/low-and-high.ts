import { failurePicture } from "../../src/drivers/failure-picture.ts";
import { createBlockCounter } from "../../src/reliability/block-tally.ts";
import { localRunner } from "../../src/reliability/local-runner.ts";
import { histogramEdges, monteCarlo } from "../../src/reliability/monte-carlo.ts";
import type { FailurePicture } from "../../src/results.ts";
import { type Problem, problemOf } from "../reliability/known-problems.ts";

const normal = (mean: number, sd: number) => ({ kind: "normal", mean, sd }) as const;

/** F = 1 + margin/100, margin = x − y + 2: fails where x is low and y is high; z plays no part. */
export const lowAndHigh: Problem = problemOf(
  { "a.x": normal(0, 1), "b.y": normal(0, 1), "c.z": normal(5, 2) },
  { sliding: ([x, y]) => 1 + (x - y + 2) / 100 },
);

/** The failure picture of 60 000 samples. */
export async function pictureOf({ states, space }: Problem): Promise<readonly FailurePicture[]> {
  const plan = { seed: "drivers", purpose: "test", samples: 60_000, centres: [1], edges: [histogramEdges(1, 0.01)] };
  const run = await monteCarlo(plan, localRunner(createBlockCounter(states, space, plan)), { precision: 0 });
  return failurePicture(space, run.states[0]);
}
