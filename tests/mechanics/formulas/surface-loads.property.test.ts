import fc from "fast-check";
import { expect, test } from "vitest";
import {
  lineLoadMoment,
  lineLoadPressure,
  lineLoadThrust,
  stripLoadMoment,
  stripLoadPressure,
  stripLoadThrust,
} from "../../../src/mechanics/formulas/surface-loads.ts";
import { tanhSinhSplit } from "./tanh-sinh.ts";

const number = (min: number, max: number): fc.Arbitrary<number> => fc.double({ min, max, noNaN: true });

/** Splits a depth integral where a load at distance a changes fastest. */
const near = (a: number, height: number): readonly number[] => [0.1, 0.3, 1, 3].map((f) => (f * a) / height);

test("thrust and moment of a line are the integrals of its pressure", () => {
  fc.assert(
    fc.property(number(0.05, 40), number(0.1, 20), (a, height) => {
      const p = (share: number): number => lineLoadPressure(25, a, share * height);
      const thrust = height * tanhSinhSplit(p, near(a, height));
      const moment = height ** 2 * tanhSinhSplit((share) => p(share) * (1 - share), near(a, height));
      expect(Math.abs(lineLoadThrust(25, a, height) / thrust - 1)).toBeLessThan(1e-11);
      expect(Math.abs(lineLoadMoment(25, a, height) / moment - 1)).toBeLessThan(1e-11);
    }),
    { numRuns: 200, seed: 1 },
  );
});

test("thrust and moment of a strip are the integrals of its pressure", () => {
  fc.assert(
    fc.property(number(0, 20), number(0.1, 10), number(0.1, 20), (from, width, height) => {
      const p = (share: number): number => stripLoadPressure(25, from, from + width, share * height);
      const cuts = [...near(from, height), ...near(from + width, height)];
      const thrust = height * tanhSinhSplit(p, cuts);
      const moment = height ** 2 * tanhSinhSplit((share) => p(share) * (1 - share), cuts);
      // the pressure itself is a difference that loses digits where the strip is far away and the depth small
      const slack = 1e-13 * height;
      expect(Math.abs(stripLoadThrust(25, from, from + width, height) - thrust)).toBeLessThan(
        1e-11 * thrust + 25 * slack,
      );
      expect(Math.abs(stripLoadMoment(25, from, from + width, height) - moment)).toBeLessThan(
        1e-11 * moment + 25 * slack * height,
      );
    }),
    { numRuns: 200, seed: 2 },
  );
});

test("a strip is the sum of its two halves, and a narrow one is a line", () => {
  fc.assert(
    fc.property(number(0, 20), number(1e-3, 10), number(0.1, 20), number(0.01, 20), (from, width, height, depth) => {
      const [middle, to] = [from + width / 2, from + width];
      const slack = 1e-12 * 25 * (height + to) * height;
      const halves = (f: (p: number, a: number, b: number, h: number) => number, h: number): number =>
        f(25, from, middle, h) + f(25, middle, to, h) - f(25, from, to, h);
      expect(Math.abs(halves(stripLoadPressure, depth))).toBeLessThan(1e-12 * 25);
      expect(Math.abs(halves(stripLoadThrust, height))).toBeLessThan(slack + 1e-12);
      expect(Math.abs(halves(stripLoadMoment, height))).toBeLessThan(slack + 1e-12);
      const narrow = 1e-4;
      const at = from + 1;
      const line = lineLoadMoment(narrow * 25, at, height);
      expect(Math.abs(stripLoadMoment(25, at - narrow / 2, at + narrow / 2, height) - line)).toBeLessThan(
        1e-7 * line + 1e-12 * 25 * height * (height + at),
      );
    }),
    { numRuns: 2000, seed: 3 },
  );
});

test("the thrust acts within the plane, and pressures are neither negative nor above the strip's own", () => {
  fc.assert(
    fc.property(number(0, 100), number(0, 100), number(0, 50), number(0, 50), (from, width, height, depth) => {
      const q = stripLoadPressure(25, from, from + width, depth);
      expect(q >= -1e-13 && q <= 25 * (1 + 1e-14)).toBe(true);
      expect(lineLoadPressure(25, from, depth)).toBeGreaterThanOrEqual(0);
      for (const [force, moment] of [
        [lineLoadThrust(25, from, height), lineLoadMoment(25, from, height)],
        [stripLoadThrust(25, from, from + width, height), stripLoadMoment(25, from, from + width, height)],
      ]) {
        expect(force).toBeGreaterThanOrEqual(0);
        expect(moment).toBeGreaterThanOrEqual(-1e-12);
        expect(moment).toBeLessThanOrEqual(force * height * (1 + 1e-12) + 1e-12);
      }
    }),
    { numRuns: 5000, seed: 4 },
  );
});
