/** One measurement in a process of its own: node --expose-gc part.mjs PART …; prints JSON. */
import { readFileSync } from "node:fs";

const dist = new URL("../../dist/", import.meta.url);
const load = (file) => import(new URL(file, dist).href);
const { readStudy } = await load("study/read-study.js");
const { buildModel } = await load("model.js");
const { createBlockCounter } = await load("reliability/block-tally.js");
const { monteCarlo } = await load("reliability/monte-carlo.js");
const { localRunner } = await load("reliability/local-runner.js");
const { fillNormals } = await load("probability/streams.js");

const blockSize = 16_384;
const text = readFileSync(new URL("bench.yaml", import.meta.url), "utf8");
const edges = Array.from({ length: 61 }, (_, k) => 0.05 * k);
const planOf = (states, samples) => ({
  seed: "bench",
  purpose: "plain sampling",
  samples,
  centres: states.names.map(() => 1),
  edges: states.names.map(() => edges),
});

/** Seconds, seconds of processor time, and the one over the other. */
async function timed(work) {
  const [processor, start] = [process.cpuUsage(), performance.now()];
  await work();
  const seconds = (performance.now() - start) / 1e3;
  const { user, system } = process.cpuUsage(processor);
  const processorSeconds = (user + system) / 1e6;
  return { seconds, processorSeconds, busy: processorSeconds / seconds };
}

async function sampled(study, samples, warmUp = 10) {
  const { states, space } = buildModel(study);
  const blocks = Math.ceil(samples / blockSize);
  const counter = createBlockCounter(states, space, planOf(states, (blocks + warmUp) * blockSize));
  for (let block = 0; block < warmUp; block++) counter.tally(blocks + block);
  const failures = [...states.names.map(() => 0), 0];
  const { processorSeconds, busy } = await timed(() => {
    for (let block = 0; block < blocks; block++) {
      const tally = counter.tally(block);
      for (const [k, state] of [...tally.states, tally.system].entries()) failures[k] += state.failures;
    }
  });
  return { samples: blocks * blockSize, failures, seconds: processorSeconds, busy };
}

/** What each unknown is worth when it is certain. */
const certain = [
  [/\{ normal: \{ mean: (\S+?),.*?\} \}/, "$1"],
  [/\{ lognormal: \{ mean: (\S+?),.*?\} \}/, "$1"],
  [/\{ truncated_normal: \{ mean: (\S+?),.*?\} \}/, "$1"],
  [/\{ gumbel: \{ mean: (\S+?),.*?\} \}/, "$1"],
  [/\{ uniform: \{ from: 0.7, to: 0.95 \} \}/, "0.82"],
  [/\{ triangular: \{ from: 0.5, peak: 2.2, to: 4.5 \} \}/, "2.2"],
];

/** The wall with fewer unknowns, or with other layers; the pairs of it that are left have no correlation. */
function grown(of, value) {
  let changed = text.replace(/correlations:[\s\S]*?(?=assessment:)/, "");
  if (of === "layers") {
    const layers = Array.from({ length: value }, (_, k) => {
      const bottom = k === value - 1 ? "" : `, bottom: ${(5.5 * (1 - (k + 1) / value)).toFixed(3)}`;
      return `      - { soil: ${k % 2 === 0 && value > 1 ? "fill" : "sand"}${bottom} }`;
    });
    return changed.replace(/ {6}- \{ soil: fill, bottom: 2.5 \}\n {6}- \{ soil: sand \}/, layers.join("\n"));
  }
  for (let left = 10; left > value; left--) {
    const [pattern, mean] = certain.find(([pattern]) => pattern.test(changed));
    changed = changed.replace(pattern, mean);
  }
  return changed;
}

const tasks = {
  correlation() {
    const { space } = buildModel(readStudy(text));
    const order = [
      "soils.fill.unit_weight",
      "soils.fill.friction_angle",
      "soils.sand.unit_weight",
      "soils.sand.friction_angle",
      "water.behind.level",
      "loads.surcharge.pressure",
      "wall.sliding_friction.ratio",
      "model.factors.earth_thrust",
      "model.factors.bearing_capacity",
      "wall.unit_weight",
    ];
    const rows = order.map((path) => space.rows[space.unknowns.findIndex((unknown) => unknown.path === path)]);
    const product = (a, b) => a.reduce((sum, value, k) => sum + value * b[k], 0);
    return { text: rows.map((a) => rows.map((b) => product(a, b)).join(" ")).join("\n") };
  },
  loop: (samples) => sampled(readStudy(text), Number(samples)),
  async growth(of, value) {
    const { seconds, samples } = await sampled(readStudy(grown(of, Number(value))), 1e6);
    return { ns: (1e9 * seconds) / samples };
  },
  async parts() {
    const { states, space } = buildModel(readStudy(text));
    const { capacity, keys, workspace } = states;
    const counter = createBlockCounter(states, space, planOf(states, 1e9));
    const z = keys.map(() => new Float64Array(blockSize));
    const tiles = Array.from({ length: blockSize / capacity }, (_, t) =>
      z.map((column) => column.subarray(t * capacity, (t + 1) * capacity)),
    );
    const factors = states.names.map(() => new Float64Array(capacity));
    const marks = new Uint8Array(capacity);
    const work = {
      "standard normals": (block) => {
        for (const [j, key] of keys.entries()) fillNormals("bench", "parts", key, block, z[j], blockSize);
      },
      "correlation, marginals, coefficients and mechanics": () => {
        for (const tile of tiles) states.evaluate(tile, capacity, factors, marks, false);
      },
      "of that, mechanics": () => {
        for (const _ of tiles) workspace.runStages(capacity);
      },
      "whole loop, with counting": (block) => counter.tally(block),
    };
    const measured = {};
    for (const [name, run] of Object.entries(work)) {
      for (let block = 0; block < 10; block++) run(block);
      const { processorSeconds, busy } = await timed(() => {
        for (let block = 0; block < 40; block++) run(block);
      });
      measured[name] = { ns: (1e9 * processorSeconds) / (40 * blockSize), busy };
    }
    return measured;
  },
  async workers(count, samples) {
    const { workerRunner } = await load("parallel/worker-runner.js");
    const study = readStudy(text);
    const plan = planOf(buildModel(study).states, Number(samples));
    const runner = workerRunner(study, plan, Number(count));
    const warmUp = Array.from({ length: 10 * Number(count) }, (_, block) => runner.tally(block));
    await Promise.all(warmUp);
    const result = await timed(() => monteCarlo(plan, runner, { precision: 0 }));
    await runner.close();
    return { ...result, samples: Number(samples) };
  },
  async memory(samples) {
    const { states, space } = buildModel(readStudy(text));
    const plan = planOf(states, Number(samples));
    const { seconds } = await timed(() =>
      monteCarlo(plan, localRunner(createBlockCounter(states, space, plan)), { precision: 0 }),
    );
    globalThis.gc();
    return { seconds, peak: process.resourceUsage().maxRSS / 1024, heap: process.memoryUsage().heapUsed / 1e6 };
  },
  flat(evaluations) {
    const { states } = buildModel(readStudy(text));
    const { capacity, keys } = states;
    const z = keys.map((key) => {
      const column = new Float64Array(capacity);
      fillNormals("bench", "flat", key, 0, column, capacity);
      return column;
    });
    const factors = states.names.map(() => new Float64Array(capacity));
    const marks = new Uint8Array(capacity);
    const run = (times) => {
      for (let k = 0; k < times; k++) states.evaluate(z, capacity, factors, marks, false);
    };
    run(3000);
    globalThis.gc();
    const before = process.memoryUsage().heapUsed;
    const times = Math.ceil(Number(evaluations) / capacity);
    run(times);
    return { evaluations: times * capacity, before, after: process.memoryUsage().heapUsed };
  },
};

const [name, ...args] = process.argv.slice(2);
console.log(JSON.stringify(await tasks[name](...args)));
