import type { ScopeResult } from "../results-decision.ts";
import type { Study } from "../study/study.ts";
import { type Display, displayIn } from "./display.ts";
import { oneIn, probabilityText } from "./number.ts";
import { answer, breakEvenText, money, pairs, percent, rules, targetWord, twoStageText } from "./scope-text.ts";
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

function optionTable(result: ScopeResult, { width }: TerminalOptions): string {
  const rows = result.options.map((option) => [
    `${option.name}${option.name === result.bestOption ? " (best today)" : option.open ? "" : " (closed)"}`,
    money(option.cost, result.currency),
    oneIn(option.probability),
    probabilityText(option.probability),
    `${money(option.expectedCost, result.currency)}`,
    `±${money(option.expectedCostStandardError, result.currency)}`,
    targetWord(option),
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
