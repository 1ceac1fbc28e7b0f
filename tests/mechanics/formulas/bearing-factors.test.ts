import { expect, test } from "vitest";
import {
  bearingFactorNc,
  bearingFactorNgammaEn1997,
  bearingFactorNgammaMeyerhof,
  bearingFactorNgammaVesic,
  bearingFactorNq,
  inclinationBase,
  inclinationNc,
  inclinationNgamma,
  inclinationNq,
  leastDrainedFrictionAngle,
  meyerhofInclinationNgamma,
  meyerhofInclinationNq,
  undrainedInclination,
} from "../../../src/mechanics/formulas/bearing-factors.ts";
import { radians } from "../../outside/cases.ts";

test("Nq is e^(π tan φ) tan²(45° + φ/2) up to 60 degrees", () => {
  for (let deg = 0; deg <= 60; deg += 0.5) {
    const phi = radians(deg);
    const printed = Math.exp(Math.PI * Math.tan(phi)) * Math.tan(Math.PI / 4 + phi / 2) ** 2;
    expect(Math.abs(bearingFactorNq(phi) / printed - 1)).toBeLessThan(1e-13);
  }
});

test("Nc meets π + 2 at no friction without losing digits", () => {
  expect(bearingFactorNc(0)).toBe(Math.PI + 2);
  expect(bearingFactorNc(1e-12)).toBeCloseTo(Math.PI + 2, 10);
  // (Nq − 1)/tan φ = (π + 2) + (π + 2)²/2 · φ + …
  expect(bearingFactorNc(1e-5)).toBeCloseTo(Math.PI + 2 + ((Math.PI + 2) ** 2 / 2) * 1e-5, 8);
});

test("without friction Nq is 1 and every Nγ is 0", () => {
  expect(bearingFactorNq(0)).toBe(1);
  for (const factor of [bearingFactorNgammaVesic, bearingFactorNgammaEn1997, bearingFactorNgammaMeyerhof])
    expect(factor(0)).toBe(0);
});

test("Vesić's and the standard's Nγ differ by 4 tan φ", () => {
  for (const deg of [10, 30, 45, 60]) {
    const vesic = bearingFactorNgammaVesic(radians(deg));
    expect((vesic - bearingFactorNgammaEn1997(radians(deg))) / (4 * Math.tan(radians(deg)))).toBeCloseTo(1, 9);
  }
});

test("the inclination bracket runs from 1 without push to 0 and not below", () => {
  expect(inclinationBase(0, 100, 2, 0, 2)).toBe(1);
  expect(inclinationBase(50, 100, 2, 0, 2)).toBe(0.5);
  expect(inclinationBase(50, 100, 2, 25, 2)).toBe(0.75);
  expect(inclinationBase(150, 100, 2, 0, 2)).toBe(0);
});

test("a base without any vertical resistance has the bracket 0", () => {
  expect(inclinationBase(0, 0, 0, 0, 2)).toBe(0);
  expect(inclinationBase(10, -5, -1, 10, 2)).toBe(0);
});

test("iq and iγ are the square and the cube of the bracket", () => {
  expect(inclinationNq(0.5)).toBe(0.25);
  expect(inclinationNgamma(0.5)).toBe(0.125);
});

test("ic is iq − (1 − iq)/(Nc tan φ), 1 without push and not below 0", () => {
  expect(inclinationNc(0.25, 30, 0.5)).toBeCloseTo(0.25 - 0.75 / 15, 15);
  expect(inclinationNc(1, 30, 0.5)).toBe(1);
  expect(inclinationNc(1, Math.PI + 2, 0)).toBe(1);
  expect(inclinationNc(0.5, Math.PI + 2, 0)).toBe(0);
  expect(inclinationNc(0, 30, 0.5)).toBe(0);
  expect(inclinationNc(0.5, Math.PI + 2, Math.tan(leastDrainedFrictionAngle))).toBe(0);
});

test("Meyerhof's factors fall to 0 at 90 degrees and at the friction angle", () => {
  expect(meyerhofInclinationNq(0)).toBe(1);
  expect(meyerhofInclinationNq(Math.PI / 4)).toBe(0.25);
  expect(meyerhofInclinationNq(Math.PI / 2)).toBe(0);
  expect(meyerhofInclinationNq(2)).toBe(0);
  expect(meyerhofInclinationNgamma(0, 0.5)).toBe(1);
  expect(meyerhofInclinationNgamma(0.25, 0.5)).toBe(0.25);
  expect(meyerhofInclinationNgamma(0.5, 0.5)).toBe(0);
  expect(meyerhofInclinationNgamma(0.6, 0.5)).toBe(0);
  expect(meyerhofInclinationNgamma(0, 0)).toBe(1);
  expect(meyerhofInclinationNgamma(0.1, 0)).toBe(0);
});

test("the undrained factor runs from 1 to a half, where the push equals the adhesion or passes it", () => {
  expect(undrainedInclination(0, 2, 50)).toBe(1);
  expect(undrainedInclination(75, 2, 50)).toBe(0.75);
  expect(undrainedInclination(100, 2, 50)).toBe(0.5);
  expect(undrainedInclination(500, 2, 50)).toBe(0.5);
  expect(undrainedInclination(0, 0, 0)).toBe(1);
  expect(undrainedInclination(10, 0, 0)).toBe(0.5);
  expect(undrainedInclination(10, -1, 50)).toBe(0.5);
});
