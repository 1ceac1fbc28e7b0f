import { mkdir, readdir, readFile, writeFile } from "node:fs/promises";
import { join } from "node:path";
import { beforeAll, describe, expect, test } from "vitest";
import { figureFiles } from "../../src/report/figures.ts";
import { few, newFolder, runWith } from "./fake-io.ts";

/** One unknown and one limit state: every kind of file, quickly. */
const study = `
title: Orchard wall (invented)
wall:
  stem: { height: 3, crest_width: 0.3, foot_width: 0.4 }
  base: { toe: 0.5, heel: 1.4, thickness: 0.4 }
  unit_weight: 24
  sliding_friction: { ratio: 0.8 }
soils:
  fill: { unit_weight: 19, friction_angle: { normal: { mean: 32, sd: 3 } } }
ground: { behind: { layers: [ { soil: fill } ] }, below: { soil: fill }, front: { level: 0.5 } }
assessment: { limit_states: [sliding], seed: orchard }
`;
const folder = newFolder();
const report = (...args: readonly string[]) => runWith(["report", "-", ...few, ...args], { input: study });

describe("the report in other forms", () => {
  let names: readonly string[];
  beforeAll(async () => {
    const ran = await report("--format", "png", "-o", join(folder, "pictures"));
    expect(ran).toMatchObject({ code: 0, err: "" });
    names = await readdir(join(folder, "pictures"));
  });

  test("png: every picture of the page in its order, as PNG of some size with something on it", async () => {
    expect(names.length).toBeGreaterThan(5);
    expect(names[0]).toMatch(/^01-[a-z0-9-]+\.png$/);
    for (const name of names) {
      const bytes = await readFile(join(folder, "pictures", name));
      // W3C PNG, 5.2: the signature; 11.2.2: width and height in the header chunk
      expect([...bytes.subarray(0, 8)]).toEqual([137, 80, 78, 71, 13, 10, 26, 10]);
      expect(bytes.readUInt32BE(16)).toBeGreaterThan(400);
      expect(bytes.length).toBeGreaterThan(5000);
    }
  });

  test("svg: the same pictures as documents of their own, with no variable of the page left", async () => {
    await report("--format", "svg", "-o", join(folder, "drawings"));
    const drawings = await readdir(join(folder, "drawings"));
    expect(drawings).toEqual(names.map((name) => name.replace(".png", ".svg")));
    const section = await readFile(
      join(folder, "drawings", drawings.find((name) => name.includes("wall-at"))!),
      "utf8",
    );
    expect(section).toMatch(/^<\?xml version="1\.0" encoding="UTF-8"\?>\n<svg [^>]*xmlns=/);
    expect(section).not.toContain("var(--");
  });

  test("csv: variables, probabilities, drivers, and the first samples with the failures that the run counts", async () => {
    const place = join(folder, "tables");
    await report("--format", "csv", "--sample-rows", "20000", "-o", place);
    expect(await readdir(place)).toEqual(["drivers.csv", "probabilities.csv", "samples.csv", "variables.csv"]);
    const rows = (await readFile(join(place, "samples.csv"), "utf8")).trim().split("\r\n");
    expect(rows[0]).toBe("soils.fill.friction_angle,factor_of_safety.sliding");
    expect(rows).toHaveLength(20_001);
    const failures = rows.slice(1).filter((row) => Number(row.split(",")[1]) < 1).length;
    const [, sliding] = (await readFile(join(place, "probabilities.csv"), "utf8")).split("\r\n");
    expect(sliding.split(",").slice(7, 9)).toEqual([String(failures), "20000"]);
  });

  test("json: one file of all that was computed", async () => {
    const { out } = await report("--format", "json", "-o", "-");
    const result = JSON.parse(out);
    expect(result).toMatchObject({ kind: "assess", check: { kind: "check" } });
  });

  test("what cannot be is refused before anything is computed", async () => {
    await writeFile(join(folder, "plain"), "");
    await mkdir(join(folder, "open"), { recursive: true });
    for (const [args, words] of [
      [["--format", "svg", "-o", "-"], "name a folder"],
      [["--format", "csv", "-o", join(folder, "plain")], "is not a folder"],
      [["--format", "html", "-o", join(folder, "open")], "it is a folder"],
      [["--sample-rows", "5"], "belongs to --format csv"],
      [["--format", "pdf"], "Allowed choices are html, json, csv, svg, png"],
    ] as const) {
      const ran = await report(...args);
      expect(ran).toMatchObject({ code: 2, out: "" });
      expect(ran.err).toContain(words);
    }
  });
});

test("figures of one title get names of their own, and colours by role become colours", () => {
  const one = `<figure><svg width="2"><text fill="var(--fail-soft)">a</text></svg><figcaption><b>A &amp; b.</b></figcaption></figure>`;
  const [first, second] = figureFiles(one + one);
  expect([first.name, second.name]).toEqual(["01-a-b", "02-a-b-2"]);
  expect(first.title).toBe("A & b");
  expect(first.svg).toContain('fill="#f0bda6"');
});
