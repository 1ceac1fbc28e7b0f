import fc from "fast-check";
import { expect, test } from "vitest";
import {
  heelArea,
  heelMomentX,
  heelMomentZ,
  toeArea,
  toeMomentX,
  toeMomentZ,
} from "../../../src/mechanics/formulas/heel-area.ts";

const number = (min: number, max: number): fc.Arbitrary<number> => fc.double({ min, max, noNaN: true });

interface Corner {
  readonly x: number;
  readonly z: number;
}

/** Area and first moments of a polygon, by the sum over its sides. */
function polygon(corners: readonly Corner[]): { area: number; x: number; z: number } {
  let [area, x, z] = [0, 0, 0];
  corners.forEach((from, i) => {
    const to = corners[(i + 1) % corners.length];
    const cross = from.x * to.z - to.x * from.z;
    area += cross / 2;
    x += (cross * (from.x + to.x)) / 6;
    z += (cross * (from.z + to.z)) / 6;
  });
  return { area, x, z };
}

/** What of a convex polygon lies below a level. */
function below(corners: readonly Corner[], level: number): readonly Corner[] {
  return corners.flatMap((from, i) => {
    const to = corners[(i + 1) % corners.length];
    const kept = from.z <= level ? [from] : [];
    if (from.z <= level === to.z <= level) return kept;
    const share = (level - from.z) / (to.z - from.z);
    return [...kept, { x: from.x + share * (to.x - from.x), z: level }];
  });
}

const wall = fc.record({
  z: number(-1, 14),
  t: number(0, 1.5),
  height: number(0.5, 9),
  xFoot: number(0.2, 5),
  heel: fc.oneof(number(0, 6), fc.constant(0)),
  tanTheta: fc.oneof(number(0, 0.5), fc.constant(0)),
  tanBeta: fc.oneof(number(0, 1), fc.constant(0)),
});

test("area and moments over the heel are those of the polygon cut at the level", () => {
  fc.assert(
    fc.property(wall, ({ z, t, height, xFoot, heel, tanTheta, tanBeta }) => {
      const [zCrest, B] = [t + height, xFoot + heel];
      const xCrest = xFoot - height * tanTheta;
      const whole = [
        { x: xFoot, z: t },
        { x: B, z: t },
        { x: B, z: zCrest + (B - xCrest) * tanBeta },
        { x: xCrest, z: zCrest },
      ];
      const cut = polygon(below(whole, z));
      const of = (formula: typeof heelArea): number => formula(z, t, zCrest, xFoot, B, tanTheta, tanBeta);
      expect(Math.abs(of(heelArea) - cut.area)).toBeLessThan(1e-11);
      expect(Math.abs(of(heelMomentX) - cut.x)).toBeLessThan(1e-10);
      expect(Math.abs(of(heelMomentZ) - cut.z)).toBeLessThan(1e-10);
    }),
    { numRuns: 3000, seed: 1 },
  );
});

test("area and moments over the toe are those of the polygon cut at the level", () => {
  fc.assert(
    fc.property(wall, ({ z, t, height, xFoot: toe, tanTheta: frontSlope }) => {
      const zCrest = t + height;
      const whole = [
        { x: 0, z: t },
        { x: toe, z: t },
        { x: toe + height * frontSlope, z: zCrest },
        { x: 0, z: zCrest },
      ];
      const cut = polygon(below(whole, z));
      expect(Math.abs(toeArea(z, t, zCrest, toe, frontSlope) - cut.area)).toBeLessThan(1e-11);
      expect(Math.abs(toeMomentX(z, t, zCrest, toe, frontSlope) - cut.x)).toBeLessThan(1e-10);
      expect(Math.abs(toeMomentZ(z, t, zCrest, toe, frontSlope) - cut.z)).toBeLessThan(1e-10);
    }),
    { numRuns: 3000, seed: 2 },
  );
});

test("the area never falls with the level, and its centroid lies inside the base and below the level", () => {
  fc.assert(
    fc.property(wall, number(0, 3), ({ z, t, height, xFoot, heel, tanTheta, tanBeta }, more) => {
      const at = (level: number, formula: typeof heelArea): number =>
        formula(level, t, t + height, xFoot, xFoot + heel, tanTheta, tanBeta);
      const area = at(z, heelArea);
      expect(at(z + more, heelArea)).toBeGreaterThanOrEqual(area - 1e-12);
      expect(area).toBeGreaterThanOrEqual(0);
      expect(at(z, heelMomentX)).toBeLessThanOrEqual(area * (xFoot + heel) + 1e-12);
      expect(at(z, heelMomentZ)).toBeLessThanOrEqual(area * Math.max(z, t) + 1e-12);
      expect(at(z, heelMomentZ)).toBeGreaterThanOrEqual(area * t - 1e-12);
    }),
    { numRuns: 3000, seed: 3 },
  );
});
