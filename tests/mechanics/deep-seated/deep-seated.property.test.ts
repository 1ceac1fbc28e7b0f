import { expect, test } from "vitest";
import { deepSeated } from "../../../src/mechanics/deep-seated/deep-seated.ts";
import type { DeepSeatedGround, DeepSeatedLayer, DeepSeatedSoil } from "../../../src/mechanics/deep-seated/ground.ts";
import { factorAt, probeOf } from "../../../src/mechanics/deep-seated/probe.ts";
import { dice, drained, ordinaryGround, randomGround, undrained } from "./random-ground.ts";

/** The same ground with every soil changed. */
function withSoils(ground: DeepSeatedGround, change: (soil: DeepSeatedSoil) => DeepSeatedSoil): DeepSeatedGround {
  const layers = (list: readonly DeepSeatedLayer[]) => list.map((layer) => ({ ...layer, soil: change(layer.soil) }));
  return {
    ...ground,
    behind: { ...ground.behind, layers: layers(ground.behind.layers) },
    below: layers(ground.below),
    front: { ...ground.front, soil: change(ground.front.soil) },
  };
}

/** Factors of the same circles in two grounds of the same outline; those left out in either are not compared. */
function pairs(one: DeepSeatedGround, other: DeepSeatedGround, roll: () => number): readonly [number, number][] {
  const [a, b] = [probeOf(one), probeOf(other)];
  return Array.from({ length: 6 }, (): [number, number] => {
    const place = [3 * roll(), 2.5 * roll(), a.limits.levels.length * roll()];
    return [factorAt(a, place), factorAt(b, place)];
  }).filter(([x, y]) => x < 1000 && y < 1000);
}

const rounding = 1e-7;

test.each([
  ["friction", (soil: DeepSeatedSoil) => ({ ...soil, frictionAngle: Math.min(soil.frictionAngle * 1.1, 1) })],
  ["cohesion", (soil: DeepSeatedSoil) => ({ ...soil, cohesion: soil.cohesion * 1.2 + 1 })],
])("more %s never lowers the factor of a circle", (_, stronger) => {
  const roll = dice(31);
  let compared = 0;
  for (let i = 0; i < 80; i++) {
    const ground = randomGround(roll);
    for (const [plain, strong] of pairs(ground, withSoils(ground, stronger), roll)) {
      expect(strong).toBeGreaterThanOrEqual(plain * (1 - rounding));
      compared++;
    }
  }
  expect(compared).toBeGreaterThan(100);
});

test("strength times k is the factor times k where there is no friction", () => {
  const ground = ordinaryGround({
    behind: { slope: 0.1, layers: [{ soil: undrained(25) }] },
    below: [{ soil: undrained(35), bottom: -2 }, { soil: undrained(60) }],
    front: { level: 0.5, ignoreTop: 0, toeSoil: true, soil: undrained(20) },
  });
  const half = withSoils(ground, (soil) => ({ ...soil, cohesion: soil.cohesion / 2 }));
  const [whole, halved] = [deepSeated(ground).factor, deepSeated(half).factor];
  expect(whole / halved).toBeCloseTo(2, 4);
});

test("lengths times k and cohesion and loads times k leave the factor as it is (line loads times k²)", () => {
  const k = 2.5;
  const ground = ordinaryGround({
    below: [{ soil: drained(28, 6), bottom: -1.5 }, { soil: undrained(50) }],
    water: {},
    firmLevel: -4,
    loads: { surcharge: 8, strips: [{ pressure: 20, from: 1, width: 2 }], lines: [{ force: 15, at: 4 }] },
  });
  const { wall, front, behind, below, loads } = ground;
  const scaled = withSoils(
    {
      ...ground,
      wall: Object.fromEntries(
        Object.entries(wall).map(([key, value]) => [key, key === "unitWeight" ? value : (value as number) * k]),
      ) as unknown as DeepSeatedGround["wall"],
      behind: { ...behind, layers: [{ ...behind.layers[0], bottom: 2 * k }, behind.layers[1]] },
      below: [{ ...below[0], bottom: -1.5 * k }, below[1]],
      firmLevel: -4 * k,
      front: { ...front, level: front.level * k, ignoreTop: front.ignoreTop * k },
      loads: {
        surcharge: loads.surcharge * k,
        strips: [{ pressure: 20 * k, from: k, width: 2 * k }],
        lines: [{ force: 15 * k * k, at: 4 * k }],
      },
    },
    (soil) => ({ ...soil, cohesion: soil.cohesion * k }),
  );
  expect(deepSeated(scaled).factor / deepSeated(ground).factor).toBeCloseTo(1, 4);
});

test("a deeper firm level never raises the factor (within the search's 0.5 %)", () => {
  for (const below of [[{ soil: undrained(40) }], [{ soil: drained(25, 3), bottom: -2 }, { soil: undrained(30) }]]) {
    let last = Number.POSITIVE_INFINITY;
    for (const firmLevel of [-0.3, -0.8, -1.5, -3, -5, -8]) {
      const { factor } = deepSeated(ordinaryGround({ below, firmLevel }));
      expect(factor).toBeLessThanOrEqual(last * 1.005);
      last = factor;
    }
  }
});

test("more load behind lowers the factor, more water behind too, more soil in front raises it", () => {
  const base = deepSeated(ordinaryGround()).factor;
  const { front } = ordinaryGround();
  expect(deepSeated(ordinaryGround({ loads: { surcharge: 30, strips: [], lines: [] } })).factor).toBeLessThan(base);
  expect(deepSeated(ordinaryGround({ water: { behind: 3, front: 0.5 } })).factor).toBeLessThan(base);
  expect(deepSeated(ordinaryGround({ front: { ...front, level: 1.5 } })).factor).toBeGreaterThan(base);
  expect(deepSeated(ordinaryGround({ earthquake: { kh: 0.1, kv: 0 } })).factor).toBeLessThan(base);
});

test("small changes of any input make small changes of the factor", () => {
  const roll = dice(41);
  for (let i = 0; i < 5; i++) {
    const ground = { ...randomGround(roll) };
    const quiet = { ...ground, loads: { ...ground.loads, lines: [] } };
    const shifted = withSoils(quiet, (soil) => ({
      ...soil,
      frictionAngle: soil.frictionAngle * (1 + 1e-6),
      unitWeight: soil.unitWeight * (1 + 1e-6),
    }));
    const [one, other] = [deepSeated(quiet).factor, deepSeated(shifted).factor];
    expect(Math.abs(other / one - 1)).toBeLessThan(2e-3);
  }
});

test("a strip as long as the surface is a surcharge", () => {
  const strip = ordinaryGround({ loads: { surcharge: 0, strips: [{ pressure: 10, from: 0, width: 100 }], lines: [] } });
  expect(deepSeated(strip).factor).toBeCloseTo(deepSeated(ordinaryGround()).factor, 4);
});

test("cutting a layer in two of the same soil changes nothing", () => {
  const whole = ordinaryGround({ below: [{ soil: drained(27, 4) }] });
  const cut = ordinaryGround({ below: [{ soil: drained(27, 4), bottom: -1.3 }, { soil: drained(27, 4) }] });
  expect(deepSeated(cut).factor / deepSeated(whole).factor).toBeCloseTo(1, 4);
});
