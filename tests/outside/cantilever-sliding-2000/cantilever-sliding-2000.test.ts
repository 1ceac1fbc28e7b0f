import { expect, test } from "vitest";
import { firstOrderSecondMoment, secondMomentIndices } from "../../../src/reliability/second-moment.ts";
import { problemOf } from "../../reliability/known-problems.ts";

test("a factor of 1.50 with a coefficient of variation of 17 % slides with a probability of about 1 %", () => {
  const found = secondMomentIndices(1.5, 0.17 * 1.5);
  expect(found.reliabilityIndexLognormal).toBeCloseTo(2.32, 2);
  expect(found.probabilityLognormal).toBeCloseTo(0.0102, 4);
});

test("fluid unit weight and base friction move the factor as by hand", () => {
  const distributions = {
    "fluid.unit_weight": { kind: "normal", mean: 45, sd: 5 },
    "base.tan_delta": { kind: "normal", mean: 0.5, sd: 0.05 },
  } as const;
  const { states, space } = problemOf(distributions, {
    sliding: ([weight, tan]) => (1.5 * (tan / 0.5)) / (weight / 45),
  });
  const [found] = firstOrderSecondMoment(states, space, () => 0);
  const [fluid, friction] = [(1.6875 - 1.35) / 2, (1.65 - 1.35) / 2];
  expect(found.sd).toBeCloseTo(Math.hypot(fluid, friction), 12); // 0.2258, V 15.1 %
  expect(found.sd).toBeCloseTo(0.2258, 4);
  expect(found.contributions["fluid.unit_weight"]).toBeCloseTo(fluid ** 2 / 0.2258 ** 2, 3);
});
