import { expect, test } from "vitest";
import {
  lineLoadMoment,
  lineLoadPressure,
  lineLoadThrust,
  stripLoadMoment,
  stripLoadPressure,
  stripLoadThrust,
} from "../../../src/mechanics/formulas/surface-loads.ts";

test("the line pressure is the formula as printed", () => {
  expect(lineLoadPressure(30, 2, 3)).toBeCloseTo(((4 * 30) / Math.PI) * ((4 * 3) / 13 ** 2), 13);
});

test("the strip pressure is the formula as printed", () => {
  const at = (a: number, s: number): number => Math.atan(a / s) - (a * s) / (a * a + s * s);
  expect(stripLoadPressure(40, 1, 3, 2)).toBeCloseTo((80 / Math.PI) * (at(3, 2) - at(1, 2)), 13);
});

test("thrust and moment of a line are the formulas as printed", () => {
  expect(lineLoadThrust(30, 2, 5)).toBeCloseTo((60 / Math.PI) * (25 / 29), 13);
  expect(lineLoadMoment(30, 2, 5)).toBeCloseTo((60 / Math.PI) * (5 - 2 * Math.atan(2.5)), 13);
});

test("thrust and moment of a strip are the formulas as printed", () => {
  expect(stripLoadThrust(40, 1, 3, 5)).toBeCloseTo((80 / Math.PI) * 5 * (Math.atan(0.6) - Math.atan(0.2)), 12);
  const at = (a: number): number => 5 * a - a * a * Math.atan(5 / a) + 25 * Math.atan(a / 5);
  expect(stripLoadMoment(40, 1, 3, 5)).toBeCloseTo((40 / Math.PI) * (at(3) - at(1)), 11);
});

test("a load at the plane itself acts at the top, without NaN", () => {
  expect(lineLoadPressure(30, 0, 0)).toBe(0);
  expect(lineLoadPressure(30, 0, 1)).toBe(0);
  expect(lineLoadThrust(30, 0, 5)).toBeCloseTo(60 / Math.PI, 13);
  expect(lineLoadMoment(30, 0, 5)).toBeCloseTo(300 / Math.PI, 12);
  expect(stripLoadPressure(40, 0, 2, 0)).toBeCloseTo(40, 13); // p itself just under a strip that touches the plane
  expect(stripLoadPressure(40, 1, 2, 0)).toBe(0);
});

test("a plane without height, or a strip without width, carries nothing", () => {
  for (const height of [0, -1]) {
    expect(lineLoadThrust(30, 2, height)).toBe(0);
    expect(lineLoadMoment(30, 2, height)).toBe(0);
    expect(stripLoadThrust(40, 0, 2, height)).toBe(0);
    expect(stripLoadMoment(40, 0, 2, height)).toBe(0);
  }
  expect(stripLoadPressure(40, 2, 2, 1)).toBe(0);
  expect(stripLoadThrust(40, 2, 2, 3)).toBe(0);
  expect(stripLoadMoment(40, 2, 2, 3)).toBe(0);
  expect(stripLoadPressure(40, 0, 2, -1)).toBe(0);
});

test("a load far away keeps its small moment to the last digits", () => {
  // H ≪ a: thrust (2Q/π)(H/a)², moment (2Q/π) H (H/a)²/3 to the first order
  const ratio = 1e-6;
  expect(lineLoadMoment(1, 1 / ratio, 1) / ((2 / Math.PI) * ratio ** 2)).toBeCloseTo(1 / 3, 11);
});
