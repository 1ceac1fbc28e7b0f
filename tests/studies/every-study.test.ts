import { readdirSync, readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { assess } from "../../src/assess.ts";
import { check } from "../../src/check.ts";
import { readStudy } from "../../src/study/read-study.ts";

const folder = new URL("../../studies/", import.meta.url);
const names = readdirSync(folder);

test("studies ship", () => {
  expect(names).toEqual(expect.arrayContaining(["two-soils-high-water", "sloping-fill-us"]));
});

describe.each(names)("the study in studies/%s", (name) => {
  const text = readFileSync(new URL(`${name}/study.yaml`, folder), "utf8");
  const study = readStudy(text, { file: `${name}/study.yaml` });

  test("says that it is invented, and teaches by comments", () => {
    expect(study.title).toContain("(invented)");
    expect(text.split("\n").filter((line) => line.includes("# ")).length).toBeGreaterThan(4);
  });

  test("is a wall worth asking about: it stands at its means, and a probability comes out that is neither 0 nor 1", async () => {
    for (const state of Object.values(check(study).limitStates)) expect(state.factorOfSafety).toBeGreaterThan(1);
    const { system } = await assess(study, { samples: 32_768, precision: 0 });
    expect(system.monteCarlo.failures).toBeGreaterThan(0);
    expect(system.monteCarlo.probability).toBeLessThan(0.2);
  });
});
