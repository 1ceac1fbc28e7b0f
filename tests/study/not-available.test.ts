import { expect, test } from "vitest";
import { notAvailable, refuseNotAvailable } from "../../src/study/not-available.ts";
import { noPlaces } from "./fixtures/read.ts";

function refused(tree: unknown, list = notAvailable): string[] {
  const findings = noPlaces();
  refuseNotAvailable(tree, list, findings);
  return findings.problems.map(({ path, message }) => `${path}: ${message}`);
}

test("a key or a value on the list is answered by its own name", () => {
  const list = [
    { path: "evidence" },
    { path: "assessment.limit_states.*", value: "deep_seated" },
    { path: "soils.*.age" },
  ];
  const tree = {
    evidence: [],
    assessment: { limit_states: ["sliding", "deep_seated"] },
    soils: { sand: { age: 1 }, clay: {} },
  };
  expect(refused(tree, list)).toEqual([
    "evidence: evidence is not available in this version",
    "assessment.limit_states.1: deep_seated is not available in this version",
    "soils.sand.age: age is not available in this version",
  ]);
});

test("what is not there is not answered", () => {
  const list = [{ path: "evidence" }, { path: "assessment.limit_states.*", value: "deep_seated" }];
  for (const tree of [{}, { assessment: { limit_states: ["sliding"] } }, null, "text", { assessment: 3 }])
    expect(refused(tree, list)).toEqual([]);
});
