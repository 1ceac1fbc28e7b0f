import { Command } from "commander";
import { describe, expect, test } from "vitest";
import {
  addSamplingOptions,
  loadStudy,
  numberBetween,
  StudyTextError,
  wholeNumber,
  withText,
} from "../../src/cli/study-input.ts";
import { fakeIo, runWith, yard } from "./fake-io.ts";

describe("options", () => {
  test("are those of the format page", () => {
    const command = addSamplingOptions(new Command("assess"));
    expect(command.options.map((option) => option.long)).toEqual(
      "--json --output --quiet --set --seed --samples --precision --workers --method".split(" "),
    );
  });

  test("--set is kept in order, split at the first equals sign", () => {
    const command = addSamplingOptions(new Command("assess")).parse(["--set", "a.b=1", "--set", " title = x = y "], {
      from: "user",
    });
    expect(command.opts().set).toEqual([
      ["a.b", "1"],
      ["title", "x = y"],
    ]);
  });

  test.each(["", "1.5", "0", "101", "many", "NaN", "Infinity"])("%j is not a whole number from 1 to 100", (text) => {
    expect(() => wholeNumber(1, 100)(text)).toThrow("it must be a whole number from 1 to 100");
  });

  test.each(["", " ", "-0.1", "1.01", "x", "NaN"])("%j is not a number from 0 to 1", (text) => {
    expect(() => numberBetween(0, 1)(text)).toThrow("it must be a number from 0 to 1");
  });

  test("numbers in range are taken, in any way of writing them", () => {
    expect(wholeNumber(1, 1e12)("1e6")).toBe(1_000_000);
    expect(numberBetween(0, 1)("0")).toBe(0);
  });
});

describe("loading a study", () => {
  test("sets values before reading, the later over the earlier", async () => {
    const set = [
      ["wall.stem.height", "6"],
      ["wall.stem.height", "20 ft"],
    ] as const;
    const { study } = await loadStudy(yard, set, fakeIo());
    expect(study.wall.stem.height).toBeCloseTo(20 * 0.3048, 12);
    expect(study.file).toBe(yard);
  });

  test("a wrong value of --set is told by its path, without a line of the file", async () => {
    const ran = await runWith(["check", yard, "--set", "wall.stem.height=-1"]);
    expect(ran.code).toBe(1);
    expect(ran.err).toContain(`${yard} wall.stem.height: `);
    expect(ran.err).not.toContain(" | ");
  });

  test("what fails on a text carries the text", () => {
    const cause = new RangeError("no");
    const failing = (): never => {
      throw cause;
    };
    const caught = ((): unknown => {
      try {
        return withText("the text", failing);
      } catch (error) {
        return error;
      }
    })();
    expect(caught).toBeInstanceOf(StudyTextError);
    expect(caught).toMatchObject({ text: "the text", cause });
  });
});
