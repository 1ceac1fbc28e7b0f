import { execFileSync } from "node:child_process";
import { existsSync, readdirSync, readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { reaches } from "./import-graph.ts";
import { isResultShapes, withoutComments } from "./import-rules.ts";

const root = new URL("../../", import.meta.url).pathname;
const list = (folder: string): readonly string[] =>
  readdirSync(`${root}${folder}`, { recursive: true, encoding: "utf8" })
    .filter((file) => file.endsWith(".ts"))
    .map((file) => file.replaceAll("\\", "/"));

/** Files of types alone: nothing of them is left to run. Shapes of results are so by their name. */
const typesOnly = [
  "cli/command.ts",
  "reliability/limit-states.ts",
  "study/study.ts",
  ...list("src").filter((file) => isResultShapes(file)),
];

/** Files that a test starts by the name of what was built from them, in a worker, where imports do not show. */
const startedByName = ["parallel/block-worker.ts"];

/** Files without a test of their own name, and the test that covers them instead. */
const coveredElsewhere: Readonly<Record<string, string>> = JSON.parse(
  readFileSync(`${root}tests/architecture/covered-elsewhere.json`, "utf8"),
);

function startsByName(file: string, test: string): boolean {
  return (
    startedByName.includes(file) && readFileSync(`${root}tests/${test}`, "utf8").includes(file.replace(/\.ts$/, ".js"))
  );
}

describe("the layout of the project", () => {
  test("every source file has a test of its own name, or is listed as types alone or with the test that covers it", () => {
    const tests = new Set(list("tests"));
    const missing = list("src").filter((file) => {
      const stem = file.replace(/\.ts$/, "");
      const own = tests.has(`${stem}.test.ts`) || tests.has(`${stem}.property.test.ts`);
      return !own && !typesOnly.includes(file) && !tests.has(coveredElsewhere[file] ?? "");
    });
    expect(missing).toEqual([]);
  });

  test("what is listed as covered elsewhere is there, and its test reaches it through imports", () => {
    const sources = new Set(list("src"));
    const wrong = Object.entries(coveredElsewhere).filter(
      ([file, test]) =>
        !sources.has(file) || !(startsByName(file, test) || reaches(root, `tests/${test}`, `src/${file}`)),
    );
    expect(wrong).toEqual([]);
  });

  test("what is listed as types alone exports nothing else", () => {
    const withCode = typesOnly.filter((file) =>
      /^export (?!type |interface )/m.test(withoutComments(readFileSync(`${root}src/${file}`, "utf8"))),
    );
    expect(withCode).toEqual([]);
  });

  test.skipIf(!existsSync(`${root}.git`))("the top level holds only what belongs there", () => {
    // A checkout may belong to another user than the one who runs the tests.
    const tracked = execFileSync("git", ["-c", "safe.directory=*", "ls-files"], { cwd: root, encoding: "utf8" })
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
});
