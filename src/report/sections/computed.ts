import type { AssessResult, ReportInput } from "../../results.ts";
import { bestEstimateSentences, methodName } from "../best-estimate-text.ts";
import { chartFigure } from "../chart-figure.ts";
import { convergenceChart } from "../charts/convergence.ts";
import { factorHistogram } from "../charts/factor-histogram.ts";
import { limitStateName } from "../display.ts";
import { htmlTable, type PageSection, paragraph, section } from "../markup.ts";
import { grouped, indexText, intervalText, oneIn, probabilityText, significant } from "../number.ts";
import { designPointWords } from "../wording.ts";
import { fromDesignPoints, handMethodsTable } from "./measures.ts";

/** How the probabilities were computed: samples, histograms, methods side by side, convergence, what was counted. */
export async function computedSection({ assess }: ReportInput): Promise<PageSection> {
  const histograms = await Promise.all(
    Object.entries(assess.limitStates).map(([name, state]) =>
      chartFigure(factorHistogram(name, state), "Below 1, on the tinted side, the wall fails."),
    ),
  );
  const { convergence } = assess.system;
  return section(
    "computed",
    "How it was computed",
    paragraph(
      `The stability calculation ran ${grouped(assess.run.sampling.evaluations)} times with values drawn from the distributions below (${methodName("plain")}, seed “${assess.seed}”). A probability is the share of runs with a factor of safety below 1; its interval is the 95 % Clopper–Pearson interval.`,
    ),
    ...bestEstimateSentences(assess).map((sentence) => paragraph(sentence)),
    `<div class="trio">${histograms.join("")}</div>`,
    methodsTable(assess),
    handMethodsTable(assess),
    fromDesignPoints(assess),
    convergence.length > 1
      ? await chartFigure(convergenceChart(convergence), "The band is the 95 % interval at each stage of the run.")
      : paragraph("The run ended at its first look, so there is no course of the estimate to draw.", "quiet"),
    countedTable(assess),
    paragraph(
      `Whatever the dependence between the limit states, the probability that any of them fails lies between ${probabilityText(assess.system.bounds[0])} and ${probabilityText(assess.system.bounds[1])}.`,
      "quiet",
    ),
  );
}

/** Each method that ran, row by row, so that a reader sees where they agree. */
function methodsTable({ limitStates }: AssessResult): string {
  const rows: (readonly string[])[] = [];
  const states: string[] = [];
  for (const [name, state] of Object.entries(limitStates)) {
    const {
      firstOrderSecondMoment: moment,
      monteCarlo,
      firstOrderReliability: first,
      secondOrderReliability: second,
    } = state;
    const add = (method: string, index: number | null, probability: number | null, note: string): void => {
      const words = probability === null ? ["–", "–"] : [oneIn(probability), probabilityText(probability)];
      rows.push([limitStateName(name), method, indexText(index), ...words, note]);
      states.push(name);
    };
    const spread = `factor ${significant(moment.mean, 3)} ± ${significant(moment.sd, 2)}`;
    add(
      "Sampling",
      monteCarlo.reliabilityIndex,
      monteCarlo.probability,
      `95 % interval ${intervalText(monteCarlo.interval)}`,
    );
    add("First-order second-moment, normal", moment.reliabilityIndexNormal, moment.probabilityNormal, spread);
    add("First-order second-moment, lognormal", moment.reliabilityIndexLognormal, moment.probabilityLognormal, spread);
    if (first !== undefined)
      add("First-order reliability", first.reliabilityIndex, first.probability, designPointWords(first));
    if (second !== undefined) add("Second-order reliability", second.reliabilityIndex, second.probability, "");
  }
  return htmlTable(
    [
      { heading: "Limit state" },
      { heading: "Method" },
      { heading: "Index", numeric: true },
      { heading: "Probability", numeric: true },
      { heading: "as a number", numeric: true },
      { heading: "Remark" },
    ],
    rows,
    {
      caption:
        "Methods side by side. Where they part, the sampling is right within its interval; the second-moment method guesses the shape of the tail.",
      states,
    },
  );
}

/** Samples that a formula had to be stretched for: counted and shown, never hidden. */
function countedTable({ limitStates, system }: AssessResult): string {
  const { counts, samples } = system.monteCarlo;
  const kinds: readonly (readonly [string, number])[] = [
    ["slope behind steeper than its soil can bear", counts.slopeUnstable],
    ["base lost contact with the ground", counts.lostContact],
    ["factor of safety at its cap", counts.capped],
    ["a value taken at its physical limit", counts.outOfRange],
  ];
  const seen = kinds.filter(([, count]) => count > 0);
  const among = Object.entries(limitStates).flatMap(([name, { monteCarlo }]) =>
    monteCarlo.probabilityAmongStable === undefined
      ? []
      : [`${limitStateName(name)} ${probabilityText(monteCarlo.probabilityAmongStable)}`],
  );
  if (seen.length === 0) return "";
  const table = htmlTable(
    [{ heading: "Samples with" }, { heading: "Count", numeric: true }, { heading: "of all samples", numeric: true }],
    seen.map(([words, count]) => [words, grouped(count), probabilityText(count / samples)]),
    { caption: "Samples for which a formula had to be stretched; they count as their factor says." },
  );
  return among.length === 0
    ? table
    : `${table}${paragraph(`Probability among the samples with a stable slope: ${among.join("; ")}.`, "quiet")}`;
}
