import { readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { describe, expect, test } from "vitest";
import { importFaults } from "./import-rules.ts";

const source = new URL("../../src", import.meta.url).pathname;
const files = readdirSync(source, { recursive: true, encoding: "utf8" }).filter((file) => file.endsWith(".ts"));

describe("the rooms of the source", () => {
  test("data flows one way: no file imports from a room below its own, or touches the machine from an inner room", () => {
    expect(files.length).toBeGreaterThan(50);
    const faults = files.flatMap((file) =>
      importFaults({ file: file.replaceAll("\\", "/"), text: readFileSync(join(source, file), "utf8") }),
    );
    expect(faults).toEqual([]);
  });

  test.each([
    [
      "probability/normal.ts",
      'import { prepareWall } from "../mechanics/prepare-wall.ts";',
      "probability/ must not import mechanics/",
    ],
    [
      "reliability/a.ts",
      'import type { Kernel } from "../mechanics/kernel.ts";',
      "reliability/ must not import mechanics/",
    ],
    [
      "study/a.ts",
      'import { marginalOf } from "../probability/marginal-of.ts";',
      "study/ must not import probability/",
    ],
    ["mechanics/stages/a.ts", 'import { x } from "../../report/number.ts";', "mechanics/ must not import report/"],
    ["report/a.ts", 'import { buildModel } from "../model.ts";', "a bridge above its room"],
    ["numeric/a.ts", 'import type { Study } from "../study/study.ts";', "numeric/ must not import study/"],
    ["reliability/a.ts", 'import { readFileSync } from "node:fs";', "imports node:fs"],
    ["report/a.ts", 'const x = await import("node:path");', "imports node:path"],
    ["report/a.ts", "const now = Date.now();", "uses Date"],
    ["drivers/a.ts", "const path = process.cwd();", "uses process"],
    ["mechanics/a.ts", "const u = Math.random();", "uses Math.random"],
    ["report/a.ts", 'const f = new Function("return 1");', "code made from strings"],
    ["study/a.ts", 'import { x } from "./b";', "without its ending"],
    ["attic/a.ts", 'import type { Study } from "../study/study.ts";', "a room that the rules do not know"],
  ])("a fault in %s is found: %s", (file, text, fault) => {
    expect(importFaults({ file, text }).join("\n")).toContain(fault);
  });

  test("what is allowed passes: rooms above, the ground floor, shared files, bridges from the command line, words in comments", () => {
    const allowed = [
      { file: "mechanics/a.ts", text: 'import type { Study } from "../study/study.ts"; // process.env is for cli' },
      { file: "drivers/a.ts", text: 'import { normalCdf } from "../numeric/normal.ts";' },
      { file: "report/a.ts", text: 'import type { CheckResult } from "../results.ts";' },
      { file: "report/a.ts", text: 'import type { SizeResult } from "../results-size.ts";' },
      {
        file: "cli/a.ts",
        text: 'import { assess } from "../assess.ts"; import { readFile } from "node:fs/promises"; process.exit(0);',
      },
      { file: "assess.ts", text: 'import { tornado } from "./drivers/tornado.ts";' },
    ];
    expect(allowed.flatMap(importFaults)).toEqual([]);
  });
});
