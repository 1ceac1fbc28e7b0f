import fc from "fast-check";
import { expect, test } from "vitest";
import { evaluateWall } from "./evaluate-wall.ts";
import { randomStudy } from "./random-study.ts";
import { unsound } from "./unsound.ts";

test("no NaN or infinity comes out of random studies over the whole range of the schema", () => {
  fc.assert(
    fc.property(fc.nat(), (seed) => {
      expect(unsound(evaluateWall(randomStudy(seed, "wide")))).toEqual([]);
    }),
    { numRuns: 300, seed: 1 }, // tests/bench/random-studies.ts does 100 000
  );
});
