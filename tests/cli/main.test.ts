import { readFile, writeFile } from "node:fs/promises";
import { join } from "node:path";
import { describe, expect, test } from "vitest";
import { version } from "../../src/version.ts";
import { newFolder, runWith, yard } from "./fake-io.ts";

/** The commands that the help lists. */
async function commandNames(): Promise<readonly string[]> {
  const { out } = await runWith(["--help"]);
  return [...out.slice(out.indexOf("Commands:")).matchAll(/^ {2}(\w+) \[options\]/gm)].map(([, name]) => name);
}

describe("the command line", () => {
  test("has the commands of the format page", async () => {
    expect(await commandNames()).toEqual(
      expect.arrayContaining(["check", "assess", "size", "report", "schema", "new"]),
    );
  });

  test("every command takes what every command takes", async () => {
    for (const name of await commandNames()) {
      const { out } = await runWith([name, "--help"]);
      for (const option of ["-o, --output", "--quiet", ...(name === "completion" ? [] : ["--json"])])
        expect(out, name).toContain(option);
      if (/<study>/.test(out)) expect(out, name).toContain("--set <path=value>");
      if (out.includes("--seed"))
        for (const option of ["--samples", "--precision", "--workers", "--method"]) expect(out, name).toContain(option);
    }
  });

  test.each([
    [["check"], "missing required argument 'study'"],
    [["chekc", yard], "unknown command 'chekc'\n(Did you mean check?)"],
    [["check", yard, "--jsn"], "unknown option '--jsn'\n(Did you mean --json?)"],
    [["check", yard, "another.yaml"], "too many arguments"],
    [["check", "no-such-file.yaml"], "cannot read no-such-file.yaml: no such file or folder"],
    [["check", yard, "--set", "water"], "write it as path=value"],
    [["assess", yard, "--samples", "many"], "it must be a whole number from 1 to 1000000000000"],
    [["assess", yard, "--precision", "2"], "it must be a number from 0 to 1"],
    [["assess", yard, "--workers", "0"], "it must be a whole number from 1 to 256"],
    [["assess", yard, "--method", "magic"], "Allowed choices are plain"],
    [["check", yard, "-o", "no-such-folder/x.txt"], "cannot write no-such-folder/x.txt"],
    [[], "Usage: toehold"],
  ])("%j ends with 2 and says why on standard error", async (args, words) => {
    const ran = await runWith(args);
    expect(ran).toMatchObject({ code: 2, out: "" });
    expect(ran.err).toContain(words);
  });

  test("a wrong study ends with 1, with file, line, column, path, the line and a caret", async () => {
    const file = join(newFolder(), "wrong.yaml");
    await writeFile(file, (await readFile(yard, "utf8")).replace("height: 5.0", "height: -5.0"));
    const ran = await runWith(["check", file]);
    expect(ran).toMatchObject({ code: 1, out: "" });
    expect(ran.err).toMatch(/wrong\.yaml:\d+:\d+ wall\.stem\.height: /);
    expect(ran.err).toMatch(/\n {2}\d+ \| .*height: -5\.0.*\n +\| +\^\n/);
  });

  test("--version and help end with 0 on standard output; every command's help has examples", async () => {
    expect(await runWith(["--version"])).toEqual({ code: 0, out: `${version}\n`, err: "" });
    expect(await runWith(["--help"])).toMatchObject({ code: 0, err: "" });
    for (const name of await commandNames()) {
      const help = await runWith([name, "--help"]);
      expect(help).toMatchObject({ code: 0, err: "" });
      expect(help.out).toMatch(/Examples?:\n {2}toehold /);
    }
  });

  test("help fits a narrow terminal", async () => {
    const { out } = await runWith(["check", "--help"], { width: 60 });
    const upToExamples = out.slice(0, out.indexOf("Examples:"));
    expect(upToExamples.split("\n").filter((line) => [...line].length > 60)).toEqual([]);
  });

  test("an internal error ends with 3, says that nothing was written and what to report", async () => {
    const clock = (): number => {
      throw new RangeError("a clock that broke");
    };
    const ran = await runWith(["assess", yard], { clock });
    expect(ran).toMatchObject({ code: 3, out: "" });
    expect(ran.err).toContain(`toehold ${version}: an internal error; nothing was written.`);
    expect(ran.err).toContain("Please report it");
    expect(ran.err).toContain("RangeError: a clock that broke");
  });
});
