import { expect, test } from "vitest";
import { CompensatedSum, compensatedSum } from "../../src/numeric/compensated-sum.ts";

test("small terms are not lost beside large ones, whichever comes first", () => {
  expect(compensatedSum([1, 1e100, 1, -1e100])).toBe(2);
  expect(compensatedSum([1e100, 1, -1e100, 1])).toBe(2);
});

test("ten million tenths add up to a million", () => {
  const sum = new CompensatedSum();
  for (let i = 0; i < 1e7; i++) sum.add(0.1);
  expect(sum.value).toBe(1e6);
});

test("merged sums equal the sum of all the terms", () => {
  const terms = Array.from({ length: 1000 }, (_, i) => Math.sin(i) * 10 ** ((i % 37) - 18));
  const parts = [new CompensatedSum(), new CompensatedSum(), new CompensatedSum()];
  terms.forEach((term, i) => {
    parts[Math.floor(i / 400)].add(term);
  });
  parts[0].merge(parts[1]);
  parts[0].merge(parts[2]);
  expect(Math.abs(parts[0].value / compensatedSum(terms) - 1)).toBeLessThan(1e-15);
});

test("only the first n entries are summed when n is given", () => {
  expect(compensatedSum([1, 2, 4], 2)).toBe(3);
});
