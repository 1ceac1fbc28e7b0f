import { expect, test } from "vitest";
import { clopperPearson } from "../../../src/numeric/clopper-pearson.ts";
import { betaQuantile } from "../../../src/numeric/incomplete-beta.ts";

test("the posterior after no failure in twenty has the printed upper limit and mean", () => {
  expect(Math.abs(betaQuantile(0.95, 1, 21).x - 0.1329459)).toBeLessThan(0.51e-7);
  // mean from the quantile function itself, by the midpoint rule
  let mean = 0;
  for (let k = 0; k < 20_000; k++) mean += betaQuantile((k + 0.5) / 20_000, 1, 21).x / 20_000;
  expect(Math.abs(mean - 0.0454545)).toBeLessThan(1e-5);
});

test("the interval shown with no failure is wider than the posterior's, and never 0", () => {
  const [low, high] = clopperPearson(0, 20);
  expect(low).toBe(0);
  expect(Math.abs(high - 0.1684335)).toBeLessThan(0.51e-7);
});
