import { gammaQuantile, gammaUpper } from "../numeric/incomplete-gamma.ts";
import { fillNormals, streamBlock } from "../probability/streams.ts";
import { evaluationsOf } from "./design-points.ts";
import type { LimitStates } from "./limit-states.ts";
import { logarithmicInterval, type SamplingEstimate, type SamplingOrder } from "./sampling-estimate.ts";
import { createLeastFactor } from "./subset-simulation.ts";

const pilotDirections = 400;
const margin = 1.25;
/** Radii looked at along each ray, and halvings of each piece where failure begins or ends. */
const radii = 24;
const halvings = 14;
/** Probability beyond the last radius, which is left out. */
const beyond = 1e-13;

/**
 * Directional sampling: random rays from the origin, the probability of failing along each one by the chi-square distribution of
 * the squared radius.
 *
 *   p = E[ Σ over failing pieces (r₁, r₂) of Q(d/2, r₁²/2) − Q(d/2, r₂²/2) ]
 *
 * Pieces are found on 24 radii and closed in by bisection; one that begins and ends between two radii is missed. A pilot of 400
 * rays sizes the run. Needs many rays where there are many unknowns.
 *
 * @source O. Ditlevsen, P. Bjerager, R. Olesen and A. M. Hasofer (1988), Directional simulation in Gaussian processes,
 *   Probabilistic Eng. Mech. 3, 207–217
 */
export function directionalSampling(states: LimitStates, order: SamplingOrder): SamplingEstimate {
  const before = evaluationsOf(states);
  const along = createRays(states, order.seed);
  const pilot = along("directional sampling, pilot", pilotDirections);
  const spent = (): number => evaluationsOf(states) - before;
  const perRay = spent() / pilotDirections;
  const spread = pilot.probability > 0 ? pilot.standardError / pilot.probability : Number.POSITIVE_INFINITY;
  const most = Math.max(pilotDirections, Math.floor((order.samples - spent()) / perRay));
  const wanted =
    order.precision > 0 && Number.isFinite(spread)
      ? Math.ceil(margin * pilotDirections * (spread / order.precision) ** 2)
      : most;
  const { probability, standardError, hits } = along(
    "directional sampling",
    Math.min(Math.max(wanted, pilotDirections), most),
  );
  return {
    method: "directional",
    probability,
    standardError,
    interval: logarithmicInterval(probability, standardError),
    intervalKind: "95 %, normal on the logarithm",
    evaluations: spent(),
    doubts: hits < 30 ? [`only ${hits} rays met failure`] : [],
  };
}

interface Rays {
  readonly probability: number;
  readonly standardError: number;
  /** Rays that meet failure. */
  readonly hits: number;
}

function createRays(states: LimitStates, seed: string): (purpose: string, count: number) => Rays {
  const { dimension, capacity, keys } = states;
  const least = createLeastFactor(states);
  // radii at equal steps between those within which next to nothing, and beyond which next to nothing, lies
  const first = Math.sqrt(2 * gammaQuantile(dimension / 2, 1e-4, false));
  const last = Math.sqrt(2 * gammaQuantile(dimension / 2, beyond, true));
  const grid = [0, ...Array.from({ length: radii - 1 }, (_, k) => first + ((last - first) * k) / (radii - 2))];
  const outside = (radius: number): number => gammaUpper(dimension / 2, (radius * radius) / 2);
  const batch = Math.max(1, Math.floor(capacity / radii));
  const direction = keys.map(() => new Float64Array(streamBlock));
  const z = keys.map(() => new Float64Array(Math.max(capacity, batch * radii)));
  const factor = new Float64Array(z[0].length);
  const at = (ray: number, radius: number, into: number): void => {
    for (let j = 0; j < dimension; j++) z[j][into] = direction[j][ray] * radius;
  };
  return (purpose, count) => {
    let [sum, squares, hits] = [0, 0, 0];
    for (let start = 0; start < count; start += streamBlock) {
      const inBlock = Math.min(streamBlock, count - start);
      for (let j = 0; j < dimension; j++)
        fillNormals(seed, purpose, keys[j], start / streamBlock, direction[j], inBlock);
      for (let i = 0; i < inBlock; i++) {
        let length = 0;
        for (let j = 0; j < dimension; j++) length += direction[j][i] ** 2;
        for (let j = 0; j < dimension; j++) direction[j][i] /= Math.sqrt(length);
      }
      for (let from = 0; from < inBlock; from += batch) {
        const rays = Math.min(batch, inBlock - from);
        for (let r = 0; r < rays; r++) for (let k = 0; k < radii; k++) at(from + r, grid[k], r * radii + k);
        least(z, rays * radii, factor);
        const failing = new Float64Array(rays);
        const edges: { ray: number; safe: number; failed: number }[] = [];
        for (let r = 0; r < rays; r++) {
          let before = factor[r * radii] < 1;
          if (before) failing[r] += 1;
          for (let k = 1; k < radii; k++) {
            const now = factor[r * radii + k] < 1;
            if (now !== before)
              edges.push(
                now ? { ray: r, safe: grid[k - 1], failed: grid[k] } : { ray: r, safe: grid[k], failed: grid[k - 1] },
              );
            before = now;
          }
        }
        closeIn(edges, from);
        for (const { ray, safe, failed } of edges) {
          const edge = 0.5 * (safe + failed);
          failing[ray] += failed > safe ? outside(edge) : -outside(edge);
        }
        for (let r = 0; r < rays; r++) {
          const p = Math.max(0, failing[r]);
          if (p > 0) hits++;
          sum += p;
          squares += p * p;
        }
      }
    }
    const probability = sum / count;
    const variance = Math.max(0, squares / count - probability * probability);
    return { probability, standardError: Math.sqrt(variance / (count - 1)), hits };
  };

  function closeIn(edges: { ray: number; safe: number; failed: number }[], from: number): void {
    for (let round = 0; round < halvings; round++)
      for (let start = 0; start < edges.length; start += capacity) {
        const part = edges.slice(start, start + capacity);
        part.forEach(({ ray, safe, failed }, i) => {
          at(from + ray, 0.5 * (safe + failed), i);
        });
        least(z, part.length, factor);
        part.forEach((edge, i) => {
          const middle = 0.5 * (edge.safe + edge.failed);
          if (factor[i] < 1) edge.failed = middle;
          else edge.safe = middle;
        });
      }
  }
}
