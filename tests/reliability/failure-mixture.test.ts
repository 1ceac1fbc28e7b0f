import { describe, expect, test } from "vitest";
import type { DesignPoint } from "../../src/reliability/design-points.ts";
import {
  balanceWeights,
  failureCentres,
  mixtureOf,
  moveSample,
  wholeMove,
} from "../../src/reliability/failure-mixture.ts";

const pointAt = (...z: number[]): DesignPoint => ({
  state: 0,
  point: Float64Array.from(z),
  reliabilityIndex: Math.hypot(...z),
  status: "smooth",
  gradient: Float64Array.from(z, (value) => -value),
});

describe("centres of failure", () => {
  test("share by probability, but a tenth at least, and sum to 1", () => {
    const centres = failureCentres([pointAt(3, 0), pointAt(0, 4)]);
    expect(centres.map(({ share }) => share).reduce((a, b) => a + b)).toBeCloseTo(1, 12);
    expect(centres[0].share).toBeGreaterThan(0.85);
    expect(centres[1].share).toBeGreaterThan(0.09);
  });

  test("a point more than 2.5 farther out than the nearest is left out, and a point found twice counts once", () => {
    expect(failureCentres([pointAt(3, 0), pointAt(0, 5.6)])).toHaveLength(1);
    expect(failureCentres([pointAt(3, 0), pointAt(3, 1e-7)])).toHaveLength(1);
  });

  test("a mixture keeps a twentieth for a wide normal, and is empty without centres", () => {
    const parts = mixtureOf(failureCentres([pointAt(3, 0)]), wholeMove);
    expect(parts.map(({ share, sd }) => [share, sd])).toEqual([
      [0.95, 1],
      [0.05, 1.5],
    ]);
    expect(mixtureOf([], wholeMove)).toEqual([]);
  });
});

test("moving a sample scales and shifts the coordinates named, and no other", () => {
  const z = [Float64Array.of(1), Float64Array.of(2), Float64Array.of(3)];
  moveSample(z, 0, 1.5, { places: [2], centre: [4] });
  expect(z.map(([value]) => value)).toEqual([1, 2, 8.5]);
});

test("balance weights are φ/q, written out for two parts in two dimensions", () => {
  const parts = [
    { share: 0.7, sd: 1, moves: [{ places: [0, 1], centre: [2, 1] }] },
    {
      share: 0.3,
      sd: 1.5,
      moves: [
        { places: [0], centre: [0] },
        { places: [1], centre: [-1] },
      ],
    },
  ];
  const [x, y] = [1.3, -0.4];
  const density = (value: number, mean: number, sd: number): number =>
    Math.exp(-((value - mean) ** 2) / (2 * sd * sd)) / (sd * Math.sqrt(2 * Math.PI));
  const phi = density(x, 0, 1) * density(y, 0, 1);
  const q =
    0.7 * density(x, 2, 1) * density(y, 1, 1) +
    0.15 * density(x, 0, 1.5) * density(y, 0, 1) +
    0.15 * density(x, 0, 1) * density(y, -1, 1.5);
  const weights = new Float64Array(1);
  balanceWeights(parts, [Float64Array.of(x), Float64Array.of(y)], 1, weights);
  expect(weights[0]).toBeCloseTo(phi / q, 12);
});
