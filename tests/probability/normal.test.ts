import { expect, test } from "vitest";
import { normal } from "../../src/probability/normal.ts";

test("x is a straight line of u, without a limit", () => {
  const x = normal({ mean: 34, sd: 3 });
  expect(x.quantileOfNormal(2)).toBe(40);
  expect(x.quantileOfNormal(-60)).toBe(34 - 180);
  expect(x.normalOfQuantile(31)).toBe(-1);
  expect([x.lowest, x.highest, x.kinks, x.jumps]).toEqual([Number.NEGATIVE_INFINITY, Number.POSITIVE_INFINITY, [], []]);
});
