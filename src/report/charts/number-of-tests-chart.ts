import type { ScopeResult, TestsPoint } from "../../results-decision.ts";
import { markWords } from "../page-svg.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";
import { money } from "../scope-text.ts";
import { shortened } from "../shortened.ts";
import { moneyLabels } from "./common.ts";

const mostLines = 4;
const looks = [
  { colour: palette.main, dash: [1, 0] },
  { colour: palette.fail, dash: [7, 3] },
  { colour: palette.target, dash: [2, 3] },
  { colour: palette.water, dash: [9, 3, 2, 3] },
] as const;

interface Curve {
  readonly name: string;
  readonly points: readonly TestsPoint[];
}

/** Value against number of tests, of the investigations (or of the proposals where the study lists none) that are worth most. */
export function numberOfTestsChart(result: ScopeResult): Chart | undefined {
  const { currency } = result;
  const curves = curvesOf(result);
  if (curves.length === 0) return undefined;
  const values = curves.flatMap(({ name, points }) =>
    points.map(({ tests, value }) => ({
      name,
      tests,
      value: Math.max(value, 0),
      tip: markWords(`${name}, ${tests} ${tests === 1 ? "test" : "tests"}: worth ${money(value, currency)}`),
    })),
  );
  const names = curves.map(({ name }) => name);
  const x = {
    field: "tests",
    type: "quantitative",
    axis: { title: "Number of tests", tickMinStep: 1, tickCount: 10, format: "d" },
    scale: { nice: false },
  };
  const y = {
    field: "value",
    type: "quantitative",
    axis: { title: `Worth, ${currency}`, labelExpr: moneyLabels, tickCount: 5 },
  };
  const colour = {
    field: "name",
    type: "nominal",
    scale: { domain: names, range: names.map((_, k) => looks[k].colour) },
    legend: { title: null, orient: "top", columns: 2, labelLimit: 380, symbolType: "stroke", symbolSize: 400 },
  };
  return {
    id: "number-of-tests",
    title: "What more tests are worth",
    alternative: curves
      .map(({ name, points }) => {
        const last = points[points.length - 1];
        return `${name}: ${money(points[1]?.value ?? 0, currency)} for one test, ${money(last.value, currency)} for ${last.tests}`;
      })
      .join(". "),
    spec: {
      data: { values },
      height: 240,
      encoding: { x, y, color: colour },
      layer: [
        {
          mark: { type: "line", strokeWidth: 2.5, aria: false },
          encoding: {
            strokeDash: {
              field: "name",
              type: "nominal",
              scale: { domain: names, range: names.map((_, k) => looks[k].dash) },
              legend: colour.legend,
            },
          },
        },
        { mark: { type: "point", filled: true, size: 28, opacity: 1 }, encoding: { description: { field: "tip" } } },
      ],
    },
  };
}

function curvesOf({ investigations, proposals }: ScopeResult): readonly Curve[] {
  const listed = investigations.flatMap(({ name, byNumberOfTests }): Curve[] =>
    byNumberOfTests === undefined ? [] : [{ name: shortened(name, 50), points: byNumberOfTests }],
  );
  const proposed = proposals.map(({ label, points }): Curve => ({ name: `Tests on ${shortened(label, 42)}`, points }));
  const most = ({ points }: Curve): number => Math.max(...points.map(({ value }) => value));
  return [...listed, ...proposed]
    .filter((curve) => most(curve) > 0)
    .sort((a, b) => most(b) - most(a))
    .slice(0, mostLines);
}
