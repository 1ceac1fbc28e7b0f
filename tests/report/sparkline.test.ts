import { expect, test } from "vitest";
import { sparkline } from "../../src/report/sparkline.ts";

const x = Array.from({ length: 81 }, (_, k) => k / 80);

test("a flat density is a row of full blocks, a triangle climbs to its peak", () => {
  expect(sparkline({ x, y: x.map(() => 2) }, 6)).toBe("██████");
  expect(sparkline({ x, y: x.map((value) => value) }, 8)).toBe("▁▂▃▄▅▆▇█");
});

test("values that are not finite or all nought do no harm", () => {
  expect(sparkline({ x, y: x.map(() => Number.POSITIVE_INFINITY) }, 4)).toBe("▁▁▁▁");
  expect(sparkline({ x: [0], y: [1] }, 3)).toHaveLength(3);
});
