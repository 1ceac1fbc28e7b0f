import { expect, test } from "vitest";
import { activeCoefficientCoulomb } from "../../../src/mechanics/formulas/coulomb.ts";
import { activeCoefficientMononobeOkabe } from "../../../src/mechanics/formulas/mononobe-okabe.ts";
import { activeCoefficientRankine, activeCoefficientRankineSloping } from "../../../src/mechanics/formulas/rankine.ts";
import { radians } from "../../outside/cases.ts";

test("a smooth vertical face and level ground give Rankine's coefficient", () => {
  for (let deg = 0; deg <= 60; deg++)
    expect(activeCoefficientCoulomb(radians(deg), 0, 0, 0)).toBeCloseTo(activeCoefficientRankine(radians(deg)), 14);
});

test("wall friction equal to the slope on a vertical face gives Rankine's coefficient for slopes", () => {
  for (const [phi, beta] of [
    [20, 15],
    [34, 10],
    [40, 40],
    [60, 45],
    [30, 29.9],
  ])
    expect(activeCoefficientCoulomb(radians(phi), radians(beta), 0, radians(beta))).toBeCloseTo(
      activeCoefficientRankineSloping(radians(phi), radians(beta)),
      13,
    );
});

test("it is the formula as printed, term by term", () => {
  const [phi, delta, theta, beta] = [34, 20, 12, 8].map(radians);
  const root = Math.sqrt(
    (Math.sin(phi + delta) * Math.sin(phi - beta)) / (Math.cos(delta + theta) * Math.cos(theta - beta)),
  );
  const printed = Math.cos(phi - theta) ** 2 / (Math.cos(theta) ** 2 * Math.cos(delta + theta) * (1 + root) ** 2);
  expect(activeCoefficientCoulomb(phi, delta, theta, beta)).toBeCloseTo(printed, 15);
});

test("a slope steeper than the friction angle takes the root as 0 and meets the limit from below", () => {
  const phi = radians(25);
  const at = activeCoefficientCoulomb(phi, radians(10), 0, phi);
  expect(activeCoefficientCoulomb(phi, radians(10), 0, radians(30))).toBe(at);
  expect(at).toBeCloseTo(Math.cos(phi) ** 2 / Math.cos(radians(10)), 14);
  expect(activeCoefficientCoulomb(phi, radians(10), 0, phi - 1e-14)).toBeCloseTo(at, 5);
});

test("without earthquake the coefficient of Mononobe and Okabe is Coulomb's bit for bit", () => {
  for (const [phi, delta, theta, beta] of [
    [34, 20, 12, 8],
    [25, 0, 0, 30],
    [60, 45, 45, 45],
  ])
    expect(activeCoefficientMononobeOkabe(radians(phi), radians(delta), radians(theta), radians(beta), 0)).toBe(
      activeCoefficientCoulomb(radians(phi), radians(delta), radians(theta), radians(beta)),
    );
});

test("a thrust that would point straight down keeps the coefficient finite", () => {
  const k = activeCoefficientCoulomb(radians(20), radians(45), radians(45), radians(45));
  expect(k).toBeGreaterThan(0);
  expect(k).toBeLessThan(200);
});
