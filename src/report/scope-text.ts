/** The decision in sentences that the page and the terminal share. */
import type { InvestigationResult, ScopeOption, ScopeResult } from "../results-decision.ts";
import type { Display } from "./display.ts";
import { grouped, indexText, oneIn, significant } from "./number.ts";

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
    ? [`“${bestOption}” misses the target of ${aim}. Where people can be hurt, the target governs, not the cost.`]
    : [`“${bestOption}” meets the target of ${aim}.`];
}

/** A chance in whole per cent. */
export const percent = (share: number): string => (share < 0.005 ? "below 1 %" : `${Math.round(100 * share)} %`);

/** Where an option stands against the target. */
export function targetWord(option: ScopeOption): string {
  if (option.meetsTarget === undefined) return "–";
  if (option.targetWithinError) return "unclear";
  return option.meetsTarget ? "met" : "missed";
}

/** The rule of the best investigation that has one: which result leads to which option. */
export function rules(investigations: readonly InvestigationResult[], display: Display): string[] {
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

export function pairs(result: ScopeResult): string[] {
  const best = [...result.pairs].sort((a, b) => (b.netValue ?? b.value) - (a.netValue ?? a.value))[0];
  if (best === undefined) return [];
  const net = best.netValue === null ? "" : `, net ${money(best.netValue, result.currency)}`;
  return [
    `Best pair: “${best.names[0]}” with “${best.names[1]}”, worth ${money(best.value, result.currency)} together${net}; one by one they add up to ${money(best.sumOfValues, result.currency)}, since pairs are not additive.`,
  ];
}

export function twoStageText(result: ScopeResult, display: Display): string[] {
  const { twoStage, investigations, currency } = result;
  if (twoStage === undefined) return [];
  if (twoStage.steps.every(({ investigate }) => investigate === undefined))
    return [`After “${twoStage.first}” no second investigation is worth its price, whatever the first finds.`];
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

export function breakEvenText({ breakEven, currency, bestOption }: ScopeResult): string[] {
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
