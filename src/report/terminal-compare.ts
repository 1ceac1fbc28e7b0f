import type { AssessResult, CheckResult, MonteCarloResult } from "../results.ts";
import type { LimitStateName, Study } from "../study/study.ts";
import { capitalised, type Display, displayIn, limitStateWords } from "./display.ts";
import { indexText, oneIn, probabilityText, significant } from "./number.ts";
import { type Difference, studyDifferences } from "./study-differences.ts";
import { type Column, textTable, wrap } from "./table.ts";
import { closing, heading, type TerminalOptions } from "./terminal.ts";

/** A study and what was found about it. */
export interface Outcome<R extends CheckResult | AssessResult> {
  readonly study: Study;
  readonly result: R;
}

export interface ComparisonOptions extends TerminalOptions {
  /** What the two columns are called: first and second, before and now. */
  readonly names: readonly [string, string];
}

type Either = Outcome<CheckResult | AssessResult>;

/** Two results of one kind side by side: what was put in differently, and what came out. */
export function terminalCompare(first: Either, second: Either, options: ComparisonOptions): string {
  const differences = studyDifferences(first.study.document, second.study.document);
  const blocks = [
    titles(first, second, options),
    heading("What differs in the studies", options),
    differences.length === 0 ? "Nothing that a result rests on." : inputTable(differences, options),
    "",
    heading("What comes out", options),
    outputs(first, second, options),
    "",
    ...unfinished(first, second, options),
    closing([], second.result.cautions, options),
  ];
  return `${blocks.join("\n")}\n`;
}

function unfinished(first: Either, second: Either, { width }: ComparisonOptions): string[] {
  const whole = [first, second].every(({ result }) => result.kind === "check" || result.run.complete);
  return whole
    ? []
    : [...wrap("Stopped by the user before the end: each side rests on the samples so far.", width), ""];
}

function titles(first: Either, second: Either, { names, width }: ComparisonOptions): string {
  const named = ([study, name]: readonly [Either, string]): string[] =>
    wrap(
      `${capitalised(name)}: ${study.result.study}${study.study.file === "" ? "" : ` (${study.study.file})`}`,
      width,
    );
  const sides = [
    [first, names[0]],
    [second, names[1]],
  ] as const;
  const mixed =
    first.study.units === second.study.units
      ? []
      : ["Plain numbers of each study are in its own units; results are in those of the first."];
  return [...sides.flatMap(named), ...mixed.flatMap((line) => wrap(line, width)), ""].join("\n");
}

/** A value may be long: each side stands on a line of its own where the table would be too wide. */
function inputTable(differences: readonly Difference[], { names, width }: ComparisonOptions): string {
  const rows = differences.map(({ path, first, second }) => [path, first, second]);
  const sizes = [0, 1, 2].map((k) => Math.max(...rows.map((row) => row[k].length), 8));
  if (sizes.reduce((sum, size) => sum + size + 2, 0) <= width)
    return textTable([{ heading: "Path" }, { heading: names[0] }, { heading: names[1] }], rows, width);
  return differences
    .flatMap(({ path, first, second }) => [
      path,
      ...wrap(`  ${names[0]}: ${first}`, width, "    "),
      ...wrap(`  ${names[1]}: ${second}`, width, "    "),
    ])
    .join("\n");
}

function outputs(first: Either, second: Either, options: ComparisonOptions): string {
  const [a, b] = [first.result, second.result];
  if (a.kind === "check" && b.kind === "check") return checkTable(a, b, displayIn(first.study.units), options);
  if (a.kind === "assess" && b.kind === "assess") return assessTables(a, b, options);
  throw new RangeError(`a ${a.kind} cannot be compared with a ${b.kind}`);
}

function checkTable(a: CheckResult, b: CheckResult, display: Display, { names, width }: ComparisonOptions): string {
  const states = limitStatesOf(a, b).map((name) => {
    const [x, y] = [a.limitStates[name]?.factorOfSafety, b.limitStates[name]?.factorOfSafety];
    return [`Factor of safety, ${limitStateWords[name] ?? name}`, factor(x), factor(y), changeText(x, y)];
  });
  const measure = (words: string, unit: string, of: (result: CheckResult) => number | null): string[] => {
    const [x, y] = [of(a) ?? undefined, of(b) ?? undefined];
    const shown = (value: number | undefined): string => (value === undefined ? "–" : display.number(value, unit));
    return [`${words}, ${display.unit(unit)}`, shown(x), shown(y), changeText(x, y)];
  };
  const base = [
    measure("Vertical force on the base", "kN/m", ({ base }) => base.vertical),
    measure("Driving force", "kN/m", ({ base }) => base.horizontal),
    measure("Eccentricity", "m", ({ base }) => base.eccentricity),
    measure("Pressure at the toe", "kPa", ({ base }) => base.pressureToe),
    measure("Pressure at the heel", "kPa", ({ base }) => base.pressureHeel),
  ];
  return textTable(columns("Result", names), [...states, ...base], width);
}

function assessTables(a: AssessResult, b: AssessResult, options: ComparisonOptions): string {
  const { names, width } = options;
  const whole = "Any of these";
  const sampled = [
    ...limitStatesOf(a, b).map(
      (name) =>
        [
          capitalised(limitStateWords[name] ?? name),
          a.limitStates[name]?.monteCarlo,
          b.limitStates[name]?.monteCarlo,
        ] as const,
    ),
    [whole, a.system.monteCarlo, b.system.monteCarlo] as const,
  ];
  const probabilities = sampled.flatMap(([name, x, y]) => [
    [name, probability(x), probability(y), ratioText(x, y)],
    ["  at least (95 % interval)", limit(x, 0), limit(y, 0), ""],
    ["  at most", limit(x, 1), limit(y, 1), ""],
    ["  reliability index", indexText(x?.reliabilityIndex ?? null), indexText(y?.reliabilityIndex ?? null), ""],
  ]);
  const factors = limitStatesOf(a, b).map((name) => {
    const [x, y] = [a.limitStates[name]?.factorAtMean, b.limitStates[name]?.factorAtMean];
    return [`Factor at means, ${limitStateWords[name] ?? name}`, factor(x), factor(y), changeText(x, y)];
  });
  const sentence = `The wall: ${oneInOf(a)} (${names[0]}), ${oneInOf(b)} (${names[1]}).`;
  return [
    ...wrap(sentence, width),
    "",
    textTable(columns("Probability of failure", names), probabilities, width),
    "",
    textTable(columns("Result", names), factors, width),
  ].join("\n");
}

const columns = (first: string, names: readonly [string, string]): Column[] => [
  { heading: first },
  { heading: names[0], align: "right" },
  { heading: names[1], align: "right" },
  { heading: "change", align: "right", spare: 1 },
];

function limitStatesOf(a: CheckResult | AssessResult, b: CheckResult | AssessResult): readonly LimitStateName[] {
  return [...new Set([...Object.keys(a.limitStates), ...Object.keys(b.limitStates)])] as LimitStateName[];
}

const factor = (value: number | undefined): string => (value === undefined ? "–" : significant(value, 3));

/** "+12 %"; nothing where there is no base to reckon from. */
export function changeText(before: number | undefined, after: number | undefined): string {
  if (before === undefined || after === undefined || before === 0) return "";
  const percent = Math.round(1000 * (after / before - 1)) / 10;
  if (percent === 0) return "none";
  const sign = percent > 0 ? "+" : "−";
  return `${sign}${Math.abs(percent) < 10 ? Math.abs(percent).toFixed(1) : Math.abs(percent).toFixed(0)} %`;
}

const probability = (mc: MonteCarloResult | undefined): string =>
  mc === undefined ? "–" : mc.failures === 0 ? "none seen" : probabilityText(mc.probability);

const limit = (mc: MonteCarloResult | undefined, end: 0 | 1): string =>
  mc === undefined ? "–" : probabilityText(mc.interval[end]);

/** How many times as likely; "unclear" where the intervals overlap, so that sampling scatter is not read as a finding. */
export function ratioText(before: MonteCarloResult | undefined, after: MonteCarloResult | undefined): string {
  if (before === undefined || after === undefined) return "";
  if (before.failures === after.failures && before.samples === after.samples) return "none";
  if (before.interval[0] <= after.interval[1] && after.interval[0] <= before.interval[1]) return "unclear";
  if (before.failures === 0 || after.failures === 0) return after.failures === 0 ? "rarer" : "likelier";
  return `× ${significant(after.probability / before.probability, 2)}`;
}

function oneInOf({ system }: AssessResult): string {
  const { failures, probability, interval } = system.monteCarlo;
  return failures === 0 ? `no failure seen, rarer than ${oneIn(interval[1])}` : `about ${oneIn(probability)}`;
}
