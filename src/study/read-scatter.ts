/** Averaging and the second-moment make-up of a spread. */
import { distributionForms, scatterKeys } from "./distribution-keys.ts";
import type { Field } from "./fields.ts";
import { type NumberContext, readKey } from "./read-number.ts";
import type { Scatter } from "./study.ts";
import { type VarianceFunction, varianceReduction } from "./variance-function.ts";

/** A quantity that is being read: where, what it measures, and where problems go. */
export interface Spot {
  readonly path: string;
  readonly field: Field;
  readonly context: NumberContext;
}

/** Γ² from `scale_of_fluctuation`, `averaged_over` and `averaging`; 1 without averaging. */
export function readReduction(raw: Record<string, unknown>, path: string, spot: Spot): number {
  if (raw.averaged_over === undefined) return 1;
  const over = readKey(raw.averaged_over, `${path}.averaged_over`, { type: "length" }, spot.field, spot.context);
  if (raw.scale_of_fluctuation === undefined) {
    spot.context.findings.problem(`${path}.averaged_over`, "averaged_over needs scale_of_fluctuation beside it");
    return Number.NaN;
  }
  const scale = readKey(
    raw.scale_of_fluctuation,
    `${path}.scale_of_fluctuation`,
    { type: "length" },
    spot.field,
    spot.context,
  );
  return varianceReduction((raw.averaging as VarianceFunction | undefined) ?? "simple", over, scale);
}

export interface ScatterReading {
  readonly scatter: Scatter;
  readonly cov: number;
  readonly knowledge: number;
}

/**
 * `cov² = Γ²·inherent² + (inherent² + measurement²)/tests + transformation²`; all but the first term is knowledge.
 *
 * @source Phoon and Kulhawy (1999), Can. Geotech. J. 36, 625–639
 */
export function readScatter(raw: Record<string, unknown>, kind: string, spot: Spot): ScatterReading | undefined {
  const { context } = spot;
  const path = `${spot.path}.scatter`;
  const given = raw.scatter as Record<string, unknown>;
  if (!distributionForms[kind]?.scatter) {
    context.findings.keyProblem(
      path,
      `scatter cannot stand beside ${kind}: it takes the place of cov`,
      "use normal or lognormal",
    );
    return undefined;
  }
  const read: Record<string, number> = {};
  for (const [name, key] of Object.entries(scatterKeys)) {
    if (given[name] !== undefined) read[name] = readKey(given[name], `${path}.${name}`, key, spot.field, context);
    else if (key.default !== undefined) read[name] = key.default;
  }
  const reduction = readReduction(given, path, spot);
  const { inherent, measurement, transformation, tests } = read as Record<
    "inherent" | "measurement" | "transformation" | "tests",
    number
  >;
  const natural = reduction * inherent ** 2;
  const cov = Math.sqrt(natural + (inherent ** 2 + measurement ** 2) / tests + transformation ** 2);
  if (cov === 0)
    context.findings.problem(
      path,
      "scatter adds up to no spread at all",
      "give at least one of inherent, measurement, transformation",
    );
  const scatter: Scatter = {
    inherent,
    ...(read.scale_of_fluctuation !== undefined && { scaleOfFluctuation: read.scale_of_fluctuation }),
    ...(read.averaged_over !== undefined && { averagedOver: read.averaged_over }),
    averaging: (given.averaging as VarianceFunction | undefined) ?? "simple",
    measurement,
    transformation,
    tests,
    varianceReduction: reduction,
  };
  return { scatter, cov: cov === 0 ? Number.NaN : cov, knowledge: 1 - natural / cov ** 2 };
}
