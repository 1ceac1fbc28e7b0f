import type { AssessResult, CheckResult } from "../results.ts";
import type { Study } from "../study/study.ts";
import { capitalised, displayIn, limitStateWords } from "./display.ts";
import { indexText, probabilityText, significant } from "./number.ts";
import { textTable } from "./table.ts";
import { heading, type TerminalOptions } from "./terminal.ts";

/** Two results of the same kind, each with a short name for its column. */
export interface Side<T> {
  readonly name: string;
  readonly study: Study;
  readonly result: T;
}

const nameOf = (state: string): string => capitalised(limitStateWords[state] ?? state);

/** Factors of safety and uncertain values of two checks, side by side. */
export function compareChecks(one: Side<CheckResult>, other: Side<CheckResult>, options: TerminalOptions): string {
  const states = union(Object.keys(one.result.limitStates), Object.keys(other.result.limitStates));
  const factor = (side: Side<CheckResult>, state: string): string => {
    const found = Object.entries(side.result.limitStates).find(([name]) => name === state);
    return found === undefined ? "–" : significant(found[1].factorOfSafety, 3);
  };
  const rows = states.map((state) => [nameOf(state), factor(one, state), factor(other, state)]);
  return [
    heading("Factors of safety, side by side", options),
    table(rows, one.name, other.name, options),
    "",
    ...valueLines(one, other, options),
  ].join("\n");
}

/** Probabilities of two assessments side by side; whether the intervals tell them apart is said. */
export function compareAssessments(
  one: Side<AssessResult>,
  other: Side<AssessResult>,
  options: TerminalOptions,
): string {
  const states = union(Object.keys(one.result.limitStates), Object.keys(other.result.limitStates));
  const row = (
    name: string,
    pick: (
      result: AssessResult,
    ) => { probability: number; interval: readonly [number, number]; reliabilityIndex: number | null } | undefined,
  ): string[] => {
    const [a, b] = [pick(one.result), pick(other.result)];
    const text = (found: typeof a): string =>
      found === undefined ? "–" : `${probabilityText(found.probability)} (${indexText(found.reliabilityIndex)})`;
    return [name, text(a), text(b), a === undefined || b === undefined ? "–" : apart(a.interval, b.interval)];
  };
  const rows = states.map((state) =>
    row(nameOf(state), (result) => Object.entries(result.limitStates).find(([name]) => name === state)?.[1].monteCarlo),
  );
  rows.push(row("Any of these", (result) => result.system.monteCarlo));
  return [
    heading("Probability (index), side by side", options),
    textTable(
      [
        { heading: "" },
        { heading: one.name, align: "right" },
        { heading: other.name, align: "right" },
        { heading: "The intervals", spare: 1 },
      ],
      rows,
      options.width,
    ),
    "",
    ...valueLines(one, other, options),
  ].join("\n");
}

const apart = (a: readonly [number, number], b: readonly [number, number]): string =>
  a[1] < b[0] ? "rises" : a[0] > b[1] ? "falls" : "overlap";

/** Means of the uncertain values where they differ. */
function valueLines(
  one: Side<CheckResult | AssessResult>,
  other: Side<CheckResult | AssessResult>,
  options: TerminalOptions,
): string[] {
  const [a, b] = [meansOf(one.result), meansOf(other.result)];
  const display = [displayIn(one.study.units), displayIn(other.study.units)];
  const rows = union(Object.keys(a), Object.keys(b))
    .filter((path) => a[path]?.text !== b[path]?.text)
    .map((path) => [
      path,
      ...[a, b].map((side, k) =>
        side[path] === undefined ? "certain or absent" : display[k].quantity(side[path].value, side[path].unit),
      ),
    ]);
  if (rows.length === 0) return ["Their uncertain values have the same means."];
  return [heading("Uncertain values that differ (means)", options), table(rows, one.name, other.name, options)];
}

interface Shown {
  readonly value: number;
  readonly unit: string;
  readonly text: string;
}

function meansOf(result: CheckResult | AssessResult): Readonly<Record<string, Shown>> {
  if (result.kind === "check")
    return Object.fromEntries(
      Object.entries(result.values).map(([path, value]) => [path, { value, unit: "–", text: value.toPrecision(10) }]),
    );
  return Object.fromEntries(
    result.variables.map(({ path, mean, sd, unit }) => [
      path,
      { value: mean, unit, text: `${mean.toPrecision(10)} ${sd.toPrecision(10)}` },
    ]),
  );
}

const union = (a: readonly string[], b: readonly string[]): readonly string[] => [...new Set([...a, ...b])];
const table = (rows: readonly (readonly string[])[], one: string, other: string, options: TerminalOptions): string =>
  textTable(
    [{ heading: "" }, { heading: one, align: "right" }, { heading: other, align: "right" }],
    rows,
    options.width,
  );
