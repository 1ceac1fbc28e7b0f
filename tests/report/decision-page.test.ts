import { describe, expect, test } from "vitest";
import { beliefsChart } from "../../src/report/charts/beliefs-chart.ts";
import { evidenceChart } from "../../src/report/charts/evidence-chart.ts";
import { investigationsChart } from "../../src/report/charts/investigations-chart.ts";
import { numberOfTestsChart } from "../../src/report/charts/number-of-tests-chart.ts";
import { optionsChart } from "../../src/report/charts/options-chart.ts";
import { displayIn } from "../../src/report/display.ts";
import { answer } from "../../src/report/scope-text.ts";
import { decisionSection } from "../../src/report/sections/decision.ts";
import { evidenceSection } from "../../src/report/sections/evidence.ts";
import { terminalAssess } from "../../src/report/terminal-assess.ts";
import type { EvidenceResult, InvestigationResult, ScopeOption, ScopeResult } from "../../src/results-decision.ts";
import { handMade } from "./hand-made.ts";

const option = (name: string, cost: number, probability: number, meetsTarget: boolean): ScopeOption => ({
  name,
  cost,
  probability,
  probabilityStandardError: 0.01 * probability,
  expectedCost: cost + 1e6 * probability,
  expectedCostStandardError: 1e4 * probability,
  reliabilityIndex: 3,
  meetsTarget,
  open: true,
});
const investigation = (name: string, value: number, cost: number | null): InvestigationResult => ({
  name,
  cost,
  value,
  standardError: 10,
  netValue: cost === null ? null : value - cost,
  chanceItChangesTheDecision: 0.2,
  chanceStandardError: 0.01,
  notDistinguishable: false,
  informs: [
    {
      path: "soils.sand.friction_angle",
      label: "Friction angle of Medium sand",
      unit: "°",
      tests: 2,
      error: 2,
      sharedError: 0,
    },
  ],
  byNumberOfTests: [0, 1, 2].map((tests) => ({ tests, value: (value * tests) / 2, standardError: 10 })),
});
const run = { version: "0", seed: "page", workers: 1, complete: true, sampling: { evaluations: 1000, seconds: 0 } };
const decided: ScopeResult = {
  study: "Page (invented)",
  kind: "scope",
  seed: "page",
  currency: "EUR",
  years: 25,
  options: [option("As drawn", 0, 4e-3, false), option("Longer heel <i>", 5000, 2e-4, true)],
  bestOption: "As drawn",
  runnerUp: { name: "Longer heel <i>", difference: 1200, standardError: 40, withinError: false },
  target: { probability: 1e-3, reliabilityIndex: 3.1, mustMeet: false },
  perfectInformation: 900,
  perfectInformationStandardError: 12,
  perfectByVariable: { "soils.sand.friction_angle": 700 },
  perfectByVariableStandardErrors: { "soils.sand.friction_angle": 10 },
  investigations: [investigation("Shear boxes", 500, 800), investigation("Standpipe", 400, null)],
  ranking: ["Shear boxes", "Standpipe"],
  pairs: [],
  proposals: [],
  breakEven: { failureCost: [], target: [] },
  variables: [],
  run,
  warnings: [],
  cautions: [],
};
const seen: EvidenceResult = {
  priorProbability: 0.11,
  priorStandardError: 1e-3,
  probability: 1e-3,
  standardError: 2e-5,
  chanceOfEvidence: 0.6,
  variables: [
    {
      path: "soils.sand.friction_angle",
      label: "Friction angle of Medium sand",
      unit: "°",
      prior: { mean: 34, sd: 4 },
      posterior: { mean: 35, sd: 2 },
    },
  ],
  conflicts: [{ paths: [], chance: 1e-8, message: "these results conflict with what is believed" }],
};
const display = displayIn("metric");
const input = { ...handMade, assess: { ...handMade.assess, evidence: seen }, scope: decided };

const dataOf = (spec: object): readonly Record<string, unknown>[] =>
  (spec as { readonly data: { readonly values: readonly Record<string, unknown>[] } }).data.values;

describe("the decision on the page", () => {
  test("opens with one plain paragraph, its first sentence of what period it is, and the caution where people can be hurt", async () => {
    const { html } = (await decisionSection(input, display))!;
    const first = /<p class="decision">(.*?)<\/p>/.exec(html)?.[1] ?? "";
    expect(first).toMatch(/^Over 25 years, “As drawn” is the best option today/);
    expect(html).toMatch(/Where people can be hurt, (expected cost does not decide|the target governs)/);
    expect(html).not.toContain("<i>");
    expect(html.match(/<svg/g)?.length).toBeGreaterThanOrEqual(2);
  });

  test("says the same as the terminal", () => {
    expect(answer(input.scope)[0]).toContain(`“${input.scope.bestOption}”`);
  });

  test("charts every option at its price and probability, and every investigation at its worth and price", () => {
    const rows = dataOf(optionsChart(input.scope).spec);
    for (const { name, cost, probability } of input.scope.options) {
      const row = rows.find((one) => one.name === name)!;
      expect(row.cost).toBe(cost);
      expect(row.probability).toBe(probability);
      expect(row.best).toBe(name === input.scope.bestOption);
    }
    const bars = dataOf(investigationsChart(input.scope).spec);
    expect(bars.map((one) => one.cost)).toEqual(
      input.scope.ranking.map((name) => input.scope.investigations.find((one) => one.name === name)!.cost),
    );
  });

  test("draws value against number of tests from no test on, only where something is worth anything", () => {
    const without = { ...input.scope, investigations: [], proposals: [] };
    expect(numberOfTestsChart(without)).toBeUndefined();
    const rows = dataOf(numberOfTestsChart(input.scope)!.spec).filter(({ name }) => name === "Standpipe");
    expect(rows.map(({ tests, value }) => [tests, value])).toEqual([
      [0, 0],
      [1, 200],
      [2, 400],
    ]);
  });
});

describe("the evidence on the page and in the terminal", () => {
  test("stands before and after side by side, and a conflict is called out", async () => {
    const { html } = (await evidenceSection(input, display))!;
    expect(seen.conflicts.length).toBe(1);
    expect(html).toContain('class="callout">Conflict: ');
    const [before, after] = dataOf(evidenceChart(seen, false).spec);
    expect(before.name).toBe("Before it was seen");
    expect(after.probability as number).toBeLessThan(before.probability as number);
    const row = dataOf(beliefsChart(seen, display).spec)[1];
    expect([row.low, row.middle, row.high]).toEqual([-0.25, 0.25, 0.75]); // 35 ± 2, seen from 34 ± 4
  });

  test("the terminal has the same table and says what describes the beliefs before it", () => {
    const text = terminalAssess(input.assess, input.study, { width: 100, colour: false });
    expect(text).toContain("What has been seen");
    expect(text).toContain("Mean before");
    expect(text).toMatch(/Conflict: .*conflict with what is believed/s);
    expect(text.replace(/\s+/g, " ")).toContain("describe the beliefs before it");
  });

  test("is not there without evidence", async () => {
    const { evidence: _, ...plain } = input.assess;
    expect(await evidenceSection({ ...input, assess: plain }, display)).toBeUndefined();
    const { scope: __, ...undecided } = input;
    expect(await decisionSection(undecided, display)).toBeUndefined();
  });
});
