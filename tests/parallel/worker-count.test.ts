import { expect, test } from "vitest";
import { workersFor } from "../../src/parallel/worker-count.ts";
import { readStudy } from "../../src/study/read-study.ts";
import { benchText } from "./bench-text.ts";

const study = readStudy(benchText);
const searched = { ...study, assessment: { ...study.assessment, limitStates: ["deep_seated" as const] } };

test("a run is spread over the cores only where each worker has a million samples", () => {
  expect([1, 1e5, 1e6, 1.9e6].map((samples) => workersFor(study, samples, 8))).toEqual([1, 1, 1, 1]);
  expect([2e6, 5e6, 1e8].map((samples) => workersFor(study, samples, 8))).toEqual([2, 5, 8]);
});

test("one core has one worker, and no machine more than 32", () => {
  expect(workersFor(study, 1e9, 1)).toBe(1);
  expect(workersFor(study, 1e9, 96)).toBe(32);
});

test("where each sample holds a search, far fewer samples are worth it, but each worker has blocks of its own", () => {
  expect(workersFor(searched, 20_000, 8)).toBe(1);
  expect(workersFor(searched, 200_000, 8)).toBe(3);
});
