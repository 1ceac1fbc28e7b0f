import type { LimitStateAssessment } from "../../results.ts";
import { capitalised, limitStateWords } from "../display.ts";
import { significant } from "../number.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";

/** Histogram of the factor of safety over the samples, the failed part in its own colour. */
export function factorHistogram(name: string, state: LimitStateAssessment): Chart {
  const { edges, counts, below, above } = state.histogram;
  const total = counts.reduce((sum, count) => sum + count, 0) + below + above;
  const used = counts.flatMap((count, bin) => (count > 0 ? [bin] : []));
  const [first, last] = [
    Math.max(0, (used[0] ?? 0) - 1),
    Math.min(counts.length - 1, (used.at(-1) ?? counts.length - 1) + 1),
  ];
  const values = counts.slice(first, last + 1).map((count, k) => {
    const bin = first + k;
    return { from: edges[bin], to: edges[bin + 1], share: (100 * count) / total, failed: edges[bin + 1] <= 1 + 1e-9 };
  });
  const words = capitalised(limitStateWords[name] ?? name);
  const outside = above > 0 ? ` ${significant((100 * above) / total, 2)} % lie above the last bar.` : "";
  return {
    id: `factor-${name}`,
    title: `${words}: factor of safety over the samples, below 1 is failure`,
    alternative: `Mean ${significant(state.monteCarlo.factorMean ?? Number.NaN, 3)}, standard deviation ${significant(state.monteCarlo.factorSd ?? Number.NaN, 3)}; ${significant(100 * state.monteCarlo.probability, 2)} % below 1.${outside}`,
    spec: {
      data: { values },
      width: 250,
      height: 150,
      layer: [
        {
          mark: { type: "bar", stroke: palette.paper, strokeWidth: 0.5 },
          encoding: {
            x: {
              field: "from",
              type: "quantitative",
              title: "Factor of safety",
              bin: { binned: true },
              axis: { grid: false, tickCount: 6 },
            },
            x2: { field: "to" },
            y: { field: "share", type: "quantitative", title: "Samples, %" },
            color: { condition: { test: "datum.failed", value: palette.fail }, value: palette.soft },
          },
        },
        {
          data: { values: [{ one: 1 }] },
          mark: { type: "rule", color: palette.fail, strokeWidth: 1.5 },
          encoding: { x: { field: "one", type: "quantitative" } },
        },
      ],
    },
  };
}
