import { describe, expect, test } from "vitest";
import { sizeContourChart } from "../../../src/report/charts/size-contour.ts";
import { sizeCurveChart, sizeFactorsChart } from "../../../src/report/charts/size-curve.ts";
import { displayIn } from "../../../src/report/display.ts";
import { renderChart } from "../../../src/report/render-chart.ts";
import type { SizePoint, SizeResult } from "../../../src/results-size.ts";

const point = (value: number, index: number, second?: number): SizePoint => ({
  value,
  ...(second === undefined ? {} : { second }),
  probability: 10 ** -index,
  standardError: 10 ** -index / 20,
  interval: [0.9 * 10 ** -index, 1.1 * 10 ** -index],
  reliabilityIndex: index,
  factorAtMean: { sliding: 1 + 0.2 * value, bearing: 2 + value },
});

/** Written by hand; all numbers are invented. */
const result: SizeResult = {
  study: "Wall (invented)",
  kind: "size",
  seed: "any",
  vary: "wall.base.heel",
  label: "Heel length",
  unit: "m",
  target: { probability: 1e-3, reliabilityIndex: 3 },
  points: [point(2, 2), point(3, 3.5), point(4, 4)],
  meetsTargetAt: 2.6,
  meetsTargetSide: "above",
  warnings: [],
  cautions: [],
  run: { version: "0", seed: "any", workers: 1, complete: true, sampling: { evaluations: 1, seconds: 0 } },
};
const two: SizeResult = {
  ...result,
  second: { vary: "wall.base.toe", label: "Toe length", unit: "m" },
  points: [0.5, 1].flatMap((toe) => [2, 3, 4].map((heel) => point(heel, heel - 0.5 + toe, toe))),
};
const [metric, us] = [displayIn("metric"), displayIn("us")];

describe("one dimension", () => {
  test("the curve says in words where the target is met, and draws it", async () => {
    const chart = sizeCurveChart(result, metric);
    expect(chart.title).toBe("Probability of failure by heel length");
    expect(chart.alternative.replace(/\s/g, " ")).toBe(
      "The target of 1 in 1000 is met at 2.60 m. 2.00 m: 1 in 100. 4.00 m: 1 in 10 000",
    );
    const svg = await renderChart(chart);
    expect(svg).toContain("target 1 in 1000");
    expect(svg).toContain("2.60 m");
    expect(svg).toContain("Heel length, m");
  });

  test("without a target it draws the curve alone; values stand in the study's units", async () => {
    const svg = await renderChart(sizeCurveChart({ ...result, target: undefined, meetsTargetAt: undefined }, us));
    expect(svg).not.toContain("target");
    expect(svg).toContain("Heel length, ft");
  });

  test("the factors have a line for each limit state", async () => {
    const chart = sizeFactorsChart(result, metric);
    expect(chart.alternative).toBe("Sliding: 1.40 to 1.80. Bearing failure: 4.00 to 6.00");
    expect(await renderChart(chart)).toContain("Bearing failure");
  });
});

describe("two dimensions", () => {
  test("cells carry the index, and the line along which the target is met runs between neighbours", async () => {
    const chart = sizeContourChart(two, metric)!;
    expect(chart.title).toBe("Reliability index by heel length and toe length");
    // index heel − 0.5 + toe is 3 at heel 3 for toe 0.5, at heel 2.5 for toe 1
    expect(chart.alternative).toBe(
      "The target, index 3.00, is met along a line from 3.00 m and 0.500 m to 2.50 m and 1.00 m.",
    );
    const svg = await renderChart(chart);
    for (const words of ["2.00", "4.50", "Toe length, m"]) expect(svg).toContain(words);
  });

  test("one dimension makes no contour, and a target out of reach no line", () => {
    expect(sizeContourChart(result, metric)).toBeUndefined();
    const far = { ...two, target: { probability: 1e-9, reliabilityIndex: 6 } };
    expect(sizeContourChart(far, metric)!.alternative).toContain("No line within the range");
  });
});
