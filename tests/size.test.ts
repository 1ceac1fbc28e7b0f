import { describe, expect, test } from "vitest";
import { check } from "../src/check.ts";
import { StudyError } from "../src/errors.ts";
import { normalUpperQuantile } from "../src/numeric/normal.ts";
import { size } from "../src/size.ts";
import { readDocument } from "../src/study/read-study.ts";

/** Dry, level ground, uncertain base friction alone: the probability of sliding has a closed form in every dimension. */
const tree = {
  title: "Sizing (invented)",
  wall: {
    stem: { height: 4.5, crest_width: 0.4, foot_width: 0.4 },
    base: { toe: 0.6, heel: 2.4, thickness: 0.5 },
    unit_weight: 24,
    sliding_friction: { angle: { normal: { mean: 27, sd: 2 } } },
  },
  soils: { sand: { unit_weight: 18, friction_angle: 32 } },
  ground: { behind: { layers: [{ soil: "sand" }] }, below: { soil: "sand" } },
  assessment: { limit_states: ["sliding"], seed: "size", samples: 400_000, target: { probability: 1e-4 } },
};
const study = readDocument(tree);

/** The heel at which N′ tan δ = E for the angle δ that is exceeded with probability 1 − p. N′ grows by a constant for each metre of heel. */
function closedForm(p: number): number {
  const driving = check(study).limitStates.sliding?.driving ?? 0;
  const angle = ((27 - 2 * normalUpperQuantile(p)) * Math.PI) / 180;
  const perMetre = 18 * 4.5 + 24 * 0.5;
  const rest = 24 * (0.4 * 4.5 + 0.5 * (0.6 + 0.4));
  return (driving / Math.tan(angle) - rest) / perMetre;
}

describe("sizing a dimension", () => {
  test("finds the heel that meets the target, as the closed form gives it", async () => {
    const found = await size(study, {
      vary: [{ path: "wall.base.heel", from: 1, to: 2.5, points: 6 }],
      precision: 0.02,
    });
    const heel = closedForm(1e-4);
    expect(found.meetsTargetSide).toBe("above");
    // 2 % of the probability is 2 %·dx/dlnp, about 0.002 m here; four standard errors and the tolerance of the root
    expect(Math.abs((found.meetsTargetAt ?? 0) - heel)).toBeLessThan(0.02);
    expect(found.atTarget?.probability).toBeGreaterThan(0.9e-4);
    expect(found.atTarget?.probability).toBeLessThan(1.1e-4);
    expect(found.atTarget?.factorAtMean.sliding).toBeGreaterThan(1);
  });

  test("falls steadily, because every point sees the same draws", async () => {
    const { points } = await size(study, { vary: [{ path: "wall.base.heel", from: 2, to: 3.5, points: 7 }] });
    for (let k = 1; k < points.length; k++) expect(points[k].probability).toBeLessThan(points[k - 1].probability);
    expect(points.map((point) => point.value)).toEqual([2, 2.25, 2.5, 2.75, 3, 3.25, 3.5]);
  });

  test("gives an index for every pair where two vary, and the same bits for the same seed", async () => {
    const vary = [
      { path: "wall.base.heel", from: 2, to: 3, points: 3 },
      { path: "wall.base.toe", from: 0.4, to: 0.8, points: 2 },
    ] as const;
    const one = await size(study, { vary });
    expect(one.points).toHaveLength(6);
    expect(one.points.map((point) => point.second)).toEqual([0.4, 0.4, 0.4, 0.8, 0.8, 0.8]);
    expect((await size(study, { vary })).points).toEqual(one.points);
    expect(one.meetsTargetAt).toBeUndefined();
  });

  test("says so where no value of the range meets the target", async () => {
    expect(
      (await size(study, { vary: [{ path: "wall.base.heel", from: 0.6, to: 1, points: 2 }] })).meetsTargetAt,
    ).toBeNull();
  });

  test.each([
    ["wall.base.heal", 1, 2, "wall.base.heal: is not a number of this study"],
    ["wall.base.heel", 3, 2, "varies from 3 to 2"],
    ["wall.base.heel", 1, 500, "varies beyond its range"],
  ])("refuses %s from %d to %d", async (path, from, to, words) => {
    const run = size(study, { vary: [{ path, from, to }] });
    await expect(run).rejects.toThrow(StudyError);
    await expect(run).rejects.toThrow(words);
  });
});

test("evidence is of the wall as it stands: a curve over other sizes leaves it out, and says so", async () => {
  const seen = readDocument({
    ...tree,
    evidence: [{ results: [26, 27], of: "wall.sliding_friction.angle", error: 1 }],
  });
  const vary = [{ path: "wall.base.heel", from: 2, to: 2.4, points: 2 }] as const;
  const [plain, noted] = [await size(study, { vary }), await size(seen, { vary })];
  expect(noted.points.map(({ probability }) => probability)).toEqual(
    plain.points.map(({ probability }) => probability),
  );
  expect(noted.warnings.map(({ path }) => path)).toContain("evidence");
  expect(plain.warnings.map(({ path }) => path)).not.toContain("evidence");
});
