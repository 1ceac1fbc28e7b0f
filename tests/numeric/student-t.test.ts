import { expect, test } from "vitest";
import { integrate } from "../../src/numeric/gauss-legendre.ts";
import { studentDensity, studentUpper, studentUpperQuantile } from "../../src/numeric/student-t.ts";

test("one and two degrees of freedom have closed forms, in the tail too", () => {
  for (const t of [0.1, 1, 7, 1e5]) {
    expect(studentUpper(t, 1) / (Math.atan(1 / t) / Math.PI)).toBeCloseTo(1, 12); // Cauchy
    const w = Math.sqrt(2 + t * t);
    expect(studentUpper(t, 2) / (1 / (w * (w + t)))).toBeCloseTo(1, 12);
  }
});

test("the lower tail mirrors the upper, far out nothing is left", () => {
  expect(studentUpper(-2, 5)).toBeCloseTo(1 - studentUpper(2, 5), 15);
  expect(studentUpper(1e200, 5)).toBe(0);
  expect(studentUpperQuantile(0.5, 4)).toBe(0);
  expect(studentUpperQuantile(0.9, 4)).toBeCloseTo(-studentUpperQuantile(0.1, 4), 14);
});

test("the density is the slope of the chance", () => {
  const mass = integrate((t) => studentDensity(t, 3), 0.5, 1.5, 30);
  expect(mass).toBeCloseTo(studentUpper(0.5, 3) - studentUpper(1.5, 3), 13);
});

test("quantiles undo the tail down to 1e-15", () => {
  for (const degrees of [3, 4, 9, 60]) {
    for (const q of [1e-15, 1e-9, 1e-3, 0.2, 0.49]) {
      expect(studentUpper(studentUpperQuantile(q, degrees), degrees) / q).toBeCloseTo(1, 11);
    }
  }
});
