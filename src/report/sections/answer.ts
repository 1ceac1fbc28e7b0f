import type { AssessResult, MonteCarloResult, ReportInput } from "../../results.ts";
import { probabilityChart } from "../charts/probabilities.ts";
import { capitalised, limitStateWords } from "../display.ts";
import { escapeHtml } from "../escape.ts";
import { figure, htmlTable } from "../markup.ts";
import { estimateSentence, grouped, indexText, oneIn, probabilityText, significant } from "../number.ts";
import { pageSvg, renderChart } from "../render-chart.ts";
import { againstTarget } from "../terminal-assess.ts";

/** What the page is opened for: one sentence for the wall, one for each limit state, against the target. */
export async function answerSection({ assess }: ReportInput): Promise<string> {
  const states = Object.entries(assess.limitStates);
  const words = states.map(([name]) => limitStateWords[name] ?? name);
  const list = words.length < 2 ? words.join("") : `${words.slice(0, -1).join(", ")} or ${words[words.length - 1]}`;
  const unfinished = assess.run.complete
    ? ""
    : `<p class="answer">This run was stopped before its end; what follows rests on the first ${escapeHtml(grouped(assess.run.sampling.evaluations))} samples.</p>`;
  const sentences = states.map(
    ([name, state]) =>
      `<li>${escapeHtml(`${capitalised(limitStateWords[name] ?? name)}: ${estimateSentence(state.monteCarlo)}.`)}</li>`,
  );
  const chart = probabilityChart(assess);
  return `<section id="answer">${unfinished}<p class="answer">${answerSentence(assess.system.monteCarlo, list)}${escapeHtml(targetSentence(assess))}</p><ul>${sentences.join("")}</ul>${figure(pageSvg(await renderChart(chart), chart, escapeHtml), chart.title, "Bars are 95 % intervals of the sampling alone; what the numbers rest on stands further down.")}${probabilityTable(assess)}<p class="quiet">${escapeHtml(periodSentence(assess))}</p></section>`;
}

function answerSentence(mc: MonteCarloResult, list: string): string {
  const how = escapeHtml(list);
  if (mc.failures === 0)
    return `<strong>None of ${escapeHtml(grouped(mc.samples))} samples failed</strong> by ${how}. That shows only that the probability is below ${escapeHtml(oneIn(mc.interval[1]))}.`;
  if (mc.failures === mc.samples)
    return `<strong>Every one of ${escapeHtml(grouped(mc.samples))} samples failed</strong> by ${how}.`;
  return `The probability that the wall fails by ${how} is <strong>${escapeHtml(estimateSentence(mc))}</strong>.`;
}

function targetSentence(assess: AssessResult): string {
  const sentences = againstTarget(assess);
  return sentences.length === 0 ? "" : ` ${sentences.join(" ")}`;
}

function periodSentence(assess: AssessResult): string {
  return assess.bestEstimate.years === undefined
    ? "No value in the study is yearly: the probability holds for the ground as it is, and is not per year."
    : `The probability is of ${assess.bestEstimate.years} years.`;
}

function probabilityTable(assess: AssessResult): string {
  const row = (name: string, factor: string, mc: MonteCarloResult): string[] => [
    name,
    factor,
    mc.failures === 0 ? "none seen" : oneIn(mc.probability),
    probabilityText(mc.probability),
    `${probabilityText(mc.interval[0])} to ${probabilityText(mc.interval[1])}`,
    indexText(mc.reliabilityIndex),
  ];
  const rows = Object.entries(assess.limitStates).map(([name, state]) =>
    row(capitalised(limitStateWords[name] ?? name), significant(state.factorAtMean, 3), state.monteCarlo),
  );
  rows.push(row("Any of these", "", assess.system.monteCarlo));
  return htmlTable(
    [
      { heading: "Limit state" },
      { heading: "Factor of safety at the means", numeric: true },
      { heading: "Probability", numeric: true },
      { heading: "as a number", numeric: true },
      { heading: "95 % interval", numeric: true },
      { heading: "Reliability index", numeric: true },
    ],
    rows,
  );
}
