import { type Arc, layArc, makeArc } from "./arc.ts";
import { resistingMoment } from "./bishop.ts";
import { circleAt, type SlipCircle } from "./circle.ts";
import { circleFactor, leftOut, liesAbove } from "./circle-factor.ts";
import { type CircleLimits, circleLimits } from "./circle-limits.ts";
import type { DeepSeatedGround } from "./ground.ts";
import { type Profile, wallProfile } from "./profile.ts";

/** One ground made ready, with the buffers and the count of circles tried. */
export interface Probe {
  readonly profile: Profile;
  readonly limits: CircleLimits;
  readonly arc: Arc;
  readonly circle: SlipCircle;
  evaluations: number;
  /** The last factor found: where the next begins. */
  last: number;
}

export function probeOf(ground: DeepSeatedGround): Probe {
  const profile = wallProfile(ground);
  return {
    profile,
    limits: circleLimits(ground),
    arc: makeArc(profile),
    circle: { x: 0, z: 0, radius: 0, entryX: 0, entryZ: 0, exitX: 0, exitZ: 0 },
    evaluations: 0,
    last: 1,
  };
}

/** Factor of safety of the circle at a place (entry, exit, depth: see CirclePlace); infinity where there is none or it is left out. */
export function factorAt(probe: Probe, place: ArrayLike<number>): number {
  if (!circleAt(probe.limits, place, probe.circle)) return leftOut;
  layArc(probe.profile, probe.circle, probe.arc);
  probe.evaluations++;
  const factor = circleFactor(probe.arc, probe.last);
  if (factor > 0 && factor < leftOut) probe.last = factor;
  return factor;
}

/** The same, but any number above `bound` where the factor lies above it: what saves most of the work. */
export function factorBelow(probe: Probe, place: ArrayLike<number>, bound: number): number {
  if (!circleAt(probe.limits, place, probe.circle)) return leftOut;
  layArc(probe.profile, probe.circle, probe.arc);
  probe.evaluations++;
  return liesAbove(probe.arc, bound) ? leftOut : circleFactor(probe.arc, probe.last);
}

/** Moments of the circle at a place at its factor. */
export function momentsAt(
  probe: Probe,
  place: ArrayLike<number>,
  factor: number,
): { resisting: number; driving: number } {
  circleAt(probe.limits, place, probe.circle);
  layArc(probe.profile, probe.circle, probe.arc);
  return { resisting: resistingMoment(probe.arc, Math.max(factor, 1e-6)), driving: probe.arc.driving };
}
