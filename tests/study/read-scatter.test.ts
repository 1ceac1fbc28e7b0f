import { expect, test } from "vitest";
import { fieldOfPath } from "../../src/study/fields.ts";
import { readReduction, readScatter } from "../../src/study/read-scatter.ts";
import { noPlaces } from "./fixtures/read.ts";

const path = "soils.sand.friction_angle";

function spot() {
  return { path, field: fieldOfPath(path)!, context: { units: "metric" as const, findings: noPlaces() } };
}

test("averaging takes its reduction from both lengths, and is 1 without", () => {
  expect(readReduction({}, path, spot())).toBe(1);
  expect(readReduction({ scale_of_fluctuation: 2 }, path, spot())).toBe(1);
  expect(readReduction({ scale_of_fluctuation: 2, averaged_over: 8 }, path, spot())).toBe(0.25);
  expect(
    readReduction({ scale_of_fluctuation: 2, averaged_over: 2, averaging: "triangular" }, path, spot()),
  ).toBeCloseTo(2 / 3, 12);
  expect(readReduction({ averaged_over: 8 }, path, spot())).toBeNaN();
});

test("scatter sums its parts as variances and splits knowledge from nature", () => {
  // Phoon and Kulhawy (1999): cov² = Γ²·w² + (w² + e²)/n + ε²; by hand 0.5·0.01 + (0.01 + 0.0025)/5 + 0.0016 = 0.0091
  const scatter = {
    inherent: 0.1,
    scale_of_fluctuation: 2,
    averaged_over: 4,
    measurement: 0.05,
    transformation: 0.04,
    tests: 5,
  };
  const read = readScatter({ normal: { mean: 30 }, scatter }, "normal", spot());
  expect(read?.cov).toBeCloseTo(Math.sqrt(0.0091), 12);
  expect(read?.knowledge).toBeCloseTo(1 - 0.005 / 0.0091, 12);
});

test("more tests make the spread smaller, down to what averaging leaves", () => {
  const cov = (tests: number): number =>
    readScatter(
      { normal: {}, scatter: { inherent: 0.1, scale_of_fluctuation: 1, averaged_over: 4, tests } },
      "normal",
      spot(),
    )!.cov;
  expect(cov(1)).toBeGreaterThan(cov(4));
  expect(cov(1e9)).toBeCloseTo(0.05, 8);
});
