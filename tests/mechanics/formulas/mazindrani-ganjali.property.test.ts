import fc from "fast-check";
import { expect, test } from "vitest";
import {
  slopeUnstable,
  slopingCohesiveForce,
  slopingCohesiveMoment,
  slopingCohesivePressure,
} from "../../../src/mechanics/formulas/mazindrani-ganjali.ts";
import { radians } from "../../outside/cases.ts";
import { tanhSinhSplit } from "./tanh-sinh.ts";

const number = (min: number, max: number): fc.Arbitrary<number> => fc.double({ min, max, noNaN: true });
const stress = fc.oneof(number(0, 300), fc.constant(0), number(-50, 3000));
const cohesion = fc.oneof(number(0.01, 60), number(0, 1000), fc.constant(0));
const friction = fc.oneof(number(0, 60), fc.constantFrom(0, 30, 60)).map(radians);
const slope = fc.oneof(number(0, 60), fc.constantFrom(0, 30, 45, 60)).map(radians);
const ground = fc.tuple(stress, stress, cohesion, friction, slope);

/** Allowance for what the rounding of stress and angles moves by itself. */
const rounding = (...sizes: readonly number[]): number => 1e-12 * Math.max(1e-80, ...sizes.map(Math.abs));

test("force and moment are the integrals of the positive pressure", () => {
  fc.assert(
    fc.property(ground, ([s0, s1, c, phi, beta]) => {
      const length = 3;
      const stressesOfKinks = [
        0,
        2 * c * Math.tan(Math.PI / 4 + phi / 2), // turns positive
        (c * Math.cos(phi)) / (Math.cos(beta) * Math.sin(beta - phi)), // the active state ends
        (2 * c * Math.cos(phi) * Math.sin(phi)) / (Math.cos(phi) ** 2 - 2 * Math.cos(beta) ** 2), // positive no longer
      ];
      const splits = s0 === s1 ? [] : stressesOfKinks.map((s) => (s - s0) / (s1 - s0));
      const p = (x: number): number => Math.max(slopingCohesivePressure(s0 + (s1 - s0) * x, c, phi, beta), 0);
      const force = length * tanhSinhSplit(p, splits);
      const moment = length ** 2 * tanhSinhSplit((x) => p(x) * (1 - x), splits);
      const slack = rounding(s0, s1, c);
      expect(Math.abs(slopingCohesiveForce(s0, s1, length, c, phi, beta) - force)).toBeLessThanOrEqual(
        1e-10 * force + slack * length,
      );
      expect(Math.abs(slopingCohesiveMoment(s0, s1, length, c, phi, beta) - moment)).toBeLessThanOrEqual(
        1e-10 * moment + slack * length ** 2,
      );
    }),
    { numRuns: 1000, seed: 1 },
  );
});

test("a stretch cut in two has the same force and moment", () => {
  fc.assert(
    fc.property(ground, number(0, 1), ([s0, s1, c, phi, beta], share) => {
      const length = 5;
      const cut = s0 + (s1 - s0) * share;
      const upper = slopingCohesiveForce(s0, cut, length * share, c, phi, beta);
      const lower = slopingCohesiveForce(cut, s1, length * (1 - share), c, phi, beta);
      const moment =
        slopingCohesiveMoment(s0, cut, length * share, c, phi, beta) +
        upper * length * (1 - share) +
        slopingCohesiveMoment(cut, s1, length * (1 - share), c, phi, beta);
      const slack = rounding(s0, s1, c) * length;
      const whole = slopingCohesiveForce(s0, s1, length, c, phi, beta);
      expect(Math.abs(upper + lower - whole)).toBeLessThanOrEqual(1e-12 * whole + slack);
      expect(Math.abs(moment - slopingCohesiveMoment(s0, s1, length, c, phi, beta))).toBeLessThanOrEqual(
        1e-12 * whole * length + slack * length,
      );
    }),
    { numRuns: 3000, seed: 2 },
  );
});

test("turning the stretch over mirrors the moment", () => {
  fc.assert(
    fc.property(ground, ([s0, s1, c, phi, beta]) => {
      const force = slopingCohesiveForce(s0, s1, 2, c, phi, beta);
      const both = slopingCohesiveMoment(s0, s1, 2, c, phi, beta) + slopingCohesiveMoment(s1, s0, 2, c, phi, beta);
      expect(Math.abs(both - 2 * force)).toBeLessThanOrEqual(1e-12 * force + rounding(s0, s1, c));
    }),
    { numRuns: 3000, seed: 3 },
  );
});

test("cohesion and friction never raise the pressure, stress never lowers it, on a stable slope", () => {
  fc.assert(
    fc.property(ground, number(0, 20), ([s, , c, phi, beta], more) => {
      const p = slopingCohesivePressure(s, c, phi, beta);
      fc.pre(p > 0 && !slopeUnstable(s + more, c, phi, beta)); // the tension that is cut off does not run one way
      const slack = rounding(s, c, more);
      expect(slopingCohesivePressure(s, c + more, phi, beta)).toBeLessThanOrEqual(p + slack);
      expect(slopingCohesivePressure(s + more, c, phi, beta)).toBeGreaterThanOrEqual(p - slack);
      const stiffer = Math.min(phi + radians(more), radians(60));
      expect(slopingCohesivePressure(s, c, stiffer, beta)).toBeLessThanOrEqual(p + slack);
    }),
    { numRuns: 3000, seed: 4 },
  );
});

test("force and moment are finite, not negative, and the force acts within the stretch", () => {
  fc.assert(
    fc.property(ground, number(0, 20), ([s0, s1, c, phi, beta], length) => {
      const force = slopingCohesiveForce(s0, s1, length, c, phi, beta);
      const moment = slopingCohesiveMoment(s0, s1, length, c, phi, beta);
      expect(Number.isFinite(force) && force >= 0).toBe(true);
      expect(moment >= 0 && moment <= force * length * (1 + 1e-12) + 1e-300).toBe(true);
    }),
    { numRuns: 3000, seed: 5 },
  );
});

test("force and moment are continuous in every argument where there is cohesion", () => {
  const turn = number(-1e-9, 1e-9);
  fc.assert(
    fc.property(ground, number(0.01, 60), fc.tuple(turn, turn, turn, turn, turn), ([s0, s1, , phi, beta], c, by) => {
      fc.pre(Math.abs(s1 - s0) > 1e-3); // at equal ends a pressure that just turns positive may take all or nothing, of 0
      const moved: [number, number, number, number, number, number] = [
        s0 + by[0],
        s1 + by[1],
        3,
        c + by[2],
        Math.max(phi + by[3] / 50, 0),
        Math.max(beta + by[4] / 50, 0),
      ];
      // p has square-root branches: a step of 1e-9 can move it by the root of that, times its size
      const allowed = 3 * Math.sqrt(1e-9) * (10 + Math.abs(s0) + Math.abs(s1) + c);
      const force = slopingCohesiveForce(s0, s1, 3, c, phi, beta);
      const moment = slopingCohesiveMoment(s0, s1, 3, c, phi, beta);
      expect(Math.abs(slopingCohesiveForce(...moved) - force)).toBeLessThan(allowed);
      expect(Math.abs(slopingCohesiveMoment(...moved) - moment)).toBeLessThan(3 * allowed);
    }),
    { numRuns: 3000, seed: 6 },
  );
});
