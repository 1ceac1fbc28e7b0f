import { expect, test } from "vitest";
import { columnAt, waterLevels, waterLineAt } from "../../../src/mechanics/deep-seated/column.ts";
import { zonesOf } from "../../../src/mechanics/deep-seated/zone.ts";
import { ordinaryGround } from "./random-ground.ts";

const at = (ground = ordinaryGround(), x = 0) => columnAt(ground, zonesOf(ground), waterLevels(ground), x);

test("over the heel stand slab, soil above and below the water, and the surcharge", () => {
  const { mass, load } = at(ordinaryGround(), 3);
  expect(mass).toBeCloseTo(0.5 * 24 + 0.5 * 20 + 1 * 18 + 3.5 * 19, 10);
  expect(load).toBe(10);
});

test("over the toe stand slab and soil up to the front level, or the slab alone", () => {
  const ground = ordinaryGround();
  expect(at(ground, 0.4).mass).toBeCloseTo(0.5 * 24 + 0.5 * 18, 10);
  expect(at({ ...ground, front: { ...ground.front, toeSoil: false } }, 0.4).mass).toBeCloseTo(0.5 * 24, 10);
});

test("free water above the soil over the toe, or above the slab without that soil, is a load", () => {
  const ground = ordinaryGround({ water: { front: 3 } });
  expect(at(ground, 0.4).load).toBeCloseTo(9.81 * 2, 10);
  expect(at({ ...ground, front: { ...ground.front, toeSoil: false } }, 0.4).load).toBeCloseTo(9.81 * 2.5, 10);
  expect(at(ground, -1).load).toBeCloseTo(9.81 * 2.3, 10);
});

test("a key is wall instead of ground", () => {
  const ground = ordinaryGround({ water: {} });
  const wall = { ...ground.wall, key: { fromToe: 2, width: 0.5, depth: 0.8 } };
  expect(at({ ...ground, wall }, 2.2).mass - at(ground, 2.2).mass).toBeCloseTo(0.8 * (24 - 18), 10);
});

test("the water line runs straight under the base; a dry side counts as the underside there, and stays dry itself", () => {
  const both = ordinaryGround({ water: { behind: 2, front: -1 } });
  const line = (ground: typeof both, x: number) => waterLineAt(ground, waterLevels(ground), x);
  expect([-1, 0, 4, 9].map((x) => line(both, x))).toEqual([-1, -1, 2, 2]);
  expect(line(both, 1.85)).toBeCloseTo(0.5, 12);
  const frontAlone = ordinaryGround({ water: { front: -1 } });
  expect(line(frontAlone, 1.85)).toBeCloseTo(-0.5, 12);
  expect(line(frontAlone, 5)).toBe(Number.NEGATIVE_INFINITY);
});

test("water stands no higher than the top of the virtual back behind and the crest in front", () => {
  const levels = waterLevels(
    ordinaryGround({
      water: { behind: 50, front: 50 },
      behind: { slope: 0.1, layers: ordinaryGround().behind.layers },
    }),
  );
  expect(levels.behind).toBeCloseTo(5.5 + 2.4 * Math.tan(0.1), 10);
  expect(levels.front).toBe(5.5);
});
