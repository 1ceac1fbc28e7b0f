import { describe, expect, test } from "vitest";
import { convergenceChart } from "../../src/report/charts/convergence.ts";
import { factorHistogram } from "../../src/report/charts/factor-histogram.ts";
import { failurePictureChart } from "../../src/report/charts/failure-picture-chart.ts";
import { fragilityChart } from "../../src/report/charts/fragility.ts";
import { probabilityChart } from "../../src/report/charts/probabilities.ts";
import { sharesChart } from "../../src/report/charts/shares.ts";
import { tornadoChart } from "../../src/report/charts/tornado-chart.ts";
import { yearlyRiskChart } from "../../src/report/charts/yearly-risk.ts";
import { displayIn } from "../../src/report/display.ts";
import { handMade } from "../report/hand-made.ts";

const { assess } = handMade;
const sliding = assess.limitStates.sliding!;
const display = displayIn("metric");
const charts = [
  probabilityChart(assess),
  sharesChart(assess),
  tornadoChart(assess, "sliding", sliding, display),
  factorHistogram("sliding", sliding),
  failurePictureChart(assess, assess.system.failurePicture, display)!,
  fragilityChart(
    assess,
    {
      path: "water.behind.level",
      points: [
        { value: 0, probability: 0, standardError: 0, interval: [0, 1e-3], method: "plain" },
        { value: 1, probability: 1e-4, standardError: 1e-5, interval: [8e-5, 1.2e-4], method: "importance" },
        { value: 3, probability: 2e-2, standardError: 1e-3, interval: [1.8e-2, 2.2e-2], method: "plain" },
      ],
    },
    assess.variables.find(({ path }) => path === "water.behind.level")!,
    display,
  ),
  convergenceChart(assess.system.convergence),
  yearlyRiskChart({
    years: 4,
    probability: 0.02,
    standardError: 0.001,
    interval: [0.018, 0.022],
    periods: 20_000,
    failures: 400,
    yearlyGivenSurvival: [0.006, 0.005, 0.005, 0.004],
  }),
];

// Unchanged, nothing more: pictures are looked at.
describe("chart specifications of results written by hand are unchanged", () => {
  test.each(charts.map((chart) => [chart.id, chart] as const))("%s", async (id, chart) => {
    await expect(`${JSON.stringify(chart, null, 2)}\n`).toMatchFileSnapshot(`charts/${id}.json`);
  });
});
