import { expect, test } from "vitest";
import { directionsOf } from "../../src/drivers/directions.ts";
import { spaceOf, standardNormal, standardSpace } from "../reliability/straight-line.ts";

test("independent unknowns have one direction each", () => {
  const { own, alone, correlated } = directionsOf(standardSpace(3));
  expect(alone).toEqual(own);
  expect(correlated).toEqual([false, false, false]);
});

test("of two correlated unknowns each alone decides the rest beside the other", () => {
  const rows = [
    [1, 0],
    [0.6, 0.8],
  ];
  const { alone, correlated } = directionsOf(spaceOf([standardNormal, standardNormal], rows));
  expect(correlated).toEqual([true, true]);
  expect(Array.from(alone[0]!)).toEqual([expect.closeTo(0.8, 12), expect.closeTo(-0.6, 12)]);
  expect(Array.from(alone[1]!)).toEqual([expect.closeTo(0, 12), expect.closeTo(1, 12)]);
});

test("an unknown that the others fix decides nothing alone", () => {
  const half = Math.SQRT1_2;
  const rows = [
    [1, 0],
    [0, 1],
    [half, half],
  ];
  const { alone } = directionsOf(spaceOf([standardNormal, standardNormal, standardNormal], rows));
  expect(alone).toEqual([null, null, null]);
});

test("an unknown spread over two coordinates has the direction of its row", () => {
  const rows = [
    [0.6, 0.8, 0],
    [0, 0, 1],
  ];
  const { alone, correlated } = directionsOf(spaceOf([standardNormal, standardNormal], rows));
  expect(correlated).toEqual([false, false]);
  expect(Array.from(alone[0]!)).toEqual([0.6, 0.8, 0]);
});
