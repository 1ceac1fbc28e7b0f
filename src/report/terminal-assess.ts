import type { AssessResult, Driver, LimitStateAssessment, VariableSummary } from "../results.ts";
import type { Study } from "../study/study.ts";
import { bestEstimateSentences } from "./best-estimate-text.ts";
import { type Display, displayIn, limitStateName, limitStateWords } from "./display.ts";
import { foldedSentence, foldRows, nextToNothing } from "./measures.ts";
import {
  grouped,
  indexText,
  intervalText,
  probabilityText,
  shareText,
  shiftText,
  significant,
  threeFigures,
} from "./number.ts";
import { sparkline } from "./sparkline.ts";
import { textTable, wrap } from "./table.ts";
import { closing, heading, paragraphLines, type TerminalOptions, terminalSafe, title } from "./terminal.ts";
import { type Beside, designText } from "./terminal-design.ts";
import { beforeAndAfter, evidenceText } from "./terminal-evidence.ts";
import { measuresOfState, measuresOfSystem } from "./terminal-measures.ts";
import {
  againstTarget,
  countedEstimate,
  designPointWords,
  type Estimate,
  estimateSentence,
  noneSeen,
  orList,
  periodSentence,
  wallEstimate,
  within,
} from "./wording.ts";

/** `toehold assess` for reading: one page of answers, or with `all` every method and measure. */
export function terminalAssess(result: AssessResult, study: Study, options: TerminalOptions): string {
  const display = displayIn(study.units);
  const blocks = [
    [...title(result.study, options), ...answer(result, options)],
    [probabilityTable(result, options)],
    ...(result.evidence === undefined
      ? []
      : [
          [
            heading("What has been seen", options),
            evidenceText(result.evidence, result.system.period !== undefined, display, options.width),
            ...paragraphLines([beforeAndAfter], options),
          ],
        ]),
    ...(result.design === undefined ? [] : [designText(result.design, besideDesign(result), display, options)]),
    [heading("What drives it", options), ...driversText(result, options)],
    ...(options.all
      ? [
          ...Object.entries(result.limitStates).map(([name, state]) => everything(name, state, result, options)),
          ...[measuresOfSystem(result, display, options)].filter((lines) => lines.length > 0),
        ]
      : []),
    [
      heading("What was put in", options),
      variableTable(result, display, options),
      ...variableNotes(result, display, options),
    ],
    howComputed(result, options),
    [closing(result.warnings, result.cautions, options)],
  ];
  return terminalSafe(`${blocks.map((block) => block.join("\n")).join("\n\n")}\n`);
}

/** Plain factors at the means and probabilities of failure, to stand beside the check with partial factors. */
function besideDesign({ limitStates }: AssessResult): Readonly<Record<string, Beside>> {
  return Object.fromEntries(
    Object.entries(limitStates).map(([name, { factorAtMean, monteCarlo }]) => [
      name,
      {
        factorOfSafety: factorAtMean,
        probability: monteCarlo.failures === 0 ? "none seen" : probabilityText(monteCarlo.probability),
      },
    ]),
  );
}

/** A sentence for the wall and one for each limit state, against the target where there is one. */
function answer(result: AssessResult, options: TerminalOptions): readonly string[] {
  const how = orList(Object.keys(result.limitStates).map((name) => limitStateWords[name] ?? name));
  const whole = `The wall fails by ${how}${within(result)}: ${estimateSentence(wallEstimate(result))}.`;
  const year = result.system.period === undefined ? "" : " (in one year)";
  const each = Object.entries(result.limitStates).map(
    ([name, state]) => `${limitStateName(name)}${year}: ${estimateSentence(countedEstimate(state.monteCarlo))}.`,
  );
  const unfinished = result.run.complete
    ? []
    : [`Stopped before its end: this rests on the first ${grouped(result.run.sampling.evaluations)} samples.`];
  return paragraphLines([...unfinished, whole, ...each, ...againstTarget(result), periodSentence(result)], options);
}

function probabilityTable(result: AssessResult, { width }: TerminalOptions): string {
  const row = (name: string, factor: string, estimate: Estimate): string[] => [
    name,
    noneSeen(estimate) ? "none seen" : probabilityText(estimate.probability),
    intervalText(estimate.interval),
    indexText(estimate.reliabilityIndex),
    factor,
    estimate.counted === undefined ? "" : grouped(estimate.counted.failures),
  ];
  const rows = Object.entries(result.limitStates).map(([name, state]) =>
    row(limitStateName(name), significant(state.factorAtMean, 3), countedEstimate(state.monteCarlo)),
  );
  rows.push(row("Any of these", "", countedEstimate(result.system.monteCarlo)));
  if (result.system.period !== undefined) rows.push(row(`The wall${within(result)}`, "", wallEstimate(result)));
  if (result.target !== undefined)
    rows.push([
      "Target",
      probabilityText(result.target.probability),
      "",
      indexText(result.target.reliabilityIndex),
      "",
      "",
    ]);
  return textTable(
    [
      { heading: "Limit state" },
      { heading: "Probability", align: "right" },
      { heading: "95 % interval", align: "right", spare: 1 },
      { heading: "Index", align: "right", spare: 2 },
      { heading: "Factor at means", align: "right", spare: 3 },
      { heading: "Failures", align: "right", spare: 4 },
    ],
    rows,
    width,
  );
}

const labelsOf = ({ variables }: AssessResult): ((path: string) => string) => {
  const labels = new Map(variables.map((variable) => [variable.path, variable.label]));
  return (path) => labels.get(path) ?? path;
};

/** The strongest few of each limit state in words; the whole table with `all`. */
function driversText(result: AssessResult, options: TerminalOptions): readonly string[] {
  const label = labelsOf(result);
  const lines = Object.entries(result.limitStates).map(([name, state]) => {
    const strongest = state.drivers.filter((driver) => (driver.share ?? 0) >= 0.05).slice(0, 4);
    const words = strongest.map((driver) => `${label(driver.path)} ${shareText(driver.share ?? 0)}${adverse(driver)}`);
    return `${limitStateName(name)}: ${words.length === 0 ? "nothing stands out" : words.join("; ")}.`;
  });
  return paragraphLines(
    [...lines, "Shares are of the variance of the factor of safety (first-order second-moment)."],
    options,
  );
}

const adverse = (driver: Driver): string => (driver.adverse === "unclear" ? "" : ` (${driver.adverse} values harm)`);

/** Everything that was found about one limit state. */
function everything(
  name: string,
  state: LimitStateAssessment,
  result: AssessResult,
  options: TerminalOptions,
): readonly string[] {
  return [
    heading(limitStateName(name), options),
    ...paragraphLines(methodSentences(state), options),
    "",
    driverTable(state, result, options),
    ...measuresOfState(state, result, options),
  ];
}

function methodSentences(state: LimitStateAssessment): readonly string[] {
  const {
    firstOrderSecondMoment: moment,
    monteCarlo: mc,
    firstOrderReliability: first,
    secondOrderReliability: second,
  } = state;
  const both = (index: number | null, probability: number | null): string =>
    `index ${indexText(index)}${probability === null ? "" : ` (${probabilityText(probability)})`}`;
  const spread =
    mc.factorMean === null || mc.factorSd === null
      ? "no sample has a factor between the limits"
      : `mean ${significant(mc.factorMean, 3)}, standard deviation ${significant(mc.factorSd, 3)} over the samples`;
  return [
    `Factor of safety: ${significant(state.factorAtMean, 3)} at the means; ${spread}.`,
    `Sampling: ${mc.failures === 0 ? "no failure seen" : both(mc.reliabilityIndex, mc.probability)}.`,
    `First-order second-moment: standard deviation ${significant(moment.sd, 3)}; ${both(moment.reliabilityIndexNormal, moment.probabilityNormal)} if the factor were normal, ${both(moment.reliabilityIndexLognormal, moment.probabilityLognormal)} if lognormal.`,
    ...(first === undefined
      ? []
      : [
          first.status === "none"
            ? `First-order reliability: ${designPointWords(first)}.`
            : `First-order reliability: ${both(first.reliabilityIndex, first.probability)}; ${designPointWords(first)}.`,
        ]),
    ...(second === undefined
      ? []
      : [`Second-order reliability: ${both(second.reliabilityIndex, second.probability)}.`]),
  ];
}

function driverTable(state: LimitStateAssessment, result: AssessResult, { width }: TerminalOptions): string {
  const label = labelsOf(result);
  const bars = new Map(state.tornado.map((bar) => [bar.path, bar]));
  const { shown, folded } = foldRows(state.drivers, nextToNothing);
  const rows = shown.map((driver) => [
    label(driver.path),
    driver.share === null ? "–" : shareText(driver.share),
    driver.shiftGivenFailure === null ? "–" : shiftText(driver.shiftGivenFailure),
    driver.adverse === "unclear" ? "–" : driver.adverse,
    significant(bars.get(driver.path)?.factorAt5 ?? Number.NaN, 3),
    significant(bars.get(driver.path)?.factorAt95 ?? Number.NaN, 3),
  ]);
  const table = textTable(
    [
      { heading: "Variable" },
      { heading: "Share", align: "right" },
      { heading: "Shift given failure, sd", align: "right", spare: 1 },
      { heading: "Harmful end", spare: 2 },
      { heading: "F at 5 %", align: "right", spare: 3 },
      { heading: "F at 95 %", align: "right", spare: 3 },
    ],
    rows,
    width,
  );
  const rest = foldedSentence(folded.map(({ path }) => label(path))).flatMap((line) => wrap(line, width, "  "));
  return [table, ...rest].join("\n");
}

/** Every uncertain value: moments, fractiles, what part is knowledge, and its density as a row of blocks. */
function variableTable({ variables }: AssessResult, display: Display, { width }: TerminalOptions): string {
  if (variables.length === 0) return "Nothing in the study is uncertain.";
  const rows = variables.map((variable) => {
    const number = (value: number): string => display.number(value, variable.unit);
    return [
      variable.label,
      display.unit(variable.unit),
      variable.distribution.replaceAll("_", " "),
      number(variable.mean),
      number(variable.sd),
      number(variable.fractile5),
      number(variable.fractile95),
      shareText(variable.knowledge),
      sparkline(variable.density),
    ];
  });
  return textTable(
    [
      { heading: "Variable" },
      { heading: "Unit" },
      { heading: "Distribution", spare: 2 },
      { heading: "Mean", align: "right" },
      { heading: "Sd", align: "right" },
      { heading: "5 %", align: "right", spare: 3 },
      { heading: "95 %", align: "right", spare: 3 },
      { heading: "Knowledge", align: "right", spare: 4 },
      { heading: "Density", spare: 5 },
    ],
    rows,
    width,
  );
}

/** What a row of the table has no room for: moments before a cut, measured values, values of one year. */
function variableNotes({ variables }: AssessResult, display: Display, options: TerminalOptions): readonly string[] {
  const lines = variables.flatMap((variable) => noteOf(variable, display));
  return lines.length === 0 ? [] : ["", ...paragraphLines(lines, options)];
}

function noteOf(variable: VariableSummary, display: Display): readonly string[] {
  const quantity = (value: number): string => display.quantity(value, variable.unit);
  const { parent, ticks, yearly, label } = variable;
  return [
    ...(parent === undefined
      ? []
      : [`${label}: mean ${quantity(parent.mean)} and sd ${quantity(parent.sd)} before the cut.`]),
    ...(ticks === undefined ? [] : [`${label}: measured ${ticks.map(quantity).join(", ")}.`]),
    ...(yearly ? [`${label}: the largest value of one year.`] : []),
  ];
}

function howComputed(result: AssessResult, options: TerminalOptions): readonly string[] {
  const { run, system } = result;
  const kept = system.period?.periods ?? system.monteCarlo.samples;
  const agreeing =
    result.evidence === undefined
      ? ""
      : ` The ${grouped(kept)} ${system.period === undefined ? "samples" : "periods"} that agree with what has been seen count.`;
  const seconds = run.sampling.seconds > 0 ? ` in ${threeFigures(run.sampling.seconds)} s` : "";
  const stop = run.complete ? "" : " Stopped by the user before the end.";
  return [
    heading("How it was computed", options),
    ...wrap(
      `Plain Monte Carlo sampling, ${grouped(run.sampling.evaluations)} samples${seconds}, seed “${result.seed}”, 95 % Clopper–Pearson intervals.${agreeing}${stop} The probability of any of the limit states lies between ${probabilityText(system.bounds[0])} and ${probabilityText(system.bounds[1])}, whatever their dependence. toehold ${run.version}.`,
      options.width,
      "  ",
    ),
    ...paragraphLines(bestEstimateSentences(result), options),
  ];
}
