import type { JointSpace } from "../probability/marginal.ts";
import type { Driver, FailurePicture, TornadoBar } from "../results.ts";

export interface DriverSources {
  /** First-order shares by path; absent for the system. */
  readonly shares?: Readonly<Record<string, number>>;
  readonly tornado?: readonly TornadoBar[];
  readonly picture: readonly FailurePicture[];
  /** Mean and standard deviation after evidence, by path; those of the distributions where absent. */
  readonly moments?: ReadonlyMap<string, { readonly mean: number; readonly sd: number }>;
}

/**
 * One row per variable, the strongest first: by its share, or by the shift of its mean given failure where there is no share.
 *
 * The adverse end is that of the shift given failure where that is clear of chance (three standard errors), else that of the
 * tornado; "unclear" where neither says.
 */
export function driverTable(space: JointSpace, sources: DriverSources): readonly Driver[] {
  const pictures = new Map(sources.picture.map((picture) => [picture.path, picture]));
  const bars = new Map((sources.tornado ?? []).map((bar) => [bar.path, bar]));
  const rows = space.unknowns.map(({ path, marginal, knowledge }): Driver => {
    const picture = pictures.get(path);
    const { mean, sd } = sources.moments?.get(path) ?? marginal;
    const shift = picture === undefined || sd === 0 ? null : (picture.meanGivenFailure - mean) / sd;
    const share = sources.shares?.[path] ?? null;
    return {
      path,
      share,
      adverse: adverseEnd(shift, picture?.failures ?? 0, bars.get(path)),
      knowledge,
      shiftGivenFailure: shift,
    };
  });
  const weight = (row: Driver): number => Math.abs(row.share ?? row.shiftGivenFailure ?? 0);
  return rows.sort((a, b) => weight(b) - weight(a));
}

function adverseEnd(shift: number | null, failures: number, bar: TornadoBar | undefined): Driver["adverse"] {
  if (shift !== null && Math.abs(shift) > 3 / Math.sqrt(Math.max(failures, 1))) return shift < 0 ? "low" : "high";
  if (bar === undefined || bar.factorAt5 === bar.factorAt95) return "unclear";
  return bar.factorAt5 < bar.factorAt95 ? "low" : "high";
}

/** Each variable at its adverse 5 % fractile, judged by the limit state with the lowest factor at the means. */
export function cautiousValues(space: JointSpace, bars: readonly TornadoBar[]): Readonly<Record<string, number>> {
  const byPath = new Map(bars.map((bar) => [bar.path, bar]));
  return Object.fromEntries(
    space.unknowns.map(({ path, marginal }) => {
      const bar = byPath.get(path);
      if (bar === undefined || bar.factorAt5 === bar.factorAt95) return [path, marginal.mean];
      return [path, bar.factorAt5 < bar.factorAt95 ? marginal.quantile(0.05) : marginal.upperQuantile(0.05)];
    }),
  );
}
