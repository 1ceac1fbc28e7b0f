import fc from "fast-check";
import { expect, test } from "vitest";
import * as bearing from "../../../src/mechanics/formulas/bearing-factors.ts";
import { radians } from "../../outside/cases.ts";

const number = (min: number, max: number): fc.Arbitrary<number> => fc.double({ min, max, noNaN: true });

const factors = {
  Nq: bearing.bearingFactorNq,
  Nc: bearing.bearingFactorNc,
  "Nγ of Vesić": bearing.bearingFactorNgammaVesic,
  "Nγ of EN 1997-1": bearing.bearingFactorNgammaEn1997,
  "Nγ of Meyerhof": bearing.bearingFactorNgammaMeyerhof,
};

for (const [name, factor] of Object.entries(factors))
  test(`${name} is finite and rises with the friction angle`, () => {
    fc.assert(
      fc.property(number(0, 60), number(0, 60), (a, b) => {
        const [low, high] = [factor(radians(Math.min(a, b))), factor(radians(Math.max(a, b)))];
        expect(Number.isFinite(low) && Number.isFinite(high)).toBe(true);
        expect(high).toBeGreaterThanOrEqual(low * (1 - 1e-13));
      }),
      { numRuns: 1000, seed: 1 },
    );
  });

test("every inclination factor lies between 0 and 1 and never rises with the push", () => {
  fc.assert(
    fc.property(
      fc.record({ n: number(0, 2000), width: number(-2, 20), c: number(0, 1000), phi: number(0.1, 60) }),
      number(0, 1500),
      number(0, 500),
      ({ n, width, c, phi: deg }, h, more) => {
        const phi = radians(deg);
        const of = (push: number): readonly number[] => {
          const bracket = bearing.inclinationBase(push, n, width, c, 1 / Math.tan(phi));
          const iq = bearing.inclinationNq(bracket);
          const alpha = Math.atan2(push, n);
          return [
            iq,
            bearing.inclinationNgamma(bracket),
            bearing.inclinationNc(iq, bearing.bearingFactorNc(phi), Math.tan(phi)),
            bearing.meyerhofInclinationNq(alpha),
            bearing.meyerhofInclinationNgamma(alpha, phi),
            bearing.undrainedInclination(push, width, c),
          ];
        };
        const [less, greater] = [of(h), of(h + more)];
        less.forEach((factor, k) => {
          expect(factor >= 0 && factor <= 1).toBe(true);
          expect(greater[k]).toBeLessThanOrEqual(factor + 1e-15);
        });
      },
    ),
    { numRuns: 5000, seed: 2 },
  );
});
