import type { AssessResult } from "../results.ts";
import { withoutControls } from "./escape.ts";

type CsvValue = string | number | null | undefined;

/** The uncertain values as they were put in: one row each, SI units, angles in degrees. */
export function variablesCsv({ variables }: AssessResult): string {
  return csvText([
    [
      "path",
      "label",
      "unit",
      "distribution",
      "mean",
      "sd",
      "fractile_5",
      "fractile_95",
      "knowledge",
      "yearly",
      "source",
    ],
    ...variables.map((variable) => [
      variable.path,
      variable.label,
      variable.unit,
      variable.distribution,
      variable.mean,
      variable.sd,
      variable.fractile5,
      variable.fractile95,
      variable.knowledge,
      String(variable.yearly),
      variable.source,
    ]),
  ]);
}

/** What drives each limit state: one row for each unknown and limit state, and for the system. */
export function driversCsv({ limitStates, system }: AssessResult): string {
  const states = [...Object.entries(limitStates), ["system", { ...system, tornado: [] }] as const];
  const rows = states.flatMap(([name, state]) => {
    const bars = new Map(state.tornado.map((bar) => [bar.path, bar]));
    const pictures = new Map(state.failurePicture.map((picture) => [picture.path, picture]));
    return state.drivers.map((driver) => [
      name,
      driver.path,
      driver.share,
      driver.adverse,
      driver.knowledge,
      driver.shiftGivenFailure,
      pictures.get(driver.path)?.meanGivenFailure,
      bars.get(driver.path)?.factorAt5,
      bars.get(driver.path)?.factorAt95,
    ]);
  });
  return csvText([
    [
      "limit_state",
      "path",
      "share",
      "adverse",
      "knowledge",
      "shift_given_failure",
      "mean_given_failure",
      "factor_at_5",
      "factor_at_95",
    ],
    ...rows,
  ]);
}

/** Probabilities with their intervals: each limit state and the system by plain sampling, then the best estimate. */
export function probabilitiesCsv({ limitStates, system, bestEstimate, seed }: AssessResult): string {
  const counted = [...Object.entries(limitStates), ["system", system] as const].map(([name, { monteCarlo }]) => [
    name,
    "plain",
    monteCarlo.probability,
    monteCarlo.standardError,
    ...monteCarlo.interval,
    monteCarlo.reliabilityIndex,
    monteCarlo.failures,
    monteCarlo.samples,
    seed,
  ]);
  const { method, probability, standardError, interval, reliabilityIndex, evaluations } = bestEstimate;
  return csvText([
    [
      "limit_state",
      "method",
      "probability",
      "standard_error",
      "interval_low",
      "interval_high",
      "reliability_index",
      "failures",
      "evaluations",
      "seed",
    ],
    ...counted,
    ["best_estimate", method, probability, standardError, ...interval, reliabilityIndex, null, evaluations, seed],
  ]);
}

/** One row per sample: values by path, then factors of safety by limit state. */
export function samplesCsv(table: {
  readonly paths: readonly string[];
  readonly limitStates: readonly string[];
  readonly rows: readonly Float64Array[];
}): string {
  const heads = [...table.paths, ...table.limitStates.map((name) => `factor_of_safety.${name}`)];
  return csvText([heads, ...table.rows.map((row) => [...row])]);
}

/** RFC 4180: commas, CRLF, quotes doubled. What is missing or not finite is an empty field. */
export function csvText(rows: readonly (readonly CsvValue[])[]): string {
  return rows.map((row) => `${row.map(field).join(",")}\r\n`).join("");
}

function field(value: CsvValue): string {
  if (value === null || value === undefined) return "";
  if (typeof value === "number") return Number.isFinite(value) ? String(value) : "";
  // A text that a spreadsheet would take for a formula is kept a text.
  const text = withoutControls(/^[=+@-]/.test(value) ? `'${value}` : value);
  return /[",]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}
