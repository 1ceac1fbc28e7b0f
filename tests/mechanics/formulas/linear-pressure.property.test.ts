import fc from "fast-check";
import { expect, test } from "vitest";
import {
  positiveCentre,
  positiveForce,
  positiveLength,
  positiveMoment,
  zeroCrossing,
} from "../../../src/mechanics/formulas/linear-pressure.ts";
import { tanhSinhSplit } from "./tanh-sinh.ts";

const pressure = fc.oneof(
  fc.double({ min: -300, max: 500, noNaN: true }).map((p) => (Math.abs(p) < 1e-9 ? 0 : p)),
  fc.constant(0),
);
const length = fc.double({ min: 0.01, max: 20, noNaN: true });

test("force and moment are the integrals of the positive pressure", () => {
  fc.assert(
    fc.property(pressure, pressure, length, (p0, p1, l) => {
      const p = (x: number): number => Math.max(p0 + (p1 - p0) * x, 0);
      const splits = p0 === p1 ? [] : [p0 / (p0 - p1)];
      const [force, moment] = [tanhSinhSplit(p, splits) * l, tanhSinhSplit((x) => p(x) * (1 - x), splits) * l * l];
      const slack = 1e-12 * (Math.abs(p0) + Math.abs(p1) + 1e-80);
      expect(Math.abs(positiveForce(p0, p1, l) - force)).toBeLessThan(slack * l);
      expect(Math.abs(positiveMoment(p0, p1, l) - moment)).toBeLessThan(slack * l * l);
    }),
    { numRuns: 1000, seed: 1 },
  );
});

test("moment, length and centre of a stretch and of its mirror belong together", () => {
  fc.assert(
    fc.property(pressure, pressure, length, (p0, p1, l) => {
      const force = positiveForce(p0, p1, l);
      expect(positiveForce(p1, p0, l)).toBeCloseTo(force, 9);
      expect(positiveMoment(p0, p1, l) + positiveMoment(p1, p0, l)).toBeCloseTo(force * l, 8);
      expect(positiveLength(p1, p0, l)).toBeCloseTo(positiveLength(p0, p1, l), 12);
      if (force > 0) expect(positiveCentre(p0, p1, l) + positiveCentre(p1, p0, l)).toBeCloseTo(l, 11);
    }),
    { numRuns: 3000, seed: 2 },
  );
});

test("the crossing lies where the positive length begins", () => {
  fc.assert(
    fc.property(pressure, pressure, length, (p0, p1, l) => {
      const crossing = zeroCrossing(p0, p1, l);
      expect(crossing >= 0 && crossing <= l).toBe(true);
      if (p0 <= 0 && p1 > 0) expect(crossing + positiveLength(p0, p1, l)).toBeCloseTo(l, 12);
      expect(crossing === 0 || p0 <= 0).toBe(true);
    }),
    { numRuns: 3000, seed: 3 },
  );
});

test("a stretch cut in two has the same force and moment", () => {
  fc.assert(
    fc.property(pressure, pressure, length, fc.double({ min: 0, max: 1, noNaN: true }), (p0, p1, l, share) => {
      const p = p0 + (p1 - p0) * share;
      const [upper, lower] = [l * share, l * (1 - share)];
      const force = positiveForce(p0, p, upper);
      expect(Math.abs(force + positiveForce(p, p1, lower) - positiveForce(p0, p1, l))).toBeLessThan(1e-11 * 500 * l);
      expect(
        Math.abs(
          positiveMoment(p0, p, upper) + force * lower + positiveMoment(p, p1, lower) - positiveMoment(p0, p1, l),
        ),
      ).toBeLessThan(1e-11 * 500 * l * l);
    }),
    { numRuns: 3000, seed: 4 },
  );
});
