import { describe, expect, test } from "vitest";
import {
  againstTarget,
  allFailed,
  designPointWords,
  type Estimate,
  estimateSentence,
  multipleText,
  noneSeen,
  orList,
  periodSentence,
  standing,
  targetName,
  wallEstimate,
  within,
} from "../../src/report/wording.ts";
import { handMade } from "./hand-made.ts";

const plain = (text: string): string => text.replaceAll("\u202f", " ");
const counted = (failures: number, samples: number, interval: readonly [number, number]): Estimate => ({
  probability: failures / samples,
  interval,
  reliabilityIndex: null,
  counted: { failures, samples },
});

describe("sentences of the page and the terminal", () => {
  test("an estimate is a sentence with its interval", () => {
    expect(estimateSentence(counted(400, 96_000, [1 / 255, 1 / 225]))).toBe(
      "about 1 in 240; between 1 in 225 and 1 in 255",
    );
    expect(estimateSentence({ probability: 1e-6, interval: [9e-7, 1.1e-6], reliabilityIndex: 4.75 })).toContain("1 in");
  });

  test("no failure seen is an upper limit, and never reads as proof of anything else", () => {
    const none = counted(0, 131_072, [0, 2.8e-5]);
    expect(noneSeen(none)).toBe(true);
    expect(plain(estimateSentence(none))).toBe(
      "no failure in 131 072 samples, which shows only that it is rarer than 1 in 35 700 (upper end of the 95 % interval)",
    );
    expect(estimateSentence(none)).not.toMatch(/safe|impossible|cannot/i);
  });

  test("nothing but failures is said plainly", () => {
    const all = counted(500, 500, [0.9926, 1]);
    expect(allFailed(all)).toBe(true);
    expect(estimateSentence(all)).toBe("failure in every one of 500 samples");
  });

  test("an interval lies below, above or about the target", () => {
    expect(standing({ interval: [1e-4, 9e-4] }, 1e-3)).toBe("below");
    expect(standing({ interval: [1.1e-3, 2e-3] }, 1e-3)).toBe("above");
    expect(standing({ interval: [9e-4, 2e-3] }, 1e-3)).toBe("open");
    expect(standing({ interval: [0, 2e-3] }, 1e-3)).toBe("open");
  });

  test("the target is named with its index and its reason, and how many times it is missed", () => {
    expect(plain(targetName(handMade.assess))).toBe("1 in 1030 (index 3.10; invented brief)");
    expect(plain(againstTarget(handMade.assess).join(" "))).toBe(
      "The whole interval lies above the target of 1 in 1030 (index 3.10; invented brief): 4.3 times the target.",
    );
    expect(againstTarget({ ...handMade.assess, target: undefined })).toEqual([]);
    expect(plain(multipleText(1, 1e-7))).toBe("over 10 000 times the target");
    expect(multipleText(0, 1e-3)).toBe("");
  });

  test("a period is named with the wall, and one year beside it", () => {
    const { assess } = handMade;
    expect(within(assess)).toBe("");
    expect(periodSentence(assess)).toContain("not per year");
    const years = { ...assess, bestEstimate: { ...assess.bestEstimate, years: 50 } };
    expect(within(years)).toBe(" within 50 years");
    expect(periodSentence(years)).toContain("is of 50 years");
  });

  test("the wall's estimate is a count only where it is one", () => {
    const { assess } = handMade;
    expect(wallEstimate(assess).counted?.failures).toBe(assess.system.monteCarlo.failures);
    const weighted = { ...assess, bestEstimate: { ...assess.bestEstimate, method: "importance sampling" } };
    expect(wallEstimate(weighted).counted).toBeUndefined();
    const period = {
      years: 50,
      probability: 0.1,
      standardError: 0.01,
      interval: [0.08, 0.12] as const,
      periods: 1000,
      failures: 100,
      yearlyGivenSurvival: [0.002],
    };
    expect(wallEstimate({ ...assess, system: { ...assess.system, period } }).counted).toEqual({
      failures: 100,
      samples: 1000,
      of: "periods",
    });
  });

  test("words are joined as one says them", () => {
    expect(orList(["sliding"])).toBe("sliding");
    expect(orList(["sliding", "overturning", "bearing failure"])).toBe("sliding, overturning or bearing failure");
  });
});

test("the end of a search for a design point reads in plain words", () => {
  expect(designPointWords({ status: "smooth" })).toBe("design point found");
  const others = [3.95, 4.2].map((reliabilityIndex) => ({ reliabilityIndex, status: "smooth", designPoint: {} }));
  expect(designPointWords({ status: "corner", others })).toBe(
    "design point found, at a kink of the limit state; others at index 3.95 and 4.20",
  );
  expect(designPointWords({ status: "usable" })).toContain("did not settle");
  expect(designPointWords({ status: "none" })).toBe("no design point: nothing within reach fails");
});
