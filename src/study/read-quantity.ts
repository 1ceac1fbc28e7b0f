/** A numeric field as it stands in the file -> a certain or uncertain quantity in house units. */
import { certainSchema, distributionForms, distributionKinds, uncertainSchema } from "./distribution-keys.ts";
import type { Field } from "./fields.ts";
import { distributionMean } from "./moments.ts";
import { isRecord } from "./paths.ts";
import { brief, type NumberContext, rangeText, readKey, readNumber, readValue } from "./read-number.ts";
import { readReduction, readScatter, type ScatterReading, type Spot } from "./read-scatter.ts";
import { type Place, resolveDistribution, showWith } from "./resolve-distribution.ts";
import { checkStructure, shown } from "./structure.ts";
import type { Distribution, Quantity, UncertainQuantity } from "./study.ts";
import { didYouMean } from "./suggest.ts";
import { displayUnit, plainUnit } from "./units.ts";

export interface Reading {
  /** NaN where it could not be read; a problem then says why. */
  readonly quantity: Quantity;
  readonly source?: string;
}

/**
 * A number, `"18 kN/m3"`, `{ value: 34, source: … }` or `{ normal: { mean: 34, sd: 2.7 }, scatter: …, source: … }`.
 *
 * @param raw what stands at the path
 */
export function readQuantity(raw: unknown, path: string, field: Field, context: NumberContext): Reading {
  const spot: Spot = { path, field, context };
  if (!isRecord(raw)) {
    if (Array.isArray(raw) || typeof raw === "boolean") return refuse(spot, raw);
    return { quantity: readValue(raw, path, field, context) };
  }
  const source = typeof raw.source === "string" ? { source: raw.source } : {};
  if (Object.hasOwn(raw, "value")) {
    if (Object.hasOwn(raw, "yearly") && distributionKinds.every((kind) => !Object.hasOwn(raw, kind))) {
      context.findings.problem(
        `${path}.yearly`,
        "yearly needs a distribution: a certain number is the same in every year",
      );
      return { quantity: Number.NaN };
    }
    const sound = checkStructure(certainSchema, raw, path, context.findings);
    return { quantity: sound ? readValue(raw.value, `${path}.value`, field, context) : Number.NaN, ...source };
  }
  return { quantity: readUncertain(raw, spot) ?? Number.NaN, ...source };
}

function refuse({ path, context }: Spot, raw: unknown): Reading {
  const hint = Array.isArray(raw) ? "measured values are written { measured: [ … ] }" : undefined;
  context.findings.problem(
    path,
    `found ${shown(raw)}; a number, a number with a unit or a distribution is needed`,
    hint,
  );
  return { quantity: Number.NaN };
}

function readUncertain(raw: Record<string, unknown>, spot: Spot): UncertainQuantity | undefined {
  const kind = kindOf(raw, spot);
  if (kind === undefined) return undefined;
  const { path, context } = spot;
  const sound = checkStructure(uncertainSchema(kind), raw, path, context.findings);
  const scatter = sound && isRecord(raw.scatter) ? readScatter(raw, kind, spot) : undefined;
  const distribution = sound ? readDistribution(kind, raw, spot, scatter?.cov) : undefined;
  const share = knowledgeShare(raw, spot, distribution, scatter);
  if (distribution === undefined || !meanInRange(distribution, spot)) return undefined;
  return {
    distribution,
    yearly: raw.yearly === true,
    ...(share !== undefined && { knowledge: share }),
    ...(scatter && { scatter: scatter.scatter }),
    ...(kind === "range" && { range: spokenRange(raw.range as Record<string, unknown>, spot) }),
  };
}

/** Ends and means that are written were judged one by one; this is for kinds whose mean follows from other numbers. */
function meanInRange(distribution: Distribution, { path, field, context }: Spot): boolean {
  const mean = distributionMean(distribution);
  if (mean >= field.lowest && mean <= field.highest) return true;
  const { factor } = displayUnit(field.dimension, context.units);
  context.findings.problem(
    path,
    `the mean of this distribution, ${brief(mean * factor)}, is outside ${rangeText(field, context.units)}`,
  );
  return false;
}

/** The one kind that stands in the object; a problem where there is none, or more than one. */
function kindOf(raw: Record<string, unknown>, { path, context }: Spot): string | undefined {
  const keys = Object.keys(raw);
  const kinds = keys.filter((key) => distributionKinds.includes(key));
  if (kinds.length === 1) return kinds[0];
  if (kinds.length > 1) {
    context.findings.keyProblem(
      `${path}.${kinds[1]}`,
      `found two distributions, ${kinds[0]} and ${kinds[1]}; one is needed`,
    );
    return undefined;
  }
  const unknown = keys.find((key) => !["scatter", "source", "yearly", "knowledge", "value"].includes(key));
  const list = `allowed: ${distributionKinds.join(", ")}`;
  if (unknown === undefined) context.findings.problem(path, "holds neither a value nor a distribution", list);
  else
    context.findings.keyProblem(
      `${path}.${unknown}`,
      `"${unknown}" is not a distribution`,
      didYouMean(unknown, [...distributionKinds, "value"], list),
    );
  return undefined;
}

function readDistribution(
  kind: string,
  raw: Record<string, unknown>,
  spot: Spot,
  scatterCov?: number,
): Distribution | undefined {
  if (kind === "mixture") return readMixture(raw.mixture as unknown[], spot);
  if (kind === "measured") return readMeasured(raw, spot);
  const given = raw[kind] as Record<string, unknown>;
  const form = distributionForms[kind]!;
  const path = `${spot.path}.${kind}`;
  const numbers: Record<string, number> = {};
  for (const [name, key] of Object.entries(form.keys)) {
    if (name === "sd" || name === "cov") continue;
    if (given[name] !== undefined)
      numbers[name] = readKey(given[name], `${path}.${name}`, key, spot.field, spot.context);
    else if (key.default !== undefined) numbers[name] = key.default;
  }
  const sd = "sd" in form.keys ? readSd(given, path, numbers.mean ?? Number.NaN, spot, scatterCov) : Number.NaN;
  return resolveDistribution(
    kind,
    numbers,
    sd,
    given.as === "lognormal" ? "lognormal" : "normal",
    placeFor(path, spot),
  );
}

function placeFor(path: string, { field, context }: Spot): Place {
  const unit = plainUnit(field.dimension, context.units);
  return { path, findings: context.findings, show: showWith(unit, displayUnit(field.dimension, context.units).factor) };
}

/** Standard deviation from exactly one of sd, cov and scatter. */
function readSd(given: Record<string, unknown>, path: string, mean: number, spot: Spot, scatterCov?: number): number {
  const { findings } = spot.context;
  const ways = [
    ...["sd", "cov"].filter((name) => given[name] !== undefined),
    ...(scatterCov !== undefined ? ["scatter"] : []),
  ];
  if (ways.length !== 1) {
    const found = ways.length === 0 ? "the spread is missing" : `${ways.join(" and ")} are both given`;
    findings.problem(
      ways[0] === undefined || ways[0] === "scatter" ? path : `${path}.${ways[0]}`,
      `${found}; one of sd, cov, scatter is needed`,
      ways.length === 0 ? "for example sd: 2.5" : undefined,
    );
    return Number.NaN;
  }
  if (ways[0] === "sd") return readKey(given.sd, `${path}.sd`, { type: "spread" }, spot.field, spot.context);
  const cov = ways[0] === "cov" ? readCov(given.cov, `${path}.cov`, spot) : scatterCov!;
  if (mean !== 0 || Number.isNaN(cov))
    return refusesCov(spot, `${path}.${ways[0]}`) ? Number.NaN : cov * Math.abs(mean);
  findings.problem(`${path}.${ways[0]}`, "a mean of 0 has no coefficient of variation", "give sd");
  return Number.NaN;
}

function readCov(raw: unknown, path: string, spot: Spot): number {
  const cov = readKey(raw, path, { type: "positive" }, spot.field, spot.context);
  if (!(cov > 5)) return cov;
  spot.context.findings.problem(
    path,
    `a coefficient of variation of ${cov} is above 5`,
    `did you mean ${cov / 100}? (${cov} % is ${cov / 100})`,
  );
  return Number.NaN;
}

function refusesCov({ path, field, context }: Spot, where: string): boolean {
  if (field.dimension !== "level") return false;
  const target = where.endsWith(".scatter") ? `${path}.scatter` : where;
  context.findings.problem(target, "a level has no coefficient of variation: it would depend on the datum", "give sd");
  return true;
}

function readMixture(parts: readonly unknown[], spot: Spot): Distribution | undefined {
  const { path, context } = spot;
  const read = parts.map((part, i) => {
    const below = `${path}.mixture.${i}`;
    const { share, of } = part as { share: unknown; of: unknown };
    return {
      share: readKey(share, `${below}.share`, { type: "share" }, spot.field, context),
      of: readNested(of, { ...spot, path: `${below}.of` }),
    };
  });
  if (read.length < 2) {
    context.findings.problem(
      `${path}.mixture`,
      "a mixture needs at least two parts",
      "a single distribution is written without mixture",
    );
    return undefined;
  }
  const sum = read.reduce((total, part) => total + part.share, 0);
  if (Math.abs(sum - 1) > 1e-6)
    context.findings.problem(`${path}.mixture`, `the shares sum to ${Number(sum.toPrecision(6))}; they must sum to 1`);
  if (read.some((part) => part.of === undefined) || !(Math.abs(sum - 1) <= 1e-6)) return undefined;
  return { kind: "mixture", parts: read.map((part) => ({ share: part.share / sum, of: part.of! })) };
}

function readNested(raw: unknown, spot: Spot): Distribution | undefined {
  if (!isRecord(raw)) {
    spot.context.findings.problem(
      spot.path,
      `found ${shown(raw)}; a distribution is needed`,
      "a value that is all but certain is a narrow uniform",
    );
    return undefined;
  }
  const kind = kindOf(raw, spot);
  if (kind === undefined || !checkStructure(uncertainSchema(kind, true), raw, spot.path, spot.context.findings))
    return undefined;
  return readDistribution(kind, raw, spot);
}

function readMeasured(raw: Record<string, unknown>, spot: Spot): Distribution | undefined {
  const { path, field, context } = spot;
  const list = raw.measured as unknown[];
  const values = list.map((value, i) => readValue(value, `${path}.measured.${i}`, field, context));
  const reduction = readReduction(raw, path, spot);
  const as = raw.as === "lognormal" ? "lognormal" : "normal";
  if (values.length < 4) {
    context.findings.problem(
      `${path}.measured`,
      `found ${values.length} measured values; at least 4 are needed`,
      "with fewer, say what you think: range",
    );
    return undefined;
  }
  if (values.some(Number.isNaN) || Number.isNaN(reduction)) return undefined;
  if (values.every((value) => value === values[0])) {
    context.findings.problem(
      `${path}.measured`,
      "all measured values are equal, so they say nothing about the spread",
      "give a distribution with sd",
    );
    return undefined;
  }
  if (as === "lognormal" && values.some((value) => value <= 0)) {
    context.findings.problem(`${path}.measured`, "a lognormal fit needs values above 0", "use as: normal");
    return undefined;
  }
  return { kind: "measured", values, as, varianceReduction: reduction };
}

/** The stated share of knowledge κ: of a yearly variable as given (0 without), else of scatter or of measured values. */
function knowledgeShare(
  raw: Record<string, unknown>,
  spot: Spot,
  distribution?: Distribution,
  scatter?: ScatterReading,
): number | undefined {
  const { path, field, context } = spot;
  if (raw.knowledge !== undefined && raw.yearly !== true) {
    context.findings.keyProblem(`${path}.knowledge`, "knowledge stands only beside yearly: true");
    return undefined;
  }
  if (raw.yearly === true) {
    return raw.knowledge === undefined
      ? 0
      : readKey(raw.knowledge, `${path}.knowledge`, { type: "portion" }, field, context);
  }
  if (scatter) return scatter.knowledge;
  if (distribution?.kind !== "measured") return undefined;
  const n = distribution.values.length;
  return 1 / n / (distribution.varianceReduction + 1 / n);
}

function spokenRange(
  given: Record<string, unknown>,
  { path, field, context }: Spot,
): NonNullable<UncertainQuantity["range"]> {
  const read = (name: string): number => readNumber(given[name], `${path}.range.${name}`, field.dimension, context);
  const widthInSd = given.width_in_sd === undefined ? 4 : Number(given.width_in_sd);
  return { lowest: read("lowest"), likely: read("likely"), highest: read("highest"), widthInSd };
}
