import { expect, test } from "vitest";
import { nextUniform, nextWord, setState } from "../../src/probability/xoshiro.ts";

test("a state of zeros is mended, because it would stay zero for ever", () => {
  const state = new Int32Array(4);
  setState(state, 0, 0, 0, 0);
  expect([...state]).toEqual([0, 0, 0, 1]);
  expect(new Set(Array.from({ length: 50 }, () => nextWord(state))).size).toBeGreaterThan(40);
});

test("a uniform number never reaches 0 or 1 and takes its high bits from the first word", () => {
  const state = new Int32Array(4);
  setState(state, 1, 2, 3, 4);
  const high = 641 >>> 5;
  const low = 1573767 >>> 6;
  expect(nextUniform(state)).toBe((high * 2 ** 26 + low + 0.5) / 2 ** 53);
  expect(0.5 / 2 ** 53).toBeGreaterThan(0);
  expect((2 ** 53 - 1 + 0.5) / 2 ** 53).toBeLessThanOrEqual(1);
});
