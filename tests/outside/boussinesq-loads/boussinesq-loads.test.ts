import { expect, test } from "vitest";
import {
  lineLoadMoment,
  lineLoadPressure,
  lineLoadThrust,
  stripLoadMoment,
  stripLoadPressure,
  stripLoadThrust,
} from "../../../src/mechanics/formulas/surface-loads.ts";
import { type Case, disagreement, readCases } from "../cases.ts";

function found(row: Case): readonly [number, number, number] {
  const [load, from, to, height, depth] = [row.load, row.from, row.to, row.height, row.depth].map(Number);
  if (row.kind === "line")
    return [
      lineLoadPressure(load, from, depth),
      lineLoadThrust(load, from, height),
      lineLoadMoment(load, from, height),
    ];
  return [
    stripLoadPressure(load, from, to, depth),
    stripLoadThrust(load, from, to, height),
    stripLoadMoment(load, from, to, height),
  ];
}

test("pressure, thrust and moment of line and strip loads agree with numerical integration of point loads", () => {
  const rows = readCases(new URL("cases.csv", import.meta.url));
  expect(rows).toHaveLength(30);
  const wrong = rows.flatMap((row, i) => {
    const values = found(row);
    return [row.pressure, row.thrust, row.moment]
      .map((printed, k) =>
        disagreement(
          `${["pressure", "thrust", "moment"][k]} of row ${i + 1}`,
          values[k],
          printed,
          1e-11 * Number(printed),
        ),
      )
      .filter((text) => text !== "");
  });
  expect(wrong).toEqual([]);
});

test("a line load beside a very deep plane throws 2Q/π against it", () => {
  expect(lineLoadThrust(30, 0, 6)).toBeCloseTo(60 / Math.PI, 12);
  expect(lineLoadThrust(30, 2, 1e7)).toBeCloseTo(60 / Math.PI, 10);
});

test("a very wide strip beside the plane presses with its own pressure", () => {
  expect(stripLoadPressure(40, 0, 1e9, 2)).toBeCloseTo(40, 6);
  expect(stripLoadThrust(40, 0, 1e9, 5)).toBeCloseTo(200, 5);
  expect(stripLoadMoment(40, 0, 1e9, 5)).toBeCloseTo(500, 4);
});
