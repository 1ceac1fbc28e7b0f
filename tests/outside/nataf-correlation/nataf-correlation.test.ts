import { readFileSync } from "node:fs";
import { expect, test } from "vitest";
import type { Marginal } from "../../../src/probability/marginal.ts";
import { marginalOf } from "../../../src/probability/marginal-of.ts";
import { correlationOfNormals } from "../../../src/probability/nataf.ts";

const lines = readFileSync(new URL("cases.csv", import.meta.url), "utf8")
  .trim()
  .split("\n")
  .slice(1);

const made = new Map<string, Marginal>();

function marginal(name: string, variation: number): Marginal {
  const id = `${name} ${variation}`;
  if (!made.has(id)) made.set(id, make(name, variation));
  return made.get(id)!;
}

function make(name: string, variation: number): Marginal {
  if (name === "normal") return marginalOf({ kind: "normal", mean: 10, sd: 2 });
  if (name === "uniform") return marginalOf({ kind: "uniform", from: -1, to: 3 });
  if (name === "exponential") return marginalOf({ kind: "gamma", mean: 2, sd: 2 });
  if (name === "rayleigh") return marginalOf({ kind: "weibull", shape: 2, scale: 1.5, shift: 0 });
  if (name === "gumbel_max") return marginalOf({ kind: "gumbel", mean: 1.4, sd: 0.5 });
  if (name === "lognormal") return marginalOf({ kind: "lognormal", mean: 30, sd: 30 * variation, shift: 0 });
  throw new Error(`no distribution ${name}`);
}

test("every row agrees to half a unit in its last digit, or has no solution where the table says so", () => {
  expect(lines.length).toBe(102);
  let blanks = 0;
  for (const line of lines) {
    const [first, second, variation1, variation2, rho, expected] = line.split(",");
    const found = correlationOfNormals(
      marginal(first, Number(variation1)),
      marginal(second, Number(variation2)),
      Number(rho),
    );
    if (expected === "") {
      blanks++;
      expect(found.possible, line).toBe(false);
    } else {
      expect(found.possible, line).toBe(true);
      if (found.possible) expect(Math.abs(found.coefficient - Number(expected)), line).toBeLessThanOrEqual(5.01e-7);
    }
  }
  expect(blanks).toBe(1);
});
