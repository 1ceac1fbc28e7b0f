import { expect, test } from "vitest";
import { bivariateNormal } from "../../../src/numeric/bivariate-normal.ts";
import { readCases } from "../cases.ts";

test("every row agrees to 1e-6 of its value, and to 2e-10 where it is above 1e-20", () => {
  const rows = readCases(new URL("cases.csv", import.meta.url));
  expect(rows.length).toBe(99);
  for (const { h, k, rho, Phi2 } of rows) {
    const found = bivariateNormal(Number(h), Number(k), Number(rho));
    expect(Math.abs(found / Number(Phi2) - 1), `${h} ${k} ${rho}`).toBeLessThan(Number(Phi2) > 1e-20 ? 2e-10 : 1e-6);
  }
});

test("small chances agree with 30-digit arithmetic to 1e-12 of their value", () => {
  const rows = readCases(new URL("deep.csv", import.meta.url));
  expect(rows.length).toBeGreaterThan(25);
  for (const { h, k, rho, Phi2 } of rows) {
    const found = bivariateNormal(Number(h), Number(k), Number(rho));
    expect(Math.abs(found / Number(Phi2) - 1), `${h} ${k} ${rho}`).toBeLessThan(1e-12);
  }
});

test("the quarter plane is Sheppard's closed form", () => {
  for (let r = -0.999; r < 1; r += 0.111) {
    expect(bivariateNormal(0, 0, r) / (0.25 + Math.asin(r) / (2 * Math.PI))).toBeCloseTo(1, 12);
  }
});
