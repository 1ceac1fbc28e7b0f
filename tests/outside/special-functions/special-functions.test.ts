import { expect, test } from "vitest";
import { logGamma } from "../../../src/numeric/gamma.ts";
import { betaLower, betaQuantile } from "../../../src/numeric/incomplete-beta.ts";
import { gammaLower, gammaQuantile, gammaUpper } from "../../../src/numeric/incomplete-gamma.ts";
import { studentUpper, studentUpperQuantile } from "../../../src/numeric/student-t.ts";
import { readCases } from "../cases.ts";

const functions: Record<string, (a: number, b: number, x: number) => number> = {
  log_gamma: (a) => logGamma(a),
  gamma_lower: (a, _, x) => gammaLower(a, x),
  gamma_upper: (a, _, x) => gammaUpper(a, x),
  beta_lower: (a, b, x) => betaLower(x, 1 - x, a, b),
  student_upper: (degrees, _, t) => studentUpper(t, degrees),
};
const rows = readCases(new URL("cases.csv", import.meta.url));

test.each(Object.keys(functions))("%s agrees with 40-digit arithmetic", (name) => {
  const own = rows.filter((row) => row.function === name);
  expect(own.length).toBeGreaterThan(4);
  for (const row of own) {
    const expected = Number(row.value);
    const found = functions[name](Number(row.a), Number(row.b), Number(row.x));
    const allowed = 1e-13 + 2e-15 * Math.abs(Math.log(expected));
    expect(Math.abs(found / expected - 1), JSON.stringify(row)).toBeLessThan(allowed);
  }
});

test("printed percentage points of chi-square and Student's t come back", () => {
  expect(2 * gammaQuantile(5, 0.05, true)).toBeCloseTo(18.307, 3); // 10 degrees of freedom
  expect(2 * gammaQuantile(0.5, 0.01, true)).toBeCloseTo(6.6349, 4); // 1
  expect(2 * gammaQuantile(15, 0.995, true)).toBeCloseTo(13.7867, 4); // 30
  expect(studentUpperQuantile(0.025, 3)).toBeCloseTo(3.182, 3);
  expect(studentUpperQuantile(0.05, 9)).toBeCloseTo(1.833, 3);
  expect(studentUpperQuantile(0.005, 29)).toBeCloseTo(2.756, 3);
});

test("the quantile of the beta distribution of one success in ten is the one in closed form", () => {
  const { x, y } = betaQuantile(0.975, 1, 10);
  expect(y).toBeCloseTo(0.025 ** 0.1, 14); // 1 − (1 − x)^10 = 0.975, analytic
  expect(x + y).toBeCloseTo(1, 15);
});
