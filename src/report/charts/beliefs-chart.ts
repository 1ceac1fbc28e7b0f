import type { EvidenceResult } from "../../results-decision.ts";
import type { Display } from "../display.ts";
import { markWords } from "../page-svg.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";
import { shortened } from "../shortened.ts";
import { mostRows } from "./common.ts";

const times = ["before it was seen", "after it was seen"] as const;

/** Mean and one standard deviation either way of every variable, before and after what has been seen, on its own scale before. */
export function beliefsChart({ variables }: EvidenceResult, display: Display): Chart {
  const moved = (one: EvidenceResult["variables"][number]): number =>
    Math.abs(one.posterior.mean - one.prior.mean) / one.prior.sd + Math.abs(1 - one.posterior.sd / one.prior.sd);
  const shown = [...variables]
    .filter(({ prior }) => prior.sd > 0)
    .sort((a, b) => moved(b) - moved(a))
    .slice(0, mostRows);
  const values = shown.flatMap(({ label, unit, prior, posterior }) =>
    [prior, posterior].map(({ mean, sd }, k) => {
      const middle = (mean - prior.mean) / prior.sd;
      return {
        name: shortened(label, 44),
        when: times[k],
        middle,
        low: middle - sd / prior.sd,
        high: middle + sd / prior.sd,
        words: k === 0 ? "" : `${display.number(prior.mean, unit)} → ${display.quantity(mean, unit)}`,
        tip: markWords(
          `${label} ${times[k]}: mean ${display.quantity(mean, unit)}, standard deviation ${display.quantity(sd, unit)}`,
        ),
      };
    }),
  );
  const edge = Math.max(1.4, ...values.flatMap(({ low, high }) => [-low, high])) * 1.05;
  const x = {
    type: "quantitative",
    scale: { domain: [-edge, 1.35 * edge], nice: false },
    axis: { title: "Distance from the mean before, in standard deviations before", tickCount: 7, grid: true },
  };
  const offset = { field: "when", scale: { domain: times } };
  return {
    id: "beliefs",
    title: "What was believed of each unknown before, and what is believed after",
    alternative: shown
      .map(
        ({ label, unit, prior, posterior }) =>
          `${label}: mean ${display.quantity(prior.mean, unit)} before, ${display.quantity(posterior.mean, unit)} after; standard deviation ${display.quantity(prior.sd, unit)} before, ${display.quantity(posterior.sd, unit)} after`,
      )
      .join(". "),
    spec: {
      data: { values },
      height: { step: 17 },
      encoding: {
        y: {
          field: "name",
          type: "nominal",
          sort: null,
          title: null,
          scale: { paddingInner: 0.35 },
          axis: { ticks: false, domain: false, labelPadding: 8, labelLimit: 300 },
        },
        yOffset: offset,
      },
      layer: [
        {
          mark: { type: "rule", strokeWidth: 8, strokeCap: "round" },
          encoding: {
            x: { field: "low", ...x },
            x2: { field: "high" },
            color: {
              field: "when",
              type: "nominal",
              legend: { title: null },
              scale: { domain: times, range: [palette.soft, palette.main] },
            },
            description: { field: "tip" },
          },
        },
        {
          mark: {
            type: "point",
            filled: true,
            size: 45,
            opacity: 1,
            color: palette.paper,
            stroke: palette.ink,
            strokeWidth: 1.2,
            aria: false,
          },
          encoding: { x: { field: "middle", ...x } },
        },
        {
          transform: [{ filter: "datum.words !== ''" }],
          mark: { type: "text", align: "left", dx: 8, fontSize: 11, color: palette.muted, aria: false },
          encoding: { x: { field: "high", ...x }, text: { field: "words" } },
        },
      ],
    },
  };
}
