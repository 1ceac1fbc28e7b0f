import { execFileSync } from "node:child_process";
import { Command, Option } from "commander";
import { describe, expect, test } from "vitest";
import { commandWords, completionScript } from "../../src/cli/completion.ts";

const program = new Command("toehold");
program
  .command("check")
  .description("Does it stand? At one set of values.")
  .argument("<study>")
  .option("-o, --output <file>", "somebody's [own] file: it's new")
  .addOption(new Option("--method <name>", "how").choices(["plain", "subset"]))
  .option("--at <point>", "where")
  .option("--json", "as JSON");
const words = commandWords(program);

describe("the words of the command line", () => {
  test("are read off the program: commands, options, and what their values may be", () => {
    expect(words).toEqual([
      {
        name: "check",
        description: "Does it stand?",
        values: [],
        options: [
          {
            names: ["-o", "--output"],
            description: "somebody's [own] file: it's new",
            takesValue: true,
            values: [],
            file: true,
          },
          { names: ["--method"], description: "how", takesValue: true, values: ["plain", "subset"], file: false },
          { names: ["--at"], description: "where", takesValue: true, values: ["mean", "cautious"], file: true },
          { names: ["--json"], description: "as JSON", takesValue: false, values: [], file: false },
        ],
      },
    ]);
  });
});

describe("the bash script", () => {
  const offered = (...typed: string[]): string[] => {
    const script = `${completionScript("bash", words)}
COMP_WORDS=("$@"); COMP_CWORD=$(($# - 1)); _toehold; printf '%s\\n' "\${COMPREPLY[@]}"`;
    return execFileSync("bash", ["-c", script, "bash", "toehold", ...typed], { encoding: "utf8" })
      .trim()
      .split("\n");
  };

  test.each([
    [[""], ["check", "help", "--help", "--version"]],
    [["ch"], ["check"]],
    [
      ["check", "-"],
      ["-o", "--output", "--method", "--at", "--json", "--help"],
    ],
    [
      ["check", "--method", ""],
      ["plain", "subset"],
    ],
    [["check", "--method", "s"], ["subset"]],
    [["check", "--at", "m"], ["mean"]],
    [["check", "--output", "-"], [""]],
    [["check", "wall"], [""]],
    [["help", "c"], ["check"]],
  ])("after %j offers %j", (typed, expected) => {
    expect(offered(...typed)).toEqual(expected);
  });
});

describe("the scripts of zsh and fish", () => {
  test("zsh: brackets and colons of a description are escaped, an apostrophe ends and opens the quotes", () => {
    expect(completionScript("zsh", words)).toContain(
      "'*--output[somebody'\\''s \\[own\\] file\\: it'\\''s new]:value:_files'",
    );
  });

  test("fish: an apostrophe is escaped, and words are offered without file names", () => {
    const script = completionScript("fish", words);
    expect(script).toContain("-s o -l output -r -F -d 'somebody\\'s [own] file: it\\'s new'");
    expect(script).toContain("-l method -x -a 'plain subset' -d 'how'");
  });
});
