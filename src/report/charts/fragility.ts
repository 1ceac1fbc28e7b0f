import type { AssessResult, VariableSummary } from "../../results.ts";
import type { FragilityCurve } from "../../results-methods.ts";
import { capitalised, type Display, uncapitalised } from "../display.ts";
import { intervalText, oneIn, probabilityText } from "../number.ts";
import { markWords } from "../page-svg.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";
import { decadeLabels, decades } from "./common.ts";

/** Below this the curve is left to the table. */
const least = 1e-10;

/** Probability of any failure as a function of one unknown, with its interval, over the range in which the unknown is likely to lie. */
export function fragilityChart(
  { system, target }: Pick<AssessResult, "system" | "target">,
  { path, points }: FragilityCurve,
  variable: VariableSummary,
  display: Display,
): Chart {
  const factor = display.factor(variable.unit);
  const seen = points.filter(({ probability }) => probability > least);
  const { floor, values } = decades(Math.min(...seen.map((point) => point.probability), target?.probability ?? 1));
  const rows = seen.map(({ value, probability, interval: [low, high] }) => ({
    value: value * factor,
    probability: Math.max(probability, floor),
    low: Math.max(low, floor),
    high: Math.max(high, floor),
    tip: markWords(
      `At ${display.quantity(value, variable.unit)}: ${oneIn(probability)} (${probabilityText(low)} to ${probabilityText(high)})`,
    ),
  }));
  const unit = display.unit(variable.unit);
  const label = capitalised(variable.label);
  const ends = [points[0], points.at(-1)].filter((point) => point !== undefined);
  const overall = probabilityText(system.monteCarlo.probability);
  return {
    id: `fragility-${path.replaceAll(".", "-")}`,
    title: `Probability of any failure against ${uncapitalised(variable.label)}`,
    alternative: `${ends.map(({ value, probability, interval }) => `At ${display.quantity(value, variable.unit)} ${probabilityText(probability)}, interval ${intervalText(interval)}`).join("; ")}. With it unknown ${overall}.`,
    spec: {
      data: { values: rows },
      height: 230,
      encoding: {
        x: {
          type: "quantitative",
          scale: {
            zero: false,
            nice: false,
            domain: [points[0].value * factor, points[points.length - 1].value * factor],
          },
          axis: { title: `${label}${unit === "–" ? "" : `, ${unit}`}`, tickCount: 8, grid: false },
        },
        y: {
          type: "quantitative",
          scale: { type: "log", domain: [floor, 1], nice: false },
          axis: {
            title: "Probability of any failure",
            values,
            labelExpr: `${decadeLabels}[0]`,
          },
        },
      },
      layer: [...believed(variable, factor, floor), ...targetLine(target?.probability), ...curve()],
    },
  };
}

/** Where the unknown is likely to lie: a band from its 5 to its 95 % value, and its mean. */
function believed({ fractile5, fractile95, mean }: VariableSummary, factor: number, floor: number): readonly object[] {
  return [
    {
      data: { values: [{ from: fractile5 * factor, to: fractile95 * factor, low: floor, high: 1 }] },
      mark: { type: "rect", color: palette.wash, aria: false },
      encoding: { x: { field: "from" }, x2: { field: "to" }, y: { field: "low" }, y2: { field: "high" } },
    },
    {
      data: { values: [{ mean: mean * factor }] },
      mark: { type: "rule", color: palette.muted, strokeDash: [2, 3] },
      encoding: { x: { field: "mean" }, y: null, description: { value: markWords("The mean") } },
    },
    {
      data: { values: [{ mean: mean * factor }] },
      mark: {
        type: "text",
        text: "mean",
        color: palette.muted,
        align: "left",
        dx: 4,
        dy: 8,
        baseline: "top",
        aria: false,
      },
      encoding: { x: { field: "mean" }, y: { value: 0 } },
    },
  ];
}

function targetLine(target: number | undefined): readonly object[] {
  if (target === undefined) return [];
  const data = { values: [{ target }] };
  return [
    {
      data,
      mark: { type: "rule", color: palette.target, strokeDash: [6, 3], strokeWidth: 2 },
      encoding: { y: { field: "target" }, x: null, description: { value: markWords(`Target: ${oneIn(target)}`) } },
    },
    {
      data,
      mark: {
        type: "text",
        text: `target ${oneIn(target)}`,
        color: palette.target,
        align: "right",
        baseline: "bottom",
        dx: -4,
        dy: -3,
        fontWeight: 600,
        aria: false,
      },
      encoding: { y: { field: "target" }, x: { value: "width" } },
    },
  ];
}

function curve(): readonly object[] {
  return [
    {
      mark: { type: "area", color: palette.soft, opacity: 0.55, aria: false },
      encoding: { x: { field: "value" }, y: { field: "low" }, y2: { field: "high" } },
    },
    {
      mark: { type: "line", color: palette.main, strokeWidth: 2, aria: false },
      encoding: { x: { field: "value" }, y: { field: "probability" } },
    },
    {
      mark: { type: "point", filled: true, color: palette.main, size: 45, opacity: 1 },
      encoding: { x: { field: "value" }, y: { field: "probability" }, description: { field: "tip" } },
    },
  ];
}
