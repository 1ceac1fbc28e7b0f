import { expect, test } from "vitest";
import { defaults, limitStateNames } from "../../src/study/defaults.ts";

test("limit states that stand by default are limit states", () => {
  expect(limitStateNames).toHaveLength(5);
  for (const name of defaults.limitStates) expect(limitStateNames).toContain(name);
});
