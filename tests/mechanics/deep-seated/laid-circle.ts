import { type Arc, layArc, makeArc } from "../../../src/mechanics/deep-seated/arc.ts";
import { circleAt, type SlipCircle } from "../../../src/mechanics/deep-seated/circle.ts";
import { circleLimits } from "../../../src/mechanics/deep-seated/circle-limits.ts";
import type { DeepSeatedGround } from "../../../src/mechanics/deep-seated/ground.ts";
import { wallProfile } from "../../../src/mechanics/deep-seated/profile.ts";

export interface LaidCircle {
  readonly arc: Arc;
  readonly circle: SlipCircle;
}

export const blankCircle = (): SlipCircle => ({ x: 0, z: 0, radius: 0, entryX: 0, entryZ: 0, exitX: 0, exitZ: 0 });

/** The circle at a place laid through a ground; undefined where there is none. */
export function laid(ground: DeepSeatedGround, place: readonly number[]): LaidCircle | undefined {
  const circle = blankCircle();
  if (!circleAt(circleLimits(ground), place, circle)) return undefined;
  const profile = wallProfile(ground);
  const arc = makeArc(profile);
  layArc(profile, circle, arc);
  return { arc, circle };
}

/** The same where a test knows that there is one. */
export function layCircle(ground: DeepSeatedGround, place: readonly number[]): LaidCircle {
  const found = laid(ground, place);
  if (found === undefined) throw new RangeError("no circle there");
  return found;
}
