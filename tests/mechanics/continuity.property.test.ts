import fc from "fast-check";
import { expect, test } from "vitest";
import { type OpenWall, openWall } from "./open-wall.ts";
import { drawsOf, randomStudy, type StudyTree } from "./random-study.ts";

/** A path and a value of it at which another formula takes over. */
type Seam = readonly [path: string, value: number];

/** Places where levels meet: everything that is a level, set to every other level of the wall. */
function seams(tree: StudyTree, wall: OpenWall): Seam[] {
  const { stem, base } = tree.wall;
  const underside = tree.wall.underside_level ?? 0;
  const thickness = base?.thickness ?? 0;
  const crest = thickness + stem.height;
  const rise = ((base?.heel ?? 0) + stem.back_run) * Math.tan((tree.ground.behind.slope * Math.PI) / 180);
  const levels = [
    0,
    thickness,
    crest,
    crest + rise,
    tree.ground.front.level - underside,
    tree.ground.front.level - underside - tree.ground.front.ignore_top,
    ...tree.ground.behind.layers.flatMap(({ bottom }) => (bottom === undefined ? [] : [bottom - underside])),
    ...[tree.water.behind, tree.water.front].flatMap((pond) => (pond ? [pond.level - underside] : [])),
    ...(tree.wall.shear_key ? [-tree.wall.shear_key.depth] : []),
  ];
  const friction = Object.entries(tree.soils).flatMap(([key, soil]) =>
    soil.friction_angle === undefined ? [] : [[`soils.${key}.friction_angle`, tree.ground.behind.slope] as Seam],
  );
  const found: Seam[] = [
    ...Object.keys(wall.drawn)
      .filter((path) => /(level|bottom)$/.test(path) && path !== "wall.underside_level")
      .flatMap((path) => levels.map((level): Seam => [path, level + underside])),
    ...friction,
    ["ground.front.ignore_top", tree.ground.front.level - underside],
  ];
  // a water-filled crack ends where the pressure first turns positive: a layer that vanishes takes its end with it
  const crack = tree.model.tension_crack === "water" ? /layers/ : /^$/;
  return found.filter(([path]) => path in wall.drawn && !crack.test(path));
}

test("factors run on without a jump where levels meet and where a slope reaches the friction angle", () => {
  let crossed = 0;
  fc.assert(
    fc.property(fc.nat(), (seed) => {
      const tree = randomStudy(seed);
      const wall = openWall(tree);
      const next = drawsOf(seed + 1);
      for (const [path, value] of seams(tree, wall)) {
        // somewhere else in the space now and then, so that the seam is met in more than one way
        const other = Object.fromEntries(
          Object.entries(wall.drawn).map(([name, drawn]) => [
            name,
            /factors|unit_weight/.test(name) ? drawn * (0.8 + 0.4 * next()) : drawn,
          ]),
        );
        const [below, above] = [
          wall.at({ ...other, [path]: value - 1e-9 }),
          wall.at({ ...other, [path]: value + 1e-9 }),
        ];
        crossed++;
        for (const name of ["sliding", "overturning", "bearing"] as const) {
          const [a, b] = [below, above].map(({ limitStates }) => limitStates[name]?.factorOfSafety ?? Number.NaN);
          // square roots at β = φ move by the root of the step; elsewhere by the step
          const allowed = /friction_angle$/.test(path) ? 1e-3 : 1e-6;
          if (!(Math.abs(a - b) <= allowed * (1 + a) * (1 + b)))
            expect.fail(`${name} jumps from ${a} to ${b} where ${path} passes ${value} (study ${seed})`);
        }
      }
    }),
    { numRuns: 80, seed: 1 },
  );
  expect(crossed).toBeGreaterThan(1000);
});

test("factors run on without a jump under a small step of every value", () => {
  fc.assert(
    fc.property(fc.nat(), (seed) => {
      const tree = randomStudy(seed);
      const wall = openWall(tree);
      for (const [path, drawn] of Object.entries(wall.drawn)) {
        const [at, beside] = [wall.factorsAt({}), wall.factorsAt({ [path]: drawn * (1 + 1e-9) })];
        for (const name of ["sliding", "overturning", "bearing"] as const) {
          const [a, b] = [at[name] ?? Number.NaN, beside[name] ?? Number.NaN];
          if (!(Math.abs(a - b) <= 1e-5 * (1 + a) * (1 + b)))
            expect.fail(`${name} jumps from ${a} to ${b} where ${path} passes ${drawn} (study ${seed})`);
        }
      }
    }),
    { numRuns: 80, seed: 2 },
  );
});
