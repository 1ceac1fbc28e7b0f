import { expect, test } from "vitest";
import { mean, meanOfLine, meanOfPressure, pressureAt } from "../../../src/mechanics/formulas/sloping-cohesive-mean.ts";
import { radians } from "../../outside/cases.ts";
import { tanhSinh } from "./tanh-sinh.ts";

test("the means of a straight line are those of its ends", () => {
  meanOfLine(3, 9);
  expect([...mean]).toEqual([6, 3.5]); // ∫ (3 + 6 ξ) ξ dξ = 3/2 + 2
});

/** Every way the mean is taken: friction angle, slope, cohesion, and the stretch as multiples of s*. */
const ways: Readonly<Record<string, readonly [phiDeg: number, betaDeg: number, c: number, from: number, to: number]>> =
  {
    "a short stretch of a stable slope, 8 points": [30, 10, 10, 2, 3],
    "a longer one, 16 points": [30, 10, 10, 1, 8],
    "a long one with a second root far away, 16 points": [30, 29.9999, 10, 1, 1e3],
    "a long one with a second root near by, closed": [30, 5, 10, 1, 60],
    "a very long one, closed": [40, 20, 0.01, 1, 1e6],
    "a slope at the friction angle": [30, 30, 10, 1, 50],
    "level ground": [30, 0, 10, 1, 50],
    "no friction on level ground, both roots at infinity": [0, 0, 10, 1, 50],
    "a slope steeper than the friction angle, up to the limit": [20, 30, 10, 1, 0],
    "a stretch that ends just short of the limit": [20, 30, 10, 1, -0.999999],
  };

for (const [title, [phiDeg, betaDeg, c, from, to]] of Object.entries(ways))
  test(`the means of the pressure: ${title}`, () => {
    const [sinPhi, cosPhi] = [Math.sin(radians(phiDeg)), Math.cos(radians(phiDeg))];
    const [sinBeta, cosBeta] = [Math.sin(radians(betaDeg)), Math.cos(radians(betaDeg))];
    const turning = (2 * c * (1 + sinPhi)) / cosPhi;
    const limit = (c * cosPhi) / (cosBeta * (sinBeta * cosPhi - cosBeta * sinPhi));
    const sa = from * turning;
    const sb = to > 0 ? to * turning : to === 0 ? limit : -to * limit;
    const p = (xi: number): number =>
      pressureAt(sa + xi * (sb - sa), sa - turning + xi * (sb - sa), c, sinPhi, cosPhi, sinBeta, cosBeta);
    // graded panels, so that the square root near the lower end of a long stretch is seen
    const cuts = [0, 1e-6, 1e-5, 1e-4, 1e-3, 1e-2, 0.1, 1];
    let [plain, weighted] = [0, 0];
    for (let i = 1; i < cuts.length; i++) {
      plain += tanhSinh(p, cuts[i - 1], cuts[i]);
      weighted += tanhSinh((xi) => p(xi) * xi, cuts[i - 1], cuts[i]);
    }
    const slope = (cosBeta * (2 * cosBeta ** 2 - cosPhi ** 2)) / cosPhi ** 2;
    meanOfPressure(sa, sb, turning, c, sinPhi, cosPhi, sinBeta, cosBeta, (2 * c * cosBeta * sinPhi) / cosPhi, slope);
    expect(Math.abs(mean[0] / plain - 1)).toBeLessThan(1e-12);
    expect(Math.abs(mean[1] / weighted - 1)).toBeLessThan(1e-12);
  });
