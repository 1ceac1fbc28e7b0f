import type { ReportInput } from "../../results.ts";
import type { ScopeResult } from "../../results-decision.ts";
import { chartFigure } from "../chart-figure.ts";
import { investigationsChart } from "../charts/investigations-chart.ts";
import { numberOfTestsChart } from "../charts/number-of-tests-chart.ts";
import { optionsChart } from "../charts/options-chart.ts";
import type { Display } from "../display.ts";
import { bullets, type Cell, htmlTable, type PageSection, paragraph, section, subheading } from "../markup.ts";
import { oneIn, probabilityText } from "../number.ts";
import { answer, breakEvenText, money, pairs, percent, rules, targetWord, twoStageText } from "../scope-text.ts";

/** What to build and what to find out first; nothing where the study has no decision. */
export async function decisionSection({ scope }: ReportInput, display: Display): Promise<PageSection | undefined> {
  if (scope === undefined) return undefined;
  const curves = numberOfTestsChart(scope);
  const decided = answer(scope).join(" ");
  return section(
    "decision",
    "What to do",
    paragraph(decided, "decision"),
    paragraph(caveats(scope, decided)),
    subheading("The options"),
    optionTable(scope),
    await chartFigure(
      optionsChart(scope),
      "The filled mark has the least expected cost: its price and what its failure is expected to cost. Right of it an option costs more to build; below it, the wall fails less often.",
    ),
    bullets(breakEvenText(scope)),
    subheading("What could be found out first"),
    ...(scope.investigations.length === 0
      ? [
          paragraph(
            "The study lists no investigation: what follows is what tests of typical error would be worth, before any price.",
          ),
        ]
      : [
          await chartFigure(
            investigationsChart(scope),
            "Bars are what the expected cost falls by when the results are known before deciding, with a 95 % interval of the sampling; the red mark is the price. An investigation pays where its bar reaches beyond its mark.",
          ),
          investigationTable(scope),
          bullets([...rules(scope.investigations, display), ...pairs(scope), ...twoStageText(scope, display)]),
        ]),
    curves === undefined
      ? ""
      : await chartFigure(
          curves,
          "Each further test brings less than the one before, because an error that all tests share, and what they do not tell, stays. The best number is where the next test costs more than it brings.",
        ),
    perfectTable(scope),
  );
}

/** What the decision rests on; the caution where people can be hurt, unless it has just been given. */
function caveats({ years }: ScopeResult, said: string): string {
  const people = "Where people can be hurt";
  const caution = said.includes(people)
    ? ""
    : ` ${people}, expected cost does not decide: the target reliability governs, whatever is cheapest.`;
  const period = years === undefined ? "" : ` They are costs of ${years} years, not discounted.`;
  return `Expected costs rest on the failure cost, the prices and the beliefs of the study, and on the errors given beside them.${period}${caution}`;
}

function optionTable({ options, bestOption, currency }: ScopeResult): string {
  const rows = options.map((option): readonly Cell[] => [
    `${option.name}${option.name === bestOption ? " (best today)" : option.open ? "" : " (closed)"}`,
    { text: money(option.cost, currency), value: option.cost },
    { text: oneIn(option.probability), value: option.probability },
    probabilityText(option.probability),
    { text: money(option.expectedCost, currency), value: option.expectedCost },
    `± ${money(1.96 * option.expectedCostStandardError, currency)}`,
    targetWord(option),
  ]);
  return htmlTable(
    [
      { heading: "Option" },
      { heading: "Price", numeric: true },
      { heading: "Probability of failure", numeric: true },
      { heading: "as a number", numeric: true },
      { heading: "Expected cost", numeric: true },
      { heading: "95 % interval", numeric: true },
      { heading: "Target" },
    ],
    rows,
    {
      caption: "All options were tried on the same samples, so that their differences are sharper than each of them.",
      sortable: true,
    },
  );
}

function investigationTable({ investigations, ranking, currency }: ScopeResult): string {
  const byName = new Map(investigations.map((one) => [one.name, one]));
  const rows = ranking
    .flatMap((name) => byName.get(name) ?? [])
    .map((one): readonly Cell[] => [
      one.name,
      one.informs.map(({ label, tests }) => `${label} (${tests})`).join("; "),
      one.notDistinguishable ? { text: "≈ 0", value: 0 } : { text: money(one.value, currency), value: one.value },
      `± ${money(1.96 * one.standardError, currency)}`,
      one.cost === null ? "–" : { text: money(one.cost, currency), value: one.cost },
      one.netValue === null ? "–" : { text: money(one.netValue, currency), value: one.netValue },
      percent(one.chanceItChangesTheDecision),
      one.bestNumberOfTests === undefined ? "–" : `${one.bestNumberOfTests}`,
    ]);
  return htmlTable(
    [
      { heading: "Investigation" },
      { heading: "Informs (tests)" },
      { heading: "Worth", numeric: true },
      { heading: "95 % interval", numeric: true },
      { heading: "Price", numeric: true },
      { heading: "Net", numeric: true },
      { heading: "Changes the decision", numeric: true },
      { heading: "Best number of tests", numeric: true },
    ],
    rows,
    {
      caption:
        "The greatest net value first. Worth is before the price; net is after it; ≈ 0 cannot be told from zero.",
      sortable: true,
    },
  );
}

function perfectTable({ perfectByVariable, perfectInformation, variables, currency }: ScopeResult): string {
  const labels = new Map(variables.map(({ path, label }) => [path, label]));
  const rows = Object.entries(perfectByVariable)
    .sort((a, b) => b[1] - a[1])
    .map(([path, value]): readonly Cell[] => [labels.get(path) ?? path, money(value, currency)]);
  return htmlTable(
    [{ heading: "If it were known exactly" }, { heading: "Worth", numeric: true }],
    [...rows, ["All of them at once", money(perfectInformation, currency)]],
    {
      caption:
        "The most that learning could be worth: no investigation of one unknown can be worth more than its line, none at all more than the last. The lines do not add up.",
    },
  );
}
