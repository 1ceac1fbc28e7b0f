import { describe, expect, test } from "vitest";
import { assess } from "../../src/assess.ts";
import { displayIn } from "../../src/report/display.ts";
import { foldedSentence, foldRows, handRows, nextToNothing, probabilityPerSd } from "../../src/report/measures.ts";
import { probabilityText } from "../../src/report/number.ts";
import { fragility, fromDesignPoints, handMethodsTable, measuresOf } from "../../src/report/sections/measures.ts";
import { measuresOfState, measuresOfSystem } from "../../src/report/terminal-measures.ts";
import type { LimitStateAssessment } from "../../src/results.ts";
import { readDocument } from "../../src/study/read-study.ts";
import { gallery } from "./gallery.ts";

const display = displayIn("metric");
const options = { width: 90, colour: false };

describe("every measure, on terminal and page", async () => {
  const study = readDocument(gallery.plain);
  const result = await assess(study, { samples: 20_000, precision: 0, all: true });
  const sliding = result.limitStates.sliding as LimitStateAssessment;

  test("the terminal ranks every unknown, within its width", () => {
    const lines = measuresOfState(sliding, result, options).flatMap((line) => line.split("\n"));
    // a long name goes on in the line below, so its words are looked for one by one
    for (const { label } of result.variables)
      for (const word of label.split(" ")) expect(lines.join("\n")).toContain(word);
    expect(lines.filter((line) => /^ *\d+\. /.test(line))).toHaveLength(result.variables.length);
    expect(lines.filter((line) => [...line].length > 90)).toEqual([]);
    expect(lines.join("\n")).toContain("Point estimates, all corners");
  });

  test("the terminal gives the system from its design points and what one known value would mean", () => {
    const text = measuresOfSystem(result, display, options).join("\n");
    expect(text).toContain("Ditlevsen");
    expect(text).toContain("Correlation of their margins");
    expect(text).toContain("Probability of any failure");
  });

  test("the page shows the same, one table for each limit state", async () => {
    const html = `${measuresOf(result)}${handMethodsTable(result)}${fromDesignPoints(result)}${await fragility(result, display)}`;
    expect(html.match(/every measure side by side/g)).toHaveLength(Object.keys(result.limitStates).length);
    expect(html).toContain("Ditlevsen’s bounds");
    expect(html).toContain("If one value were known");
    expect(html).not.toContain("NaN");
  });

  test("nothing is shown where nothing was asked for", async () => {
    const short = await assess(study, { samples: 2000, precision: 0 });
    expect(measuresOf(short)).toBe("");
    expect(handMethodsTable(short)).toBe("");
    expect(fromDesignPoints(short)).toBe("");
    expect(await fragility(short, display)).toBe("");
    expect(measuresOfSystem(short, display, options)).toEqual([]);
    expect(handRows(short.limitStates.sliding as LimitStateAssessment)).toEqual([]);
  });
});

test("a change of probability that is not clear of its error reads 0", () => {
  expect(probabilityPerSd({ value: -2e-3, standardError: 1e-4 }, 2)).toBe(`−${probabilityText(4e-3)}`);
  expect(probabilityPerSd({ value: 1e-4, standardError: 1e-4 }, 2)).toBe("0");
  expect(probabilityPerSd({ value: null, standardError: null }, 2)).toBe("–");
});

test("rows that say next to nothing are named in one line where there are many, and keep theirs where there are few", () => {
  const rows = [0.4, 1e-4, 2e-4, 0, 5e-4].map((share, i) => ({ path: `x${i}`, share, shiftGivenFailure: null }));
  expect(foldRows(rows, nextToNothing).shown.map(({ path }) => path)).toEqual(["x0"]);
  expect(foldRows(rows.slice(0, 4), nextToNothing).folded).toEqual([]);
  expect(nextToNothing({ share: 1e-4, shiftGivenFailure: -0.3 })).toBe(false);
  expect(nextToNothing({ importance: 0, totalIndex: 0, rankCorrelation: 0.3 })).toBe(false);
  expect(foldedSentence(["Toe length", "Base thickness"])).toEqual([
    "Next to nothing by every measure here: toe length, base thickness.",
  ]);
  expect(foldedSentence([])).toEqual([]);
});
