import { expect, test } from "vitest";
import { positiveForce, positiveMoment } from "../../../src/mechanics/formulas/linear-pressure.ts";
import {
  activeCoefficientRankine,
  passiveCoefficientRankine,
  rootActiveCoefficientRankine,
} from "../../../src/mechanics/formulas/rankine.ts";
import { disagreement, halfUnit, radians, readCases } from "../cases.ts";

const waterUnitWeight = 9.81;

/** Two sands, water table at the boundary. */
function sands(): Record<string, number> {
  const upper = activeCoefficientRankine(radians(30));
  const lower = activeCoefficientRankine(radians(35));
  const at3 = 16 * 3;
  const added = lower * (18 - waterUnitWeight) * 3;
  const u = waterUnitWeight * 3;
  const forces = [
    positiveForce(0, upper * at3, 3),
    positiveForce(lower * at3, lower * at3, 3),
    positiveForce(0, added, 3),
    positiveForce(0, u, 3),
  ];
  const total = forces[0] + forces[1] + forces[2] + forces[3];
  const moment =
    positiveMoment(0, upper * at3, 3) +
    3 * forces[0] +
    positiveMoment(lower * at3, lower * at3 + added, 3) +
    positiveMoment(0, u, 3);
  return {
    "upper pressure at 3 m": upper * at3,
    "lower pressure at 3 m": lower * at3,
    "pressure at 6 m": lower * at3 + added,
    "water pressure at 6 m": u,
    "force 1": forces[0],
    "force 2": forces[1],
    "force 3": forces[2],
    "force of water": forces[3],
    total,
    "height of total": moment / total,
  };
}

/** Passive pressure with cohesion below the water table. */
function passive(): Record<string, number> {
  const upper = passiveCoefficientRankine(radians(30));
  const lower = passiveCoefficientRankine(radians(26));
  const bond = (2 * 10) / rootActiveCoefficientRankine(radians(26));
  const at2 = 15.72 * 2;
  const at3 = at2 + (18.86 - waterUnitWeight);
  const water = positiveForce(0, waterUnitWeight, 1);
  return {
    "upper pressure at 2 m": upper * at2,
    "lower pressure at 2 m": lower * at2 + bond,
    "pressure at 3 m": lower * at3 + bond,
    "force of water": water,
    total: positiveForce(0, upper * at2, 2) + positiveForce(lower * at2 + bond, lower * at3 + bond, 1) + water,
  };
}

const interfacePressures = {
  "upper pressure": 48 * activeCoefficientRankine(radians(30)),
  "lower pressure": 48 * activeCoefficientRankine(radians(36)),
};

test("pressures on both sides of a boundary, forces and their height agree with every row of the table", () => {
  const found: Record<string, Record<string, number>> = {
    sands: sands(),
    passive: passive(),
    interface: interfacePressures,
  };
  const rows = readCases(new URL("cases.csv", import.meta.url));
  expect(rows).toHaveLength(17);
  const wrong = rows
    .map((row) => {
      const tolerance = row.example === "interface" ? 0.02 : halfUnit(row.value);
      return disagreement(`${row.example}, ${row.quantity}`, found[row.example][row.quantity], row.value, tolerance);
    })
    .filter((text) => text !== "");
  expect(wrong).toEqual([]);
});
