import { readFile, writeFile } from "node:fs/promises";
import { join } from "node:path";
import { describe, expect, test } from "vitest";
import { jsonOf, newFolder, runWith, usStudy, valueIn, yard } from "../fake-io.ts";

const folder = newFolder();

describe("toehold check", () => {
  test("prints factors, forces, the calculation and the cautions, and ends with 0 whatever the wall's fate", async () => {
    const weak = ["--set", "water.behind.level=4.5", "--set", "wall.sliding_friction.ratio=0.3"];
    const ran = await runWith(["check", yard, ...weak]);
    expect(ran).toMatchObject({ code: 0, err: "" });
    for (const words of [
      "Factor of safety",
      "At these values the wall fails by sliding.",
      "Soil over the heel",
      "tan²(45° − φ/2)",
      "Cautions",
      "licensed engineer",
    ])
      expect(ran.out).toContain(words);
  });

  test("gives the keys of the result file with --json, and nothing else", async () => {
    const result = await jsonOf(["check", yard, "--json"]);
    expect(Object.keys(result as object)).toEqual(
      expect.arrayContaining("study kind warnings cautions values forces pressure base limit_states sheet".split(" ")),
    );
    expect(valueIn(result, "kind")).toBe("check");
    expect(valueIn(result, "values", "soils.fill.friction_angle")).toBe(37);
    expect(Object.keys(valueIn(result, "base") as object)).toEqual(
      "vertical horizontal resultant_x eccentricity effective_width pressure_toe pressure_heel".split(" "),
    );
    expect(Object.keys(valueIn(result, "limit_states", "sliding") as object)).toEqual(
      "factor_of_safety resisting driving unit".split(" "),
    );
    expect(Object.keys(valueIn(result, "sheet", "0") as object)).toEqual(
      expect.arrayContaining("symbol text formula value unit".split(" ")),
    );
  });

  const factorOf = async (...args: string[]): Promise<unknown> =>
    valueIn(await jsonOf(["check", yard, "--json", ...args]), "limit_states", "sliding", "factor_of_safety");

  test("--at cautious is harder on the wall than the means", async () => {
    expect(await factorOf("--at", "cautious")).toBeLessThan((await factorOf()) as number);
  });

  test("--at design_point:sliding stands where sliding begins", async () => {
    expect(await factorOf("--at", "design_point:sliding")).toBeCloseTo(1, 4);
  });

  test("--at the design point of a limit state that the study leaves out is refused", async () => {
    const ran = await runWith(["check", yard, "--at", "design_point:eccentricity"]);
    expect(ran).toMatchObject({ code: 1, out: "" });
    expect(ran.err).toContain("eccentricity is not among the limit states of this study");
  });

  test("--at FILE takes values by path, and answers a wrong path with its line", async () => {
    const file = join(folder, "values.yaml");
    await writeFile(file, "water.behind.level: 3.2\n");
    expect(await factorOf("--at", file)).toBeLessThan((await factorOf()) as number);
    await writeFile(file, "# a comment\nwater.behind.lvel: 3.2\n");
    const wrong = await runWith(["check", yard, "--at", file]);
    expect(wrong).toMatchObject({ code: 1, out: "" });
    expect(wrong.err).toContain(`${file}:2:1 water.behind.lvel: is not an uncertain value of this study`);
    expect(wrong.err).toContain("  2 | water.behind.lvel: 3.2\n    | ^");
  });

  test.each([
    ["design_point:slding", "names no limit state; write for example --at design_point:sliding"],
    ["design_point", "names no limit state"],
    ["median", "cannot read median: no such file or folder"],
  ])("--at %s is wrong usage", async (at, words) => {
    const ran = await runWith(["check", yard, "--at", at]);
    expect(ran).toMatchObject({ code: 2, out: "" });
    expect(ran.err).toContain(words);
  });

  test("reads a study from standard input", async () => {
    const input = await readFile(yard, "utf8");
    expect(valueIn(await jsonOf(["check", "-", "--json"], { input }), "kind")).toBe("check");
  });

  test("shows a US study in feet and pounds, and its JSON in SI", async () => {
    const ran = await runWith(["check", usStudy]);
    expect(ran.out).toContain("lb/ft");
    expect(ran.out).not.toMatch(/Resisting.*kN/);
    const weight = valueIn(await jsonOf(["check", usStudy, "--json"]), "values", "soils.fill.unit_weight");
    expect(weight).toBeCloseTo(120 * 0.157087464, 4); // 1 lbf/ft³ = 0.157087464 kN/m³: 4.4482216 N over 0.3048³ m³
  });

  test.each([40, 60])("fits a terminal of %d columns but for words that are longer", async (width) => {
    const { out } = await runWith(["check", yard], { width });
    const sentences = out.slice(out.indexOf("Cautions"));
    expect(sentences.split("\n").filter((line) => [...line].length > width)).toEqual([]);
  });

  test("colours only where colour is on, and never in a file", async () => {
    expect((await runWith(["check", yard])).out).not.toContain("\u001b");
    expect((await runWith(["check", yard], { colour: true })).out).toContain("\u001b[1m");
    const file = join(folder, "check.txt");
    await runWith(["check", yard, "-o", file], { colour: true });
    expect(await readFile(file, "utf8")).not.toContain("\u001b");
  });
});
