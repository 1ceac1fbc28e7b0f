import { execFileSync } from "node:child_process";
import { link, lstat, mkdir, readdir, readFile, stat, symlink, writeFile } from "node:fs/promises";
import { join } from "node:path";
import { beforeEach, describe, expect, test } from "vitest";
import { readInput, refuseBadTarget, writeOutput } from "../../src/cli/files.ts";
import { UsageError } from "../../src/cli/io.ts";
import { fakeIo, newFolder } from "./fake-io.ts";

let folder: string;
let study: string;
beforeEach(async () => {
  folder = newFolder();
  study = join(folder, "study.yaml");
  await writeFile(study, "the study");
});

describe("reading", () => {
  test("- is standard input", async () => {
    expect(await readInput("-", fakeIo({ input: "from a pipe" }))).toBe("from a pipe");
  });

  test.each([
    ["nowhere.yaml", "no such file or folder"],
    [".", "it is a folder"],
    ["study.yaml/inside", "part of its path is not a folder"],
  ])("%s cannot be read, and the message says why", async (name, why) => {
    const file = join(folder, name);
    await expect(readInput(file, fakeIo())).rejects.toThrow(new UsageError(`cannot read ${file}: ${why}`));
  });
});

describe("writing", () => {
  test("replaces a file whole and leaves nothing beside it", async () => {
    const target = join(folder, "out.txt");
    await writeOutput(target, "one", [study]);
    await writeOutput(target, "two", [study]);
    expect(await readFile(target, "utf8")).toBe("two");
    expect((await readdir(folder)).sort()).toEqual(["out.txt", "study.yaml"]);
  });

  test("never writes over an input, whatever name or link it goes by", async () => {
    await symlink(study, join(folder, "soft"));
    await link(study, join(folder, "hard"));
    for (const name of ["study.yaml", "./study.yaml", "soft", "hard"]) {
      const target = `${folder}/${name}`;
      await expect(writeOutput(target, "x", ["-", study])).rejects.toThrow("is an input of this command");
    }
    expect(await readFile(study, "utf8")).toBe("the study");
  });

  test("writes through a link and keeps it", async () => {
    await writeFile(join(folder, "real.txt"), "old");
    await symlink("real.txt", join(folder, "link.txt"));
    await writeOutput(join(folder, "link.txt"), "new", [study]);
    expect((await lstat(join(folder, "link.txt"))).isSymbolicLink()).toBe(true);
    expect(await readFile(join(folder, "real.txt"), "utf8")).toBe("new");
  });

  test("leaves a device a device", async () => {
    await writeOutput("/dev/null", "gone", [study]);
    expect((await stat("/dev/null")).isCharacterDevice()).toBe(true);
  });

  test("writes into a pipe", async () => {
    const pipe = join(folder, "pipe");
    execFileSync("mkfifo", [pipe]);
    const [text] = await Promise.all([readFile(pipe, "utf8"), writeOutput(pipe, "through", [study])]);
    expect(text).toBe("through");
  });

  test("says why a place cannot be written to, before and while writing", async () => {
    await mkdir(join(folder, "sub"));
    const cases = [
      ["sub", "it is a folder"],
      ["nowhere/out.txt", "no such file or folder"],
      ["study.yaml/out.txt", "part of its path is not a folder"],
    ] as const;
    for (const [name, why] of cases) {
      const target = join(folder, name);
      const message = `cannot write ${target}: ${why}`;
      await expect(refuseBadTarget(target, [])).rejects.toThrow(new UsageError(message));
      await expect(writeOutput(target, "x", [])).rejects.toThrow(new UsageError(message));
    }
  });

  test("no target, and standard output, are no bad targets", async () => {
    await refuseBadTarget(undefined, [study]);
    await refuseBadTarget("-", ["-"]);
  });
});
