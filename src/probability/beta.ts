import { betaDensity, betaLower, betaQuantile, type UnitPoint } from "../numeric/incomplete-beta.ts";
import { completeMarginal, requireFinite, requirePositive } from "./complete-marginal.ts";
import type { Marginal } from "./marginal.ts";

/**
 * Beta distribution between two ends.
 *
 * Density: f(x) = t^(a − 1) (1 − t)^(b − 1)/(B(a, b)(to − from)), t = (x − from)/(to − from)
 * Parameters: with m = (mean − from)/(to − from) and v = (sd/(to − from))²: a + b = m(1 − m)/v − 1, a = m (a + b)
 */
export function beta(parameters: {
  readonly from: number;
  readonly to: number;
  readonly mean: number;
  readonly sd: number;
}): Marginal {
  // parameters
  const { from, to, mean, sd } = parameters;
  const width = to - from;
  for (const [name, value] of Object.entries({ from, to })) requireFinite("beta", name, value);
  requirePositive("beta", "to - from", width);
  requirePositive("beta", "sd", sd);
  if (!(mean > from && mean < to)) throw new RangeError(`beta: mean is ${mean}, must lie between ${from} and ${to}`);
  const largest = Math.sqrt((mean - from) * (to - mean));
  if (!(sd < largest))
    throw new RangeError(`beta: sd is ${sd}, must stay below ${largest} with that mean between those ends`);
  const sum = ((mean - from) / sd) * ((to - mean) / sd) - 1;
  const a = ((mean - from) / width) * sum;
  const b = ((to - mean) / width) * sum;

  // evaluation: always with the distance from both ends, so that neither loses digits
  const place = ({ x, y }: UnitPoint): number => (x < y ? from + width * x : to - width * y);
  const share = (distance: number): number => Math.min(Math.max(distance / width, 0), 1);
  return completeMarginal({
    kind: "beta",
    mean,
    sd,
    lowest: from,
    highest: to,
    pdf: (x) => (x < from || x > to ? 0 : betaDensity(share(x - from), share(to - x), a, b) / width),
    cdf: (x) => betaLower(share(x - from), share(to - x), a, b),
    ccdf: (x) => betaLower(share(to - x), share(x - from), b, a),
    quantile: (p) => place(betaQuantile(p, a, b)),
    upperQuantile: (q) => place(betaQuantile(q, a, b, true)),
  });
}
