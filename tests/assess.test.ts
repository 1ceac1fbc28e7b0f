import { describe, expect, test } from "vitest";
import { assess, cautiousPoint } from "../src/assess.ts";
import { check } from "../src/check.ts";
import { readDocument } from "../src/study/read-study.ts";
import { gallery } from "./report/gallery.ts";

const messages = (result: { warnings: readonly { path: string; message: string }[] }): string =>
  result.warnings.map(({ path, message }) => `${path}: ${message}`).join("\n");

describe("an assessment", () => {
  test("finds the probability that a closed form gives: a wall whose only unknown is its base friction", async () => {
    // F = N′ tan δ / E is 1 at one angle δ*; P(F < 1) = Φ((δ* − mean)/sd).
    const tree = {
      ...gallery["nothing uncertain"],
      wall: { ...(gallery.plain.wall as object), sliding_friction: { angle: { normal: { mean: 24, sd: 2.5 } } } },
      assessment: { limit_states: ["sliding"], seed: "closed", samples: 200_000, precision: 0 },
    };
    const study = readDocument(tree);
    const { driving, resisting } = check(study).limitStates.sliding ?? { driving: 0, resisting: 0 };
    const critical = (Math.atan((driving / resisting) * Math.tan((24 * Math.PI) / 180)) * 180) / Math.PI;
    const { normalCdf } = await import("../src/numeric/normal.ts");
    const expected = normalCdf((critical - 24) / 2.5);
    const found = (await assess(study)).system.monteCarlo;
    expect(expected).toBeGreaterThan(1e-3);
    expect(Math.abs(found.probability - expected)).toBeLessThan(
      4.89 * Math.sqrt((expected * (1 - expected)) / found.samples),
    ); // one seed in a million
  });

  test("adding a variable that nothing uses changes no bit of the rest", async () => {
    const study = readDocument(gallery.plain);
    const more = readDocument({
      ...gallery.plain,
      soils: {
        ...(gallery.plain.soils as object),
        spare: { unit_weight: 18, friction_angle: { normal: { mean: 30, sd: 3 } } },
      },
    });
    const [one, other] = [await assess(study), await assess(more)];
    expect(other.limitStates).toEqual(one.limitStates);
    expect(other.system).toEqual(one.system);
    expect(other.variables).toEqual(one.variables);
  });

  test("one more uncertain value moves no draw of the others", async () => {
    const study = readDocument(gallery.plain);
    const more = readDocument({
      ...gallery.plain,
      wall: { ...(gallery.plain.wall as object), unit_weight: { normal: { mean: 24, sd: 1e-9 } } },
    });
    const [one, other] = [await assess(study), await assess(more)];
    expect(other.limitStates.sliding?.monteCarlo.failures).toBe(one.limitStates.sliding?.monteCarlo.failures);
    expect(other.limitStates.bearing?.monteCarlo.failures).toBe(one.limitStates.bearing?.monteCarlo.failures);
  });

  test("warns where model uncertainty is missing, with published figures, and is silent where it is given", async () => {
    expect(messages(await assess(readDocument(gallery.plain)))).toMatch(
      /no model uncertainty is given.*JCSS Probabilistic Model Code/,
    );
    const given = readDocument({
      ...gallery.plain,
      model: { factors: { earth_thrust: { lognormal: { mean: 1, sd: 0.1 } } } },
    });
    expect(messages(await assess(given))).not.toContain("no model uncertainty");
  });

  test("says what no failures mean, and that a probability without yearly values is not per year", async () => {
    const result = await assess(readDocument(gallery["zero failures"]));
    expect(result.system.monteCarlo.failures).toBe(0);
    expect(messages(result)).toContain("not that the wall cannot fail");
    expect(messages(result)).toContain("is not per year");
    expect(result.cautions.join(" ")).toContain("licensed engineer");
  });

  test("counts samples on a slope steeper than its soil, and gives the probability among the others", async () => {
    const steep = readDocument({
      ...gallery.plain,
      ground: { ...(gallery.plain.ground as object), behind: { slope: 30, layers: [{ soil: "fill" }] } },
      water: undefined,
    });
    const result = await assess(steep);
    const { counts, probabilityAmongStable, probability } = result.system.monteCarlo;
    expect(counts.slopeUnstable).toBeGreaterThan(50); // P(φ < 30°) = Φ(−2) of 6000
    expect(probabilityAmongStable).toBeLessThanOrEqual(probability);
    expect(messages(result)).toContain("steeper than the soil");
  });

  test("a target is met only where the whole interval lies below it", async () => {
    const aim = (probability: number) =>
      readDocument({
        ...gallery.plain,
        assessment: { seed: "gallery", samples: 6000, precision: 0, target: { probability } },
      });
    const { interval } = (await assess(readDocument(gallery.plain))).bestEstimate;
    expect((await assess(aim(interval[1] * 1.01))).bestEstimate.meetsTarget).toBe(true);
    expect((await assess(aim((interval[0] + interval[1]) / 2))).bestEstimate.meetsTarget).toBe(false);
  });

  test("cautious values are each at the adverse 5 % fractile", () => {
    const point = cautiousPoint(readDocument(gallery.plain));
    expect(point.values["soils.sand.friction_angle"]).toBeCloseTo(32 - 2.5 * 1.6448536269514722, 9);
    expect(point.values["water.behind.level"]).toBeGreaterThan(2.5);
  });
});
