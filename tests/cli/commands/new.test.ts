import { readFile, writeFile } from "node:fs/promises";
import { join } from "node:path";
import { beforeEach, describe, expect, test } from "vitest";
import { readStudy } from "../../../src/study/read-study.ts";
import { few, newFolder, runWith } from "../fake-io.ts";

let folder: string;
let file: string;
beforeEach(() => {
  folder = join(newFolder(), "deep", "my-wall");
  file = join(folder, "study.yaml");
});

describe("toehold new", () => {
  test("writes a study that runs as it is, and says what to do next", async () => {
    const made = await runWith(["new", folder]);
    expect(made).toEqual({
      code: 0,
      err: "",
      out: `Written to ${file}. Next:\n  toehold check ${file}\n  toehold assess ${file}\n`,
    });
    expect((await runWith(["assess", file, ...few])).code).toBe(0);
  });

  test("never writes over a study", async () => {
    await runWith(["new", folder, "--quiet"]);
    await writeFile(file, "mine");
    const again = await runWith(["new", folder]);
    expect(again).toMatchObject({ code: 2, out: "" });
    expect(again.err).toBe(`toehold: ${file} is there already and was left as it is; choose another folder\n`);
    expect(await readFile(file, "utf8")).toBe("mine");
  });

  test("takes flags in place of answers", async () => {
    const flags = ["--title", "Bay 9", "--units", "us", "--wall", "gravity", "--height", "10", "--water", "0"];
    await runWith(["new", folder, ...flags]);
    const study = readStudy(await readFile(file, "utf8"));
    expect(study).toMatchObject({ title: "Bay 9", units: "us" });
    expect(study.wall.base).toBeUndefined();
    expect(study.wall.stem.height).toBeCloseTo(3.048, 9);
    expect(study.water.behind).toBeUndefined();
  });

  test("asks on a terminal, again where an answer does not read, and takes the usual for an empty one", async () => {
    const answers = ["Bay 7", "imperial", "us", "", "tall", "14", "0"];
    const questions: string[] = [];
    const ask = async (question: string): Promise<string> => {
      questions.push(question);
      return answers.shift() ?? "";
    };
    expect((await runWith(["new", folder], { ask })).code).toBe(0);
    expect(questions).toEqual([
      "Title of the study [A wall of mine]: ",
      "Units, metric or us [metric]: ",
      "Units, metric or us [metric]: ",
      "Kind of wall, cantilever or gravity [cantilever]: ",
      "Height of the stem above the base slab, ft [13]: ",
      "Height of the stem above the base slab, ft [13]: ",
      "Highest credible water level behind, ft above the underside, 0 for dry ground [7]: ",
    ]);
    const study = readStudy(await readFile(file, "utf8"));
    expect(study).toMatchObject({ title: "Bay 7", units: "us" });
    expect(study.wall.stem.height).toBeCloseTo(14 * 0.3048, 9);
  });

  test("asks nothing with --quiet or --json, and says where the study is as JSON", async () => {
    const ask = async (): Promise<string> => {
      throw new RangeError("asked");
    };
    const ran = await runWith(["new", folder, "--json"], { ask });
    expect(JSON.parse(ran.out)).toEqual({ kind: "new", file });
    expect(await runWith(["new", folder, "-o", "other.yaml", "--quiet"], { ask })).toEqual({
      code: 0,
      out: "",
      err: "",
    });
    expect(await readFile(join(folder, "other.yaml"), "utf8")).toContain("A wall of mine");
  });

  test("--set changes the study that is written and keeps its comments", async () => {
    await runWith([
      "new",
      folder,
      "--set",
      "wall.stem.height=5.5",
      "--set",
      "loads.surcharge.pressure={ uniform: { from: 5, to: 15 } }",
    ]);
    const text = await readFile(file, "utf8");
    expect(text).toContain("# The ground below is invented");
    expect(text).toContain("pressure: { uniform: { from: 5, to: 15 } }");
    expect(readStudy(text).wall.stem.height).toBe(5.5);
  });

  test("a wrong --set writes nothing", async () => {
    const ran = await runWith(["new", folder, "--set", "wall.stem.hight=5"]);
    expect(ran.code).toBe(1);
    expect(ran.err).toContain("wall.stem.hight");
    await expect(readFile(file)).rejects.toThrow("ENOENT");
  });

  test.each([
    [["--units", "imperial"], "Allowed choices are metric, us"],
    [["--height", "0.1"], "it must be a number from 0.5 to 60"],
    [["-o", "../out.yaml"], "-o is a name in the folder"],
  ])("%j is wrong usage", async (args, words) => {
    const ran = await runWith(["new", folder, ...args]);
    expect(ran.code).toBe(2);
    expect(ran.err).toContain(words);
  });
});
