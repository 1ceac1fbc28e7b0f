import type { ScopeOption, ScopeResult } from "../../results-decision.ts";
import { oneIn } from "../number.ts";
import { markWords } from "../page-svg.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";
import { money } from "../scope-text.ts";
import { textWidth } from "../text-width.ts";
import { chartWidth, decadeLabels, decades, moneyLabels } from "./common.ts";

/** Pixels between the decades' names and the right end, near enough. */
const axisRoom = chartWidth - 150;
/** Words of two options closer than this, in pixels, would run into each other. */
const tooClose = 20;
const height = 280;
/** The target's words stand so far above its line, to their middle. */
const targetRise = 10;

/** What each option costs to build against how likely the wall then fails; the best today filled. */
export function optionsChart(result: ScopeResult): Chart {
  const { options, currency, bestOption, target } = result;
  const seen = options.map(({ probability }) => probability).concat(target?.probability ?? 1);
  const { floor, values } = decades(Math.min(...seen.filter((p) => p > 0)));
  const dearest = Math.max(...options.map(({ cost }) => cost), 1);
  const cheapest = Math.min(...options.map(({ cost }) => cost), 0);
  const room = 0.05 * (dearest - cheapest);
  const x = {
    type: "quantitative",
    scale: { domain: [cheapest - room, dearest + room], nice: false, zero: false },
    axis: { title: `Price of the option, ${currency}`, labelExpr: moneyLabels, tickCount: 6 },
  };
  const y = {
    type: "quantitative",
    scale: { type: "log", domain: [floor, 1], nice: false },
    axis: { title: "Probability of failure", values, labelExpr: `${decadeLabels}[1]` },
  };
  const rows = placed(
    options.map((option) =>
      rowOf(option, result, floor, (option.cost - cheapest + room) / (dearest - cheapest + 2 * room)),
    ),
    floor,
    target?.probability,
  );
  return {
    id: "options",
    title: "What each option costs, and how likely the wall then fails",
    alternative: options
      .map(({ name, cost, probability }) => `${name}: ${money(cost, currency)}, ${oneIn(probability)}`)
      .concat(`Least expected cost: ${bestOption}`)
      .join(". "),
    spec: {
      data: { values: rows },
      height,
      layer: [
        ...targetLayers(target?.probability, x, y),
        {
          mark: { type: "rule", strokeWidth: 7, color: palette.soft, strokeCap: "round", aria: false },
          encoding: { x: { field: "cost", ...x }, y: { field: "low", ...y }, y2: { field: "high" } },
        },
        ...[true, false].map((best) => ({
          transform: [{ filter: `datum.best === ${best}` }],
          mark: {
            type: "point",
            filled: true,
            size: 130,
            opacity: 1,
            stroke: palette.main,
            strokeWidth: 2,
            fill: best ? palette.main : palette.paper,
          },
          encoding: { x: { field: "cost", ...x }, y: { field: "probability", ...y }, description: { field: "tip" } },
        })),
        ...["left", "right"].flatMap((align) =>
          [true, false].map((best) => ({
            transform: [{ filter: `datum.align === '${align}' && datum.best === ${best}` }],
            mark: {
              type: "text",
              align,
              dx: align === "left" ? 12 : -12,
              dy: { expr: "datum.lift" },
              fontSize: 13,
              fontWeight: best ? 700 : 400,
              aria: false,
            },
            encoding: { x: { field: "cost", ...x }, y: { field: "probability", ...y }, text: { field: "words" } },
          })),
        ),
      ],
    },
  };
}

interface Row {
  readonly name: string;
  readonly cost: number;
  readonly probability: number;
  readonly low: number;
  readonly high: number;
  readonly best: boolean;
  readonly words: string;
  readonly align: "left" | "right";
  readonly lift: number;
  readonly tip: string;
}

function rowOf(option: ScopeOption, { bestOption, currency }: ScopeResult, floor: number, along: number): Row {
  const { name, cost, probability, probabilityStandardError: error, expectedCost } = option;
  const best = name === bestOption;
  const words = `${name}${best ? " (least expected cost)" : ""}: ${oneIn(probability)}`;
  return {
    name,
    cost,
    probability: Math.max(probability, floor),
    low: Math.max(probability - 1.96 * error, floor),
    high: Math.max(probability + 1.96 * error, floor),
    best,
    words,
    align: along * axisRoom + textWidth(words, 13) * 1.08 + 14 > axisRoom && along > 0.5 ? "right" : "left",
    lift: 0,
    tip: markWords(
      `${name}: price ${money(cost, currency)}, probability of failure ${oneIn(probability)}, expected cost ${money(expectedCost, currency)}`,
    ),
  };
}

/** Words that would lie on each other, or on those of the target, move apart, upwards. */
function placed(rows: readonly Row[], floor: number, target: number | undefined): readonly Row[] {
  const pixel = ({ probability }: Pick<Row, "probability">): number =>
    (height * Math.log10(probability)) / Math.log10(floor);
  const used: number[] = target === undefined ? [] : [pixel({ probability: target }) - targetRise];
  return [...rows]
    .sort((a, b) => pixel(b) - pixel(a))
    .map((row) => {
      let at = pixel(row);
      while (used.some((other) => Math.abs(other - at) < tooClose)) at -= tooClose / 4;
      used.push(at);
      return { ...row, lift: at - pixel(row) };
    });
}

function targetLayers(target: number | undefined, x: object, y: object): readonly object[] {
  if (target === undefined) return [];
  const data = { values: [{ target }] };
  const at = { field: "target", ...y };
  return [
    {
      data,
      mark: { type: "rule", color: palette.target, strokeDash: [6, 3], strokeWidth: 2 },
      encoding: { y: at, description: { value: markWords(`Target: ${oneIn(target)}`) } },
    },
    {
      data,
      mark: {
        type: "text",
        color: palette.target,
        align: "right",
        baseline: "bottom",
        dx: -4,
        dy: -4,
        fontWeight: 600,
        text: `target ${oneIn(target)}`,
        aria: false,
      },
      encoding: { y: at, x: { ...x, value: "width", field: undefined } },
    },
  ];
}
