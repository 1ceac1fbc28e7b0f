import type { AssessResult, LimitStateAssessment } from "../../results.ts";
import { capitalised, limitStateWords } from "../display.ts";
import { significant } from "../number.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";
import { labelsOf } from "./labels.ts";

/** Factor of safety with one unknown at its 5 and 95 % fractile, the others at their means; the widest bar on top. */
export function tornadoChart(result: AssessResult, name: string, state: LimitStateAssessment): Chart {
  const labels = labelsOf(result);
  const bars = state.tornado.filter((bar) => Math.abs(bar.factorAt95 - bar.factorAt5) > 1e-9).slice(0, 10);
  const values = bars.flatMap((bar) => [
    { variable: labels(bar.path), end: "at its 5 % value", from: state.factorAtMean, to: bar.factorAt5 },
    { variable: labels(bar.path), end: "at its 95 % value", from: state.factorAtMean, to: bar.factorAt95 },
  ]);
  const words = capitalised(limitStateWords[name] ?? name);
  const widest = bars[0];
  const ends = values.flatMap((row) => [row.from, row.to]).concat(1);
  const pad = 0.03 * (Math.max(...ends) - Math.min(...ends)) + 0.01;
  const scale = { zero: false, domain: [Math.min(...ends) - pad, Math.max(...ends) + pad], nice: false };
  return {
    id: `tornado-${name}`,
    title: `${words}: factor of safety with one unknown moved at a time`,
    alternative:
      widest === undefined
        ? "No unknown moves the factor."
        : `Widest: ${labels(widest.path)}, from ${significant(widest.factorAt5, 3)} at its 5 % value to ${significant(widest.factorAt95, 3)} at its 95 % value; ${significant(state.factorAtMean, 3)} at the means.`,
    spec: {
      data: { values },
      width: 300,
      height: { step: 22 },
      layer: [
        {
          mark: { type: "bar", height: { band: 0.7 } },
          encoding: {
            y: { field: "variable", type: "nominal", sort: null, title: null, axis: { labelLimit: 480 } },
            x: { field: "from", type: "quantitative", title: "Factor of safety", scale, axis: { tickCount: 6 } },
            x2: { field: "to" },
            color: {
              field: "end",
              type: "nominal",
              title: null,
              scale: { domain: ["at its 5 % value", "at its 95 % value"], range: [palette.main, palette.soft] },
            },
          },
        },
        {
          data: { values: [{ one: 1 }] },
          mark: { type: "rule", color: palette.fail, strokeWidth: 1.5 },
          encoding: { x: { field: "one", type: "quantitative", scale } },
        },
      ],
    },
  };
}
