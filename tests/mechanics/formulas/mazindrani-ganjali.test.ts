import { expect, test } from "vitest";
import { positiveForce, positiveMoment } from "../../../src/mechanics/formulas/linear-pressure.ts";
import {
  slopeUnstable,
  slopingCohesiveForce,
  slopingCohesiveMoment,
  slopingCohesivePressure,
  slopingCohesiveThrust,
} from "../../../src/mechanics/formulas/mazindrani-ganjali.ts";
import {
  activeCoefficientRankine,
  activeCoefficientRankineSloping,
  rootActiveCoefficientRankine,
} from "../../../src/mechanics/formulas/rankine.ts";
import { radians } from "../../outside/cases.ts";

test("it is the formula as printed, term by term", () => {
  const [phi, beta] = [28, 14].map(radians);
  const [s, c] = [95, 12];
  const [cb, cf, sf] = [Math.cos(beta), Math.cos(phi), Math.sin(phi)];
  const root = Math.sqrt(
    4 * cb * cb * (cb * cb - cf * cf) * s * s + 4 * c * c * cf * cf + 8 * c * s * cb * cb * sf * cf,
  );
  const printed = cb * ((2 * cb * cb * s + 2 * c * cf * sf - root) / (cf * cf) - s);
  expect(slopingCohesivePressure(s, c, phi, beta)).toBeCloseTo(printed, 11);
});

test("on level ground it is Ka σ − 2 c √Ka", () => {
  for (const [phiDeg, c] of [
    [0, 20],
    [25, 10],
    [38, 3],
    [60, 50],
  ]) {
    const phi = radians(phiDeg);
    const line = (s: number): number => activeCoefficientRankine(phi) * s - 2 * c * rootActiveCoefficientRankine(phi);
    for (const s of [0, 10, 80, 400]) expect(slopingCohesivePressure(s, c, phi, 0)).toBeCloseTo(line(s), 10);
    expect(slopingCohesiveForce(0, 200, 6, c, phi, 0)).toBeCloseTo(positiveForce(line(0), line(200), 6), 10);
    expect(slopingCohesiveMoment(0, 200, 6, c, phi, 0)).toBeCloseTo(positiveMoment(line(0), line(200), 6), 10);
    expect(slopingCohesiveMoment(200, 0, 6, c, phi, 0)).toBeCloseTo(positiveMoment(line(200), line(0), 6), 10);
  }
});

test("without cohesion it is K σ along the slope, a slope steeper than the friction angle included", () => {
  for (const [phiDeg, betaDeg] of [
    [30, 15],
    [30, 30],
    [30, 0],
    [25, 40],
    [0, 0],
    [0, 45],
    [60, 45],
  ]) {
    const [phi, beta] = [radians(phiDeg), radians(betaDeg)];
    const k = activeCoefficientRankineSloping(phi, beta);
    expect(slopingCohesivePressure(80, 0, phi, beta)).toBe(80 * k);
    expect(slopingCohesiveForce(20, 80, 5, 0, phi, beta)).toBeCloseTo(250 * k, 10);
    expect(slopingCohesiveMoment(20, 80, 5, 0, phi, beta)).toBeCloseTo((25 * (40 + 80) * k) / 6, 10);
    expect(slopingCohesiveForce(-20, 80, 5, 0, phi, beta)).toBeCloseTo(160 * k, 10); // 4 m of 5 m
  }
});

test("with vanishing cohesion it meets K σ on every slope up to the friction angle", () => {
  for (const [phiDeg, betaDeg] of [
    [30, 15],
    [30, 30],
    [30, 0],
    [0, 0],
    [60, 45],
    [45, 45],
  ]) {
    const [phi, beta] = [radians(phiDeg), radians(betaDeg)];
    const without = slopingCohesiveForce(0, 80, 5, 0, phi, beta);
    expect(Math.abs(slopingCohesiveForce(0, 80, 5, 1e-12, phi, beta) / without - 1)).toBeLessThan(1e-5);
    expect(
      Math.abs(slopingCohesivePressure(80, 1e-12, phi, beta) / slopingCohesivePressure(80, 0, phi, beta) - 1),
    ).toBeLessThan(1e-5);
  }
});

test("the pressure turns positive at 2 c tan(45° + φ/2), whatever the slope", () => {
  for (const phiDeg of [0, 12, 30, 60])
    for (const betaDeg of [0, 10, 30, 45]) {
      const [phi, beta, c] = [radians(phiDeg), radians(betaDeg), 15];
      const turning = 2 * c * Math.tan(Math.PI / 4 + phi / 2);
      // without friction and at 45° the active state ends at the same stress: p is a square root there, then 0
      const corner = phiDeg === 0 && betaDeg === 45;
      expect(Math.abs(slopingCohesivePressure(turning, c, phi, beta))).toBeLessThan(corner ? 1e-6 : 1e-12);
      expect(slopingCohesivePressure(0.999 * turning, c, phi, beta)).toBeLessThan(0);
      if (!corner) expect(slopingCohesivePressure(1.001 * turning, c, phi, beta)).toBeGreaterThan(0);
      expect(slopingCohesiveForce(0, turning, 3, c, phi, beta)).toBe(0);
    }
});

test("vertical stress below 0 counts as 0", () => {
  expect(slopingCohesivePressure(-5, 10, 0.5, 0.2)).toBe(slopingCohesivePressure(0, 10, 0.5, 0.2));
  expect(slopingCohesiveForce(-50, -5, 3, 10, 0.5, 0.2)).toBe(0);
});

test("beyond the limit of the active state the root is 0 and the slope is unstable", () => {
  const [phi, beta, c] = [radians(20), radians(35), 10];
  const limit = (c * Math.cos(phi)) / (Math.cos(beta) * Math.sin(beta - phi));
  expect(slopeUnstable(limit * (1 - 1e-12), c, phi, beta)).toBe(false);
  expect(slopeUnstable(limit * (1 + 1e-12), c, phi, beta)).toBe(true);
  expect(slopeUnstable(1e9, c, phi, phi)).toBe(false);
  expect(slopeUnstable(1, 0, phi, beta)).toBe(true);
  expect(slopeUnstable(0, 0, phi, beta)).toBe(false);
  const s = 2 * limit;
  const [cb, cf, sf] = [Math.cos(beta), Math.cos(phi), Math.sin(phi)];
  expect(slopingCohesivePressure(s, c, phi, beta)).toBeCloseTo(
    cb * ((2 * cb * cb * s + 2 * c * cf * sf) / (cf * cf) - s),
    11,
  );
});

test("equal stress at both ends is the plain rectangle", () => {
  const [phi, beta, c] = [radians(25), radians(12), 8];
  const p = slopingCohesivePressure(90, c, phi, beta);
  expect(slopingCohesiveForce(90, 90, 3, c, phi, beta)).toBeCloseTo(3 * p, 12);
  expect(slopingCohesiveMoment(90, 90, 3, c, phi, beta)).toBeCloseTo(4.5 * p, 12);
});

test("a stretch without length, and stress below the turning point, give nothing", () => {
  expect(slopingCohesiveForce(0, 100, 0, 10, 0.5, 0.2)).toBe(0);
  expect(slopingCohesiveMoment(0, 100, 0, 10, 0.5, 0.2)).toBe(0);
  expect(slopingCohesiveForce(0, 5, 2, 10, 0.5, 0.2)).toBe(0);
});

test("force and moment in one go are those taken one by one", () => {
  const into = new Float64Array(2);
  for (const [s0, s1, c] of [
    [0, 100, 10],
    [100, 20, 5],
    [0, 100, 0],
    [0, 5, 10],
  ]) {
    slopingCohesiveThrust(into, s0, s1, 4, c, 0.5, 0.6);
    expect([...into]).toEqual([
      slopingCohesiveForce(s0, s1, 4, c, 0.5, 0.6),
      slopingCohesiveMoment(s0, s1, 4, c, 0.5, 0.6),
    ]);
  }
});
