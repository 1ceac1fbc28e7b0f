import type { Distribution } from "../study/study.ts";
import { beta } from "./beta.ts";
import { gamma } from "./gamma.ts";
import { gumbel } from "./gumbel.ts";
import { lognormal } from "./lognormal.ts";
import type { Marginal } from "./marginal.ts";
import { measured } from "./measured.ts";
import { mixture } from "./mixture.ts";
import { normal } from "./normal.ts";
import { triangular } from "./triangular.ts";
import { truncatedNormal } from "./truncated-normal.ts";
import { uniform } from "./uniform.ts";
import { weibull } from "./weibull.ts";

type Constructors = { [K in Distribution["kind"]]: (distribution: Extract<Distribution, { kind: K }>) => Marginal };

/** Every kind of distribution by its word in the study file: a new member is its own file and one line here. */
const constructors: Constructors = {
  normal,
  lognormal,
  truncated_normal: truncatedNormal,
  uniform,
  triangular,
  beta,
  gumbel,
  weibull,
  gamma,
  mixture: ({ parts }) => mixture(parts.map(({ share, of }) => ({ share, of: marginalOf(of) }))),
  measured,
};

/**
 * The marginal of a distribution as a study states it, in the quantity's own unit.
 *
 * @throws RangeError where the parameters make no distribution; the message names the parameter and what is allowed
 */
export function marginalOf(distribution: Distribution): Marginal {
  return (constructors[distribution.kind] as (of: Distribution) => Marginal)(distribution);
}
