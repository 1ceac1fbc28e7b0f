import type { AssessResult, ReportInput } from "../../results.ts";
import { chartFigure } from "../chart-figure.ts";
import { probabilityChart } from "../charts/probabilities.ts";
import { yearlyRiskChart } from "../charts/yearly-risk.ts";
import { limitStateName, limitStateWords } from "../display.ts";
import { escapeHtml } from "../escape.ts";
import { htmlTable, type PageSection, paragraph, section } from "../markup.ts";
import { betweenText, grouped, indexText, intervalText, oneIn, probabilityText, significant } from "../number.ts";
import {
  aboutText,
  againstTarget,
  allFailed,
  countedEstimate,
  countText,
  type Estimate,
  estimateSentence,
  noneSeen,
  oneInCell,
  orList,
  periodSentence,
  standing,
  wallEstimate,
  within,
} from "../wording.ts";

/** What the page is opened for: a sentence for the wall and one for each limit state, against the target. */
export async function answerSection({ assess }: ReportInput): Promise<PageSection> {
  const year = assess.system.period === undefined ? "" : ", in one year";
  return section(
    "answer",
    "The answer",
    unfinished(assess),
    answerSentence(assess),
    ...againstTarget(assess).map((sentence) => paragraph(sentence, "against")),
    `<ul class="states">${Object.entries(assess.limitStates)
      .map(
        ([name, state]) =>
          `<li data-state="${name}"><b>${escapeHtml(limitStateName(name))}${year}:</b> ${escapeHtml(stateSentence(assess, countedEstimate(state.monteCarlo), state.firstOrderReliability?.probability ?? null))}</li>`,
      )
      .join("")}</ul>`,
    await chartFigure(
      probabilityChart(assess),
      "Bars are 95 % intervals of the sampling alone; how far the model behind them can be trusted stands further down.",
    ),
    probabilityTable(assess),
    paragraph(periodSentence(assess), "quiet"),
    assess.system.period === undefined
      ? ""
      : await chartFigure(
          yearlyRiskChart(assess.system.period),
          "A wall that has stood for years has shown part of its strength: what ground there is stays the same, only the yearly values are drawn anew.",
        ),
  );
}

function unfinished({ run }: AssessResult): string {
  return run.complete
    ? ""
    : paragraph(
        `This run was stopped before its end; what follows rests on the first ${grouped(run.sampling.evaluations)} samples.`,
        "callout",
      );
}

/** The figure in large type, then what it is a figure of. */
function answerSentence(assess: AssessResult): string {
  const estimate = wallEstimate(assess);
  const how = `${orList(Object.keys(assess.limitStates).map((name) => limitStateWords[name] ?? name))}${within(assess)}`;
  const [big, rest] = answerParts(estimate, how);
  return `<p class="answer"><strong>${escapeHtml(big)}</strong> ${escapeHtml(rest)}</p>`;
}

function answerParts(estimate: Estimate, how: string): readonly [big: string, rest: string] {
  const { counted, interval, probability } = estimate;
  const words = counted === undefined ? "" : countText(counted);
  if (noneSeen(estimate))
    return [
      "No failure seen",
      `in ${words}. That shows only that the probability that the wall fails by ${how} is below ${oneIn(interval[1])}, the upper end of the 95 % interval.`,
    ];
  if (allFailed(estimate))
    return [
      "Every sample failed",
      `The wall fails by ${how} in all of ${words}, so its probability of failure is ${betweenText(interval)} (95 % interval).`,
    ];
  const about = aboutText(probability);
  return [
    `${about[0].toUpperCase()}${about.slice(1)}`,
    `is the probability that the wall fails by ${how}: ${betweenText(interval)} (95 % interval); as a number, ${probabilityText(probability)}.`,
  ];
}

/** One limit state in words, with its place against the target and what the first order adds where sampling saw nothing. */
function stateSentence({ target, system }: AssessResult, estimate: Estimate, firstOrder: number | null): string {
  const places = {
    below: "; the whole interval lies below the target",
    above: "; the whole interval lies above the target",
    open: "; the target lies within the interval",
  };
  // A target of many years is no measure of one.
  const place =
    target === undefined || system.period !== undefined ? "" : places[standing(estimate, target.probability)];
  const beside =
    noneSeen(estimate) && firstOrder !== null ? `. A first-order estimate puts it at ${oneIn(firstOrder)}` : "";
  return `${estimateSentence(estimate)}${place}${beside}.`;
}

function probabilityTable(assess: AssessResult): string {
  const { target } = assess;
  const row = (name: string, factor: string, estimate: Estimate): string[] => [
    name,
    oneInCell(estimate),
    probabilityText(estimate.probability),
    intervalText(estimate.interval),
    indexText(estimate.reliabilityIndex),
    factor,
  ];
  const states = Object.entries(assess.limitStates);
  const rows = states.map(([name, state]) =>
    row(limitStateName(name), significant(state.factorAtMean, 3), countedEstimate(state.monteCarlo)),
  );
  if (assess.system.period !== undefined) rows.push(row("Any of these", "", countedEstimate(assess.system.monteCarlo)));
  rows.push(row(`The wall${within(assess)}`, "", wallEstimate(assess)));
  if (target !== undefined)
    rows.push([
      "Target",
      oneIn(target.probability),
      probabilityText(target.probability),
      "",
      indexText(target.reliabilityIndex),
      "",
    ]);
  return htmlTable(
    [
      { heading: "Limit state" },
      { heading: "Probability", numeric: true },
      { heading: "as a number", numeric: true },
      { heading: "95 % interval", numeric: true },
      { heading: "Reliability index", numeric: true },
      { heading: "Factor of safety at the means", numeric: true },
    ],
    rows,
    { states: states.map(([name]) => name) },
  );
}
