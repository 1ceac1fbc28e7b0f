import type { InvestigationResult, ScopeOption, ScopeResult } from "../results-decision.ts";
import type { Study } from "../study/study.ts";
import { type Display, displayIn } from "./display.ts";
import { grouped, indexText, oneIn, probabilityText, significant } from "./number.ts";
import { textTable, wrap } from "./table.ts";
import { closing, heading, type TerminalOptions } from "./terminal.ts";
import { evidenceText } from "./terminal-evidence.ts";

/** `toehold scope` for reading: what is best today, what each investigation is worth, and what hangs on the figures given. */
export function terminalScope(result: ScopeResult, study: Study, options: TerminalOptions): string {
  const display = displayIn(study.units);
  const say = (sentences: readonly string[]): string =>
    sentences.flatMap((sentence) => wrap(sentence, options.width, "  ")).join("\n");
  const blocks = [
    `${heading(result.study, options)}\n${say(answer(result))}`,
    `${heading("Options", options)}\n${optionTable(result, options)}`,
    ...(result.evidence === undefined
      ? []
      : [
          `${heading("Evidence", options)}\n${evidenceText(result.evidence, result.years !== undefined, display, options.width)}`,
        ]),
    `${heading("What investigations are worth", options)}\n${investigationText(result, display, options)}`,
    `${heading("What could be learned at most", options)}\n${perfectText(result, options)}`,
    ...(result.twoStage === undefined
      ? []
      : [`${heading("Two stages", options)}\n${say(twoStageText(result, display))}`]),
    `${heading("Where the decision tips", options)}\n${say(breakEvenText(result))}`,
    say([`${result.run.sampling.evaluations} evaluations, seed “${result.seed}”. toehold ${result.run.version}.`]),
    closing(result.warnings, result.cautions, options),
  ];
  return `${blocks.join("\n\n")}\n`;
}

/** 12 400 EUR, to three figures. */
export function money(value: number, currency: string): string {
  if (Math.abs(value) < 0.5) return `0 ${currency}`;
  const rounded = Number(value.toPrecision(3));
  return `${rounded < 0 ? "−" : ""}${Math.abs(rounded) < 1000 ? significant(Math.abs(rounded), 3) : grouped(Math.abs(rounded))} ${currency}`;
}

/** The decision in plain sentences; the period in the first. */
export function answer(result: ScopeResult): string[] {
  const period =
    result.years === undefined
      ? "For the ground as it is (nothing in the study is yearly)"
      : `Over ${result.years} years`;
  const best = result.options.find((option) => option.name === result.bestOption);
  const sentences = [
    best === undefined
      ? `${period}, no option is open.`
      : `${period}, “${best.name}” is the best option today: expected cost ${money(best.expectedCost, result.currency)}, probability of failure ${oneIn(best.probability)}.`,
  ];
  const { runnerUp } = result;
  if (runnerUp !== undefined)
    sentences.push(
      `The runner-up, “${runnerUp.name}”, is expected to cost ${money(runnerUp.difference, result.currency)} more${runnerUp.withinError ? ", which this run cannot tell from nothing: the two are as good as equal" : ""}.`,
    );
  return [...sentences, ...investigationSentence(result), ...targetSentence(result)];
}

function investigationSentence(result: ScopeResult): string[] {
  const priced = result.investigations.filter((one) => one.netValue !== null);
  if (priced.length === 0)
    return result.investigations.length === 0
      ? ["The study lists no investigation; what tests would be worth stands below."]
      : [];
  const best = priced.reduce((a, b) => ((b.netValue ?? 0) > (a.netValue ?? 0) ? b : a));
  if ((best.netValue ?? 0) <= 0)
    return [
      `No investigation is worth its price before deciding: the best of them, “${best.name}”, is worth ${money(best.value, result.currency)} and costs ${money(best.cost ?? 0, result.currency)}.`,
    ];
  return [
    `“${best.name}” is the investigation to buy first: it is worth ${money(best.value, result.currency)} before its price of ${money(best.cost ?? 0, result.currency)}, and changes the decision with a chance of ${percent(best.chanceItChangesTheDecision)}.`,
  ];
}

function targetSentence({ target, options, bestOption }: ScopeResult): string[] {
  if (target === undefined) return [];
  const best = options.find((option) => option.name === bestOption);
  const aim = `${oneIn(target.probability)} (index ${indexText(target.reliabilityIndex)})`;
  if (target.mustMeet) return [`The target of ${aim} must be met; options that miss it are closed.`];
  return best?.meetsTarget === false
    ? [`It misses the target of ${aim}. Where people can be hurt, the target governs, not the cost.`]
    : [`It meets the target of ${aim}.`];
}

const percent = (share: number): string => (share < 0.005 ? "below 1 %" : `${Math.round(100 * share)} %`);

function optionTable(result: ScopeResult, { width }: TerminalOptions): string {
  const met = (option: ScopeOption): string =>
    option.meetsTarget === undefined
      ? "–"
      : option.targetWithinError
        ? "unclear"
        : option.meetsTarget
          ? "met"
          : "missed";
  const rows = result.options.map((option) => [
    `${option.name}${option.name === result.bestOption ? " (best today)" : option.open ? "" : " (closed)"}`,
    money(option.cost, result.currency),
    oneIn(option.probability),
    probabilityText(option.probability),
    `${money(option.expectedCost, result.currency)}`,
    `±${money(option.expectedCostStandardError, result.currency)}`,
    met(option),
  ]);
  return textTable(
    [
      { heading: "Option" },
      { heading: "Price", align: "right" },
      { heading: "Probability", align: "right" },
      { heading: "as a number", align: "right", spare: 3 },
      { heading: "Expected cost", align: "right" },
      { heading: "error", align: "right", spare: 2 },
      { heading: "Target", spare: 1 },
    ],
    rows,
    width,
  );
}

function investigationText(result: ScopeResult, display: Display, options: TerminalOptions): string {
  if (result.investigations.length === 0) return proposalText(result, display, options);
  const { currency } = result;
  const byName = new Map(result.investigations.map((one) => [one.name, one]));
  const rows = result.ranking
    .flatMap((name) => byName.get(name) ?? [])
    .map((one) => [
      one.name,
      one.notDistinguishable ? "≈ 0" : money(one.value, currency),
      `±${money(one.standardError, currency)}`,
      one.cost === null ? "–" : money(one.cost, currency),
      one.netValue === null ? "–" : money(one.netValue, currency),
      percent(one.chanceItChangesTheDecision),
      one.bestNumberOfTests === undefined ? "–" : String(one.bestNumberOfTests),
    ]);
  const table = textTable(
    [
      { heading: "Investigation" },
      { heading: "Worth", align: "right" },
      { heading: "error", align: "right", spare: 2 },
      { heading: "Price", align: "right" },
      { heading: "Net", align: "right" },
      { heading: "Changes the decision", align: "right", spare: 1 },
      { heading: "Best number of tests", align: "right", spare: 3 },
    ],
    rows,
    options.width,
  );
  const words = [
    "Worth is what the expected cost falls by when its results are known before deciding; net is after its price. ≈ 0 cannot be told from zero.",
    ...rules(result.investigations, display),
    ...pairs(result),
  ];
  return `${table}\n${words.flatMap((sentence) => wrap(sentence, options.width, "  ")).join("\n")}`;
}

/** The rule of the best investigation that has one: which result leads to which option. */
function rules(investigations: readonly InvestigationResult[], display: Display): string[] {
  return investigations.flatMap((one) => {
    if (one.rule === undefined || one.rule.length < 2 || one.informs.length !== 1 || one.notDistinguishable) return [];
    const { unit } = one.informs[0];
    const steps = one.rule.map(
      ({ from, to, option, chance }) => `${range(from, to, unit, display)}: ${option} (${percent(chance)})`,
    );
    return [`${one.name}, by the mean of its results — ${steps.join("; ")}.`];
  });
}

function range(from: number | null, to: number | null, unit: string, display: Display): string {
  if (from === null) return to === null ? "whatever it is" : `below ${display.quantity(to, unit)}`;
  return to === null
    ? `above ${display.quantity(from, unit)}`
    : `${display.number(from, unit)} to ${display.quantity(to, unit)}`;
}

function pairs(result: ScopeResult): string[] {
  const best = [...result.pairs].sort((a, b) => (b.netValue ?? b.value) - (a.netValue ?? a.value))[0];
  if (best === undefined) return [];
  const net = best.netValue === null ? "" : `, net ${money(best.netValue, result.currency)}`;
  return [
    `Best pair: “${best.names[0]}” with “${best.names[1]}”, worth ${money(best.value, result.currency)} together${net}; one by one they add up to ${money(best.sumOfValues, result.currency)}, since pairs are not additive.`,
  ];
}

function proposalText(result: ScopeResult, display: Display, { width }: TerminalOptions): string {
  if (result.proposals.length === 0) return "Nothing that could be learned would change the decision.";
  const rows = result.proposals.map((one) => [
    one.label,
    display.quantity(one.error, one.unit),
    ...one.points.slice(0, 4).map((point) => money(point.value, result.currency)),
  ]);
  const tests = result.proposals[0].points
    .slice(0, 4)
    .map((point) => ({ heading: `${point.tests} test${point.tests === 1 ? "" : "s"}`, align: "right" as const }));
  const table = textTable(
    [{ heading: "Tests on" }, { heading: "Error of one", align: "right", spare: 1 }, ...tests],
    rows,
    width,
  );
  return `${table}\n${wrap("The study lists no investigation: this is what tests of typical error would be worth, before any price.", width, "  ").join("\n")}`;
}

function perfectText(result: ScopeResult, { width }: TerminalOptions): string {
  const labels = new Map(result.variables.map((variable) => [variable.path, variable.label]));
  const entries = Object.entries(result.perfectByVariable).sort((a, b) => b[1] - a[1]);
  const table = textTable(
    [{ heading: "If it were known exactly" }, { heading: "Worth", align: "right" }],
    entries.map(([path, value]) => [labels.get(path) ?? path, money(value, result.currency)]),
    width,
  );
  const sentence = `Knowing all of them would be worth ${money(result.perfectInformation, result.currency)}: no investigation can be worth more, none of one variable more than its line. The lines do not add up.`;
  return `${table}\n${wrap(sentence, width, "  ").join("\n")}`;
}

function twoStageText(result: ScopeResult, display: Display): string[] {
  const { twoStage, investigations, currency } = result;
  if (twoStage === undefined) return [];
  const first = investigations.find((one) => one.name === twoStage.first);
  const unit = first?.informs.length === 1 ? first.informs[0].unit : undefined;
  const steps = twoStage.steps.map((step) => {
    const where =
      unit === undefined || step.from === undefined || step.to === undefined
        ? `with a chance of ${percent(step.chance)}`
        : `if its mean result is ${range(step.from, step.to, unit, display)} (${percent(step.chance)})`;
    return `${where}, ${step.investigate === undefined ? `“${step.build}”` : `do “${step.investigate}” next`}`;
  });
  return [
    `Do “${twoStage.first}” first; then ${steps.join("; ")}.`,
    `The plan saves ${money(twoStage.netValue, currency)} (±${money(twoStage.standardError, currency)}) against deciding today, all investigations paid; the best single one, “${twoStage.bestSingle.name}”, saves ${money(twoStage.bestSingle.netValue, currency)}.`,
  ];
}

function breakEvenText({ breakEven, currency, bestOption }: ScopeResult): string[] {
  const costs = breakEven.failureCost.map(({ multiple, failureCost, below, above }) => {
    const at =
      failureCost === undefined
        ? `${significant(multiple, 3)} times the failure cost given`
        : `a failure cost of ${money(failureCost, currency)} (${significant(multiple, 3)} times that given)`;
    return `At ${at} the best option turns from “${below}” below to “${above}” above.`;
  });
  const targets = breakEven.target.map(
    ({ from, to, option }) =>
      `${from <= 0 ? `up to ${oneIn(to)}` : to >= 1 ? `above ${oneIn(from)}` : `${oneIn(from)} to ${oneIn(to)}`}: ${option === null ? "none meets it" : `“${option}”`}`,
  );
  return [
    ...(costs.length === 0
      ? [`“${bestOption}” stays best whatever failure costs, within a wide range of the figure given.`]
      : costs),
    ...(targets.length < 2
      ? []
      : [`If a target had to be met, the cheapest way by acceptable probability — ${targets.join("; ")}.`]),
  ];
}
