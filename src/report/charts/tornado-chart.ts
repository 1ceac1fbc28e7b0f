import type { AssessResult, LimitStateAssessment, TornadoBar } from "../../results.ts";
import { type Display, limitStateName } from "../display.ts";
import { significant } from "../number.ts";
import { markWords } from "../page-svg.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";
import { labelsOf } from "./common.ts";

const ends = ["at its 5 % value", "at its 95 % value"] as const;
const mostBars = 8;

/** Factor of safety with one unknown at its 5 and 95 % fractile, the others at their means; the widest bar on top. */
export function tornadoChart(result: AssessResult, name: string, state: LimitStateAssessment, display: Display): Chart {
  const labels = labelsOf(result);
  const width = (bar: TornadoBar): number => Math.abs(bar.factorAt95 - bar.factorAt5);
  const bars = [...state.tornado]
    .filter((bar) => width(bar) > 1e-9)
    .sort((a, b) => width(b) - width(a))
    .slice(0, mostBars);
  const values = bars.flatMap((bar) => rowsOf(bar, state.factorAtMean, result, display, name, labels(bar.path)));
  const factors = values.flatMap((row) => [row.from, row.to]).concat(1);
  const [low, high] = [Math.min(...factors), Math.max(...factors)];
  const pad = 0.13 * (high - low) + 0.01;
  const x = {
    type: "quantitative",
    scale: { zero: false, domain: [low - pad, high + pad], nice: false },
    axis: { title: "Factor of safety", tickCount: 8 },
  };
  const widest = bars[0];
  return {
    id: `tornado-${name}`,
    state: name,
    title: `${limitStateName(name)}: the factor of safety with one unknown moved at a time`,
    alternative:
      widest === undefined
        ? "No unknown moves the factor."
        : `Widest: ${labels(widest.path)}, from ${significant(widest.factorAt5, 3)} at its 5 % value to ${significant(widest.factorAt95, 3)} at its 95 % value; ${significant(state.factorAtMean, 3)} at the means.`,
    spec: {
      data: { values },
      height: { step: 24 },
      encoding: {
        y: {
          field: "variable",
          type: "nominal",
          sort: null,
          title: null,
          axis: { ticks: false, domain: false, labelPadding: 8 },
        },
      },
      layer: [
        {
          mark: { type: "bar", height: { band: 0.66 }, stroke: palette.main, strokeWidth: 1 },
          encoding: {
            x: { field: "from", ...x },
            x2: { field: "to" },
            color: {
              field: "end",
              type: "nominal",
              legend: { title: null },
              scale: { domain: ends, range: [palette.main, palette.soft] },
            },
            description: { field: "tip" },
          },
        },
        ...["right", "left"].map((align) => ({
          transform: [{ filter: `datum.align === '${align}'` }],
          mark: { type: "text", align, dx: align === "left" ? 5 : -5, fontSize: 11, color: palette.muted, aria: false },
          encoding: { x: { field: "to", ...x }, text: { field: "words" } },
        })),
        {
          data: { values: [{ one: 1 }] },
          mark: { type: "rule", color: palette.fail, strokeWidth: 2, aria: false },
          encoding: { x: { field: "one", ...x }, y: null },
        },
      ],
    },
  };
}

interface Row {
  readonly variable: string;
  readonly end: string;
  readonly from: number;
  readonly to: number;
  readonly align: string;
  readonly words: string;
  readonly tip: string;
}

function rowsOf(
  bar: TornadoBar,
  atMean: number,
  { variables }: AssessResult,
  display: Display,
  state: string,
  variable: string,
): readonly Row[] {
  const summary = variables.find((candidate) => candidate.path === bar.path);
  const value = (which: "fractile5" | "fractile95"): string =>
    summary === undefined ? "" : display.quantity(summary[which], summary.unit);
  return [
    { to: bar.factorAt5, other: bar.factorAt95, end: ends[0], words: value("fractile5") },
    { to: bar.factorAt95, other: bar.factorAt5, end: ends[1], words: value("fractile95") },
  ].map(({ to, other, end, words }) => ({
    variable,
    end,
    from: atMean,
    to,
    align: to < other ? "right" : "left",
    words,
    tip: markWords(`${variable} ${end}, ${words}: factor of safety ${significant(to, 3)}`, state),
  }));
}
