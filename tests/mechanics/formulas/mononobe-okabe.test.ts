import { expect, test } from "vitest";
import {
  activeCoefficientMononobeOkabe,
  largestSeismicAngle,
  seismicAngle,
  submergedMassRatio,
} from "../../../src/mechanics/formulas/mononobe-okabe.ts";
import { radians } from "../../outside/cases.ts";

test("the seismic angle is atan(kh/(1 − kv)), times the mass ratio below water", () => {
  expect(seismicAngle(0.2, 0, 1)).toBeCloseTo(Math.atan(0.2), 15);
  expect(seismicAngle(0.2, 0.1, 1)).toBeCloseTo(Math.atan(0.2 / 0.9), 15);
  expect(seismicAngle(0.2, -0.1, 1)).toBeCloseTo(Math.atan(0.2 / 1.1), 15);
  expect(submergedMassRatio(20, 9.81)).toBeCloseTo(20 / 10.19, 14);
  expect(seismicAngle(0.2, 0.1, submergedMassRatio(20, 9.81))).toBeCloseTo(Math.atan((0.2 / 0.9) * (20 / 10.19)), 15);
});

test("without horizontal shaking the angle is 0, whatever the soil weighs under water", () => {
  for (const mass of [1, 2, Number.POSITIVE_INFINITY, -3, Number.NaN]) expect(seismicAngle(0, 0.3, mass)).toBe(0);
});

test("soil without buoyant weight, or weightless soil, takes the angle at 89 degrees", () => {
  for (const saturated of [9.81, 5, 9.81 + 1e-9]) expect(submergedMassRatio(saturated, 9.81)).toBe(1e6);
  expect(seismicAngle(0.1, 0, 1e6)).toBe(largestSeismicAngle);
  expect(seismicAngle(1e-12, 0, 1e6)).toBeCloseTo(1e-6, 15);
  for (const mass of [Number.POSITIVE_INFINITY, -3, Number.NaN, 1e9])
    expect(seismicAngle(0.1, 0, mass)).toBe(largestSeismicAngle);
  expect(seismicAngle(0.1, 1, 1)).toBe(largestSeismicAngle);
  expect(seismicAngle(0.1, 1.5, 1)).toBe(largestSeismicAngle);
  expect(largestSeismicAngle).toBeCloseTo(radians(89), 15);
});

test("shaking raises the coefficient", () => {
  const at = (psi: number): number =>
    activeCoefficientMononobeOkabe(radians(32), radians(16), radians(5), radians(6), psi);
  let last = at(0);
  for (let psi = 0.01; psi < radians(26); psi += 0.01) {
    expect(at(psi)).toBeGreaterThan(last);
    last = at(psi);
  }
});

test("beyond the limit of equilibrium the root is 0, and the value there is met from below", () => {
  const [phi, delta, theta, beta] = [30, 15, 0, 10].map(radians);
  const psi = phi - beta;
  const limit =
    Math.cos(phi - theta - psi) ** 2 / (Math.cos(psi) * Math.cos(theta) ** 2 * Math.cos(delta + theta + psi));
  expect(activeCoefficientMononobeOkabe(phi, delta, theta, beta, psi)).toBeCloseTo(limit, 6);
  expect(activeCoefficientMononobeOkabe(phi, delta, theta, beta, psi - 1e-14)).toBeCloseTo(limit, 5);
  expect(activeCoefficientMononobeOkabe(phi, delta, theta, beta, psi + 1e-14)).toBeCloseTo(limit, 12);
});

test("the largest seismic angle and inclinations keep the coefficient below 7e3", () => {
  for (let phi = 0; phi <= 60; phi += 5)
    for (let delta = 0; delta <= 60; delta += 5)
      for (let theta = 0; theta <= 45; theta += 5)
        for (let beta = 0; beta <= 60; beta += 5) {
          const k = activeCoefficientMononobeOkabe(
            radians(phi),
            radians(delta),
            radians(theta),
            radians(beta),
            largestSeismicAngle,
          );
          expect(k >= 0 && k < 7e3).toBe(true);
        }
});
