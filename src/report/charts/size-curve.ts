import type { SizePoint, SizeResult } from "../../results-size.ts";
import { type Display, limitStateName } from "../display.ts";
import { indexText, oneIn, probabilityText, significant } from "../number.ts";
import { markWords } from "../page-svg.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";
import { decadeLabels, decades } from "./common.ts";

/** Probability of failure along one dimension with its 95 % interval, and where it meets the target. */
export function sizeCurveChart(result: SizeResult, display: Display): Chart {
  const { points, target, meetsTargetAt, label, unit } = result;
  const { floor, values } = decades(
    Math.min(...points.map(({ probability }) => probability).filter((p) => p > 0), target?.probability ?? 1),
  );
  const rows = points.map(({ value, probability, interval: [low, high], reliabilityIndex }) => ({
    value: value * display.factor(unit),
    probability: Math.max(probability, floor),
    low: Math.max(low, floor),
    high: Math.max(high, floor),
    tip: markWords(
      `${label} ${display.quantity(value, unit)}: ${oneIn(probability)} (${probabilityText(probability)}), index ${indexText(reliabilityIndex)}`,
    ),
  }));
  const met = meetsTargetAt ?? undefined;
  return {
    id: "size-curve",
    title: `Probability of failure by ${lower(label)}`,
    alternative: [
      ...(met === undefined || target === undefined
        ? []
        : [`The target of ${oneIn(target.probability)} is met at ${display.quantity(met, unit)}`]),
      ...[points[0], points.at(-1)].flatMap((point) =>
        point === undefined ? [] : [`${display.quantity(point.value, unit)}: ${oneIn(point.probability)}`],
      ),
    ].join(". "),
    spec: {
      data: { values: rows },
      height: 300,
      encoding: {
        x: {
          field: "value",
          type: "quantitative",
          scale: { zero: false, nice: false },
          axis: { title: `${label}, ${display.unit(unit)}`, grid: false },
        },
        y: {
          type: "quantitative",
          scale: { type: "log", domain: [floor, 1], nice: false },
          axis: { title: "Probability of failure", values, labelExpr: `${decadeLabels}[0]` },
        },
      },
      layer: [
        {
          mark: { type: "area", color: palette.soft, opacity: 0.45 },
          encoding: { y: { field: "low" }, y2: { field: "high" } },
        },
        { mark: { type: "line", color: palette.main, strokeWidth: 2 }, encoding: { y: { field: "probability" } } },
        {
          mark: { type: "point", filled: true, size: 36, color: palette.main },
          encoding: { y: { field: "probability" }, description: { field: "tip" } },
        },
        ...(target === undefined ? [] : targetLayers(target.probability)),
        ...(met === undefined || target === undefined
          ? []
          : metLayers(met * display.factor(unit), target.probability, display.quantity(met, unit))),
      ],
    },
  };
}

/** A dashed line at the target, named at its left end. */
const targetLayers = (probability: number): readonly object[] => [
  {
    data: { values: [{ target: probability }] },
    mark: { type: "rule", color: palette.target, strokeDash: [6, 4], strokeWidth: 1.5 },
    encoding: { x: null, y: { field: "target" } },
  },
  {
    data: { values: [{ target: probability, words: `target ${oneIn(probability)}` }] },
    mark: { type: "text", color: palette.target, align: "left", baseline: "bottom", dx: 6, dy: -4, fontSize: 12 },
    encoding: { x: { value: 0 }, y: { field: "target" }, text: { field: "words" } },
  },
];

const metLayers = (value: number, probability: number, words: string): readonly object[] => [
  {
    data: { values: [{ value, probability, words: `met at ${words}` }] },
    mark: { type: "point", shape: "diamond", filled: true, size: 130, color: palette.target },
    encoding: { y: { field: "probability" }, description: { field: "words" } },
  },
  {
    data: { values: [{ value, probability, words }] },
    mark: {
      type: "text",
      color: palette.target,
      align: "left",
      baseline: "bottom",
      dx: 8,
      dy: -6,
      fontSize: 13,
      fontWeight: 600,
    },
    encoding: { y: { field: "probability" }, text: { field: "words" } },
  },
];

/** Lines of the factors of safety at the means along the same dimension. */
export function sizeFactorsChart(result: SizeResult, display: Display): Chart {
  const { points, label, unit } = result;
  const rows = points.flatMap(({ value, factorAtMean }) =>
    Object.entries(factorAtMean).map(([state, factor]) => ({
      value: value * display.factor(unit),
      factor,
      name: limitStateName(state),
      tip: markWords(`${limitStateName(state)}, ${display.quantity(value, unit)}: ${significant(factor, 3)}`),
    })),
  );
  const [first, last] = [points[0], points.at(-1)];
  const range = Object.keys(first?.factorAtMean ?? {}).map((state) => {
    const factor = (point: SizePoint | undefined): string =>
      significant(Object.entries(point?.factorAtMean ?? {}).find(([name]) => name === state)?.[1] ?? Number.NaN, 3);
    return `${limitStateName(state)}: ${factor(first)} to ${factor(last)}`;
  });
  return {
    id: "size-factors",
    title: `Factor of safety at the means by ${lower(label)}`,
    alternative: range.join(". "),
    spec: {
      data: { values: rows },
      height: 190,
      encoding: {
        x: {
          field: "value",
          type: "quantitative",
          scale: { zero: false, nice: false },
          axis: { title: `${label}, ${display.unit(unit)}`, grid: false },
        },
        y: { field: "factor", type: "quantitative", axis: { title: "Factor of safety at the means", tickCount: 5 } },
        color: {
          field: "name",
          type: "nominal",
          sort: null,
          scale: { range: [palette.main, palette.fail, palette.water, palette.target, palette.muted] },
          legend: { title: null, symbolType: "stroke", symbolSize: 400, symbolStrokeWidth: 2 },
        },
        strokeDash: {
          field: "name",
          type: "nominal",
          sort: null,
          legend: { title: null, symbolType: "stroke", symbolSize: 400, symbolStrokeWidth: 2 },
        },
      },
      layer: [
        { mark: { type: "line", strokeWidth: 2 } },
        {
          mark: { type: "point", filled: true, size: 22 },
          encoding: { description: { field: "tip" }, strokeDash: { value: [1, 0] } },
        },
      ],
    },
  };
}

const lower = (label: string): string => label.charAt(0).toLowerCase() + label.slice(1);
