import { expect, test } from "vitest";
import { spread } from "../../../src/reliability/monte-carlo.ts";

test.each([
  [1e-2, 9900],
  [1e-3, 99_900],
  [7.2e-5, 1_388_789],
])("a probability of %d is known to 10 %% after %d samples and not one sooner", (p, samples) => {
  // the stop rule sees failures and samples; here the failures are those expected
  expect(spread(p * samples, samples)).toBeLessThanOrEqual(0.1 + 1e-12);
  expect(spread(p * (samples - 1), samples - 1)).toBeGreaterThan(0.1);
});
