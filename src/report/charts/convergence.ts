import type { ConvergencePoint } from "../../results.ts";
import { grouped, probabilityText } from "../number.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";

/** The estimate of the probability that any limit state fails, as samples come in, with its 95 % interval. */
export function convergenceChart(points: readonly ConvergencePoint[]): Chart {
  const values = points.map(({ samples, probability, interval }) => ({
    samples,
    probability,
    low: interval[0],
    high: interval[1],
  }));
  const last = points.at(-1);
  const x = {
    field: "samples",
    type: "quantitative",
    title: "Samples",
    scale: { type: "log", nice: false },
    axis: { format: "~s", tickCount: 5 },
  };
  const y = {
    type: "quantitative",
    title: "Probability of any failure",
    axis: { format: "~g", tickCount: 5 },
    scale: { zero: false },
  };
  return {
    id: "convergence",
    title: "How the estimate settled as samples came in",
    alternative:
      last === undefined
        ? "No samples."
        : `After ${grouped(last.samples)} samples ${probabilityText(last.probability)}, interval ${probabilityText(last.interval[0])} to ${probabilityText(last.interval[1])}.`,
    spec: {
      data: { values },
      width: 520,
      height: 170,
      layer: [
        {
          mark: { type: "area", color: palette.soft, opacity: 0.6 },
          encoding: { x, y: { field: "low", ...y }, y2: { field: "high" } },
        },
        {
          mark: { type: "line", color: palette.main, point: { color: palette.main, size: 22 } },
          encoding: { x, y: { field: "probability", ...y } },
        },
      ],
    },
  };
}
