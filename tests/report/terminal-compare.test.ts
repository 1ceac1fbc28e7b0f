import { readFile, writeFile } from "node:fs/promises";
import { join } from "node:path";
import { describe, expect, test } from "vitest";
import { changeText, ratioText } from "../../src/report/terminal-compare.ts";
import type { MonteCarloResult } from "../../src/results.ts";
import { few, jsonOf, newFolder, runWith, usStudy, valueIn, yard } from "../cli/fake-io.ts";

const sampled = (failures: number, samples: number, interval: readonly [number, number]): MonteCarloResult => ({
  probability: failures / samples,
  standardError: 0,
  interval,
  failures,
  samples,
  reliabilityIndex: null,
  factorMean: null,
  factorSd: null,
  counts: { slopeUnstable: 0, lostContact: 0, capped: 0, outOfRange: 0 },
});

describe("the words of a change", () => {
  test.each([
    [2, 2.5, "+25 %"],
    [2, 1.97, "−1.5 %"],
    [2, 2.0001, "none"],
    [0, 2, ""],
    [undefined, 2, ""],
    [2, undefined, ""],
  ])("from %s to %s is %j", (before, after, words) => {
    expect(changeText(before, after)).toBe(words);
  });

  test("a probability is so many times the other, and unclear where the intervals overlap", () => {
    const [low, high] = [sampled(100, 10_000, [0.008, 0.012]), sampled(300, 10_000, [0.027, 0.033])];
    const [near, none] = [sampled(110, 10_000, [0.009, 0.013]), sampled(0, 10_000, [0, 0.0003])];
    expect(ratioText(low, high)).toBe("× 3.0");
    expect(ratioText(high, low)).toBe("× 0.33");
    expect(ratioText(low, near)).toBe("unclear");
    expect(ratioText(low, none)).toBe("rarer");
    expect(ratioText(none, low)).toBe("likelier");
    expect(ratioText(low, low)).toBe("none");
    expect(ratioText(undefined, low)).toBe("");
  });
});

describe("--compare", () => {
  test("shows two checks side by side, with what differs between the studies", async () => {
    const ran = await runWith(["check", yard, "--set", "wall.base.heel=3.6", "--compare", yard]);
    expect(ran).toMatchObject({ code: 0, err: "" });
    expect(ran.out).toMatch(/Path +first +second\n.*\nwall\.base\.heel +3\.6 +3\n/);
    expect(ran.out).toMatch(/Factor of safety, sliding +2\.\d\d +1\.97 +−\d+ %/);
    expect(ran.out).toContain("Cautions");
  });

  test("shows two assessments side by side", async () => {
    const args = ["assess", yard, "--set", "water.behind.level=3.9", "--compare", yard, ...few];
    const ran = await runWith(args);
    expect(ran).toMatchObject({ code: 0, err: "" });
    expect(ran.out).toMatch(/Any of these +\S.* +× 0\.\d+/);
    expect(ran.out).toContain("at most");
  });

  test("gives the second result beside the keys of the first with --json", async () => {
    const args = ["check", yard, "--set", "wall.base.heel=3.6", "--json"];
    const result = await jsonOf([...args, "--compare", usStudy]);
    expect(valueIn(result, "compared_with", "study")).toContain("Access road");
    const { compared_with: _, ...first } = result as { compared_with: unknown };
    expect(first).toEqual(await jsonOf(args));
  });

  test("a mistake in the second study is told with the second file's line", async () => {
    const other = join(newFolder(), "other.yaml");
    await writeFile(other, (await readFile(yard, "utf8")).replace("height: 5.0", "height: -5.0"));
    const ran = await runWith(["check", yard, "--compare", other]);
    expect(ran).toMatchObject({ code: 1, out: "" });
    expect(ran.err).toMatch(/other\.yaml:\d+:\d+ wall\.stem\.height: [\s\S]*\| +height: -5\.0/);
  });

  test("says in whose units things are where the two differ", async () => {
    expect((await runWith(["check", usStudy, "--compare", yard])).out).toContain("results are in those of the first");
  });

  test("fits a terminal of 60 columns", async () => {
    const ran = await runWith(["assess", yard, "--compare", usStudy, ...few], { width: 60 });
    expect(ran.out.split("\n").filter((line) => [...line].length > 60)).toEqual([]);
  });

  test("a stopped run is told, with 130", async () => {
    const ran = await runWith(["assess", yard, "--compare", yard, "--precision", "0"], { signal: AbortSignal.abort() });
    expect(ran.code).toBe(130);
    expect(ran.out).toContain("Stopped by the user before the end");
  });

  test("never writes over either study", async () => {
    const other = join(newFolder(), "other.yaml");
    await writeFile(other, await readFile(yard, "utf8"));
    expect(await runWith(["check", yard, "--compare", other, "-o", other])).toMatchObject({ code: 2, out: "" });
    expect(await readFile(other, "utf8")).toBe(await readFile(yard, "utf8"));
  });
});
