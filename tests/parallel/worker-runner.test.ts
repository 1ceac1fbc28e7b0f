import { execFile } from "node:child_process";
import { existsSync } from "node:fs";
import { promisify } from "node:util";
import { beforeAll, describe, expect, test } from "vitest";
import type { BlockCounter, SamplingPlan } from "../../src/reliability/block-tally.ts";
import type { MonteCarloOptions, MonteCarloRun } from "../../src/reliability/monte-carlo.ts";
import type { AssessResult } from "../../src/results.ts";
import type { Study } from "../../src/study/study.ts";
import { benchText } from "./bench-text.ts";

/** Workers are files of the built package, so all of it is taken from there. */
const root = new URL("../../", import.meta.url);
const built = new URL("dist/", root);
const load = <T>(file: string): Promise<T> => import(/* @vite-ignore */ new URL(file, built).href);

let runner: typeof import("../../src/parallel/worker-runner.ts");
let door: typeof import("../../src/index.ts");
let study: Study;
let sampling: typeof import("../../src/reliability/monte-carlo.ts");
let local: BlockCounter;

beforeAll(async () => {
  if (!existsSync(new URL("parallel/block-worker.js", built))) throw new Error("run `npm run build` first");
  runner = await load("parallel/worker-runner.js");
  door = await load("index.js");
  study = door.readStudy(benchText);
  sampling = await load("reliability/monte-carlo.js");
  const { buildModel } = await load<typeof import("../../src/model.ts")>("model.js");
  const { createBlockCounter } =
    await load<typeof import("../../src/reliability/block-tally.ts")>("reliability/block-tally.js");
  const { states, space } = buildModel(study);
  local = createBlockCounter(states, space, longest);
});

/** Runs on so many workers; on none, in this thread. */
async function sampled(workers: number, samples: number, options: MonteCarloOptions): Promise<MonteCarloRun> {
  const plan = { ...longest, samples };
  if (workers === 0)
    return await sampling.monteCarlo(plan, { ahead: 1, tally: async (block) => local.tally(block) }, options);
  const started = runner.workerRunner(study, plan, workers);
  return await sampling.monteCarlo(plan, started, options).finally(() => started.close());
}

const longest: SamplingPlan = {
  seed: "any",
  purpose: "plain sampling",
  samples: 12 * 16_384,
  centres: [1, 1, 1],
  edges: [
    [0, 1, 2],
    [0, 1, 2],
    [0, 1, 2],
  ],
};

describe("sampling on worker threads", () => {
  test("gives the same bits for no, 1, 2 and 5 workers, run to its end", async () => {
    const alone = await sampled(0, longest.samples, { precision: 0 });
    for (const workers of [1, 2, 5]) expect(await sampled(workers, longest.samples, { precision: 0 })).toEqual(alone);
  });

  test("gives the same bits for no, 1, 2 and 5 workers, stopped early at a precision", async () => {
    const alone = await sampled(0, longest.samples, { precision: 0.06 });
    expect(alone.samples).toBeLessThan(longest.samples);
    for (const workers of [1, 2, 5])
      expect(await sampled(workers, longest.samples, { precision: 0.06 })).toEqual(alone);
  });

  test("a run stopped by the user equals a run of as many samples as it has", async () => {
    const stop = new AbortController();
    const onProgress = (done: number): void => {
      if (done >= 100_000) stop.abort();
    };
    const stopped = await sampled(2, longest.samples, { precision: 0, signal: stop.signal, onProgress });
    expect(stopped.complete).toBe(false);
    expect(stopped.samples).toBeLessThan(longest.samples);
    const whole = await sampled(0, stopped.samples, { precision: 0 });
    for (const [k, state] of [...stopped.states, stopped.system].entries())
      expect({ ...state, convergence: 0 }).toEqual({ ...[...whole.states, whole.system][k], convergence: 0 });
  });

  test("what goes wrong in a worker is rejected: a block out of the run, a study without a model, an end too soon", async () => {
    const two = runner.workerRunner(study, { ...longest, samples: 50_000 }, 2);
    await expect(two.tally(99)).rejects.toThrow("block 99 lies outside a run of 50000 samples");
    expect((await two.tally(3)).samples).toBe(50_000 - 3 * 16_384);
    const lost = two.tally(0);
    await Promise.all([expect(lost).rejects.toThrow("a worker ended early"), two.close()]);
    const broken = runner.workerRunner({ ...study, correlations: undefined as never }, longest, 1);
    await expect(broken.tally(0)).rejects.toThrow(TypeError);
    await expect(broken.tally(1)).rejects.toThrow(TypeError);
    await broken.close();
  });

  test("the command line spreads a run over workers and ends when it is done, with the numbers of one thread", async () => {
    const start = promisify(execFile);
    const launcher = new URL("bin/toehold.mjs", root).pathname;
    const file = new URL("tests/bench/bench.yaml", root).pathname;
    const ran = async (workers: string): Promise<AssessResult> => {
      const args = [
        launcher,
        "assess",
        file,
        "--json",
        "--samples",
        "200000",
        "--precision",
        "0",
        "--workers",
        workers,
      ];
      const { stdout, stderr } = await start(process.execPath, args);
      expect(stderr).toBe("");
      return JSON.parse(stdout);
    };
    const [one, three] = [await ran("1"), await ran("3")];
    expect([one.run.workers, three.run.workers]).toEqual([1, 3]);
    expect({ ...three, run: 0 }).toEqual({ ...one, run: 0 });
  });
});
