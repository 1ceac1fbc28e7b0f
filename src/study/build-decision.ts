/** The `evidence` and `decision` parts of a study. */
import type { TreeReader } from "./build-study.ts";
import { defaults, limitStateNames } from "./defaults.ts";
import { type Field, fieldOfPath } from "./fields.ts";
import { isRecord, valueAt } from "./paths.ts";
import { readKey, readNumber } from "./read-number.ts";
import { readQuantity } from "./read-quantity.ts";
import type { Decision, Evidence, Investigation, LimitStateName, Option, Quantity } from "./study.ts";

export function buildEvidence(read: TreeReader): readonly Evidence[] {
  return read.list("evidence").flatMap((entry, i) => {
    const built = isRecord(entry) ? buildEntry(read, entry, `evidence.${i}`) : undefined;
    return built === undefined ? [] : [built];
  });
}

function buildEntry(read: TreeReader, entry: Record<string, unknown>, path: string): Evidence | undefined {
  const results = entry.results !== undefined;
  if (results === (entry.survived !== undefined)) {
    const found = results ? "holds both results and survived" : "holds neither results nor survived";
    read.findings.problem(
      path,
      `${found}; one of them is needed`,
      "for example { results: [34.1, 36.0], of: soils.fill.friction_angle, error: 1.5 }",
    );
    return undefined;
  }
  return results ? buildResults(read, entry, path) : buildSurvival(read, entry, path);
}

function buildResults(read: TreeReader, entry: Record<string, unknown>, path: string): Evidence | undefined {
  if (typeof entry.of !== "string") {
    if (entry.of === undefined)
      read.findings.problem(path, "results need the path they are of", "for example of: soils.fill.friction_angle");
    return undefined;
  }
  const field = fieldOfPath(entry.of);
  if (field === undefined) return undefined; // cross-checks.ts says which paths there are
  const error = readError(read, entry.error, `${path}.error`, field);
  const transformation = typeof entry.transformation === "number" ? entry.transformation : undefined;
  return {
    kind: "results",
    of: entry.of,
    results: read
      .list(`${path}.results`)
      .map((value, k) => readNumber(value, `${path}.results.${k}`, field.dimension, read)),
    ...(error !== undefined && { error }),
    ...(transformation !== undefined && { transformation }),
  };
}

/** Standard deviation of a result, in the unit of the variable. */
function readError(read: TreeReader, raw: unknown, path: string, field: Field): number | undefined {
  return raw === undefined ? undefined : readKey(raw, path, { type: "spread" }, field, read);
}

function buildSurvival(read: TreeReader, entry: Record<string, unknown>, path: string): Evidence {
  for (const key of ["of", "error", "transformation"]) {
    if (entry[key] !== undefined)
      read.findings.keyProblem(`${path}.${key}`, `${key} goes with results, not with survived`);
  }
  const survived = isRecord(entry.survived) ? entry.survived : {};
  const under: Record<string, Quantity> = {};
  for (const [name, raw] of Object.entries(survived)) {
    const field = fieldOfPath(name);
    if (field !== undefined && raw !== null)
      under[name] = readQuantity(raw, `${path}.survived.${name}`, field, read).quantity;
  }
  return { kind: "survived", under };
}

export function buildDecision(read: TreeReader): Decision | undefined {
  if (!read.has("decision")) return undefined;
  const list = (key: string): number[] => read.list(`decision.${key}`).map((_, i) => i);
  return {
    currency: read.text("decision.currency", ""),
    failureCost: buildFailureCost(read),
    mustMeetTarget: read.flag("decision.must_meet_target", defaults.mustMeetTarget),
    options: list("options").map((i) => buildOption(read, `decision.options.${i}`)),
    investigations: list("investigations").map((i) => buildInvestigation(read, `decision.investigations.${i}`)),
  };
}

function buildFailureCost(read: TreeReader): Decision["failureCost"] {
  const path = "decision.failure_cost";
  const plain = read.number(path);
  if (plain !== undefined) return plain;
  const costs: Partial<Record<LimitStateName, number>> = {};
  for (const name of limitStateNames) {
    const cost = read.number(`${path}.${name}`);
    if (cost !== undefined) costs[name] = cost;
  }
  return costs;
}

function buildOption(read: TreeReader, path: string): Option {
  const change = valueAt(read.tree, `${path}.change`);
  return {
    name: read.text(`${path}.name`, ""),
    cost: read.number(`${path}.cost`) ?? Number.NaN,
    change: isRecord(change) ? change : {},
    alwaysOpen: read.flag(`${path}.always_open`, defaults.alwaysOpen),
  };
}

function buildInvestigation(read: TreeReader, path: string): Investigation {
  const cost = read.number(`${path}.cost`);
  const informs = valueAt(read.tree, `${path}.informs`);
  const entries = Array.isArray(informs) ? informs.map((_, k) => `${path}.informs.${k}`) : [path];
  if (typeof informs === "string" && !read.has(`${path}.tests`)) {
    read.findings.problem(`${path}.tests`, "is missing: how many tests are made", "for example tests: 6");
  }
  if (Array.isArray(informs)) {
    for (const key of ["tests", "error", "transformation"]) {
      if (read.has(`${path}.${key}`))
        read.findings.keyProblem(`${path}.${key}`, `${key} belongs to each entry of informs, where informs is a list`);
    }
  }
  return {
    name: read.text(`${path}.name`, ""),
    ...(cost !== undefined && { cost }),
    informs: entries.map((entry) =>
      buildInformed(read, entry, typeof informs === "string" ? informs : read.text(`${entry}.path`, "")),
    ),
  };
}

function buildInformed(read: TreeReader, entry: string, path: string): Investigation["informs"][number] {
  const field = fieldOfPath(path);
  const error = field && readError(read, valueAt(read.tree, `${entry}.error`), `${entry}.error`, field);
  const transformation = read.number(`${entry}.transformation`);
  return {
    path,
    tests: read.number(`${entry}.tests`) ?? Number.NaN,
    ...(error !== undefined && { error }),
    ...(transformation !== undefined && { transformation }),
  };
}
