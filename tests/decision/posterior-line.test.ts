import { expect, test } from "vitest";
import { posteriorLine } from "../../src/decision/posterior-line.ts";
import { normalCdf, normalPdf } from "../../src/numeric/normal.ts";

const form = { offset: 0.4, row: Float64Array.of(0.3, 0.4) };

test("a correction that is normal again gives the straight line of the conjugate formula", () => {
  // k = 0.4 + 0.5 s, and a result of 1.4 with error 0.5: s has precision 1 + 1 and mean 1
  const at = posteriorLine({ form, logCorrection: (k) => -0.5 * ((1.4 - k) / 0.5) ** 2 });
  for (const xi of [-5, -2, 0, 1, 4]) expect(at(xi)).toBeCloseTo(1 + xi / Math.SQRT2, 4);
});

test("a cut below k = 0.4 gives the upper half of the normal, in both tails", () => {
  const at = posteriorLine({ form, logCorrection: (k) => (k < 0.4 ? -60 : 0) });
  for (const xi of [-3, -1, 0, 2, 4.5]) {
    const above = normalCdf(-at(xi));
    expect(above / (0.5 * normalCdf(-xi))).toBeCloseTo(1, 2);
  }
});

test("rises, and stretches by the ratio of the densities", () => {
  const logCorrection = (k: number): number => Math.log(0.2 * normalPdf(k + 1) + 0.8 * normalPdf((k - 1) / 0.3));
  const at = posteriorLine({ form, logCorrection });
  const density = (s: number): number => normalPdf(s) * Math.exp(logCorrection(0.4 + 0.5 * s));
  const slope = (xi: number): number => (at(xi + 0.01) - at(xi - 0.01)) / 0.02;
  const constant = (slope(0) * density(at(0))) / normalPdf(0);
  for (const xi of [-2.5, -1, 0.5, 2])
    expect((slope(xi) * density(at(xi))) / normalPdf(xi) / constant).toBeCloseTo(1, 2);
});
