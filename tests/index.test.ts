import { expect, test } from "vitest";
import * as toehold from "../src/index.ts";

const text = `
title: Library wall (invented)
wall:
  stem: { height: 4, crest_width: 0.3, foot_width: 0.5 }
  base: { toe: 0.7, heel: 2.2, thickness: 0.4 }
  unit_weight: 24
  sliding_friction: { ratio: 0.8 }
soils: { sand: { unit_weight: 18, friction_angle: { normal: { mean: 33, sd: 2 } } } }
ground: { behind: { layers: [ { soil: sand } ] }, below: { soil: sand } }
assessment: { seed: library, samples: 2000 }
`;

test("the public door reads, checks, assesses and reports a study", async () => {
  const study = toehold.readStudy(text);
  const checked = toehold.check(study);
  const assessed = await toehold.assess(study);
  expect(checked.limitStates.sliding?.factorOfSafety).toBeGreaterThan(1);
  expect(assessed.system.monteCarlo.samples).toBe(2000);
  expect(await toehold.report({ study, check: checked, assess: assessed })).toContain("Library wall (invented)");
  expect(JSON.parse(toehold.resultJson(checked)).kind).toBe("check");
  expect(toehold.studyJsonSchema()).toHaveProperty("properties");
  expect(() => toehold.readStudy("title: x")).toThrow(toehold.StudyError);
});
