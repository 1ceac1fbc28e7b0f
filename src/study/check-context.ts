/** What the checks between values work on. */
import type { TreeReader } from "./build-study.ts";
import { meanOf } from "./moments.ts";
import { brief } from "./read-number.ts";
import { withUnit } from "./resolve-distribution.ts";
import type { Quantity, Study } from "./study.ts";
import { type Dimension, displayUnit, plainUnit } from "./units.ts";

export interface CheckContext {
  readonly study: Study;
  readonly read: TreeReader;
  /** The study was changed from outside (an option, --set): what no longer has an object is left aside, not refused. */
  readonly changed: boolean;
  problem(path: string, message: string, hint?: string): void;
  keyProblem(path: string, message: string, hint?: string): void;
  notice(path: string, message: string): void;
  /** A value at the means; NaN where it could not be read, and a comparison with it then finds nothing wrong. */
  mean(quantity: Quantity | undefined): number;
  /** `2.5 m`, in the study's units. */
  say(value: number, dimension: Dimension): string;
}

export function checkContext(study: Study, read: TreeReader, changed: boolean): CheckContext {
  const { problem, keyProblem, notice } = read.findings;
  return {
    study,
    read,
    changed,
    problem,
    keyProblem,
    notice,
    mean: (quantity) => (quantity === undefined ? Number.NaN : meanOf(quantity)),
    say: (value, dimension) =>
      withUnit(brief(value * displayUnit(dimension, study.units).factor), plainUnit(dimension, study.units)),
  };
}

/** Outline at the means, m, levels as in the study; NaN where something could not be read. */
export interface MeanOutline {
  readonly baseWidth: number;
  readonly height: number;
  readonly heel: number;
  readonly underside: number;
  readonly crest: number;
  /** Ground surface above the heel. */
  readonly surface: number;
}

export function meanOutline({ study, mean }: CheckContext): MeanOutline {
  const { stem, base, undersideLevel } = study.wall;
  const heel = base ? mean(base.heel) : 0;
  const baseWidth = (base ? mean(base.toe) : 0) + mean(stem.footWidth) + heel;
  const height = mean(stem.height) + (base ? mean(base.thickness) : 0);
  const underside = mean(undersideLevel);
  const crest = underside + height;
  const rise = (heel + mean(stem.backRun)) * Math.tan((mean(study.ground.behind.slope) * Math.PI) / 180);
  return { baseWidth, height, heel, underside, crest, surface: crest + rise };
}
