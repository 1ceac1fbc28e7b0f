import { describe, expect, test } from "vitest";
import { lengthOf } from "../../src/report/table.ts";
import { terminalAssess } from "../../src/report/terminal-assess.ts";
import { gallery, reportInput } from "./gallery.ts";
import { handMade } from "./hand-made.ts";

const { assess, study } = handMade;
const plain = (text: string): string => text.replaceAll("\u202f", " ");
const shown = (options: object = {}): string =>
  plain(terminalAssess(assess, study, { width: 100, colour: false, ...options }));

describe("toehold assess on a terminal", () => {
  test("opens with the wall, then each limit state, then the target", () => {
    const lines = shown().split("\n");
    expect(lines.slice(0, 6)).toEqual([
      "Hand-made wall (invented)",
      "The wall fails by sliding, overturning or bearing failure: about 1 in 238; between 1 in 216 and 1 in",
      "  263.",
      "Sliding: about 1 in 238; between 1 in 216 and 1 in 263.",
      "Overturning: no failure in 100 000 samples, which shows only that it is rarer than 1 in 27 000",
      "  (upper end of the 95 % interval).",
    ]);
    expect(shown()).toContain("The whole interval lies above the target of 1 in 1030");
  });

  test("echoes every unknown with moments, fractiles, knowledge and a picture at a width of 100", () => {
    const table = shown().slice(shown().indexOf("What was put in"));
    for (const heading of ["Distribution", "Mean", "Sd", "5 %", "95 %", "Knowledge", "Density"])
      expect(table).toContain(heading);
    expect(table).toMatch(
      /Friction angle of Medium sand +° +normal +32\.0 +2\.50 +27\.9 +36\.1 +100 % +[▁▂▃▄▅▆▇█]{10}/,
    );
  });

  test("names both pairs of moments of a cut distribution, and the measured values", () => {
    const [first, second] = assess.variables;
    const variables = [
      { ...first, distribution: "truncated_normal", parent: { mean: 33, sd: 3 } },
      { ...second, distribution: "measured", ticks: [1.2, 1.9, 2.4, 1.6] },
    ];
    const text = plain(terminalAssess({ ...assess, variables }, study, { width: 100, colour: false }));
    expect(text).toContain("Friction angle of Medium sand: mean 33.0° and sd 3.00° before the cut.");
    expect(text).toContain("Water level behind the wall: measured 1.20 m, 1.90 m, 2.40 m, 1.60 m.");
  });

  test("--all adds every method of every limit state", () => {
    expect(shown()).not.toContain("if lognormal");
    expect(shown({ all: true }).match(/if lognormal/g)).toHaveLength(3);
  });

  test.each([40, 60, 80, 100])("no line runs over a terminal of %d columns", async (width) => {
    const input = await reportInput(gallery["twelve layers and twenty-four unknowns"]);
    const text = terminalAssess(input.assess, input.study, { width, colour: false, all: true });
    const long = text.split("\n").filter((line) => lengthOf(line) > width);
    expect(long).toEqual([]);
  });

  test("a run that was stopped says so first", () => {
    const stopped = { ...assess, run: { ...assess.run, complete: false } };
    expect(terminalAssess(stopped, study, { width: 100, colour: false }).split("\n")[1]).toMatch(
      /^Stopped before its end/,
    );
  });
});
