/**
 * Adds up parts of the coverage that ran side by side, each with seeds of its own. By hand, from the top folder:
 *
 *   npx esbuild tests/outside/wall-probabilities/coverage-parts.ts --bundle --platform=node --format=esm --packages=external \
 *     | node --input-type=module - tests/outside/wall-probabilities/coverage.json PART PART …
 */
import { readFileSync, writeFileSync } from "node:fs";
import type { WallCoverage } from "./stored.ts";

const [target, ...files] = process.argv.slice(2);
const parts = files.map((file) => JSON.parse(readFileSync(file, "utf8")) as readonly WallCoverage[]);
const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0);

const whole = parts[0].map((wall, w) => ({
  ...wall,
  methods: wall.methods.map((first) => {
    const all = parts.flatMap((part) => part[w].methods.filter(({ method }) => method === first.method));
    const seeds = sum(all.map((part) => part.seeds));
    const mean = (value: "meanOverTruth" | "meanEvaluations"): number =>
      sum(all.map((part) => part[value] * part.seeds)) / seeds;
    return {
      method: first.method,
      seeds,
      covered: sum(all.map((part) => part.covered)),
      tooLow: sum(all.map((part) => part.tooLow)),
      tooHigh: sum(all.map((part) => part.tooHigh)),
      doubted: sum(all.map((part) => part.doubted)),
      first: first.first,
      meanOverTruth: mean("meanOverTruth"),
      meanEvaluations: Math.round(mean("meanEvaluations")),
    };
  }),
}));
writeFileSync(target, `${JSON.stringify(whole, null, 2)}\n`);
