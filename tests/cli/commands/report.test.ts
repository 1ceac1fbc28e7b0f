import { readdir, readFile, writeFile } from "node:fs/promises";
import { join } from "node:path";
import { beforeEach, describe, expect, test } from "vitest";
import { few, newFolder, runWith, yard } from "../fake-io.ts";

/** One unknown and one limit state: a page of every section, quickly. */
const small = `
title: Garden wall (invented)
wall:
  stem: { height: 3, crest_width: 0.3, foot_width: 0.4 }
  base: { toe: 0.5, heel: 1.4, thickness: 0.4 }
  unit_weight: 24
  sliding_friction: { ratio: 0.8 }
soils:
  fill: { unit_weight: 19, friction_angle: { normal: { mean: 32, sd: 3 } } }
ground: { behind: { layers: [ { soil: fill } ] }, below: { soil: fill }, front: { level: 0.5 } }
assessment: { limit_states: [sliding], seed: garden }
`;

let folder: string;
beforeEach(() => {
  folder = newFolder();
});

describe("toehold report", () => {
  test("writes one page, prints the summary and says where the page is", async () => {
    const page = join(folder, "page.html");
    const ran = await runWith(["report", yard, "-o", page, ...few]);
    expect(ran).toMatchObject({ code: 0, err: "" });
    expect(ran.out).toContain("The wall fails by");
    expect(ran.out).toContain(`The report is in ${page}: open it in a browser.`);
    expect(await readFile(page, "utf8")).toMatch(/^<!doctype html>/);
    expect(await readdir(folder)).toEqual(["page.html"]);
  });

  test("-o - puts the page, and nothing else, on standard output", async () => {
    const ran = await runWith(["report", "-", "-o", "-", ...few], { input: small });
    expect(ran).toMatchObject({ code: 0, err: "" });
    expect(ran.out).toMatch(/^<!doctype html>[\s\S]*<\/html>\s*$/);
  });

  test("--quiet prints nothing, --json the assessment", async () => {
    const page = join(folder, "page.html");
    const input = { input: small };
    expect(await runWith(["report", "-", "-o", page, "--quiet", ...few], input)).toEqual({ code: 0, out: "", err: "" });
    const ran = await runWith(["report", "-", "-o", page, "--json", ...few], input);
    expect(JSON.parse(ran.out)).toMatchObject({ kind: "assess" });
  });

  test("--vary adds what another dimension would bring; half an order of it is refused before anything is computed", async () => {
    const vary = ["--vary", "wall.base.heel", "--from", "1", "--to", "2", "--points", "3"];
    const ran = await runWith(["report", "-", "-o", "-", ...vary, ...few], { input: small });
    expect(ran.out).toContain('<section id="size"');
    expect(ran.out).toContain("Another heel length");
    const half = await runWith(["report", "-", "-o", "-", ...vary.slice(0, 4)], { input: small });
    expect(half).toMatchObject({ code: 2, out: "" });
    expect(half.err).toContain("each --vary needs its --from and its --to");
  });

  test("never writes over the study", async () => {
    const study = join(folder, "own.yaml");
    const text = await readFile(yard, "utf8");
    await writeFile(study, text);
    const ran = await runWith(["report", study, "-o", study, ...few]);
    expect(ran).toMatchObject({ code: 2, out: "" });
    expect(await readFile(study, "utf8")).toBe(text);
  });

  test("a place that cannot be written to is found before anything is computed", async () => {
    const page = join(folder, "nowhere", "page.html");
    const clock = (): number => {
      throw new RangeError("the run began");
    };
    const ran = await runWith(["report", yard, "-o", page], { clock });
    expect(ran).toMatchObject({ code: 2, out: "", err: `toehold: cannot write ${page}: no such file or folder\n` });
  });

  test("a wrong study writes no page", async () => {
    const page = join(folder, "never.html");
    const ran = await runWith(["report", yard, "--set", "wall.stem.height=-5", "-o", page]);
    expect(ran).toMatchObject({ code: 1, out: "" });
    expect(await readdir(folder)).toEqual([]);
  });
});
