import { expect, test } from "vitest";
import {
  heelArea,
  heelMomentX,
  heelMomentZ,
  toeArea,
  toeMomentX,
  toeMomentZ,
} from "../../../src/mechanics/formulas/heel-area.ts";

const t = 0.5;
const zCrest = 5.5;

test("level ground on a vertical back is a rectangle", () => {
  expect(heelArea(9, t, zCrest, 1.2, 3.2, 0, 0)).toBe(10);
  expect(heelMomentX(9, t, zCrest, 1.2, 3.2, 0, 0)).toBeCloseTo(22, 12);
  expect(heelMomentZ(9, t, zCrest, 1.2, 3.2, 0, 0)).toBeCloseTo(30, 12);
  expect(heelArea(2.5, t, zCrest, 1.2, 3.2, 0, 0)).toBe(4);
  expect(heelMomentZ(2.5, t, zCrest, 1.2, 3.2, 0, 0)).toBeCloseTo(6, 13);
});

test("rising ground adds a triangle whose centroid lies at two thirds towards the heel", () => {
  const tanBeta = 0.25; // 2 m of heel: 0.5 m high
  expect(heelArea(9, t, zCrest, 1.2, 3.2, 0, tanBeta)).toBeCloseTo(10.5, 13);
  expect(heelMomentX(9, t, zCrest, 1.2, 3.2, 0, tanBeta)).toBeCloseTo(22 + 0.5 * (1.2 + 4 / 3), 12);
  expect(heelMomentZ(9, t, zCrest, 1.2, 3.2, 0, tanBeta)).toBeCloseTo(30 + 0.5 * (5.5 + 0.5 / 3), 12);
});

test("half way up the triangle three quarters of it lie below", () => {
  const area = heelArea(5.75, t, zCrest, 1.2, 3.2, 0, 0.25) - 10;
  expect(area).toBeCloseTo(0.375, 13);
});

test("a back that runs in adds the triangle over the back face", () => {
  const tanTheta = 0.1; // 0.5 m over 5 m
  expect(heelArea(9, t, zCrest, 1.2, 3.2, tanTheta, 0)).toBeCloseTo(10 + 1.25, 13);
  expect(heelMomentX(9, t, zCrest, 1.2, 3.2, tanTheta, 0)).toBeCloseTo(22 + 1.25 * (1.2 - 0.5 / 3), 12);
  expect(heelMomentZ(9, t, zCrest, 1.2, 3.2, tanTheta, 0)).toBeCloseTo(30 + 1.25 * (0.5 + (2 / 3) * 5), 12);
});

test("no heel and a vertical back leave nothing", () => {
  for (const formula of [heelArea, heelMomentX, heelMomentZ]) {
    expect(formula(9, t, zCrest, 3.2, 3.2, 0, 0.3)).toBe(0);
    expect(formula(9, t, zCrest, 3.2, 3.2, 0, 0)).toBe(0);
  }
});

test("levels below the slab count as its top, levels above the surface as the surface", () => {
  for (const formula of [heelArea, heelMomentX, heelMomentZ]) {
    expect(formula(-3, t, zCrest, 1.2, 3.2, 0.1, 0.2)).toBe(0);
    expect(formula(t, t, zCrest, 1.2, 3.2, 0.1, 0.2)).toBe(0);
    expect(formula(zCrest + 2.5 * 0.2, t, zCrest, 1.2, 3.2, 0.1, 0.2)).toBeCloseTo(
      formula(100, t, zCrest, 1.2, 3.2, 0.1, 0.2),
      12,
    );
  }
});

test("soil over the toe in front of a face that runs in", () => {
  expect(toeArea(1.5, t, zCrest, 0.8, 0.1)).toBeCloseTo(0.8 + 0.05, 14);
  expect(toeMomentX(1.5, t, zCrest, 0.8, 0.1)).toBeCloseTo(0.8 * 0.4 + 0.05 * (0.8 + 0.1 / 3), 14);
  expect(toeMomentZ(1.5, t, zCrest, 0.8, 0.1)).toBeCloseTo(0.8 * 1 + 0.05 * (0.5 + 2 / 3), 14);
  expect(toeArea(0.3, t, zCrest, 0.8, 0.1)).toBe(0);
  expect(toeArea(99, t, zCrest, 0.8, 0.1)).toBe(toeArea(zCrest, t, zCrest, 0.8, 0.1));
});
