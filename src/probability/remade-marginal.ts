import type { Distribution } from "../study/study.ts";
import { marginalOf } from "./marginal-of.ts";
import type { Remade } from "./moved-marginal.ts";

/**
 * The same kind of distribution with another mean and standard deviation, where these are its parameters; undefined for the others
 * (a range has ends, a mixture parts, measured values are what they are), which are shifted and stretched as a whole.
 */
export function remadeMarginal(distribution: Distribution): Remade | undefined {
  switch (distribution.kind) {
    case "normal":
    case "lognormal":
    case "beta":
    case "gumbel":
    case "gamma":
      return (mean, sd) => marginalOf({ ...distribution, mean, sd });
    default:
      return undefined;
  }
}
