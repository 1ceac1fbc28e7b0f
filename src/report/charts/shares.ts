import type { AssessResult } from "../../results.ts";
import { capitalised, limitStateWords } from "../display.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";
import { labelsOf, mostRows } from "./labels.ts";

/** First-order shares of every variable, a column of bars for each limit state. */
export function sharesChart(result: AssessResult): Chart {
  const labels = labelsOf(result);
  const states = Object.entries(result.limitStates);
  const strength = (path: string): number =>
    Math.max(...states.map(([, state]) => Math.abs(state.firstOrderSecondMoment.contributions[path] ?? 0)));
  const paths = result.variables
    .map((variable) => variable.path)
    .sort((a, b) => strength(b) - strength(a))
    .slice(0, mostRows);
  const values = states.flatMap(([name, state]) =>
    paths.map((path) => ({
      variable: labels(path),
      state: capitalised(limitStateWords[name] ?? name),
      share: 100 * (state.firstOrderSecondMoment.contributions[path] ?? 0),
    })),
  );
  const strongest = states.map(([name]) => {
    const top = values
      .filter((row) => row.state === capitalised(limitStateWords[name] ?? name))
      .sort((a, b) => b.share - a.share)[0];
    return top === undefined ? "" : `${top.state}: ${top.variable}, ${Math.round(top.share)} %`;
  });
  return {
    id: "shares",
    title: "Share of each unknown in the spread of the factor of safety",
    alternative: `The largest: ${strongest.join("; ")}.`,
    spec: {
      data: { values },
      facet: {
        column: {
          field: "state",
          type: "nominal",
          title: null,
          sort: states.map(([name]) => capitalised(limitStateWords[name] ?? name)),
        },
      },
      spec: {
        width: 150,
        height: { step: 22 },
        mark: { type: "bar", color: palette.main, height: { band: 0.7 } },
        encoding: {
          y: { field: "variable", type: "nominal", sort: null, title: null, axis: { labelLimit: 480 } },
          x: { field: "share", type: "quantitative", title: "Share, %", axis: { tickCount: 4 } },
        },
      },
    },
  };
}
