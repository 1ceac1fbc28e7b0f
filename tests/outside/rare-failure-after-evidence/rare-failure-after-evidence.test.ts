import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { assess } from "../../../src/assess.ts";
import { readStudy } from "../../../src/study/read-study.ts";
import { readCases } from "../cases.ts";

const here = new URL(".", import.meta.url);

describe("probability of failure after evidence, against brute force", () => {
  test.each(readCases(new URL("cases.csv", here)))("$study", async (row) => {
    const study = readStudy(readFileSync(new URL(`${row.study}.yaml`, here), "utf8"));
    const { bestEstimate, evidence, system } = await assess(study, { samples: 32_768, precision: 0.05 });
    const [expected, spread] = [Number(row.probability), Number(row.standard_error)];
    // about 1e-5; each fails 1 in 15 000
    const allowed = 4 * Math.hypot(bestEstimate.standardError, spread);
    expect(Math.abs(bestEstimate.probability - expected)).toBeLessThan(allowed);
    expect(bestEstimate.standardError).toBeLessThan(0.1 * expected);
    expect(bestEstimate.interval[0]).toBeLessThan(bestEstimate.probability);
    expect(bestEstimate.crossCheck?.agrees).toBe(true);
    expect(Math.abs(evidence!.probability - expected)).toBeLessThan(4 * Math.hypot(evidence!.standardError, spread));
    // the same share of samples agrees as the chance of what was survived says; fails 1 in 15 000
    const chance = evidence!.chanceOfEvidence;
    if (chance !== null && study.evidence.every((entry) => entry.kind === "survived"))
      expect(Math.abs(system.monteCarlo.samples / 32_768 - chance)).toBeLessThan(0.01);
  });
});
