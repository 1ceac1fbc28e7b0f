import { expect, test } from "vitest";
import { findDesignPoints } from "../../../src/reliability/design-points.ts";
import { curvaturesAt, secondOrder } from "../../../src/reliability/second-order.ts";
import { standardSpace, statesOfMargins } from "../../reliability/straight-line.ts";
import { readCases } from "../cases.ts";

const rows = readCases(new URL("cases.csv", import.meta.url)).map((row) => ({
  breitung: row.Pf_Breitung,
  hohenbichlerRackwitz: row.Pf_Hohenbichler_Rackwitz,
  index: Number(row.beta),
  curvatures: row.curvatures.split(" ").map(Number),
}));
const halfUnit = (text: string): number => 0.501 * 10 ** (Number(text.split("e")[1]) - 6);

test("Breitung and Hohenbichler–Rackwitz agree to the printed digits", () => {
  expect(rows.length).toBe(21);
  for (const row of rows) {
    const found = secondOrder(row.index, row.curvatures)!;
    expect(Math.abs(found.breitung - Number(row.breitung)), row.curvatures.join()).toBeLessThan(halfUnit(row.breitung));
    expect(Math.abs(found.hohenbichlerRackwitz - Number(row.hohenbichlerRackwitz)), row.curvatures.join()).toBeLessThan(
      halfUnit(row.hohenbichlerRackwitz),
    );
  }
});

test("search and differences find index and curvatures, turned out of the axes", () => {
  for (const { index, curvatures } of rows) {
    const d = curvatures.length + 1;
    // a rotation that mixes all coordinates: reflection in the plane at right angles to (1, 2, …, d)
    const mirror = Array.from({ length: d }, (_, i) => i + 1);
    const square = mirror.reduce((sum, v) => sum + v * v, 0);
    const states = statesOfMargins(d, {
      paraboloid: (u) => {
        const along = mirror.reduce((sum, v, i) => sum + v * u[i], 0);
        const turned = u.map((value, i) => value - (2 * along * mirror[i]) / square);
        return index + curvatures.reduce((sum, k, i) => sum + 0.5 * k * turned[i] ** 2, 0) - turned[d - 1];
      },
    });
    const [point] = findDesignPoints(states, standardSpace(d), "paraboloid").states[0].points;
    expect(point.reliabilityIndex, `${index} ${curvatures}`).toBeCloseTo(index, 6);
    const found = curvaturesAt(states, point);
    expect(found.smooth).toBe(true);
    [...curvatures]
      .sort((a, b) => b - a)
      .forEach((curvature, i) => {
        expect(Math.abs(found.values[i] - curvature), `${index} ${curvatures}`).toBeLessThan(1e-4);
      });
  }
});
