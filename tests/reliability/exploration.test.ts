import { expect, test } from "vitest";
import { drawBack, explore, startsFrom } from "../../src/reliability/exploration.ts";
import { cosine, norm, type Point, pointEvaluator } from "../../src/reliability/point-evaluator.ts";
import { statesOfMargins } from "./straight-line.ts";

const states = statesOfMargins(4, { either: (u) => Math.min(2 - u[0], 2.5 + u[1]) });
const evaluator = pointEvaluator(states);
const margins = (points: readonly Point[]): Float64Array => evaluator.margins(0, points);

test("exploring points reach far and no farther than 7, the same for the same seed", () => {
  const found = explore(states, evaluator, "explore");
  const lengths = found.points.map(norm);
  expect(found.points.length).toBe(300);
  expect(Math.max(...lengths)).toBeCloseTo(7, 12);
  expect(lengths.filter((length) => length > 4).length).toBeGreaterThan(100);
  expect(explore(states, evaluator, "explore")).toEqual(found);
});

test("points are drawn back to the surface along their rays and still fail", () => {
  const failing = [Float64Array.of(6, 1, 0, 0), Float64Array.of(0, -5, 2, 0)];
  const drawn = drawBack(margins, failing, 30);
  drawn.forEach((point, i) => {
    expect(cosine(point, failing[i])).toBeCloseTo(1, 12);
    expect(margins([point])[0]).toBeLessThan(0);
    expect(margins([point])[0]).toBeGreaterThan(-1e-6);
  });
  expect(drawBack(margins, [], 5)).toEqual([]);
});

test("starts fail, lie in distinct directions, and reach both regions", () => {
  const starts = startsFrom(explore(states, evaluator, "starts"), margins, 0, 5);
  expect(starts.length).toBeGreaterThan(1);
  expect(starts.length).toBeLessThanOrEqual(5);
  expect(Array.from(margins(starts)).every((margin) => margin < 0)).toBe(true);
  starts.forEach((a, i) => {
    starts.slice(i + 1).forEach((b) => {
      expect(cosine(a, b)).toBeLessThan(0.7);
    });
  });
  expect(starts.some((point) => point[0] >= 2)).toBe(true);
  expect(starts.some((point) => point[1] <= -2.5)).toBe(true);
});
