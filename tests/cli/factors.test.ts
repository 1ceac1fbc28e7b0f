import { writeFile } from "node:fs/promises";
import { join } from "node:path";
import { expect, test } from "vitest";
import { jsonOf, newFolder, runWith } from "./fake-io.ts";

/** Level dry sand behind a plain wall: all of it can be followed by hand. */
const study = `
title: Wall by hand (invented)
wall:
  stem: { height: 4, crest_width: 0.4, foot_width: 0.4 }
  base: { toe: 0.8, heel: 2, thickness: 0.5 }
  unit_weight: 25
  sliding_friction: { angle: 24 }
soils:
  sand: { unit_weight: 18, friction_angle: { normal: { mean: 32, sd: 2 } } }
ground: { behind: { layers: [ { soil: sand } ] }, below: { soil: sand } }
loads: { surcharge: { pressure: 10 } }
assessment: { limit_states: [sliding, overturning], seed: by-hand, samples: 4096, precision: 0 }
`;
const factorsText = `
actions: { permanent_unfavourable: 1.35, permanent_favourable: 0.9, variable: 1.5 }
strength: { tan_friction_angle: 1.25 }
resistance: { sliding: 1.1 }
`;

async function folderWith(text: string): Promise<{ readonly file: string; readonly factors: string }> {
  const folder = newFolder();
  const [file, factors] = [join(folder, "wall.yaml"), join(folder, "factors.yaml")];
  await writeFile(file, study);
  await writeFile(factors, text);
  return { file, factors };
}

interface WithDesign {
  readonly design: { readonly limit_states: Record<string, { ratio: number; resisting: number; driving: number }> };
}

/** EN 1997-1:2004, 2.4.6 and 6.5.3: design strengths by tan φ/γ, design actions by multiplication, R/γ_R ≥ H. Clauses from memory; worked here by hand. */
function byHand(): { readonly sliding: number; readonly overturning: number } {
  const tanDesign = Math.tan((32 * Math.PI) / 180) / 1.25;
  const s = Math.sin(Math.atan(tanDesign));
  const ka = (1 - s) / (1 + s);
  const [earth, load] = [1.35 * ka * 18 * (4.5 ** 2 / 2), 1.5 * ka * 10 * 4.5];
  const weights = [
    [25 * 0.4 * 4, 1],
    [25 * 3.2 * 0.5, 1.6],
    [18 * 2 * 4, 2.2],
  ];
  const normal = weights.reduce((sum, [weight]) => sum + 0.9 * weight, 0);
  const tanBase = Math.tan((24 * Math.PI) / 180) / 1.25;
  const stabilising = weights.reduce((sum, [weight, x]) => sum + 0.9 * weight * x, 0);
  return {
    sliding: (normal * tanBase) / 1.1 / (earth + load),
    overturning: stabilising / (earth * 1.5 + load * 2.25),
  };
}

test("check --factors gives what a calculation by hand gives, and leaves the plain check as it is", async () => {
  const { file, factors } = await folderWith(factorsText);
  const { design, ...plain } = (await jsonOf(["check", file, "--factors", factors, "--json"])) as WithDesign;
  expect(plain).toEqual(await jsonOf(["check", file, "--json"]));
  const expected = byHand();
  expect(design.limit_states.sliding.ratio).toBeCloseTo(expected.sliding, 10);
  expect(design.limit_states.overturning.ratio).toBeCloseTo(expected.overturning, 10);
});

test("it reads as a table beside the plain factors, with what each force took, and says whose factors they are", async () => {
  const { file, factors } = await folderWith(factorsText);
  const { code, out } = await runWith(["check", file, "--factors", factors]);
  expect(code).toBe(0);
  expect(out).toMatch(/Limit state +Plain factor +Design ratio/);
  expect(out).toMatch(/Surcharge +1\.50 +1\.50/);
  expect(out.replace(/\s+/g, " ")).toContain("The factors are your own; no code's set is built in.");
  expect(out.replace(/\s+/g, " ")).toContain("Strengths are divided: tan φ′ 1.25.");
});

test("assess --factors shows the probability beside both, and report the same on the page", async () => {
  const { file, factors } = await folderWith(factorsText);
  const { out } = await runWith(["assess", file, "--factors", factors]);
  expect(out).toMatch(/Plain factor +Design ratio .*Probability/);
  const { out: page } = await runWith(["report", file, "--factors", factors, "-o", "-"]);
  expect(page).toContain('<section id="design"');
  expect(page).toContain("With partial factors");
});

test("a wrong file of factors ends with 1, its line and what is allowed", async () => {
  const { file, factors } = await folderWith("actions: { permanant_unfavourable: 1.35, variable: 50 }\n");
  const { code, out, err } = await runWith(["check", file, "--factors", factors]);
  expect({ code, out }).toEqual({ code: 1, out: "" });
  expect(err).toContain(`${factors}:1:`);
  expect(err).toContain('unknown key "permanant_unfavourable"');
  expect(err).toContain("permanent_unfavourable");
  expect(err).toContain("50 is outside 0 to 10");
});

test("a file of factors that is not there is found before anything is computed", async () => {
  const { file } = await folderWith("");
  expect((await runWith(["assess", file, "--factors", "nowhere.yaml"])).code).toBe(2);
});
