import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { ReadOut } from "../../src/mechanics/read-out.ts";
import { evaluateWall } from "./evaluate-wall.ts";
import { type OpenWall, openWall } from "./open-wall.ts";
import { drawsOf, randomStudy, type StudyTree } from "./random-study.ts";

/** Runs a law over random walls; `bend` turns the tree into one the law speaks of. */
function law(
  title: string,
  bend: (tree: StudyTree) => void,
  holds: (wall: OpenWall, next: () => number, tree: StudyTree) => void,
  numRuns = 80,
): void {
  test(title, () => {
    fc.assert(
      fc.property(fc.nat(), (seed) => {
        const tree = randomStudy(seed);
        bend(tree);
        holds(openWall(tree), drawsOf(seed + 1), tree);
      }),
      { numRuns, seed: 1 },
    );
  });
}

/** Horizontal thrust of soil and uniform surcharge: the list gives the surcharge's share of one cut pressure apart. */
const earthThrust = ({ forces }: ReadOut): number =>
  forces
    .filter((force) => force.group === "earth" || force.name === "Surcharge")
    .reduce((sum, force) => sum + force.horizontal, 0);

const pathsOf = (wall: OpenWall, pattern: RegExp): string[] =>
  Object.keys(wall.drawn).filter((path) => pattern.test(path));

/** The listed values times a factor, the rest as drawn. */
const scaled = (wall: OpenWall, paths: readonly string[], factor: number): Record<string, number> =>
  Object.fromEntries(paths.map((path) => [path, wall.drawn[path] * factor]));

const rounding = (x: number): number => 1e-9 * (1 + Math.abs(x));

describe("strength and loads", () => {
  law(
    "more friction never raises the Rankine thrust of a stable slope",
    (tree) => {
      tree.model.earth_pressure = "rankine";
      delete tree.model.wall_friction;
      delete tree.loads.earthquake;
      for (const soil of Object.values(tree.soils)) delete soil.overconsolidation_ratio;
    },
    (wall, next) => {
      const friction = pathsOf(wall, /friction_angle$/);
      const before = wall.at({});
      if (before.marks.includes("slope_unstable")) return;
      const after = wall.at(scaled(wall, friction, 1 + 0.3 * next()));
      expect(earthThrust(after)).toBeLessThanOrEqual(earthThrust(before) + rounding(earthThrust(before)));
    },
  );

  law(
    "more cohesion never raises the active thrust of a stable slope",
    (tree) => {
      tree.model.earth_pressure = tree.model.earth_pressure === "at_rest" ? "rankine" : tree.model.earth_pressure;
      for (const soil of Object.values(tree.soils)) delete soil.overconsolidation_ratio;
    },
    (wall, next) => {
      const before = wall.at({});
      if (before.marks.includes("slope_unstable")) return;
      const after = wall.at(scaled(wall, pathsOf(wall, /cohesion$|undrained_strength$/), 1 + next()));
      expect(earthThrust(after)).toBeLessThanOrEqual(earthThrust(before) + rounding(earthThrust(before)));
    },
  );

  law(
    "more friction on the base never lowers the sliding factor, and touches nothing else",
    () => undefined,
    (wall, next) => {
      const base = pathsOf(wall, /^wall\.sliding_friction\.(ratio|angle)$/);
      const [before, after] = [wall.factorsAt({}), wall.factorsAt(scaled(wall, base, 1 + 0.4 * next()))];
      expect(after.sliding).toBeGreaterThanOrEqual((before.sliding ?? Number.NaN) * (1 - 1e-12));
      expect(after.overturning).toBe(before.overturning);
      expect(after.bearing).toBe(before.bearing);
    },
  );

  law(
    "a surcharge that does not stand on the heel never helps against overturning",
    (tree) => {
      tree.loads.surcharge = { pressure: 5, on_heel: false };
      tree.ground.behind.slope = 0; // on a slope, or with wall friction, the thrust's vertical part can outweigh it
      if (tree.model.earth_pressure === "coulomb") tree.model.wall_friction = 0;
      tree.wall.stem.foot_width -= tree.wall.stem.back_run;
      tree.wall.stem.back_run = 0;
      tree.model.tension_crack = "dry";
      if (tree.wall.shear_key) Object.assign(tree.wall.shear_key, { from_toe: 0, width: 0.2 });
      const crest = (tree.wall.underside_level ?? 0) + tree.wall.stem.height + (tree.wall.base?.thickness ?? 0);
      for (const layer of tree.ground.behind.layers)
        if (layer.bottom !== undefined) layer.bottom = Math.min(layer.bottom, crest);
    },
    (wall, next) => {
      const before = wall.factorsAt({}).overturning ?? Number.NaN;
      const after = wall.factorsAt({ "loads.surcharge.pressure": 5 + 30 * next() }).overturning;
      expect(after).toBeLessThanOrEqual(before * (1 + 1e-12));
    },
  );

  law(
    "a larger model factor on the thrust scales the earth thrust alone",
    (tree) => {
      tree.model.factors.earth_thrust = 1;
    },
    (wall) => {
      const [before, after] = [wall.at({}), wall.at({ "model.factors.earth_thrust": 1.7 })];
      expect(earthThrust(after)).toBeCloseTo(1.7 * earthThrust(before), 7);
      const rest = ({ forces }: ReadOut): number =>
        forces
          .filter(({ group }) => group === "weight" || group === "water" || group === "inertia" || group === "front")
          .reduce((sum, force) => sum + Math.abs(force.horizontal) + Math.abs(force.vertical), 0);
      expect(rest(after)).toBe(rest(before));
    },
  );
});

describe("water", () => {
  law(
    "higher water behind never raises the sliding factor of a wall with dry cracks",
    (tree) => {
      tree.model.tension_crack = "dry";
      tree.water.behind ??= { level: (tree.wall.underside_level ?? 0) + 1 };
      for (const soil of Object.values(tree.soils))
        soil.saturated_unit_weight = Math.min(soil.saturated_unit_weight, soil.unit_weight + 2);
    },
    (wall, next) => {
      const level = wall.drawn["water.behind.level"];
      const [before, after] = [wall.factorsAt({}), wall.factorsAt({ "water.behind.level": level + 3 * next() })];
      expect(after.sliding).toBeLessThanOrEqual((before.sliding ?? Number.NaN) * (1 + 1e-12));
    },
    200,
  );

  law(
    "water below the underside on both sides is as no water, but for bearing and what stands before a key",
    (tree) => {
      const underside = tree.wall.underside_level ?? 0;
      tree.water.behind = { level: underside - 3 };
      tree.water.front = { level: underside - 3 };
      delete tree.wall.shear_key;
    },
    (wall, _next, tree) => {
      const dry = evaluateWall({ ...tree, water: { flow: "hydrostatic" } }).limitStates;
      const wet = wall.factorsAt({});
      expect(wet.sliding).toBeCloseTo(dry.sliding?.factorOfSafety ?? Number.NaN, 9);
      expect(wet.overturning).toBeCloseTo(dry.overturning?.factorOfSafety ?? Number.NaN, 9);
    },
    60,
  );
});
