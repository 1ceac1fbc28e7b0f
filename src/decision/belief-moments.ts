import type { BeliefSample } from "./belief-sample.ts";
import { applyForm, type BeliefVariable, formSd } from "./decision-problem.ts";

export interface Moments {
  readonly mean: number;
  readonly sd: number;
}

/** Mean and standard deviation of X itself, nature included, where z is standard normal. Exact where X is normal. */
export function normalMoments({ marginal, image }: BeliefVariable): Moments {
  const size = formSd(image);
  if (image.offset === 0 && Math.abs(size - 1) < 1e-12) return { mean: marginal.mean, sd: marginal.sd };
  if (marginal.kind === "normal") return { mean: marginal.mean + marginal.sd * image.offset, sd: marginal.sd * size };
  // trapezoidal rule under a normal weight, from −8 to 8; the shift by the mean keeps the digits of the variance
  let [weights, first, second] = [0, 0, 0];
  for (let i = -400; i <= 400; i++) {
    const v = i / 50;
    const weight = Math.exp(-0.5 * v * v);
    const off = marginal.quantileOfNormal(image.offset + size * v) - marginal.mean;
    weights += weight;
    first += weight * off;
    second += weight * off * off;
  }
  const mean = first / weights;
  return { mean: marginal.mean + mean, sd: Math.sqrt(Math.max(second / weights - mean * mean, 0)) };
}

/** The same from weighted samples, where the evidence leaves something to weigh. */
export function sampledMoments({ marginal, image }: BeliefVariable, beliefs: BeliefSample): Moments {
  const u = new Float64Array(beliefs.count);
  applyForm(image, beliefs.z, beliefs.count, u);
  let [weights, first, second] = [0, 0, 0];
  for (let j = 0; j < beliefs.count; j++) {
    const weight = beliefs.weight[j];
    const off = marginal.quantileOfNormal(u[j]) - marginal.mean;
    weights += weight;
    first += weight * off;
    second += weight * off * off;
  }
  const mean = first / weights;
  return { mean: marginal.mean + mean, sd: Math.sqrt(Math.max(second / weights - mean * mean, 0)) };
}
