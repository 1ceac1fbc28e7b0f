import type { AssessResult, LimitStateAssessment } from "../results.ts";
import { type Display, limitStateName } from "./display.ts";
import { foldedSentence, foldRows, handRows, nextToNothing, probabilityPerSd } from "./measures.ts";
import { probabilityText, shareText, shiftText, significant } from "./number.ts";
import { textTable, wrap } from "./table.ts";
import { heading, paragraphLines, type TerminalOptions } from "./terminal.ts";

/** For `--all`: hand methods side by side and the ranking of the unknowns by every measure, for one limit state. */
export function measuresOfState(
  state: LimitStateAssessment,
  result: AssessResult,
  { width }: TerminalOptions,
): readonly string[] {
  const rows = handRows(state);
  const hands =
    rows.length === 0
      ? []
      : [
          "",
          textTable(
            [
              { heading: "Hand method" },
              { heading: "Mean of F", align: "right" },
              { heading: "Sd", align: "right" },
              { heading: "Index, normal", align: "right", spare: 2 },
              { heading: "Index, lognormal", align: "right", spare: 1 },
              { heading: "p off by (n, ln)", align: "right", spare: 3 },
            ],
            rows,
            width,
          ),
        ];
  return [...hands, ...rankingOf(state, result, width)];
}

function rankingOf(state: LimitStateAssessment, result: AssessResult, width: number): readonly string[] {
  const drivers = state.allDrivers;
  if (drivers === undefined) return [];
  const labels = new Map(result.variables.map(({ path, label }) => [path, label]));
  const sds = new Map(result.variables.map(({ path, sd }) => [path, sd]));
  const derivatives = new Map(drivers.derivatives.map((row) => [row.path, row]));
  const share = (value: number | null | undefined): string => (value == null ? "–" : shareText(value));
  const { shown, folded } = foldRows(drivers.ranking, nextToNothing);
  const rows = shown.map((row) => [
    `${row.rank}. ${labels.get(row.path) ?? row.path}`,
    share(row.importance),
    share(row.firstIndex),
    share(row.totalIndex),
    row.rankCorrelation == null ? "–" : significant(row.rankCorrelation, 2),
    row.shiftGivenFailure == null ? "–" : shiftText(row.shiftGivenFailure),
    probabilityPerSd(derivatives.get(row.path)?.perMean, sds.get(row.path)),
    row.adverse === "unclear" ? "–" : row.adverse,
  ]);
  const table = textTable(
    [
      { heading: "Every measure" },
      { heading: "At design point", align: "right", spare: 0 },
      { heading: "Index alone", align: "right", spare: 4 },
      { heading: "Index in all", align: "right", spare: 2 },
      { heading: "Rank corr.", align: "right", spare: 3 },
      { heading: "Shift, sd", align: "right", spare: 2 },
      { heading: "p per sd of mean", align: "right", spare: 1 },
      { heading: "Harmful end", spare: 5 },
    ],
    rows,
    width,
  );
  const remarks = drivers.ranking.flatMap(({ path, disagreements }) =>
    disagreements.map((remark) => `${labels.get(path) ?? path}: ${remark}.`),
  );
  const of = drivers.indicesOf === "factor" ? "the factor of safety" : "the logarithm of the factor of safety";
  const correlated = drivers.correlated
    ? " Unknowns are correlated: an index alone then counts what an unknown tells about the others, and they sum to no whole."
    : "";
  return [
    "",
    table,
    ...foldedSentence(folded.map(({ path }) => labels.get(path) ?? path)).flatMap((line) => wrap(line, width, "  ")),
    ...remarks.flatMap((remark) => wrap(remark, width, "  ")),
    ...wrap(`Indices (Sobol’) are of ${of}.${correlated}`, width, "  "),
  ];
}

/** For `--all`: the system from its design points, and its probability at values of the strongest unknowns. */
export function measuresOfSystem(result: AssessResult, display: Display, options: TerminalOptions): readonly string[] {
  const { fromDesignPoints: points, fragility = [] } = result.system;
  const lines: string[] = [];
  if (points !== undefined)
    lines.push(
      heading("The limit states together", options),
      ...paragraphLines(
        [
          `From their design points alone the probability of any of them is ${probabilityText(points.probability)}, within ${probabilityText(points.ditlevsen[0])} and ${probabilityText(points.ditlevsen[1])} (Ditlevsen), ${probabilityText(points.cornell[0])} and ${probabilityText(points.cornell[1])} (Cornell).`,
          ...pairs(points.limitStates, points.correlation),
        ],
        options,
      ),
    );
  for (const { path, points: curve } of fragility) {
    const variable = result.variables.find((one) => one.path === path);
    if (variable === undefined) continue;
    const shown = curve.filter((_, i) => i % 4 === 0);
    lines.push(
      "",
      textTable(
        [
          { heading: `${variable.label}` },
          { heading: "Probability of any failure", align: "right" },
          { heading: "95 % interval", align: "right", spare: 1 },
        ],
        shown.map(({ value, probability, interval: [low, high] }) => [
          display.quantity(value, variable.unit),
          probabilityText(probability),
          `${probabilityText(low)} to ${probabilityText(high)}`,
        ]),
        options.width,
      ),
    );
  }
  return lines;
}

function pairs(names: readonly string[], correlation: readonly (readonly number[])[]): readonly string[] {
  const found = names.flatMap((a, i) =>
    names
      .slice(0, i)
      .map(
        (b, j) => `${limitStateName(b)} and ${limitStateName(a).toLowerCase()} ${significant(correlation[i][j], 2)}`,
      ),
  );
  return found.length === 0 ? [] : [`Correlation of their margins: ${found.join("; ")}.`];
}
