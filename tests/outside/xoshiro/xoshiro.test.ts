import { readFileSync } from "node:fs";
import { expect, test } from "vitest";
import { nextWord, setState } from "../../../src/probability/xoshiro.ts";

const cases = readFileSync(new URL("cases.csv", import.meta.url), "utf8")
  .trim()
  .split("\n")
  .slice(1);

test("the generator gives the outputs of its authors' reference program", () => {
  const state = new Int32Array(4);
  setState(state, 1, 2, 3, 4);
  let index = 0;
  for (const line of cases) {
    const [wanted, output] = line.split(",").map(Number);
    for (; index < wanted; index++) nextWord(state);
    expect(nextWord(state) >>> 0, `output ${wanted}`).toBe(output);
    index++;
  }
  expect(index).toBe(102_401);
});
