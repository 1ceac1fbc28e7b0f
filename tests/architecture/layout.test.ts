import { execFileSync } from "node:child_process";
import { readdirSync, readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { version } from "../../src/version.ts";

const root = new URL("../../", import.meta.url).pathname;
const list = (folder: string): readonly string[] =>
  readdirSync(`${root}${folder}`, { recursive: true, encoding: "utf8" })
    .filter((file) => file.endsWith(".ts"))
    .map((file) => file.replaceAll("\\", "/"));

/** Files without a test of their own name, and what covers them instead. */
const coveredElsewhere: Readonly<Record<string, string>> = JSON.parse(
  readFileSync(`${root}tests/architecture/covered-elsewhere.json`, "utf8"),
);

describe("the layout of the project", () => {
  test("every source file has a test of its own name, or is listed with the test that covers it", () => {
    const tests = list("tests");
    const known = new Set(tests);
    const missing = list("src").filter((file) => {
      const stem = file.replace(/\.ts$/, "");
      const own = tests.some((name) => name === `${stem}.test.ts` || name === `${stem}.property.test.ts`);
      return !own && !known.has(coveredElsewhere[file] ?? "");
    });
    expect(missing).toEqual([]);
  });

  test("the list of files covered elsewhere names only files that are there and have no test of their own", () => {
    const sources = new Set(list("src"));
    const tests = new Set(list("tests"));
    const stale = Object.keys(coveredElsewhere).filter(
      (file) => !sources.has(file) || tests.has(file.replace(/\.ts$/, ".test.ts")),
    );
    expect(stale).toEqual([]);
  });

  test("the top level holds only what belongs there", () => {
    const tracked = execFileSync("git", ["ls-files"], { cwd: root, encoding: "utf8" })
      .split("\n")
      .filter((file) => file !== "");
    const top = new Set(tracked.map((file) => file.split("/")[0]));
    const allowed = [
      "src",
      "tests",
      "studies",
      "bin",
      ".ci",
      "README.md",
      "DEVELOPERS.md",
      "CHANGELOG.md",
      "LICENSE",
      "package.json",
      "package-lock.json",
      "tsconfig.json",
      "tsconfig.test.json",
      "biome.json",
      "vitest.config.ts",
      ".gitignore",
      ".npmrc",
      "typedoc.json",
    ];
    expect([...top].filter((name) => !allowed.includes(name))).toEqual([]);
  });

  test("results carry the version of the package", () => {
    expect(version).toBe(JSON.parse(readFileSync(`${root}package.json`, "utf8")).version);
  });
});
