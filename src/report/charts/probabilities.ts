import type { AssessResult } from "../../results.ts";
import { limitStateName } from "../display.ts";
import { oneIn, probabilityText } from "../number.ts";
import { markWords } from "../page-svg.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";
import { textWidth } from "../text-width.ts";
import {
  allFailed,
  countedEstimate,
  type Estimate,
  estimateSentence,
  noneSeen,
  oneInCell,
  wallEstimate,
  yearsText,
} from "../wording.ts";
import { chartWidth, decadeLabels, decades } from "./common.ts";

/** Probability of each limit state and of the wall, with its interval, on a logarithmic axis, against the target. */
export function probabilityChart(result: AssessResult): Chart {
  const { period, monteCarlo: any } = result.system;
  const year = period === undefined ? "" : ", one year";
  const whole = period === undefined ? "The wall" : `The wall, ${yearsText(period.years)}`;
  const named: readonly { name: string; state: string; estimate: Estimate }[] = [
    ...Object.entries(result.limitStates).map(([state, { monteCarlo }]) => ({
      name: limitStateName(state) + year,
      state,
      estimate: countedEstimate(monteCarlo),
    })),
    ...(period === undefined ? [] : [{ name: `Any${year}`, state: "any", estimate: countedEstimate(any) }]),
    { name: whole, state: "any", estimate: wallEstimate(result) },
  ];
  const seen = named.flatMap(({ estimate: { interval, probability } }) => [...interval, probability]);
  const { floor, values } = decades(Math.min(...[...seen, result.target?.probability ?? 1].filter((p) => p > 0)));
  return {
    id: "probabilities",
    title: "Probability of each kind of failure, with its 95 % interval",
    alternative: named.map(({ name, estimate }) => `${name}: ${estimateSentence(estimate)}`).join(". "),
    spec: {
      data: { values: named.map((row) => rowOf(row.name, row.state, row.estimate, floor)) },
      height: { step: 40 },
      encoding: {
        y: {
          field: "name",
          type: "nominal",
          sort: null,
          title: null,
          axis: {
            ticks: false,
            domain: false,
            labelPadding: 10,
            labelFontSize: 13,
            labelFontWeight: { condition: { test: `datum.value === '${whole}'`, value: 700 }, value: 400 },
          },
        },
        x: {
          type: "quantitative",
          scale: { type: "log", domain: [floor, 1], nice: false },
          axis: {
            title: "Probability of failure",
            values,
            labelExpr: values.length > 9 ? `${decadeLabels}[0]` : decadeLabels,
            labelLineHeight: 15,
            labelFlush: false,
          },
        },
      },
      layer: [...targetLayers(result.target?.probability), ...rowLayers()],
    },
  };
}

/** Pixels between the names and the end of the axis, near enough. */
const axisRoom = chartWidth - 150;

const places = ["right", "left", "above"] as const;
type Place = (typeof places)[number];

function rowOf(name: string, state: string, estimate: Estimate, floor: number): Record<string, unknown> {
  const none = noneSeen(estimate);
  const [low, high] = estimate.interval;
  const words = none ? `none seen: rarer than ${oneIn(high)}` : oneInCell(estimate);
  // Words stand right of their bar; left of it, or above its end, where the axis ends too soon.
  const pixels = (p: number): number => axisRoom * (1 - Math.log10(Math.max(p, floor)) / Math.log10(floor));
  const room = textWidth(words, 13) * 1.08 + 14;
  const far = pixels(high) + room > axisRoom + 20;
  const place: Place = !far ? "right" : pixels(low) < room ? "above" : "left";
  return {
    name,
    probability: none ? null : Math.max(estimate.probability, floor),
    low: Math.max(low, floor),
    high: Math.max(high, floor),
    end: Math.max(place === "left" ? low : high, floor),
    place,
    kind: none ? "none" : allFailed(estimate) ? "all" : "some",
    words,
    tip: markWords(
      `${name}: ${estimateSentence(estimate)} (${probabilityText(low)} to ${probabilityText(high)})`,
      state,
    ),
  };
}

function rowLayers(): readonly object[] {
  const tip = { field: "tip" };
  const words = (place: Place, halo: boolean): object => ({
    transform: [{ filter: `datum.place === '${place}'` }],
    mark: {
      type: "text",
      align: place === "right" ? "left" : "right",
      dx: place === "right" ? 12 : place === "left" ? -12 : 0,
      dy: place === "above" ? -14 : 0,
      fontSize: 13,
      fontWeight: 600,
      aria: false,
      ...(halo ? { stroke: palette.paper, strokeWidth: 5, strokeJoin: "round" } : {}),
    },
    encoding: { x: { field: "end" }, text: { field: "words" } },
  });
  return [
    {
      mark: { type: "rule", strokeWidth: 9, color: palette.soft, strokeCap: "round" },
      encoding: { x: { field: "low" }, x2: { field: "high" }, description: tip },
    },
    {
      transform: [{ filter: "datum.kind !== 'none'" }],
      mark: { type: "point", filled: true, size: 110, color: palette.main, opacity: 1 },
      encoding: { x: { field: "probability" }, description: tip },
    },
    {
      transform: [{ filter: "datum.kind === 'none'" }],
      mark: { type: "tick", color: palette.main, thickness: 2.5, size: 18 },
      encoding: { x: { field: "high" }, description: tip },
    },
    ...places.flatMap((place) => [words(place, true), words(place, false)]),
  ];
}

function targetLayers(target: number | undefined): readonly object[] {
  if (target === undefined) return [];
  const data = { values: [{ target }] };
  const x = { field: "target" };
  return [
    {
      data,
      mark: { type: "rule", color: palette.target, strokeDash: [6, 3], strokeWidth: 2 },
      encoding: { x, y: null, description: { value: markWords(`Target: ${oneIn(target)}`) } },
    },
    {
      data,
      mark: {
        type: "text",
        color: palette.target,
        align: "left",
        baseline: "bottom",
        dx: -3,
        dy: -4,
        fontWeight: 600,
        text: `target ${oneIn(target)}`,
        aria: false,
      },
      encoding: { x, y: { value: 0 } },
    },
  ];
}
