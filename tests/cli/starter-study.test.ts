import { describe, expect, test } from "vitest";
import { check } from "../../src/check.ts";
import { type StarterAnswers, starterStudy } from "../../src/cli/starter-study.ts";
import { readStudy } from "../../src/study/read-study.ts";

const sizes: readonly StarterAnswers[] = (["metric", "us"] as const).flatMap((units) =>
  (["cantilever", "gravity"] as const).flatMap((wall) =>
    [0.5, 2, 4, 12, 18].flatMap((metres) =>
      [0, 0.5].map((share) => {
        const height = units === "us" ? Number((metres * 3.28084).toFixed(1)) : metres;
        return { title: "A wall", units, wall, height, water: share * height };
      }),
    ),
  ),
);

describe("the study to start from", () => {
  test.each(sizes)("reads without complaint: $units, $wall, $height high, water to $water", (answers) => {
    const study = readStudy(starterStudy(answers));
    expect(study.water.behind === undefined).toBe(answers.water === 0);
    expect(study.wall.base === undefined).toBe(answers.wall === "gravity");
  });

  test.each(sizes.filter(({ units, height }) => height >= 2 && (units === "metric" || height > 6)))(
    "stands at its means: $units, $wall, $height high, water to $water",
    (answers) => {
      for (const state of Object.values(check(readStudy(starterStudy(answers))).limitStates))
        expect(state.factorOfSafety).toBeGreaterThan(1);
    },
  );

  test("keeps any title whole", () => {
    const title = 'Bay "3": #1 \\ { x }\n- y';
    expect(readStudy(starterStudy({ title, units: "metric", wall: "cantilever", height: 4, water: 0 })).title).toBe(
      title,
    );
  });

  test("says that its ground is invented", () => {
    expect(
      starterStudy({ title: "t", units: "metric", wall: "cantilever", height: 4, water: 2 }).match(/invented/g)?.length,
    ).toBeGreaterThan(3);
  });
});
