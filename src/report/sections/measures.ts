import type { AssessResult, VariableSummary } from "../../results.ts";
import type { FragilityCurve } from "../../results-methods.ts";
import { chartFigure } from "../chart-figure.ts";
import { fragilityChart } from "../charts/fragility.ts";
import { type Display, limitStateName, uncapitalised } from "../display.ts";
import { bullets, type Cell, htmlTable, paragraph, subheading } from "../markup.ts";
import { handRows, probabilityPerSd } from "../measures.ts";
import { intervalText, oneIn, probabilityText, shareText, shiftText, significant } from "../number.ts";

/** Every measure of what drives the failures, one table for each limit state; nothing where they were not asked for. */
export function measuresOf(assess: AssessResult): string {
  const variables = new Map(assess.variables.map((variable) => [variable.path, variable]));
  return Object.entries(assess.limitStates)
    .map(([name, { allDrivers }]) => {
      if (allDrivers === undefined) return "";
      const derivatives = new Map(allDrivers.derivatives.map((row) => [row.path, row]));
      const share = (value: number | null | undefined): Cell =>
        value == null ? "–" : { text: shareText(value), value };
      const rows = allDrivers.ranking.map((row): readonly Cell[] => {
        const variable = variables.get(row.path);
        return [
          { text: `${row.rank}`, value: row.rank },
          variable?.label ?? row.path,
          share(row.importance),
          share(row.firstIndex),
          share(row.totalIndex),
          row.rankCorrelation == null ? "–" : { text: significant(row.rankCorrelation, 2), value: row.rankCorrelation },
          row.shiftGivenFailure == null
            ? "–"
            : { text: shiftText(row.shiftGivenFailure), value: Math.abs(row.shiftGivenFailure) },
          probabilityPerSd(derivatives.get(row.path)?.perMean, variable?.sd),
          row.adverse === "unclear" ? "–" : row.adverse,
          share(row.knowledge),
        ];
      });
      const remarks = allDrivers.ranking.flatMap(({ path, disagreements }) =>
        disagreements.map((remark) => `${variables.get(path)?.label ?? path}: ${remark}.`),
      );
      const of = allDrivers.indicesOf === "factor" ? "factor of safety" : "logarithm of the factor of safety";
      const table = htmlTable(
        [
          { heading: "Rank", numeric: true },
          { heading: "Unknown" },
          { heading: "Importance at the design point", numeric: true },
          { heading: "Sobol’ index alone", numeric: true },
          { heading: "in all", numeric: true },
          { heading: "Rank correlation", numeric: true },
          { heading: "Shift given failure, sd", numeric: true },
          { heading: "Probability per sd of the mean", numeric: true },
          { heading: "Harmful end" },
          { heading: "Could be learned", numeric: true },
        ],
        rows,
        {
          caption: `${limitStateName(name)}: every measure side by side. Sobol’ indices and rank correlations are of the ${of} over its whole range, importance and shift of where it fails.${allDrivers.correlated ? " Unknowns are correlated: an index alone counts what an unknown tells about the others, and they sum to no whole." : ""}`,
          sortable: true,
        },
      );
      return `<div data-state="${name}">${table}${remarks.length === 0 ? "" : bullets(remarks)}</div>`;
    })
    .join("");
}

/** The classic hand methods beside each other, with how far each is off. */
export function handMethodsTable(assess: AssessResult): string {
  const states: string[] = [];
  const rows = Object.entries(assess.limitStates).flatMap(([name, state]) =>
    handRows(state).map((row) => {
      states.push(name);
      return [limitStateName(name), ...row];
    }),
  );
  if (rows.length === 0) return "";
  return htmlTable(
    [
      { heading: "Limit state" },
      { heading: "Hand method" },
      { heading: "Mean of F", numeric: true },
      { heading: "Standard deviation", numeric: true },
      { heading: "Index, normal", numeric: true },
      { heading: "Index, lognormal", numeric: true },
      { heading: "Probability, off by (normal, lognormal)", numeric: true },
    ],
    rows,
    {
      caption: "Hand methods, held against sampling, or against the design point where sampling saw too little.",
      states,
    },
  );
}

/** The system from its design points alone, in words. */
export function fromDesignPoints(assess: AssessResult): string {
  const points = assess.system.fromDesignPoints;
  if (points === undefined) return "";
  const pairs = points.limitStates.flatMap((a, i) =>
    points.limitStates
      .slice(0, i)
      .map(
        (b, j) =>
          `${limitStateName(b)} and ${limitStateName(a).toLowerCase()} ${significant(points.correlation[i][j], 2)}`,
      ),
  );
  return paragraph(
    `From the design points alone any of the limit states has a probability of ${probabilityText(points.probability)}, within ${intervalText(points.ditlevsen)} (Ditlevsen’s bounds).${pairs.length === 0 ? "" : ` Correlation of the margins there: ${pairs.join("; ")}.`}`,
    "quiet",
  );
}

/** Probability of the system at values of its strongest unknowns, each as a curve with its numbers below. */
export async function fragility(assess: AssessResult, display: Display): Promise<string> {
  const curves = await Promise.all(
    (assess.system.fragility ?? []).map(async (curve) => {
      const variable = assess.variables.find(({ path }) => path === curve.path);
      if (variable === undefined) return "";
      const chart = await chartFigure(
        fragilityChart(assess, curve, variable, display),
        "All other unknowns as believed; the tinted stretch is where this one is likely to lie, from its 5 to its 95 % value. The band about the curve is the 95 % interval of the sampling.",
      );
      return chart + fragilityTable(curve, variable, display);
    }),
  );
  return curves.length === 0 ? "" : `${subheading("If one value were known")}${curves.join("")}`;
}

function fragilityTable({ points }: FragilityCurve, variable: VariableSummary, display: Display): string {
  return htmlTable(
    [
      { heading: variable.label },
      { heading: "Probability of any failure", numeric: true },
      { heading: "as a number", numeric: true },
      { heading: "95 % interval", numeric: true },
    ],
    points
      .filter((_, i) => i % 4 === 0)
      .map(({ value, probability, interval }) => [
        display.quantity(value, variable.unit),
        oneIn(probability),
        probabilityText(probability),
        intervalText(interval),
      ]),
    {
      caption: `Some of these values, from the 0.1 to the 99.9 % fractile of ${uncapitalised(variable.label)}.`,
    },
  );
}
