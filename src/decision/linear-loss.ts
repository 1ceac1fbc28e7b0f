import { normalPdf, normalUpper } from "../numeric/normal.ts";

/**
 * Unit normal loss L(z) = φ(z) − z [1 − Φ(z)], the expected excess of a standard normal over z.
 *
 * @source H. Raiffa and R. Schlaifer (1961), Applied Statistical Decision Theory (from memory); values in
 *   tests/outside/unit-normal-loss
 */
export function unitNormalLoss(z: number): number {
  return normalPdf(z) - z * normalUpper(z);
}

/** Two actions whose costs cross in a straight line at a break-even value of a normal mean. */
export interface LinearDecision {
  /** Cost per unit of the mean beyond the break-even. */
  readonly slope: number;
  readonly breakEven: number;
  readonly mean: number;
  readonly sd: number;
}

/** Value of knowing the mean: slope·sd·L(|mean − breakEven|/sd). */
export function perfectInformationLinear({ slope, breakEven, mean, sd }: LinearDecision): number {
  return slope * sd * unitNormalLoss(Math.abs(mean - breakEven) / sd);
}

/** Value of n tests of standard deviation `error`: the same with the pre-posterior sd, √(sd⁴/(sd² + error²/n)). */
export function testValueLinear(decision: LinearDecision, tests: number, error: number): number {
  if (tests === 0) return 0;
  const { sd } = decision;
  return perfectInformationLinear({ ...decision, sd: (sd * sd) / Math.hypot(sd, error / Math.sqrt(tests)) });
}
