import type { Driver } from "../results.ts";

/** What each measure says of one unknown; what was not computed is left out. */
export interface DriverMeasures {
  readonly path: string;
  readonly adverse: Driver["adverse"];
  /** How much of its variance could be learned. */
  readonly knowledge: number;
  /** First-order share of the variance of the factor, around the means. */
  readonly share?: number | null;
  /** Importance at the design point. */
  readonly importance?: number | null;
  /** Total variance-based index of the factor, over its whole range. */
  readonly totalIndex?: number | null;
  /** First-order variance-based index. */
  readonly firstIndex?: number | null;
  /** Rank correlation with the factor. */
  readonly rankCorrelation?: number | null;
  /** Mean given failure less mean, in standard deviations. */
  readonly shiftGivenFailure?: number | null;
}

export interface RankedDriver extends DriverMeasures {
  /** From 1. */
  readonly rank: number;
  /** Mean of its parts of all measures, each measure summing to 1 over the unknowns. */
  readonly weight: number;
  /** Where measures disagree on this unknown, and why that may be. */
  readonly disagreements: readonly string[];
}

type Measure = "share" | "importance" | "totalIndex" | "rankCorrelation" | "shiftGivenFailure";

/** Squares of correlations and shifts are what shares and indices are made of, in a straight-line limit state. */
const sizeOf: Readonly<Record<Measure, (row: DriverMeasures) => number | null | undefined>> = {
  share: (row) => (row.share == null ? row.share : Math.max(row.share, 0)),
  importance: (row) => row.importance,
  totalIndex: (row) => (row.totalIndex == null ? row.totalIndex : Math.max(row.totalIndex, 0)),
  rankCorrelation: (row) => (row.rankCorrelation == null ? row.rankCorrelation : row.rankCorrelation ** 2),
  shiftGivenFailure: (row) => (row.shiftGivenFailure == null ? row.shiftGivenFailure : row.shiftGivenFailure ** 2),
};

const measures = Object.keys(sizeOf) as Measure[];
/** Measures of what happens around the means, and of what happens where the wall fails. */
const usual: readonly Measure[] = ["share", "totalIndex", "rankCorrelation"];
const atFailure: readonly Measure[] = ["importance", "shiftGivenFailure"];

/**
 * One ranking of the unknowns from all measures that there are, strongest first, with a remark where they disagree.
 *
 * In a straight-line limit state of independent normals all of them say the same; where they part, the reason is worth a sentence.
 */
export function rankDrivers(rows: readonly DriverMeasures[]): readonly RankedDriver[] {
  const parts = partsOf(rows);
  const weighed = rows.map((row, i) => {
    const own = [...parts.values()].map((part) => part[i]);
    const weight = own.length === 0 ? 0 : own.reduce((sum, part) => sum + part, 0) / own.length;
    return { ...row, weight, disagreements: disagreementsOf(row, i, parts) };
  });
  return weighed.sort((a, b) => b.weight - a.weight).map((row, i) => ({ ...row, rank: i + 1 }));
}

/** Each measure as parts of 1; a measure that is missing for an unknown, or says nothing at all, is left out. */
function partsOf(rows: readonly DriverMeasures[]): ReadonlyMap<Measure, readonly number[]> {
  const parts = new Map<Measure, readonly number[]>();
  for (const measure of measures) {
    const sizes = rows.map(sizeOf[measure]);
    if (!sizes.every((size): size is number => typeof size === "number" && Number.isFinite(size))) continue;
    const total = sizes.reduce((sum, size) => sum + size, 0);
    if (total > 0)
      parts.set(
        measure,
        sizes.map((size) => size / total),
      );
  }
  return parts;
}

const large = 0.15;
const apart = 3;

function disagreementsOf(
  row: DriverMeasures,
  i: number,
  parts: ReadonlyMap<Measure, readonly number[]>,
): readonly string[] {
  const meanOf = (group: readonly Measure[]): number | undefined => {
    const own = group.flatMap((measure) => parts.get(measure)?.[i] ?? []);
    return own.length === 0 ? undefined : own.reduce((sum, part) => sum + part, 0) / own.length;
  };
  const [around, failing] = [meanOf(usual), meanOf(atFailure)];
  const remarks: string[] = [];
  if (around !== undefined && failing !== undefined) {
    if (failing >= large && failing > apart * around)
      remarks.push(
        "matters where the wall fails much more than around the means: its tail, or a bend of the limit state, decides",
      );
    if (around >= large && around > apart * failing)
      remarks.push("moves the factor of safety around the means, but the wall fails without it");
  }
  const { firstIndex, totalIndex, rankCorrelation, shiftGivenFailure } = row;
  if (firstIndex != null && totalIndex != null && totalIndex >= large && totalIndex > 2 * Math.max(firstIndex, 0))
    remarks.push("acts mostly together with others: alone it explains little of the spread");
  if (rankCorrelation != null && shiftGivenFailure != null && rankCorrelation * shiftGivenFailure > 0.1)
    remarks.push("fails at the other end than the one that lowers the factor on the whole: both ends are worth a look");
  return remarks;
}
