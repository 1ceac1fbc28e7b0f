import type { AssessResult } from "../../results.ts";
import { limitStateName } from "../display.ts";
import { shareText } from "../number.ts";
import { markWords } from "../page-svg.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";
import { chartWidth, labelRoom, labelsOf, mostRows } from "./common.ts";

/** Unknowns with less than this in every limit state are left to the table, but for the first few. */
const leastShare = 0.005;
const fewestRows = 3;

/** First-order shares of every variable, a column of bars for each limit state. */
export function sharesChart(result: AssessResult): Chart {
  const labels = labelsOf(result);
  const states = Object.entries(result.limitStates);
  const shareOf = (path: string, k: number): number => states[k][1].firstOrderSecondMoment.contributions[path] ?? 0;
  const strength = (path: string): number => Math.max(...states.map((_, k) => Math.abs(shareOf(path, k))));
  const paths = result.variables
    .map((variable) => variable.path)
    .sort((a, b) => strength(b) - strength(a))
    .filter((path, place) => place < mostRows && (place < fewestRows || strength(path) >= leastShare));
  const values = states.flatMap(([name], k) =>
    paths.map((path) => {
      const share = shareOf(path, k);
      return {
        variable: labels(path),
        state: limitStateName(name),
        share: 100 * share,
        words: Math.abs(share) < 0.01 ? "" : shareText(share),
        tip: markWords(`${labels(path)}: ${shareText(share)} of the variance, ${limitStateName(name)}`, name),
      };
    }),
  );
  const strongest = states.map(([name], k) => {
    const top = [...paths].sort((a, b) => shareOf(b, k) - shareOf(a, k))[0];
    return top === undefined ? "" : `${limitStateName(name)}: ${labels(top)}, ${shareText(shareOf(top, k))}`;
  });
  const room = chartWidth - labelRoom(paths.map(labels)) - 18 * (states.length - 1);
  const most = Math.max(...values.map((row) => row.share), 1);
  const least = Math.min(...values.map((row) => row.share), 0);
  return {
    id: "shares",
    title: "Share of each unknown in the variance of the factor of safety",
    alternative: `The largest: ${strongest.join("; ")}.`,
    spec: {
      data: { values },
      spacing: 18,
      facet: {
        column: {
          field: "state",
          type: "nominal",
          title: null,
          sort: states.map(([name]) => limitStateName(name)),
          header: { labelAnchor: "start" },
        },
      },
      spec: {
        width: Math.floor(room / Math.max(states.length, 1)),
        height: { step: 22 },
        encoding: {
          y: {
            field: "variable",
            type: "nominal",
            sort: null,
            title: null,
            axis: { ticks: false, domain: false, labelPadding: 8 },
          },
          x: {
            field: "share",
            type: "quantitative",
            axis: null,
            scale: { domain: [least < 0 ? 1.3 * least : 0, 1.3 * most], nice: false },
          },
        },
        layer: [
          {
            mark: { type: "bar", color: palette.main, height: { band: 0.66 } },
            encoding: { description: { field: "tip" } },
          },
          {
            mark: { type: "text", align: "left", dx: 4, aria: false },
            encoding: { x: { field: "share", type: "quantitative" }, text: { field: "words" } },
          },
        ],
      },
    },
  };
}
