import { expect, test } from "vitest";
import { crestOf, frameOf, surfaceAt } from "../../../src/report/drawing/frame.ts";
import { handMade } from "../hand-made.ts";

const { section } = handMade.check;
const canvas = { width: 500, height: 400, padLeft: 4, padTop: 30, below: 64 };

test("metres lie alike both ways, and the wall with its dimensions inside", () => {
  const f = frameOf(section, canvas);
  expect(f.x(1) - f.x(0)).toBeCloseTo(f.y(0) - f.y(1), 10);
  expect(f.x(f.left)).toBeGreaterThanOrEqual(canvas.padLeft);
  expect(f.x(f.right)).toBeLessThanOrEqual(canvas.padLeft + canvas.width + 1e-9);
  expect(f.y(f.high)).toBeCloseTo(canvas.padTop, 10);
  expect(f.height - f.y(0)).toBeGreaterThanOrEqual(canvas.below - 1e-9);
  expect(f.right).toBeGreaterThan(section.baseWidth);
});

test("the surface rises from the crest of the back face", () => {
  const sloped = { ...section, slope: 45 };
  expect(crestOf(sloped)).toBeCloseTo(1.3, 12);
  expect(surfaceAt(sloped, 1)).toBe(5);
  expect(surfaceAt(sloped, 3.3)).toBeCloseTo(7, 12);
});
