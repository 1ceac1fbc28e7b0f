import fc from "fast-check";
import { expect, test } from "vitest";
import { activeCoefficientCoulomb } from "../../../src/mechanics/formulas/coulomb.ts";
import { radians } from "../../outside/cases.ts";

const degrees = (min: number, max: number): fc.Arbitrary<number> =>
  fc.double({ min, max, noNaN: true }).map((deg) => radians(deg));
const face = fc.tuple(degrees(5, 60), degrees(0, 1), degrees(0, 25), degrees(0, 1));

/**
 * Thrust of one plane wedge of unit height and unit weight, by equilibrium of weight, wall force and slip force: the
 * active coefficient is twice the largest of them.
 */
function wedgeThrust(slip: number, phi: number, delta: number, theta: number, beta: number): number {
  // corners: foot (0, 0), crest (−tan θ, 1), and where the slip plane at `slip` to the horizontal meets the surface
  const along = (1 + Math.tan(theta) * Math.tan(beta)) / (Math.sin(slip) - Math.cos(slip) * Math.tan(beta));
  const area = 0.5 * along * (Math.cos(slip) + Math.tan(theta) * Math.sin(slip));
  const wallForce = delta + theta; // its inclination to the horizontal
  return (area * Math.sin(slip - phi)) / Math.cos(slip - phi - wallForce);
}

test("it is the largest thrust of all plane wedges", () => {
  fc.assert(
    fc.property(face, ([phi, deltaShare, theta, betaShare]) => {
      const delta = (deltaShare / radians(1)) * phi * 0.66;
      const beta = (betaShare / radians(1)) * phi * 0.9;
      const k = activeCoefficientCoulomb(phi, delta, theta, beta);
      let largest = 0;
      const [from, to] = [Math.max(phi, beta) + 1e-4, Math.PI / 2 + theta - 1e-4];
      for (let i = 0; i <= 2000; i++) {
        const thrust = wedgeThrust(from + ((to - from) * i) / 2000, phi, delta, theta, beta);
        largest = Math.max(largest, 2 * thrust);
      }
      expect(largest / k).toBeLessThanOrEqual(1 + 1e-12);
      expect(largest / k).toBeGreaterThan(1 - 1e-4);
    }),
    { numRuns: 300, seed: 1 },
  );
});

test("more friction never raises it, a steeper slope never lowers it", () => {
  const shares = fc.tuple(degrees(0, 60), degrees(0, 40), degrees(0, 30), degrees(0, 45), degrees(0, 10));
  fc.assert(
    fc.property(shares, ([phi, delta, theta, beta, more]) => {
      fc.pre(beta + more <= phi && delta + theta < radians(80)); // active states; beyond, the root is 0 by convention
      const k = activeCoefficientCoulomb(phi, delta, theta, beta);
      const stronger = Math.min(phi + more, radians(60));
      expect(activeCoefficientCoulomb(phi, delta, theta, beta + more)).toBeGreaterThanOrEqual(k * (1 - 1e-12));
      if (theta < phi)
        expect(activeCoefficientCoulomb(stronger, delta, theta, beta)).toBeLessThanOrEqual(k * (1 + 1e-12));
    }),
    { numRuns: 5000, seed: 2 },
  );
});

test("it is finite and not negative over the whole physical range", () => {
  fc.assert(
    fc.property(degrees(0, 60), degrees(0, 60), degrees(0, 45), degrees(0, 60), (phi, delta, theta, beta) => {
      const k = activeCoefficientCoulomb(phi, delta, theta, beta);
      expect(k >= 0 && k < 200).toBe(true);
    }),
    { numRuns: 5000, seed: 3 },
  );
});
