import { expect, test } from "vitest";
import { densityPicture } from "../../../src/report/charts/density-picture.ts";

const density = { x: [0, 1, 2, 3, 4], y: [0, 1, 2, 1, 0] };

test("a density is a curve with its mean, and measured values are ticks under it", () => {
  const svg = densityPicture({ density, mean: 2, ticks: [1, 3, 99] });
  expect(svg).toContain('aria-hidden="true"');
  expect(svg.match(/<line /g)).toHaveLength(3);
  expect(svg).not.toMatch(/#[0-9a-f]{6}/);
});

test("an infinite density does no harm", () => {
  expect(densityPicture({ density: { ...density, y: [Number.POSITIVE_INFINITY, 1, 1, 1, 0] }, mean: 1 })).not.toMatch(
    /NaN|Infinity/,
  );
});
