import type { AssessResult, Driver, LimitStateAssessment, MonteCarloResult } from "../results.ts";
import type { Study } from "../study/study.ts";
import { capitalised, type Display, displayIn, limitStateWords } from "./display.ts";
import { grouped, indexText, probabilityText, significant, threeFigures } from "./number.ts";
import { textTable, wrap } from "./table.ts";
import { closing, heading, type TerminalOptions } from "./terminal.ts";
import { againstTarget, countedEstimate, estimateSentence, orList, wallEstimate } from "./wording.ts";

/** `toehold assess` for reading: one page of answers, or with `all` every method and measure. */
export function terminalAssess(result: AssessResult, study: Study, options: TerminalOptions): string {
  const display = displayIn(study.units);
  const blocks = [
    [heading(result.study, options), ...answer(result, options)],
    [probabilityTable(result, options)],
    [heading("What drives it", options), driversText(result, options)],
    ...(options.all
      ? Object.entries(result.limitStates).map(([name, state]) => everything(name, state, result, options))
      : []),
    [heading("What was put in", options), variableTable(result, display, options)],
    howComputed(result, options),
    [closing(result.warnings, result.cautions, options)],
  ];
  return `${blocks.map((block) => block.join("\n")).join("\n\n")}\n`;
}

/** A sentence for the wall and one for each limit state, against the target where there is one. */
function answer(result: AssessResult, { width }: TerminalOptions): string[] {
  const whole = `The wall fails by ${orList(Object.keys(result.limitStates).map((name) => limitStateWords[name] ?? name))}: ${estimateSentence(wallEstimate(result))}.`;
  const each = Object.entries(result.limitStates).map(
    ([name, state]) =>
      `${capitalised(limitStateWords[name] ?? name)}: ${estimateSentence(countedEstimate(state.monteCarlo))}.`,
  );
  return [whole, ...each, ...againstTarget(result)].flatMap((sentence) => wrap(sentence, width, "  "));
}

function probabilityTable(result: AssessResult, { width }: TerminalOptions): string {
  const row = (name: string, factor: string, mc: MonteCarloResult): string[] => [
    name,
    factor,
    mc.failures === 0 ? "none seen" : probabilityText(mc.probability),
    `${probabilityText(mc.interval[0])} to ${probabilityText(mc.interval[1])}`,
    indexText(mc.reliabilityIndex),
    grouped(mc.failures),
  ];
  const rows = Object.entries(result.limitStates).map(([name, state]) =>
    row(capitalised(limitStateWords[name] ?? name), significant(state.factorAtMean, 3), state.monteCarlo),
  );
  rows.push(row("Any of these", "", result.system.monteCarlo));
  return textTable(
    [
      { heading: "Limit state" },
      { heading: "Factor at means", align: "right", spare: 2 },
      { heading: "Probability", align: "right" },
      { heading: "95 % interval", align: "right" },
      { heading: "Index", align: "right", spare: 1 },
      { heading: "Failures", align: "right", spare: 3 },
    ],
    rows,
    width,
  );
}

/** The strongest few of each limit state in words; the whole table with `all`. */
function driversText(result: AssessResult, options: TerminalOptions): string {
  const labels = new Map(result.variables.map((variable) => [variable.path, variable.label]));
  const lines = Object.entries(result.limitStates).flatMap(([name, state]) => {
    const strongest = state.drivers.filter((driver) => (driver.share ?? 0) >= 0.05).slice(0, 4);
    const words = strongest.map(
      (driver) =>
        `${labels.get(driver.path) ?? driver.path} ${Math.round((driver.share ?? 0) * 100)} %${adverse(driver)}`,
    );
    return wrap(
      `${capitalised(limitStateWords[name] ?? name)}: ${words.length === 0 ? "nothing stands out" : words.join("; ")}.`,
      options.width,
      "  ",
    );
  });
  return [
    ...lines,
    ...wrap("Shares are of the variance of the factor of safety (first-order second-moment).", options.width),
  ].join("\n");
}

const adverse = (driver: Driver): string => (driver.adverse === "unclear" ? "" : ` (${driver.adverse} values harm)`);

function everything(
  name: string,
  state: LimitStateAssessment,
  result: AssessResult,
  options: TerminalOptions,
): string[] {
  const labels = new Map(result.variables.map((variable) => [variable.path, variable.label]));
  const moment = state.firstOrderSecondMoment;
  const mc = state.monteCarlo;
  const bars = new Map(state.tornado.map((bar) => [bar.path, bar]));
  const rows = state.drivers.map((driver) => [
    labels.get(driver.path) ?? driver.path,
    driver.share === null ? "–" : `${(driver.share * 100).toFixed(1)} %`,
    driver.shiftGivenFailure === null
      ? "–"
      : `${driver.shiftGivenFailure > 0 ? "+" : ""}${significant(driver.shiftGivenFailure, 2)}`,
    driver.adverse,
    significant(bars.get(driver.path)?.factorAt5 ?? Number.NaN, 3),
    significant(bars.get(driver.path)?.factorAt95 ?? Number.NaN, 3),
  ]);
  return [
    heading(capitalised(limitStateWords[name] ?? name), options),
    ...wrap(
      `Factor of safety: ${significant(state.factorAtMean, 3)} at the means; ${mc.factorMean === null ? "no sample counts" : `mean ${significant(mc.factorMean, 3)}, standard deviation ${significant(mc.factorSd ?? 0, 3)} over the samples`}.`,
      options.width,
    ),
    ...wrap(
      `First-order second-moment: standard deviation ${significant(moment.sd, 3)}; index ${indexText(moment.reliabilityIndexNormal)} if the factor were normal (${probabilityText(moment.probabilityNormal)}), ${indexText(moment.reliabilityIndexLognormal)} if lognormal (${probabilityText(moment.probabilityLognormal)}). Sampling gives ${probabilityText(mc.probability)}.`,
      options.width,
    ),
    "",
    textTable(
      [
        { heading: "Variable" },
        { heading: "Share", align: "right" },
        { heading: "Shift given failure, sd", align: "right", spare: 1 },
        { heading: "Harmful end", spare: 2 },
        { heading: "F at 5 %", align: "right", spare: 3 },
        { heading: "F at 95 %", align: "right", spare: 3 },
      ],
      rows,
      options.width,
    ),
  ];
}

function variableTable(result: AssessResult, display: Display, { width }: TerminalOptions): string {
  const rows = result.variables.map((variable) => {
    const unit = display.unit(variable.unit);
    return [
      variable.label,
      unit,
      variable.distribution.replace("_", " "),
      display.number(variable.mean, variable.unit),
      display.number(variable.sd, variable.unit),
      display.number(variable.fractile5, variable.unit),
      display.number(variable.fractile95, variable.unit),
      `${Math.round(variable.knowledge * 100)} %`,
    ];
  });
  return textTable(
    [
      { heading: "Variable" },
      { heading: "Unit" },
      { heading: "Distribution", spare: 1 },
      { heading: "Mean", align: "right" },
      { heading: "Sd", align: "right" },
      { heading: "5 %", align: "right", spare: 3 },
      { heading: "95 %", align: "right", spare: 3 },
      { heading: "Can be learned", align: "right", spare: 2 },
    ],
    rows,
    width,
  );
}

function howComputed(result: AssessResult, options: TerminalOptions): string[] {
  const { run, system } = result;
  const seconds = run.sampling.seconds > 0 ? ` in ${threeFigures(run.sampling.seconds)} s` : "";
  const stop = run.complete ? "" : " Stopped by the user before the end.";
  return [
    heading("How it was computed", options),
    ...wrap(
      `Plain Monte Carlo sampling, ${grouped(run.sampling.evaluations)} samples${seconds}, seed “${result.seed}”, 95 % Clopper–Pearson intervals.${stop}`,
      options.width,
    ),
    ...wrap(
      `The probability of any of the limit states lies between ${probabilityText(system.bounds[0])} and ${probabilityText(system.bounds[1])}, whatever their dependence. toehold ${run.version}.`,
      options.width,
    ),
  ];
}
