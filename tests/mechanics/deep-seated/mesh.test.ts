import { expect, test } from "vitest";
import { distinctValleys, layMesh, lineEntries, valleysOf } from "../../../src/mechanics/deep-seated/mesh.ts";
import { probeOf } from "../../../src/mechanics/deep-seated/probe.ts";
import { drained, ordinaryGround } from "./random-ground.ts";

const coarse = { entries: 6, exits: 5, depths: 2, starts: 3 };

test("valleys are nodes that no neighbour lies below, the deepest first", () => {
  const mesh = layMesh(probeOf(ordinaryGround()), coarse);
  const valleys = valleysOf(mesh);
  expect(valleys.length).toBeGreaterThan(0);
  expect(valleys[0].factor).toBe(Math.min(...mesh.factors));
  expect(valleys.map(({ factor }) => factor)).toEqual([...valleys.map(({ factor }) => factor)].sort((a, b) => a - b));
});

test("planes lie where circles touch the base, are tangent to a layer or firm ground, and at loads and the farthest entry", () => {
  const soil = drained(30);
  const ground = ordinaryGround({
    below: [{ soil, bottom: -1 }, { soil }],
    loads: { surcharge: 0, strips: [], lines: [{ force: 20, at: 5 }] },
  });
  const probe = probeOf(ground);
  const { planes } = layMesh(probe, coarse);
  expect(planes.filter(({ axis }) => axis === 2)).toHaveLength(3);
  expect(planes.filter(({ axis }) => axis === 0)).toHaveLength(2);
  expect(lineEntries(probe)[0]).toBeCloseTo((1.3 + 5 - 3.7) / 5.5, 12);
});

test("valleys that are all but the same place count once, the deeper one", () => {
  const kept = distinctValleys([
    { place: [1, 1, 1], factor: 1.2 },
    { place: [1.01, 1.02, 1.1], factor: 1.1 },
    { place: [2, 1, 1], factor: 1.5 },
  ]);
  expect(kept.map(({ factor }) => factor)).toEqual([1.1, 1.5]);
});
