import type { EvidenceResult } from "../../results-decision.ts";
import { oneIn } from "../number.ts";
import { markWords } from "../page-svg.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";
import { decadeLabels, decades } from "./common.ts";

/** Probability of failure before and after what has been seen. */
export function evidenceChart(evidence: EvidenceResult, yearly: boolean): Chart {
  const year = yearly ? ", one year" : "";
  const named = [
    { name: `Before it was seen${year}`, p: evidence.priorProbability, error: evidence.priorStandardError },
    { name: `After it was seen${year}`, p: evidence.probability, error: evidence.standardError },
  ];
  const { floor, values } = decades(Math.min(...named.map(({ p }) => p).filter((p) => p > 0), 0.1));
  const rows = named.map(({ name, p, error }) => ({
    name,
    probability: Math.max(p, floor),
    low: Math.max(p - 1.96 * error, floor),
    high: Math.min(Math.max(p + 1.96 * error, floor), 1),
    words: oneIn(p),
    tip: markWords(`${name}: ${oneIn(p)}`),
  }));
  const x = {
    type: "quantitative",
    scale: { type: "log", domain: [floor, 1], nice: false },
    axis: {
      title: "Probability of failure",
      values,
      labelExpr: values.length > 9 ? `${decadeLabels}[0]` : decadeLabels,
      labelLineHeight: 15,
      labelFlush: false,
    },
  };
  return {
    id: "evidence",
    title: "What the evidence does to the probability of failure",
    alternative: named.map(({ name, p }) => `${name}: ${oneIn(p)}`).join(". "),
    spec: {
      data: { values: rows },
      height: { step: 40 },
      encoding: {
        y: {
          field: "name",
          type: "nominal",
          sort: null,
          title: null,
          axis: { ticks: false, domain: false, labelPadding: 10, labelFontSize: 13 },
        },
      },
      layer: [
        {
          mark: { type: "rule", strokeWidth: 9, color: palette.soft, strokeCap: "round", aria: false },
          encoding: { x: { field: "low", ...x }, x2: { field: "high" } },
        },
        {
          mark: { type: "point", filled: true, size: 110, color: palette.main, opacity: 1 },
          encoding: { x: { field: "probability", ...x }, description: { field: "tip" } },
        },
        {
          mark: { type: "text", align: "left", dx: 12, fontSize: 13, fontWeight: 600, aria: false },
          encoding: { x: { field: "high", ...x }, text: { field: "words" } },
        },
      ],
    },
  };
}
