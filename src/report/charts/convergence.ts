import type { ConvergencePoint } from "../../results.ts";
import { grouped, intervalText, probabilityText, superscript } from "../number.ts";
import { markWords } from "../page-svg.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";

/** The estimate of the probability that any limit state fails, as samples come in, with its 95 % interval. */
export function convergenceChart(points: readonly ConvergencePoint[]): Chart {
  const most = Math.max(...points.map((point) => point.interval[1]), 1e-300);
  const power = most > 0.1 ? 0 : Math.floor(Math.log10(most));
  const unit = 10 ** power;
  const values = points.map(({ samples, probability, interval }) => ({
    samples,
    probability: probability / unit,
    low: interval[0] / unit,
    high: interval[1] / unit,
    tip: markWords(
      `After ${grouped(samples)} samples: ${probabilityText(probability)}, interval ${intervalText(interval)}`,
    ),
  }));
  const last = points.at(-1);
  const lowest = Math.min(...values.map((row) => row.low));
  return {
    id: "convergence",
    title: "How the estimate settled as samples came in",
    alternative:
      last === undefined
        ? "No samples."
        : `After ${grouped(last.samples)} samples ${probabilityText(last.probability)}, interval ${intervalText(last.interval)}.`,
    spec: {
      data: { values },
      height: 190,
      encoding: {
        x: {
          field: "samples",
          type: "quantitative",
          scale: { type: "log", nice: false },
          axis: { title: "Samples", format: "~s", tickCount: 6, grid: false },
        },
        y: {
          type: "quantitative",
          scale: { zero: false, domainMin: Math.max(lowest - 0.1 * (most / unit - lowest), 0) },
          axis: {
            title: `Probability of any failure${power === 0 ? "" : `, × 10${superscript(power)}`}`,
            tickCount: 5,
          },
        },
      },
      layer: [
        {
          mark: { type: "area", color: palette.soft, opacity: 0.55, aria: false },
          encoding: { y: { field: "low" }, y2: { field: "high" } },
        },
        {
          mark: { type: "rule", color: palette.soft, strokeWidth: 3 },
          encoding: { y: { field: "low" }, y2: { field: "high" }, description: { field: "tip" } },
        },
        {
          mark: { type: "line", color: palette.main, strokeWidth: 2, aria: false },
          encoding: { y: { field: "probability" } },
        },
        {
          mark: { type: "point", filled: true, color: palette.main, size: 45, opacity: 1 },
          encoding: { y: { field: "probability" }, description: { field: "tip" } },
        },
      ],
    },
  };
}
