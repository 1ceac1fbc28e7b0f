import { factorCap } from "../kernel.ts";
import type { CirclePlace } from "./circle.ts";
import { leftOut } from "./circle-factor.ts";
import type { DeepSeatedGround } from "./ground.ts";
import { defaultGrid, distinctValleys, lineEntries, type Valley } from "./mesh.ts";
import { descend } from "./nelder-mead.ts";
import { factorAt, factorBelow, probeOf } from "./probe.ts";
import { type DeepSeatedResult, resultOf } from "./result.ts";
import { searchCircles } from "./search.ts";

/**
 * The same from circles known beforehand (the valleys at the means, at design points, of a few samples) and their neighbours,
 * for sampling. Where none of them is allowed in this ground it searches in full.
 *
 * Its error, on the unsafe side but for that of a full search, over random walls with spreads as they are found in soil:
 * see tests/mechanics/deep-seated/near.test.ts.
 *
 * @param places of at least one circle; more make the error smaller
 */
export function deepSeatedNear(ground: DeepSeatedGround, places: readonly CirclePlace[]): DeepSeatedResult {
  const probe = probeOf(ground);
  const lines = lineEntries(probe);
  const known: Valley[] = [];
  let bound = factorCap;
  const look = (place: readonly number[]): void => {
    const factor = factorBelow(probe, place, 1.15 * bound);
    if (factor === leftOut) return;
    bound = Math.min(bound, factor);
    known.push({ place, factor });
  };
  for (const { entry, exit, depth } of places) {
    look([entry, exit, depth]);
    for (const line of lines) if (Math.abs(line - entry) < 0.25) look([line, exit, depth]);
  }
  if (known.length === 0) return resultOf(ground, probe, searchCircles(probe, defaultGrid));
  const starts = distinctValleys(known).slice(0, nearStarts);
  const ends = starts.map(({ place }): Valley => {
    const end = descend((at) => factorAt(probe, at), place, nearSteps, 1e-5, nearCircles);
    return { place: end.x, factor: end.value };
  });
  return resultOf(ground, probe, distinctValleys([...ends, ...known]));
}

/** Known circles whose neighbours are tried, the first steps to them (entry, exit, depth), and how many are tried from each. */
const nearStarts = 3;
const nearSteps = [0.08, 0.12, 0.2];
const nearCircles = 30;

/** Valleys of several grounds together, for deepSeatedNear: of the means, design points and some samples. */
export function knownPlaces(grounds: readonly DeepSeatedGround[]): readonly CirclePlace[] {
  const valleys = grounds.flatMap((ground) => searchCircles(probeOf(ground), defaultGrid));
  return distinctValleys(valleys).map(({ place }) => ({ entry: place[0], exit: place[1], depth: place[2] }));
}
