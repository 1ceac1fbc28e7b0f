import { expect, test } from "vitest";
import { wallProfile } from "../../../src/mechanics/deep-seated/profile.ts";
import { layerAt } from "../../../src/mechanics/deep-seated/zone.ts";
import { dice, randomGround } from "./random-ground.ts";
import { columnOf, waterLevelAt } from "./thin-slices.ts";

test("what stands above a point of the ground is the sum of what is there, level by level, over 200 random walls", () => {
  const roll = dice(5);
  for (let i = 0; i < 200; i++) {
    const ground = randomGround(roll);
    const profile = wallProfile(ground);
    for (let k = 0; k < 3; k++) {
      const j = Math.floor(roll() * profile.bands);
      const x = profile.edges[j] + roll() * (profile.edges[j + 1] - profile.edges[j]);
      const z = -0.85 - 4 * roll();
      const column = columnOf(ground, x, z);
      const zone = profile.zones[j];
      const layer = layerAt(zone, z);
      const level = waterLevelAt(ground, x);
      const wet = level !== undefined && z < level;
      const line = (of: Float64Array): number => of[2 * j] + of[2 * j + 1] * x;
      const curve = (of: Float64Array): number => of[3 * j] + of[3 * j + 1] * x + of[3 * j + 2] * x * x;
      const gamma = wet ? zone.saturated[layer] : zone.moist[layer];
      const start = wet ? zone.saturatedStart[layer] : zone.moistStart[layer] + line(profile.lift);
      const momentStart = wet
        ? zone.saturatedMomentStart[layer]
        : zone.moistMomentStart[layer] + curve(profile.liftMoment);
      expect(line(profile.mass) - start - gamma * z).toBeCloseTo(column.mass, 6);
      expect(curve(profile.moment) - momentStart - (gamma * z * z) / 2).toBeCloseTo(column.moment, 5);
      expect(line(profile.load)).toBeCloseTo(column.load, 6);
      if (level !== undefined) expect(line(profile.water)).toBeCloseTo(level, 8);
      else expect(profile.water[2 * j]).toBe(Number.NEGATIVE_INFINITY);
    }
  }
});
