import { expect, test } from "vitest";
import { scrambledSobolSequence, sobolDimensions, sobolSequence } from "../../src/probability/sobol-sequence.ts";

const keys = (dimension: number): string[] => Array.from({ length: dimension }, (_, j) => `u${j}`);

function points(dimension: number, count: number, replicate: number): Float64Array[] {
  const columns = Array.from({ length: dimension }, () => new Float64Array(count));
  scrambledSobolSequence(keys(dimension), "seed", "test", replicate).fill(columns, count);
  return columns;
}

test("a sequence filled in parts is the same as in one go", () => {
  const whole = points(3, 100, 0);
  const sequence = scrambledSobolSequence(keys(3), "seed", "test", 0);
  const parts = Array.from({ length: 3 }, () => new Float64Array(60));
  sequence.fill(parts, 60);
  expect(parts[2]).toEqual(whole[2].subarray(0, 60));
  sequence.fill(parts, 40);
  expect(parts[1].subarray(0, 40)).toEqual(whole[1].subarray(60));
});

test("scrambled, each of 256 cells still holds one of 256 points, in every dimension", () => {
  for (const column of points(sobolDimensions, 256, 1))
    expect(new Set(column.map((x) => Math.floor(x * 256))).size).toBe(256);
});

test("scrambled, the first two dimensions still hold a point in every elementary interval", () => {
  const [x, y] = points(2, 64, 2);
  for (let k = 0; k <= 6; k++) {
    const cells = new Set(
      Array.from(x, (value, i) => Math.floor(value * 2 ** k) * 64 + Math.floor(y[i] * 2 ** (6 - k))),
    );
    expect(cells.size).toBe(64);
  }
});

test("a scrambled point is uniform over replicates: mean 1/2 and variance 1/12", () => {
  const values = Array.from({ length: 4000 }, (_, replicate) => points(2, 4, replicate)[1][3]);
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
  const variance = values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / values.length;
  // a correct scrambling fails one seed in a million
  expect(Math.abs(mean - 0.5)).toBeLessThan(4.89 * Math.sqrt(1 / 12 / 4000));
  expect(Math.abs(variance - 1 / 12)).toBeLessThan(4.89 * Math.sqrt(1 / 180 / 4000));
});

test("replicates differ, and neither 0 nor 1 occurs", () => {
  const [a, b] = [points(1, 1024, 0)[0], points(1, 1024, 1)[0]];
  expect(a).not.toEqual(b);
  for (const x of a) expect(x > 0 && x < 1).toBe(true);
});

test("more dimensions than there are direction numbers for are refused", () => {
  expect(() => sobolSequence(sobolDimensions + 1)).toThrow("101 dimensions exceed the 100");
  expect(() => scrambledSobolSequence(keys(101), "seed", "test", 0)).toThrow(RangeError);
});
