import type { InvestigationResult, ScopeResult } from "../../results-decision.ts";
import { markWords } from "../page-svg.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";
import { money } from "../scope-text.ts";
import { shortened } from "../shortened.ts";
import { moneyLabels, mostRows } from "./common.ts";

const kinds = ["worth what it costs", "worth less than it costs", "no price given"] as const;

/** What each investigation is worth, with its error, beside its price; the greatest net value on top. */
export function investigationsChart(result: ScopeResult): Chart {
  const { currency, perfectInformation } = result;
  const byName = new Map(result.investigations.map((one) => [one.name, one]));
  const listed = result.ranking.flatMap((name) => byName.get(name) ?? []).slice(0, mostRows);
  const values = listed.map((one) => rowOf(one, currency));
  const x = {
    type: "quantitative",
    axis: { title: currency, labelExpr: moneyLabels, tickCount: 7 },
    scale: { zero: true },
  };
  const used = kinds.filter((kind) => values.some((row) => row.kind === kind));
  const colours = { [kinds[0]]: palette.main, [kinds[1]]: palette.soft, [kinds[2]]: palette.soil1 };
  return {
    id: "investigations",
    title: "What each investigation is worth, and what it costs",
    alternative: listed
      .map(
        ({ name, value, cost }) =>
          `${name}: worth ${money(value, currency)}${cost === null ? "" : `, price ${money(cost, currency)}`}`,
      )
      .concat(`Knowing everything: ${money(perfectInformation, currency)}`)
      .join(". "),
    spec: {
      data: { values },
      height: { step: 34 },
      encoding: {
        y: {
          field: "name",
          type: "nominal",
          sort: null,
          title: null,
          axis: { ticks: false, domain: false, labelPadding: 8, labelLimit: 320, labelFontSize: 13 },
        },
      },
      layer: [
        {
          mark: { type: "bar", height: { band: 0.55 } },
          encoding: {
            x: { field: "value", ...x },
            color: {
              field: "kind",
              type: "nominal",
              legend: { title: null },
              scale: { domain: used, range: used.map((kind) => colours[kind]) },
            },
            description: { field: "tip" },
          },
        },
        {
          mark: { type: "rule", strokeWidth: 2, color: palette.ink, aria: false },
          encoding: { x: { field: "low", ...x }, x2: { field: "high" } },
        },
        {
          transform: [{ filter: "isValid(datum.cost)" }],
          mark: { type: "tick", thickness: 3, size: 30, color: palette.fail, opacity: 1 },
          encoding: { x: { field: "cost", ...x }, description: { field: "priceTip" } },
        },
      ],
    },
  };
}

function rowOf({ name, value, standardError, cost, netValue }: InvestigationResult, currency: string) {
  return {
    name: shortened(name, 44),
    value: Math.max(value, 0),
    low: Math.max(value - 1.96 * standardError, 0),
    high: value + 1.96 * standardError,
    cost,
    kind: netValue === null ? kinds[2] : netValue > 0 ? kinds[0] : kinds[1],
    tip: markWords(`${name}: worth ${money(value, currency)} ± ${money(1.96 * standardError, currency)}`),
    priceTip: markWords(`${name}: price ${cost === null ? "not given" : money(cost, currency)}`),
  };
}
