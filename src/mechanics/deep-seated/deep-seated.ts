import type { DeepSeatedGround } from "./ground.ts";
import { defaultGrid, type SearchGrid } from "./mesh.ts";
import { probeOf } from "./probe.ts";
import { type DeepSeatedResult, resultOf } from "./result.ts";
import { searchCircles } from "./search.ts";

export type { DeepSeatedGround } from "./ground.ts";
export { deepSeatedNear, knownPlaces } from "./near.ts";
export type { DeepSeatedResult } from "./result.ts";

/**
 * Deep-seated failure: the smallest factor of safety over all admissible circles, by Bishop's simplified method in the limit of
 * thin slices.
 *
 * @param grid fineness of the search; ten grids agree to 0.5 % (tests/mechanics/deep-seated/search.test.ts)
 */
export function deepSeated(ground: DeepSeatedGround, grid: SearchGrid = defaultGrid): DeepSeatedResult {
  const probe = probeOf(ground);
  return resultOf(ground, probe, searchCircles(probe, grid));
}
