import { readFileSync } from "node:fs";

/** The wall of the speed tests: ten unknowns of mixed kinds, eight correlated pairs. */
export const benchText: string = readFileSync(new URL("../bench/bench.yaml", import.meta.url), "utf8");
