import { describe, expect, test } from "vitest";
import { check } from "../../src/check.ts";
import { readDocument } from "../../src/study/read-study.ts";
import { gallery } from "../report/gallery.ts";

type Tree = Record<string, unknown>;
const base = gallery["nothing uncertain"] as Tree;
const wall = base.wall as Tree;
const ground = base.ground as Tree;

const notesOf = (changes: Tree): string =>
  check(readDocument({ ...base, ...changes }))
    .warnings.map(({ path, message }) => `${path}: ${message}`)
    .join("\n");

describe("notes on how a wall was taken", () => {
  test.each<[string, Tree, RegExp]>([
    [
      "a short heel",
      { wall: { ...wall, base: { toe: 1.6, heel: 1, thickness: 0.5 } } },
      /wall\.base\.heel: the heel is short: the wedge clears the stem only with a heel of 2\.77 m/,
    ],
    [
      "wall friction above the slope on the virtual back",
      { model: { earth_pressure: "coulomb", wall_friction: 15 } },
      /wall friction of 15\.0° on the virtual back is above the slope of 0\.0°.*unsafe side/,
    ],
    [
      "a key without passive resistance",
      { wall: { ...wall, shear_key: { depth: 0.4, width: 0.4, from_toe: 1.5 } } },
      /wall\.shear_key: the shear key adds its weight alone/,
    ],
    [
      "a key with passive resistance",
      {
        wall: { ...wall, shear_key: { depth: 0.4, width: 0.4, from_toe: 1.5 } },
        ground: { ...ground, front: { level: 0.9, mobilised: 0.3 } },
      },
      /driving pressure behind the key, below the underside, is left out/,
    ],
    [
      "a strip over the heel",
      { loads: { strips: [{ pressure: 20, from: 0.5, width: 4 }] } },
      /loads\.strips\.0: what of this load stands over the heel.*traffic must not help/,
    ],
    [
      "a line load over the heel",
      { loads: { lines: [{ force: 20, at: 0.5 }] } },
      /loads\.lines\.0: what of this load stands over the heel/,
    ],
    ["a surcharge behind the heel", {}, /loads\.surcharge: the surcharge pushes from behind the virtual back/],
    [
      "a surcharge on the heel",
      { loads: { surcharge: { pressure: 10, on_heel: true } } },
      /counted as a weight on the heel too/,
    ],
    ["pressure at rest", { model: { earth_pressure: "at_rest" } }, /describes a restrained wall/],
    [
      "a slope with layers",
      { ground: { ...ground, behind: { ...(ground.behind as Tree), slope: 10 } } },
      /Rankine's sloping pressure with layers or water is an approximation/,
    ],
    [
      "free water in an earthquake",
      { loads: { earthquake: { kh: 0.1, kv: 0 } }, water: { behind: { level: 1 }, front: { level: 1.2 } } },
      /free water in front moves in an earthquake/,
    ],
    ["the sign of kv", { loads: { earthquake: { kh: 0.1, kv: 0.05 } } }, /try both signs of kv/],
    [
      "a slope steeper than its soil",
      { ground: { ...ground, behind: { ...(ground.behind as Tree), slope: 34 } } },
      /steeper than a soil behind the wall can bear \(φ′ 32\.0°\)/,
    ],
  ])("%s", (_, changes, words) => {
    expect(notesOf(changes)).toMatch(words);
  });

  test("none of them where there is no cause", () => {
    const calm = {
      ...base,
      loads: undefined,
      water: undefined,
      wall: { ...wall, base: { toe: 0.8, heel: 3.2, thickness: 0.5 } },
    };
    expect(check(readDocument(calm)).warnings.filter(({ path }) => !path.startsWith("assessment"))).toEqual([]);
  });

  test("eccentricity without bearing", () => {
    expect(notesOf({ assessment: { limit_states: ["eccentricity"], eccentricity_limit: 0.3 } })).toContain(
      "normally comes after bearing failure",
    );
  });
});
