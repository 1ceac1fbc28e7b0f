import { normalUpper } from "../numeric/normal.ts";

/** A point that failures gather about, in coordinates z: normally the design point of a limit state of an option. */
export interface FailureCentre {
  readonly point: Float64Array;
  /** Place of the option, and name of the limit state. */
  readonly option: number;
  readonly limitState: string;
  /** The point where safety begins, not failure: the origin itself fails. Samples then gather about the origin. */
  readonly originFails?: boolean;
  /**
   * The same point with one yearly coordinate read as the greatest of the period, where it was found so: how likely failure
   * is there over the years.
   */
  readonly overYears?: { readonly point: Float64Array; readonly coordinate: number };
}

/** Share of all samples, and the normal that they are drawn from. */
export interface Stratum {
  readonly share: number;
  readonly centre: Float64Array;
  /** Standard deviation in every direction. */
  readonly spread: number;
  /** Unit vector along which the samples are spread evenly over their distribution; absent where there is none to prefer. */
  readonly along?: Float64Array;
}

const wideShare = 0.05;
const wideSpread = 1.5;

/**
 * Unit normals at the centres of all options, and a wide one about the origin for what the centres do not see.
 *
 * Half of the samples go to the options in equal parts, so that every probability is known; the other half by Φ(−β), where
 * the cost is. Within an option, centres farther than its nearest by more than 2.5 are left out, and the others get their
 * Φ(−β), but not less than a tenth of the largest. Centres that nearly coincide are one.
 */
export function failureMixture(centres: readonly FailureCentre[], options: number, dimension: number): Stratum[] {
  const kept = Array.from({ length: options }, (_, o) => sharesWithin(centres.filter(({ option }) => option === o)));
  const likely = kept.map((own) => Math.max(0, ...own.map(({ likely: chance }) => chance)));
  const all = likely.reduce((sum, weight) => sum + weight, 0);
  const present = likely.filter((weight) => weight > 0).length;
  const strata: { share: number; centre: Float64Array; spread: number }[] = [];
  kept.forEach((own, o) => {
    if (own.length === 0) return;
    const ofOption = (1 - wideShare) * (0.5 / present + (0.5 * likely[o]) / all);
    for (const { centre, share } of own) {
      const point = centre.originFails ? new Float64Array(dimension) : centre.point;
      const near = strata.find((other) => distanceBetween(other.centre, point) < 0.3);
      if (near) near.share += ofOption * share;
      else strata.push({ share: ofOption * share, centre: point, spread: 1 });
    }
  });
  const centred = strata.map((one) => ({ ...one, ...direction(one.centre) }));
  const [nearest] = centred.map((one) => one.centre).sort((a, b) => Math.hypot(...a) - Math.hypot(...b));
  const origin = new Float64Array(dimension);
  const share = present === 0 ? 1 : wideShare;
  return [...centred, { share, centre: origin, spread: wideSpread, ...direction(nearest ?? origin) }];
}

/** Centres of one option with their shares of its samples. */
function sharesWithin(
  centres: readonly FailureCentre[],
): { readonly centre: FailureCentre; readonly share: number; readonly likely: number }[] {
  const distance = ({ point, originFails, overYears }: FailureCentre): number =>
    originFails ? 0 : Math.hypot(...(overYears?.point ?? point));
  const nearest = Math.min(...centres.map(distance));
  const kept = centres.filter((centre) => distance(centre) <= nearest + 2.5);
  const likely = kept.map((centre) => normalUpper(distance(centre)));
  const held = likely.map((chance) => Math.max(chance, 0.1 * Math.max(...likely)));
  const sum = held.reduce((total, chance) => total + chance, 0);
  return kept.map((centre, i) => ({ centre, share: held[i] / sum, likely: likely[i] }));
}

/** The same centres for what is believed, not for failure: half of the samples at the origin, the rest about the centres. */
export function beliefMixture(centres: readonly Float64Array[], dimension: number): Stratum[] {
  const distinct: Float64Array[] = [];
  for (const centre of centres)
    if (Math.hypot(...centre) > 0.5 && distinct.every((other) => distanceBetween(other, centre) > 0.5))
      distinct.push(centre);
  const centre = new Float64Array(dimension);
  const share = distinct.length === 0 ? 1 : 0.5;
  return [
    { share, centre, spread: 1, ...direction(distinct[0] ?? centre) },
    ...distinct.map((one) => ({ share: 0.5 / distinct.length, centre: one, spread: 1, ...direction(one) })),
  ];
}

function direction(towards: Float64Array): { along?: Float64Array } {
  const size = Math.hypot(...towards);
  return size === 0 ? {} : { along: towards.map((x) => x / size) };
}

function distanceBetween(a: Float64Array, b: Float64Array): number {
  return Math.hypot(...a.map((value, i) => value - b[i]));
}

/** Even numbers of samples by share, each at least 2, that add up to an even `total`. */
export function stratumSizes(strata: readonly Stratum[], total: number): number[] {
  const sizes = strata.map(({ share }) => Math.max(2, 2 * Math.round((share * total) / 2)));
  const largest = sizes.indexOf(Math.max(...sizes));
  sizes[largest] += total - sizes.reduce((sum, size) => sum + size, 0);
  return sizes;
}

/**
 * φ(z)/h(z) of the mixture h, the weight of a sample whichever stratum it came from (balance heuristic).
 *
 * @param sizes samples drawn from each stratum
 */
export function mixtureWeight(strata: readonly Stratum[], sizes: readonly number[]): (z: Float64Array) => number {
  const total = sizes.reduce((sum, size) => sum + size, 0);
  const parts = strata.map(({ centre, spread }, s) => ({
    log: Math.log(sizes[s] / total) - 0.5 * centre.reduce((sum, x) => sum + x * x, 0),
    centre,
    spread,
    entries: [...centre.keys()].filter((j) => centre[j] !== 0),
  }));
  return (z) => {
    let density = 0;
    for (const { log, centre, spread, entries } of parts) {
      let exponent = log;
      for (const j of entries) exponent += centre[j] * z[j];
      if (spread !== 1) {
        let square = 0;
        for (let j = 0; j < z.length; j++) square += z[j] * z[j];
        exponent += 0.5 * square * (1 - 1 / (spread * spread)) - z.length * Math.log(spread);
      }
      density += Math.exp(exponent);
    }
    return 1 / density;
  };
}
