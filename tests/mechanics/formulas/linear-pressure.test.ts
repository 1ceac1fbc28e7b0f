import { expect, test } from "vitest";
import {
  positiveCentre,
  positiveForce,
  positiveLength,
  positiveMoment,
  zeroCrossing,
} from "../../../src/mechanics/formulas/linear-pressure.ts";

test("a trapezoid under pressure throughout", () => {
  expect(positiveForce(10, 30, 4)).toBe(80);
  expect(positiveMoment(10, 30, 4)).toBeCloseTo((16 * (20 + 30)) / 6, 12);
  expect(positiveLength(10, 30, 4)).toBe(4);
  expect(positiveCentre(10, 30, 4)).toBe(2);
  expect(zeroCrossing(10, 30, 4)).toBe(0);
});

test("tension at the top leaves a triangle at the bottom", () => {
  expect(positiveLength(-10, 30, 4)).toBe(3);
  expect(zeroCrossing(-10, 30, 4)).toBe(1);
  expect(positiveCentre(-10, 30, 4)).toBe(1.5);
  expect(positiveForce(-10, 30, 4)).toBe(45);
  expect(positiveMoment(-10, 30, 4)).toBe(45); // a third of 3 m above the bottom
});

test("tension at the bottom leaves a triangle at the top", () => {
  expect(positiveLength(30, -10, 4)).toBe(3);
  expect(zeroCrossing(30, -10, 4)).toBe(0);
  expect(positiveCentre(30, -10, 4)).toBe(2.5);
  expect(positiveForce(30, -10, 4)).toBe(45);
  expect(positiveMoment(30, -10, 4)).toBe(45 * 3);
});

test("tension throughout gives nothing, and the crossing lies at the bottom", () => {
  for (const [p0, p1] of [
    [-10, -30],
    [-10, 0],
    [0, -10],
    [0, 0],
  ]) {
    expect(positiveForce(p0, p1, 4)).toBeCloseTo(0, 15);
    expect(positiveMoment(p0, p1, 4)).toBeCloseTo(0, 15);
    expect(positiveLength(p0, p1, 4)).toBeCloseTo(0, 15);
    expect(positiveCentre(p0, p1, 4)).toBeCloseTo(0, 15);
    expect(zeroCrossing(p0, p1, 4)).toBe(4);
  }
});

test("a pressure that starts at zero turns positive at once", () => {
  expect(zeroCrossing(0, 30, 4)).toBe(0);
  expect(positiveLength(0, 30, 4)).toBe(4);
});

test("a stretch without length gives nothing and no NaN", () => {
  for (const [p0, p1] of [
    [10, 30],
    [-10, 30],
    [30, -10],
    [-10, -30],
    [0, 0],
  ])
    for (const formula of [positiveForce, positiveMoment, positiveLength, positiveCentre, zeroCrossing])
      expect(Math.abs(formula(p0, p1, 0))).toBe(0);
});
