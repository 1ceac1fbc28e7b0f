import { expect, test } from "vitest";
import { deepSeated } from "../../../src/mechanics/deep-seated/deep-seated.ts";
import { factorCap } from "../../../src/mechanics/kernel.ts";
import { dice, drained, ordinaryGround, randomGround, undrained } from "./random-ground.ts";
import { thinSlices } from "./thin-slices.ts";

test("the critical circle of an ordinary wall, and its moments, are those of plain slices", () => {
  const ground = ordinaryGround();
  const found = deepSeated(ground);
  if (found.circle === undefined) throw new RangeError("no circle");
  expect(found.factor).toBeCloseTo(found.resisting / found.driving, 6);
  const slices = thinSlices(ground, found.circle, 10_000);
  expect(found.factor / slices.factor).toBeCloseTo(1, 4);
  expect(found.resisting / slices.resisting).toBeCloseTo(1, 4);
});

test("without room between base and firm level the factor is the cap, with a note", () => {
  const ground = ordinaryGround({ firmLevel: -0.01 });
  const { factor, resisting, driving, circle } = deepSeated(ground);
  expect({ factor, resisting, driving, circle }).toEqual({
    factor: factorCap,
    resisting: 0,
    driving: 0,
    circle: undefined,
  });
  expect(
    deepSeated(ground)
      .notes.map(({ message }) => message)
      .join(),
  ).toContain("no circle fits between the base and the firm level");
});

test("ground in front as high as behind drives nothing: the cap", () => {
  const clay = undrained(20);
  const high = ordinaryGround({
    wall: { ...ordinaryGround().wall, unitWeight: 18 },
    behind: { slope: 0, layers: [{ soil: clay }] },
    below: [{ soil: clay }],
    front: { level: 20, ignoreTop: 0, toeSoil: true, soil: clay },
    water: {},
    loads: { surcharge: 0, strips: [], lines: [] },
  });
  const { factor, driving } = deepSeated(high);
  expect(factor).toBe(factorCap);
  expect(driving).toBeLessThanOrEqual(0);
});

test("ground without any strength has the factor 0", () => {
  const slurry = undrained(0);
  const ground = ordinaryGround({
    behind: { slope: 0, layers: [{ soil: slurry }] },
    below: [{ soil: slurry }],
    front: { ...ordinaryGround().front, soil: slurry },
  });
  expect(deepSeated(ground).factor).toBe(0);
});

test("a weak seam below the base pulls the circle down to it", () => {
  const sand = drained(38);
  const seam = (strength: number) =>
    deepSeated(
      ordinaryGround({
        below: [{ soil: sand, bottom: -2 }, { soil: undrained(strength), bottom: -2.4 }, { soil: sand }],
      }),
    );
  const [weak, strong] = [seam(12), seam(2000)];
  expect(weak.factor).toBeLessThan(0.9 * strong.factor);
  if (weak.circle === undefined) throw new RangeError("no circle");
  expect(weak.circle.z - weak.circle.radius).toBeCloseTo(-2.4, 2);
});

test("the ignored top is dug away: circles leave at the lowered ground", () => {
  const ground = ordinaryGround();
  const dug = ordinaryGround({ front: { ...ground.front, ignoreTop: 1.6 } });
  const found = deepSeated(dug);
  expect(found.circle?.exitZ).toBeGreaterThanOrEqual(-0.6 - 1e-9);
  expect(found.circle?.exitZ).toBeLessThanOrEqual(0);
  expect(found.factor).toBeLessThan(deepSeated(ground).factor);
});

test("a load counts from the crest on to where the circle enters, at the entry too", () => {
  const at = 4.5;
  const loaded = deepSeated(ordinaryGround({ loads: { surcharge: 10, strips: [], lines: [{ force: 120, at }] } }));
  const { entryX } = loaded.circle ?? { entryX: 0 };
  expect(entryX).toBeGreaterThanOrEqual(1.3 + at - 1e-6);
  expect(loaded.factor).toBeLessThan(deepSeated(ordinaryGround()).factor);
});

test("25 random walls give a number between 0 and the cap, with some thousand circles each", () => {
  const roll = dice(77);
  for (let i = 0; i < 25; i++) {
    const { factor, resisting, driving, evaluations } = deepSeated(randomGround(roll));
    if (!(factor >= 0 && factor <= factorCap)) throw new RangeError(`wall ${i}: ${factor}`);
    if (!Number.isFinite(resisting) || !Number.isFinite(driving)) throw new RangeError(`wall ${i}: ${resisting}`);
    // about 10 µs each: what keeps a search under 0.1 s
    expect(evaluations).toBeLessThan(10_000);
  }
});
