import { describe, expect, test } from "vitest";
import { gammaQuantile } from "../../src/numeric/incomplete-gamma.ts";
import { normalCdf, normalQuantile, normalUpper } from "../../src/numeric/normal.ts";
import { fillNormals, fillUniforms, streamBlock, streamName } from "../../src/probability/streams.ts";

/** A right stream misses this many standard deviations, either way, once in a million tests. */
const limit = 4.89;

function normals(seed: string, purpose: string, key: string, block: number, count = streamBlock): Float64Array {
  const out = new Float64Array(count);
  fillNormals(seed, purpose, key, block, out, count);
  return out;
}

describe("a stream belongs to its four names", () => {
  test("the same names give the same numbers, whatever was drawn in between", () => {
    const first = normals("bay-3", "sampling", "soils.fill.friction_angle", 7);
    normals("bay-3", "sampling", "soils.fill.unit_weight", 7);
    expect(normals("bay-3", "sampling", "soils.fill.friction_angle", 7)).toEqual(first);
  });

  test("a shorter fill is the beginning of a longer one", () => {
    const whole = normals("s", "p", "k", 0);
    for (const count of [0, 1, 2, 3, 4, 5, 777])
      expect(normals("s", "p", "k", 0, count)).toEqual(whole.slice(0, count));
    const uniforms = [new Float64Array(100), new Float64Array(7)];
    for (const out of uniforms) fillUniforms("s", "p", "k", 0, out, out.length);
    expect(uniforms[1]).toEqual(uniforms[0].slice(0, 7));
  });

  test("no two sets of names share a stream: not by a shifted border, not by letters beyond ASCII", () => {
    const names = [
      ["a", "b", "c", 1],
      ["a", "bc", "", 1],
      ["a", "b", "c", 11],
      ["a", "c", "b", 1],
      ['a","b', "", "c", 1],
      ["א", "b", "c", 1],
      ["Ð", "b", "c", 1], // the same low byte as the line above
      ["\\u05d0", "b", "c", 1],
    ] as const;
    const starts = names.map(([seed, purpose, key, block]) => [...normals(seed, purpose, key, block, 3)].join());
    expect(new Set(starts).size).toBe(names.length);
    expect(streamName("א", "p", "k", 0)).toBe('[0,"p","k","\\u05d0"]');
  });

  test("a fill beyond the block is refused, entries beyond the count stay untouched", () => {
    expect(() => normals("s", "p", "k", 0, streamBlock + 1)).toThrow(
      new RangeError("16385 samples do not fit a block of 16384"),
    );
    const out = new Float64Array(10).fill(-99);
    fillNormals("s", "p", "k", 0, out, 6);
    expect([...out.slice(6)]).toEqual([-99, -99, -99, -99]);
  });
});

// The tests below look at 200 blocks of one key; each quantity has a false alarm once in a million seeds.
const blocks = 200;
const count = blocks * streamBlock;
const columns = Array.from({ length: blocks }, (_, block) => normals("statistics", "test", "a", block));

describe("normals (3.3 million, false alarms once in a million for each line)", () => {
  test("moments up to the sixth are those of a standard normal", () => {
    const sums = [0, 0, 0, 0, 0, 0, 0];
    for (const column of columns) {
      for (const x of column) {
        let power = 1;
        for (let k = 1; k <= 6; k++) {
          power *= x;
          sums[k] += power;
        }
      }
    }
    const moments = [1, 0, 1, 0, 3, 0, 15, 0, 105, 0, 945, 0, 10395]; // E xᵏ
    for (let k = 1; k <= 6; k++) {
      const sd = Math.sqrt((moments[2 * k] - moments[k] ** 2) * count);
      expect(Math.abs(sums[k] - moments[k] * count) / sd, `power ${k}`).toBeLessThan(limit);
    }
  });

  test("each tail holds as many as it should, down to the tail that is drawn apart", () => {
    for (const from of [1, 2, 3, 3.6541528853610088, 4, 4.4]) {
      const expected = count * normalUpper(from);
      for (const sign of [-1, 1]) {
        const found = columns.reduce((sum, column) => sum + column.filter((x) => sign * x > from).length, 0);
        expect(Math.abs(found - expected) / Math.sqrt(expected), `beyond ${sign * from}`).toBeLessThan(limit);
      }
    }
  });

  test("200 bins of equal chance are filled evenly", () => {
    const bins = new Float64Array(200);
    for (const column of columns) for (const x of column) bins[Math.min(199, Math.floor(200 * normalCdf(x)))]++;
    const expected = count / 200;
    const chiSquare = bins.reduce((sum, n) => sum + (n - expected) ** 2 / expected, 0);
    expect(chiSquare).toBeLessThan(2 * gammaQuantile(99.5, 1e-6, true));
    expect(chiSquare).toBeGreaterThan(2 * gammaQuantile(99.5, 1e-6, false));
  });

  test("the sum of squares of four neighbours is chi-square (where the ziggurat of 2000 was found out)", () => {
    const bins = new Float64Array(100);
    const edges = Array.from({ length: 99 }, (_, i) => 2 * gammaQuantile(2, (i + 1) / 100, false));
    for (const column of columns) {
      for (let i = 0; i < streamBlock; i += 4) {
        const square = column[i] ** 2 + column[i + 1] ** 2 + column[i + 2] ** 2 + column[i + 3] ** 2;
        bins[edges.findIndex((edge) => square < edge) < 0 ? 99 : edges.findIndex((edge) => square < edge)]++;
      }
    }
    const expected = count / 400;
    const chiSquare = bins.reduce((sum, n) => sum + (n - expected) ** 2 / expected, 0);
    expect(chiSquare).toBeLessThan(2 * gammaQuantile(49.5, 1e-6, true));
  });

  test("neighbours, blocks, keys, purposes and seeds that differ in one letter are uncorrelated", () => {
    const correlation = (pairs: (block: number) => [Float64Array, Float64Array]): number => {
      let sum = 0;
      for (let block = 0; block < 60; block++) {
        const [a, b] = pairs(block);
        const n = Math.min(a.length, b.length);
        for (let i = 0; i < n; i++) sum += a[i] * b[i];
      }
      return sum / Math.sqrt(60 * streamBlock);
    };
    const other =
      (seed: string, purpose: string, key: string) =>
      (block: number): [Float64Array, Float64Array] => [columns[block], normals(seed, purpose, key, block)];
    expect(Math.abs(correlation((block) => [columns[block], columns[block].subarray(1)]))).toBeLessThan(limit);
    expect(Math.abs(correlation((block) => [columns[block], columns[block].subarray(4)]))).toBeLessThan(limit);
    expect(Math.abs(correlation((block) => [columns[block], columns[block + 1]]))).toBeLessThan(limit);
    expect(Math.abs(correlation(other("statistics", "test", "b")))).toBeLessThan(limit);
    expect(Math.abs(correlation(other("statistics", "tesu", "a")))).toBeLessThan(limit);
    expect(Math.abs(correlation(other("statisticr", "test", "a")))).toBeLessThan(limit);
  });

  test("first values of ten thousand streams are normal: seeding spoils nothing", () => {
    const n = 10_000;
    let [sum, squares, product, last] = [0, 0, 0, 0];
    for (let block = 0; block < n; block++) {
      const [x] = normals("first", "test", "k", block, 1);
      sum += x;
      squares += x * x;
      product += x * last;
      last = x;
    }
    expect(Math.abs(sum) / Math.sqrt(n)).toBeLessThan(limit);
    expect(Math.abs(squares - n) / Math.sqrt(2 * n)).toBeLessThan(limit);
    expect(Math.abs(product) / Math.sqrt(n)).toBeLessThan(limit);
  });
});

test("uniforms fill 1000 bins evenly and their pairs fill a 30 by 30 grid (false alarm once in a million)", () => {
  const bins = new Float64Array(1000);
  const grid = new Float64Array(900);
  const out = new Float64Array(streamBlock);
  for (let block = 0; block < 60; block++) {
    fillUniforms("statistics", "test", "a", block, out, streamBlock);
    for (let i = 0; i < streamBlock; i++) bins[Math.floor(1000 * out[i])]++;
    for (let i = 0; i < streamBlock; i += 2) grid[30 * Math.floor(30 * out[i]) + Math.floor(30 * out[i + 1])]++;
  }
  for (const counts of [bins, grid]) {
    const expected = counts.reduce((a, b) => a + b, 0) / counts.length;
    const chiSquare = counts.reduce((sum, n) => sum + (n - expected) ** 2 / expected, 0);
    expect(chiSquare).toBeLessThan(2 * gammaQuantile((counts.length - 1) / 2, 1e-6, true));
  }
  expect(normalQuantile(normalUpper(limit) * 2)).toBeLessThan(-4.74); // the limit is what it says
});
