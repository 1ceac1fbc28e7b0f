import { expect, test } from "vitest";
import { makeArc } from "../../../src/mechanics/deep-seated/arc.ts";
import { deepSeated } from "../../../src/mechanics/deep-seated/deep-seated.ts";
import { descend } from "../../../src/mechanics/deep-seated/nelder-mead.ts";
import { profileOf } from "../../../src/mechanics/deep-seated/profile.ts";
import { zoneOf } from "../../../src/mechanics/deep-seated/zone.ts";
import { slopeFactor, smallestOnSlope } from "../../mechanics/deep-seated/plain-slope.ts";
import { ordinaryGround, undrained } from "../../mechanics/deep-seated/random-ground.ts";
import { disagreement, radians, readCases } from "../cases.ts";

const clay = undrained(1, 1);

test("the smallest factor over circles gives Taylor's stability numbers to their printed digits", () => {
  const wrong = readCases(new URL("cases.csv", import.meta.url)).flatMap((row) => {
    const steepness = Number(row.slope_deg);
    const run = steepness === 90 ? 0 : 1 / Math.tan(radians(steepness));
    const lowest = steepness > 53 ? -1 : -100; // a steep slope fails through its toe
    const { factor } = smallestOnSlope({ height: 1, run, layers: [{ soil: clay }] }, lowest);
    return disagreement(`${row.slope_deg}°`, 1 / factor, row.stability_number);
  });
  expect(wrong.filter((text) => text !== "")).toEqual([]);
});

/** Level ground of weight 1 and strength 1, loaded by 1 kPa right of x = 0. */
function loadedHalfPlane() {
  const zone = zoneOf([{ soil: clay }]);
  return profileOf({
    edges: [-50, 0, 50],
    zoneAt: () => zone,
    columnAt: (x) => ({ mass: 0, moment: 0, load: x > 0 ? 1 : 0 }),
    waterLineAt: () => Number.NEGATIVE_INFINITY,
    lines: [],
    loadEdges: [],
    frontWater: Number.NEGATIVE_INFINITY,
    kh: 0,
    kv: 0,
  });
}

test("a load over half of level ground fails at 5.52 c, on the circle that Fellenius found", () => {
  const profile = loadedHalfPlane();
  const arc = makeArc(profile);
  const factorOf = ([x, z, radius]: Float64Array): number => {
    const half = Math.sqrt(radius * radius - z * z);
    if (!(z >= 0 && half > 0 && radius < 40)) return Number.POSITIVE_INFINITY;
    return slopeFactor(profile, arc, { x, z, radius, entryX: x + half, entryZ: 0, exitX: x - half, exitZ: 0 });
  };
  let found = descend(factorOf, [1, 3, 6], [1, 1, 1], 1e-13, 500);
  for (let i = 0; i < 5; i++) found = descend(factorOf, found.x, [0.3, -0.3, 0.3], 1e-13, 500);
  expect(disagreement("q/c", found.value, "5.52")).toBe("");
  expect(found.value).toBeCloseTo(5.520201, 5);
  expect(Math.acos(found.x[1] / found.x[2])).toBeCloseTo(1.16556, 3);
});

test("one circle through loaded level ground has the factor of its closed form", () => {
  const profile = loadedHalfPlane();
  const [omega, half] = [1, 7];
  const radius = half / Math.sin(omega);
  const circle = { x: 0, z: radius * Math.cos(omega), radius, entryX: half, entryZ: 0, exitX: -half, exitZ: 0 };
  expect(slopeFactor(profile, makeArc(profile), circle)).toBeCloseTo((4 * omega) / Math.sin(omega) ** 2, 9);
});

test("the full search over walls finds the vertical cut's 0.261 too", () => {
  const strong = undrained(30, 18);
  const { factor } = deepSeated(
    ordinaryGround({
      wall: {
        stemHeight: 1,
        crestWidth: 0.01,
        footWidth: 0.01,
        backRun: 0,
        toe: 0,
        heel: 0,
        thickness: 0,
        unitWeight: 18,
      },
      behind: { slope: 0, layers: [{ soil: strong }] },
      below: [{ soil: strong }],
      firmLevel: -3,
      front: { level: 0, ignoreTop: 1, toeSoil: true, soil: strong },
      water: {},
      loads: { surcharge: 0, strips: [], lines: [] },
    }),
  );
  expect(Math.abs(30 / (factor * 18 * 2) / 0.261 - 1)).toBeLessThan(0.005);
});
