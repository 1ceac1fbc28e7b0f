import { CommanderError } from "commander";
import { describe, expect, test } from "vitest";
import { internalErrorText, showFailure } from "../../src/cli/failure.ts";
import { StoppedError, UsageError } from "../../src/cli/io.ts";
import { StudyTextError } from "../../src/cli/study-input.ts";
import { StudyError } from "../../src/errors.ts";
import { version } from "../../src/version.ts";
import { fakeIo } from "./fake-io.ts";

const shown = async (error: unknown): Promise<{ code: number; err: string }> => {
  const io = fakeIo();
  const code = await showFailure(error, io);
  expect(io.written.out).toBe("");
  return { code, err: io.written.err };
};
const wrong = new StudyError([{ path: "wall.stem.height", message: "is too high" }]);
const text = "title: t\nwall:\n  stem: { height: 50 }\n";

describe("what went wrong", () => {
  test.each([
    [new CommanderError(0, "commander.help", ""), 0, ""],
    [new CommanderError(1, "commander.unknownOption", ""), 2, ""],
    [new StoppedError("ended"), 130, ""],
    [new UsageError("no such file"), 2, "toehold: no such file\n"],
    [new StudyTextError(new UsageError("not yet"), text), 2, "toehold: not yet\n"],
  ])("%s ends with %d", async (error, code, err) => {
    expect(await shown(error)).toEqual({ code, err });
  });

  test("a problem found after reading is shown at its place in the file", async () => {
    const { code, err } = await shown(new StudyTextError(wrong, text, "bay.yaml"));
    expect(code).toBe(1);
    expect(err).toContain(
      "bay.yaml:3:19 wall.stem.height: is too high\n  3 |   stem: { height: 50 }\n    |                   ^",
    );
  });

  test("a problem that reading gave no place, for it was set from outside, is not put on a line", async () => {
    const { code, err } = await shown(new StudyTextError(wrong, text));
    expect(code).toBe(1);
    expect(err).toMatch(/^wall\.stem\.height: is too high\n\n1 problem in the study/);
    expect(await shown(wrong)).toEqual({ code, err });
  });

  test("anything else is an internal error, with its stack and the version", async () => {
    for (const error of [
      new RangeError("broken promise"),
      new StudyTextError(new RangeError("broken promise"), text),
    ]) {
      const { code, err } = await shown(error);
      expect(code).toBe(3);
      expect(err).toContain(`toehold ${version}: an internal error`);
      expect(err).toContain("RangeError: broken promise\n    at ");
    }
    expect(internalErrorText("thrown text")).toMatch(/thrown text\n$/);
  });
});
