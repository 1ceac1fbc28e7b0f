import type { SizePoint, SizeResult } from "../../results-size.ts";
import type { Display } from "../display.ts";
import { indexText, oneIn } from "../number.ts";
import { markWords } from "../page-svg.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";

/** Reliability index over two dimensions as shaded cells, with the line along which the target is met; undefined for one dimension. */
export function sizeContourChart(result: SizeResult, display: Display): Chart | undefined {
  const { second, points, target } = result;
  if (second === undefined || points.length === 0) return undefined;
  const [across, up] = [valuesOf(points, ({ value }) => value), valuesOf(points, (point) => point.second ?? 0)];
  const [xFactor, yFactor] = [display.factor(result.unit), display.factor(second.unit)];
  const [xHalf, yHalf] = [halfStep(across) * xFactor, halfStep(up) * yFactor];
  const rows = points.map((point) => {
    const [x, y] = [point.value * xFactor, (point.second ?? 0) * yFactor];
    return {
      x,
      y,
      left: x - xHalf,
      right: x + xHalf,
      bottom: y - yHalf,
      top: y + yHalf,
      index: point.reliabilityIndex ?? (point.probability > 0.5 ? -3 : 7),
      words: indexText(point.reliabilityIndex),
      tip: markWords(
        `${result.label} ${display.quantity(point.value, result.unit)}, ${second.label} ${display.quantity(point.second ?? 0, second.unit)}: ${oneIn(point.probability)}, index ${indexText(point.reliabilityIndex)}`,
      ),
    };
  });
  const line = target === undefined ? [] : crossings(points, up, target.reliabilityIndex);
  const axis = (field: string, label: string, unit: string): object => ({
    field,
    type: "quantitative",
    scale: { zero: false, nice: false },
    axis: { title: `${label}, ${display.unit(unit)}`, grid: false },
  });
  return {
    id: "size-contour",
    title: `Reliability index by ${lower(result.label)} and ${lower(second.label)}`,
    alternative:
      target === undefined
        ? "The study names no target."
        : line.length === 0
          ? `No line within the range along which the index is ${indexText(target.reliabilityIndex)}.`
          : `The target, index ${indexText(target.reliabilityIndex)}, is met along a line from ${pair(line[0], result, display)} to ${pair(line.at(-1)!, result, display)}.`,
    spec: {
      data: { values: rows },
      height: 340,
      layer: [
        {
          mark: { type: "rect", color: palette.soft },
          encoding: {
            x: axis("left", result.label, result.unit),
            x2: { field: "right" },
            y: axis("bottom", second.label, second.unit),
            y2: { field: "top" },
            // a role of the palette at more or less strength, so that words stay readable at night too
            opacity: { field: "index", type: "quantitative", scale: { range: [0.06, 0.95] }, legend: null },
            description: { field: "tip" },
          },
        },
        {
          mark: { type: "text", color: palette.ink, fontSize: 12 },
          encoding: {
            x: { field: "x", type: "quantitative" },
            y: { field: "y", type: "quantitative" },
            text: { field: "words" },
          },
        },
        ...(line.length === 0
          ? []
          : [
              {
                data: { values: line.map(([x, y], place) => ({ x: x * xFactor, y: y * yFactor, place })) },
                mark: { type: "line", color: palette.target, strokeWidth: 2.5, strokeDash: [6, 4] },
                encoding: {
                  x: { field: "x", type: "quantitative" },
                  y: { field: "y", type: "quantitative" },
                  order: { field: "place" },
                },
              },
            ]),
      ],
    },
  };
}

const valuesOf = (points: readonly SizePoint[], of: (point: SizePoint) => number): readonly number[] => [
  ...new Set(points.map(of)),
];

const halfStep = (values: readonly number[]): number =>
  values.length > 1 ? (values[values.length - 1] - values[0]) / (values.length - 1) / 2 : 0.5;

/** Where the index crosses the target along the first dimension, for every value of the second: between neighbours, linearly. */
function crossings(
  points: readonly SizePoint[],
  up: readonly number[],
  wanted: number,
): readonly (readonly [number, number])[] {
  return up.flatMap((second) => {
    const row = points.filter((point) => point.second === second && point.reliabilityIndex !== null);
    for (let k = 1; k < row.length; k++) {
      const [a, b] = [(row[k - 1].reliabilityIndex ?? 0) - wanted, (row[k].reliabilityIndex ?? 0) - wanted];
      if (a !== b && a * b <= 0)
        return [[row[k - 1].value + ((row[k].value - row[k - 1].value) * a) / (a - b), second] as const];
    }
    return [];
  });
}

const pair = ([x, y]: readonly [number, number], { unit, second }: SizeResult, display: Display): string =>
  `${display.quantity(x, unit)} and ${display.quantity(y, second?.unit ?? unit)}`;

const lower = (label: string): string => label.charAt(0).toLowerCase() + label.slice(1);
