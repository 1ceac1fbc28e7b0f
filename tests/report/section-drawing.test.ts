import { describe, expect, test } from "vitest";
import { check } from "../../src/check.ts";
import { displayIn } from "../../src/report/display.ts";
import { drawingWidth, sectionDrawing } from "../../src/report/section-drawing.ts";
import type { Section } from "../../src/results.ts";
import { readDocument } from "../../src/study/read-study.ts";
import { gallery } from "./gallery.ts";
import { handMade } from "./hand-made.ts";

const metric = displayIn("metric");
const { section, pressure } = handMade.check;
const draw = (s: Section, more: object = {}): string =>
  sectionDrawing(s, metric, { id: "t", title: "A wall", pressure, ...more });
const wordsOf = (svg: string): readonly string[] => [...svg.matchAll(/<text [^>]*>([^<]*)</g)].map((match) => match[1]);

describe("the section", () => {
  test("names its soils, dimensions, levels, loads and pressures", () => {
    const words = wordsOf(draw(section, { water: { behind: [0.6, 3.1] } }));
    for (const expected of ["Gravel fill", "to 2.00 m", "Medium sand", "4.50", "0.50", "0.80", "2.40", "3.70", "0.30"])
      expect(words).toContain(expected);
    expect(words).toContain("1.70 m (0.60 to 3.10)");
    expect(words).toContain("10.0 kPa");
    for (const jump of ["18.2", "20.6", "26.4", "16.7"]) expect(words).toContain(jump);
  });

  test("is true to scale: the stem's height and the base's width stand in their ratio", () => {
    const outline = /<polygon points="([^"]*)" fill="#aab1b2"/.exec(draw(section))?.[1] ?? "";
    const points = outline.split(" ").map((pair) => pair.split(",").map(Number));
    const span = (place: 0 | 1): number =>
      Math.max(...points.map((point) => point[place])) - Math.min(...points.map((point) => point[place]));
    expect(span(0) / span(1)).toBeCloseTo(3.7 / 5, 2);
  });

  test("says the same in words for those who cannot see it", () => {
    const svg = draw(section, { water: { behind: [0.6, 3.1] } });
    expect(svg).toContain('role="img" aria-labelledby="t-title t-words"');
    expect(svg).toContain('<title id="t-title">A wall</title>');
    expect(svg).toMatch(
      /<desc id="t-words">Section to scale\. Stem 4\.50 m high, base 3\.70 m wide.*water at 1\.70 m, likely between 0\.600 m and 3\.10 m/,
    );
  });

  test("stands in site levels and US units where the study does", () => {
    const svg = sectionDrawing({ ...section, undersideLevel: 100 }, displayIn("us"), { id: "t", title: "A wall" });
    expect(wordsOf(svg)).toContain("333.7 ft");
    expect(wordsOf(svg)).toContain("14.76");
  });

  test("draws the critical circle where there is one", () => {
    const circle = { x: 1, z: 6, radius: 7, entryX: 7.8, exitX: -2.5 };
    const drawn = draw({ ...section, circle });
    expect(wordsOf(drawn).join(" ")).toContain("dash-dotted arc: critical circle");
    expect(drawn).toContain('stroke-dasharray="9 4 2 4"');
  });

  test("beside a failure the wall at its means stands in broken lines, and only where it differs", () => {
    const broken = (svg: string): number => svg.match(/stroke-dasharray="(7|5) 4"/g)?.length ?? 0;
    const risen = { ...section, water: { ...section.water, behind: section.water.behind! + 1 } };
    const failing = draw(risen, { means: { section, pressure } });
    expect(wordsOf(failing)).toContain("1.70 at the means");
    expect(wordsOf(failing).some((text) => text.includes("other broken lines: the wall at its means"))).toBe(true);
    // one water level, and the pressure of earth and of water
    expect(broken(failing)).toBe(3);
    expect(broken(draw(section, { means: { section, pressure } }))).toBe(2);
    expect(broken(draw(section))).toBe(0);
  });

  test("names a load that stands too far away to be drawn", () => {
    const words = wordsOf(draw({ ...section, lines: [{ force: 30, at: 60 }] }));
    expect(words.some((text) => /30\.0 kN\/m, 60\.0 m behind the crest/.test(text))).toBe(true);
  });

  test.each(Object.keys(gallery))("holds every number finite and inside its canvas: %s", (name) => {
    const study = readDocument(gallery[name]);
    const result = check(study);
    const svg = sectionDrawing(result.section, displayIn(study.units), {
      id: "t",
      title: study.title,
      pressure: result.pressure,
    });
    expect(svg).not.toMatch(/NaN|undefined|Infinity/);
    expect(svg).not.toMatch(/<script|<svg onload/);
    const height = Number(/viewBox="0 0 \d+ ([\d.]+)"/.exec(svg)?.[1]);
    for (const [, x, y] of svg.matchAll(/<text x="([-\d.]+)" y="([-\d.]+)"/g)) {
      expect(Number(x)).toBeGreaterThanOrEqual(0);
      expect(Number(x)).toBeLessThanOrEqual(drawingWidth);
      expect(Number(y)).toBeGreaterThanOrEqual(8);
      expect(Number(y)).toBeLessThanOrEqual(height);
    }
  });
});
