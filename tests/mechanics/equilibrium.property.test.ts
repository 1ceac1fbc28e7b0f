import fc from "fast-check";
import { expect, test } from "vitest";
import type { ReadOut } from "../../src/mechanics/read-out.ts";
import { evaluateWall } from "./evaluate-wall.ts";
import { openWall } from "./open-wall.ts";
import { drawsOf, randomStudy } from "./random-study.ts";

/** Largest gap between the listed forces and the sums at the base, as a share of what is summed. */
function gap({ forces, base, limitStates }: ReadOut, passiveCounts: boolean): number {
  let [vertical, horizontal, moment, force, moments] = [0, 0, 0, 0, 0];
  for (const row of forces) {
    vertical += row.vertical;
    force += Math.abs(row.vertical) + Math.abs(row.horizontal);
    if (row.group !== "front") horizontal += row.horizontal;
    if (row.group === "front" && !passiveCounts) continue;
    moment += row.vertical * row.x - row.horizontal * row.z;
    moments += Math.abs(row.vertical * row.x) + Math.abs(row.horizontal * row.z);
  }
  const { overturning } = limitStates;
  if (overturning === undefined) throw new RangeError("overturning is not listed");
  const atBase = base.resultantX === null ? moment : base.vertical * base.resultantX;
  return Math.max(
    Math.abs(vertical - base.vertical) / force,
    Math.abs(horizontal - base.horizontal) / force,
    Math.abs(moment - (overturning.resisting - overturning.driving)) / moments,
    Math.abs(moment - atBase) / moments,
  );
}

test("forces and moments close over thousands of random walls", () => {
  let walls = 0;
  fc.assert(
    fc.property(fc.nat(), (seed) => {
      const tree = randomStudy(seed);
      const wall = openWall(tree);
      const next = drawsOf(seed + 1);
      for (let k = 0; k < 30; k++) {
        const changes = Object.fromEntries(
          Object.entries(wall.drawn).map(([path, value]) => [path, next() < 0.3 ? value * (0.2 + 2 * next()) : value]),
        );
        expect(gap(wall.at(k === 0 ? {} : changes), tree.ground.front.in_overturning)).toBeLessThan(1e-12);
        walls++;
      }
    }),
    { numRuns: 150, seed: 1 },
  );
  expect(walls).toBe(4500);
});

test("forces and moments close over the whole range of the schema", () => {
  fc.assert(
    fc.property(fc.nat(), (seed) => {
      const tree = randomStudy(seed, "wide");
      expect(gap(evaluateWall(tree), tree.ground.front.in_overturning)).toBeLessThan(1e-12);
    }),
    { numRuns: 200, seed: 2 },
  );
});

test("an open kernel gives what a kernel of certain values gives", () => {
  fc.assert(
    fc.property(fc.nat(), (seed) => {
      const tree = randomStudy(seed);
      const [open, certain] = [openWall(tree).at({}), evaluateWall(tree)];
      for (const [name, state] of Object.entries(certain.limitStates)) {
        const found = open.limitStates[name as keyof typeof open.limitStates];
        expect(found?.factorOfSafety).toBeCloseTo(state.factorOfSafety, 9);
      }
      expect(open.marks).toEqual(certain.marks);
    }),
    { numRuns: 100, seed: 3 },
  );
});
