/** The `assessment` part of a study. */
import { normalCdf, normalQuantile } from "../numeric/normal.ts";
import type { TreeReader } from "./build-study.ts";
import { defaults, limitStateNames } from "./defaults.ts";
import { isRecord, valueAt } from "./paths.ts";
import type { Assessment, LimitStateName, Target } from "./study.ts";
import { namedTarget } from "./targets.ts";

export function buildAssessment(read: TreeReader): Assessment {
  const eccentricityLimit = read.number("assessment.eccentricity_limit");
  const period = read.number("assessment.period");
  const target = buildTarget(read);
  return {
    limitStates: buildLimitStates(read),
    ...(eccentricityLimit !== undefined && { eccentricityLimit }),
    seed: String(read.number("assessment.seed") ?? read.text("assessment.seed", defaults.seed)),
    samples: read.number("assessment.samples") ?? defaults.samples,
    precision: read.number("assessment.precision") ?? defaults.precision,
    ...(period !== undefined && { period }),
    ...(target && { target }),
  };
}

/** In the order of the program, each once. */
function buildLimitStates(read: TreeReader): readonly LimitStateName[] {
  if (!read.has("assessment.limit_states")) return defaults.limitStates;
  const listed = read.list("assessment.limit_states");
  for (const [i, name] of listed.entries()) {
    if (listed.indexOf(name) < i)
      read.findings.problem(`assessment.limit_states.${i}`, `${String(name)} is listed twice`, "keep one of the two");
  }
  return limitStateNames.filter((name) => listed.includes(name));
}

function buildTarget(read: TreeReader): Target | undefined {
  const path = "assessment.target";
  const given = valueAt(read.tree, path);
  if (!isRecord(given)) return undefined;
  const ways = ["probability", "reliability_index", "named"].filter((key) => given[key] !== undefined);
  if (ways.length !== 1) {
    const found = ways.length === 0 ? "says no target" : `gives ${ways.join(" and ")}`;
    read.findings.problem(
      path,
      `${found}; one of probability, reliability_index, named is needed`,
      "for example { reliability_index: 3.8 }",
    );
    return undefined;
  }
  return { ...targetLevel(read, path), ...targetWords(read, path) };
}

/** p = Φ(−β), whichever of the two is given. */
function targetLevel(read: TreeReader, path: string): Pick<Target, "reliabilityIndex" | "probability"> {
  const probability = read.number(`${path}.probability`);
  if (probability !== undefined) return { probability, reliabilityIndex: -normalQuantile(probability) };
  const named = namedTarget(read.text(`${path}.named`, ""));
  const reliabilityIndex = named?.reliabilityIndex ?? read.number(`${path}.reliability_index`) ?? Number.NaN;
  return { reliabilityIndex, probability: normalCdf(-reliabilityIndex) };
}

function targetWords(read: TreeReader, path: string): Pick<Target, "period" | "reason" | "named"> {
  const named = namedTarget(read.text(`${path}.named`, ""));
  const given = read.number(`${path}.period`);
  if (named?.period !== undefined && given !== undefined && given !== named.period) {
    read.findings.problem(
      `${path}.period`,
      `${named.name} is a target for a period of ${named.period}, not ${given}`,
      "leave period out, or name another target",
    );
  }
  const period = given ?? named?.period;
  const reason = read.text(
    `${path}.reason`,
    named === undefined ? "" : `${named.source}${named.fromMemory ? " (from memory)" : ""}`,
  );
  return {
    ...(period !== undefined && { period }),
    ...(reason !== "" && { reason }),
    ...(named && { named: named.name }),
  };
}
