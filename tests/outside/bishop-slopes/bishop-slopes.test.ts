import { expect, test } from "vitest";
import { makeArc } from "../../../src/mechanics/deep-seated/arc.ts";
import {
  circleOnSlope,
  type PlainSlope,
  slopeFactor,
  slopeProfile,
  smallestOnSlope,
} from "../../mechanics/deep-seated/plain-slope.ts";
import { disagreement, radians, readCases } from "../cases.ts";

const cases = readCases(new URL("cases.csv", import.meta.url));
const slopeOf = (row: Readonly<Record<string, string>>): PlainSlope => {
  const unitWeight = Number(row.unit_weight);
  const soil = {
    unitWeight,
    saturatedUnitWeight: unitWeight,
    frictionAngle: radians(row.friction_deg),
    cohesion: Number(row.cohesion),
  };
  return { height: Number(row.height), run: Number(row.run), layers: [{ soil }] };
};

test("published factors of slopes are found again", () => {
  const wrong = cases.map((row) => {
    const slope = slopeOf(row);
    const profile = slopeProfile(slope);
    const found =
      row.kind === "one_circle"
        ? slopeFactor(profile, makeArc(profile), circleOnSlope(slope, Number(row.x), Number(row.z), Number(row.radius)))
        : smallestOnSlope(slope, 0).factor;
    return disagreement(row.kind, found, row.factor, Number(row.tolerance));
  });
  expect(wrong).toEqual(["", ""]);
});

/** The circle of Fredlund and Krahn by plain slices of equal width, normal forces as they come. */
function plainSlices(count: number, cut: boolean): number {
  const [x, z, radius, cohesion, unitWeight] = [20, 70, 80, 600, 120];
  const tan = Math.tan(radians(20));
  const from = x - Math.sqrt(radius ** 2 - z ** 2);
  const width = (x + Math.sqrt(radius ** 2 - (z - 40) ** 2) - from) / count;
  const slices = Array.from({ length: count }, (_, i) => {
    const at = from + (i + 0.5) * width;
    const angle = Math.asin((at - x) / radius);
    const surface = Math.min(Math.max(at / 2, 0), 40);
    return { angle, weight: unitWeight * width * (surface - z + radius * Math.cos(angle)) };
  });
  const driving = slices.reduce((sum, { angle, weight }) => sum + weight * Math.sin(angle), 0);
  let factor = 1;
  for (let i = 0; i < 100; i++) {
    const resisting = slices.reduce((sum, { angle, weight }) => {
      const tilt = Math.cos(angle) + (Math.sin(angle) * tan) / factor;
      const normal = (weight - (cohesion * width * Math.tan(angle)) / factor) / tilt;
      return sum + (cohesion * width) / Math.cos(angle) + (cut ? Math.max(normal, 0) : normal) * tan;
    }, 0);
    factor = resisting / driving;
  }
  return factor;
}

test("the published circle lies between thin slices with and without the limit on the normal force", () => {
  const slope = slopeOf(cases[1]);
  const profile = slopeProfile(slope);
  const found = slopeFactor(profile, makeArc(profile), circleOnSlope(slope, 20, 70, 80));
  expect(found).toBeCloseTo(plainSlices(50_000, true), 4);
  expect(plainSlices(50_000, false)).toBeCloseTo(2.0756, 4);
  expect(plainSlices(50_000, false)).toBeLessThan(2.08);
  expect(found).toBeGreaterThan(2.08);
});

test("a long shallow circle in dry ground without cohesion has the factor of the infinite slope", () => {
  const soil = { unitWeight: 19, saturatedUnitWeight: 21, frictionAngle: radians(35), cohesion: 0 };
  const slope: PlainSlope = { height: 10, run: 20, layers: [{ soil }] };
  const profile = slopeProfile(slope);
  const arc = makeArc(profile);
  // through two points of the slope, its centre far above
  const errors = [50, 500, 5000].map((radius) => {
    const [mx, mz, half] = [10, 5, 0.4 * Math.hypot(10, 20)];
    const rise = Math.sqrt(radius ** 2 - half ** 2);
    const [nx, nz] = [-10 / Math.hypot(10, 20), 20 / Math.hypot(10, 20)];
    const [dx, dz] = [half * nz, -half * nx];
    const circle = {
      x: mx + nx * rise,
      z: mz + nz * rise,
      radius,
      entryX: mx + dx,
      entryZ: mz + dz,
      exitX: mx - dx,
      exitZ: mz - dz,
    };
    return slopeFactor(profile, arc, circle) / (Math.tan(radians(35)) / 0.5) - 1;
  });
  expect(errors[0]).toBeGreaterThan(errors[1]);
  expect(errors[1]).toBeGreaterThan(errors[2]);
  expect(Math.abs(errors[2])).toBeLessThan(1e-5);
});
