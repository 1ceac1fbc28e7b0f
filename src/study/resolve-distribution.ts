/** Numbers under a kind's name -> a distribution in house units, or a problem. */
import { normalCdf } from "../numeric/normal.ts";
import type { Findings } from "./findings.ts";
import { brief } from "./read-number.ts";
import type { Distribution } from "./study.ts";

export type Numbers = Readonly<Record<string, number>>;

/** Where a distribution stands, and what can go wrong with it. */
export interface Place {
  readonly path: string;
  readonly findings: Findings;
  /** House value -> the number as the study would write it. */
  readonly show: (value: number) => string;
}

/** A smallest share of the parent that a cut may leave: below it, quantiles of what is left lose their digits. */
const leastLeft = 1e-9;

/**
 * @param given the keys of the kind, read; NaN where one could not be read (its problem is then already there)
 * @param sd of the kinds that have one
 */
export function resolveDistribution(
  kind: string,
  given: Numbers,
  sd: number,
  as: "normal" | "lognormal",
  place: Place,
): Distribution | undefined {
  if (Object.values(given).some(Number.isNaN)) return undefined;
  switch (kind) {
    case "normal":
    case "gumbel":
      return Number.isNaN(sd) ? undefined : { kind, mean: given.mean!, sd };
    case "lognormal":
    case "gamma":
      return positiveKind(kind, given, sd, place);
    case "truncated_normal":
      return truncatedNormal(given, sd, place);
    case "uniform":
      return ordered(given, ["from", "to"], place) ? { kind, from: given.from!, to: given.to! } : undefined;
    case "triangular":
      return ordered(given, ["from", "peak", "to"], place)
        ? { kind, from: given.from!, peak: given.peak!, to: given.to! }
        : undefined;
    case "beta":
      return beta(given, sd, place);
    case "weibull":
      return { kind, shape: given.shape!, scale: given.scale!, shift: given.shift! };
    case "range":
      return range(given, as, place);
    default:
      throw new RangeError(`no distribution is called ${kind}`);
  }
}

/** The named numbers must not fall, and the first must be below the last. */
function ordered(given: Numbers, names: readonly string[], { path, findings, show }: Place): boolean {
  const [first, last] = [names[0]!, names.at(-1)!];
  for (let i = 1; i < names.length; i++) {
    const [lower, upper] = [names[i - 1]!, names[i]!];
    if (given[lower]! <= given[upper]!) continue;
    findings.problem(
      `${path}.${upper}`,
      `${upper} ${show(given[upper]!)} is below ${lower} ${show(given[lower]!)}`,
      "are the two the wrong way round?",
    );
    return false;
  }
  if (given[first]! < given[last]!) return true;
  findings.problem(
    `${path}.${last}`,
    `${last} must be above ${first}; both are ${show(given[first]!)}`,
    "a certain number is written alone",
  );
  return false;
}

function positiveKind(
  kind: "lognormal" | "gamma",
  given: Numbers,
  sd: number,
  { path, findings, show }: Place,
): Distribution | undefined {
  const shift = kind === "lognormal" ? given.shift! : 0;
  if (!(given.mean! > shift)) {
    const bound = kind === "lognormal" ? `its shift ${show(shift)}` : "0";
    const hint =
      kind === "lognormal"
        ? "a lognormal variable lies above its shift: give a lower shift, or another distribution"
        : "a gamma variable is above 0";
    findings.problem(`${path}.mean`, `mean ${show(given.mean!)} must be above ${bound}`, hint);
    return undefined;
  }
  if (Number.isNaN(sd)) return undefined;
  return kind === "lognormal" ? { kind, mean: given.mean!, sd, shift } : { kind, mean: given.mean!, sd };
}

function truncatedNormal(given: Numbers, sd: number, place: Place): Distribution | undefined {
  if (!ordered(given, ["from", "to"], place) || Number.isNaN(sd)) return undefined;
  const [below, above] = [(given.from! - given.mean!) / sd, (given.to! - given.mean!) / sd];
  const left = below > 0 ? normalCdf(-below) - normalCdf(-above) : normalCdf(above) - normalCdf(below);
  if (left >= leastLeft) return { kind: "truncated_normal", mean: given.mean!, sd, from: given.from!, to: given.to! };
  place.findings.problem(
    place.path,
    `from ${place.show(given.from!)} to ${place.show(given.to!)} leaves next to nothing of a normal distribution with mean ${place.show(given.mean!)} and sd ${place.show(sd)}`,
  );
  return undefined;
}

/** A beta distribution between bounds exists where sd² < (mean − from)(to − mean). */
function beta(given: Numbers, sd: number, place: Place): Distribution | undefined {
  const { from, to, mean } = given as { from: number; to: number; mean: number };
  if (!ordered(given, ["from", "to"], place)) return undefined;
  if (!(mean > from && mean < to)) {
    place.findings.problem(
      `${place.path}.mean`,
      `mean ${place.show(mean)} must lie between from ${place.show(from)} and to ${place.show(to)}`,
    );
    return undefined;
  }
  if (Number.isNaN(sd)) return undefined;
  const most = Math.sqrt((mean - from) * (to - mean));
  if (sd < most) return { kind: "beta", from, to, mean, sd };
  place.findings.problem(
    place.path,
    `no beta distribution between ${place.show(from)} and ${place.show(to)} with mean ${place.show(mean)} has sd ${place.show(sd)}; it must be below ${place.show(most)}`,
  );
  return undefined;
}

function range(given: Numbers, as: "normal" | "lognormal", place: Place): Distribution | undefined {
  if (!ordered(given, ["lowest", "likely", "highest"], place)) return undefined;
  const mean = given.likely!;
  const sd = (given.highest! - given.lowest!) / given.width_in_sd!;
  if (as === "normal") return { kind: "normal", mean, sd };
  if (mean > 0) return { kind: "lognormal", mean, sd, shift: 0 };
  place.findings.problem(
    `${place.path}.likely`,
    `likely ${place.show(mean)} must be above 0 for a lognormal distribution`,
    "use as: normal",
  );
  return undefined;
}

/** `12.3 lb/ft3`, `34 degrees`. */
export function showWith(unit: string, factor: number): (value: number) => string {
  return (value) => withUnit(brief(value * factor), unit);
}

/** `1 degree`, `2 degrees`, `0.8`. */
export function withUnit(text: string, unit: string): string {
  return unit === "" ? text : `${text} ${text === "1" && unit === "degrees" ? "degree" : unit}`;
}
