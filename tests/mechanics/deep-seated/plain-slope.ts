import { type Arc, layArc, makeArc } from "../../../src/mechanics/deep-seated/arc.ts";
import type { SlipCircle } from "../../../src/mechanics/deep-seated/circle.ts";
import { circleFactor } from "../../../src/mechanics/deep-seated/circle-factor.ts";
import type { DeepSeatedLayer } from "../../../src/mechanics/deep-seated/ground.ts";
import { descend } from "../../../src/mechanics/deep-seated/nelder-mead.ts";
import { type Profile, profileOf } from "../../../src/mechanics/deep-seated/profile.ts";
import { momentTo, weightTo, zoneOf } from "../../../src/mechanics/deep-seated/zone.ts";

/** A slope without a wall, level in front of its toe (0, 0) and behind its crest (run, height); dry, in horizontal layers. */
export interface PlainSlope {
  readonly height: number;
  /** Horizontal length of the slope; 0 for a vertical cut. */
  readonly run: number;
  readonly layers: readonly DeepSeatedLayer[];
}

const far = 1000;

export function slopeProfile({ height, run, layers }: PlainSlope): Profile {
  const zone = zoneOf(layers);
  const surface = (x: number): number => (x <= 0 ? 0 : x >= run ? height : (height * x) / run);
  const bottoms = layers.flatMap(({ bottom }) => (bottom === undefined ? [] : [(run * bottom) / height]));
  return profileOf({
    edges: [-far, 0, run, far, ...bottoms.filter((x) => x > 0 && x < run)],
    zoneAt: () => zone,
    columnAt: (x) => ({
      mass: weightTo(zone, surface(x), Number.NEGATIVE_INFINITY),
      moment: momentTo(zone, surface(x), Number.NEGATIVE_INFINITY),
      load: 0,
    }),
    waterLineAt: () => Number.NEGATIVE_INFINITY,
    lines: [],
    loadEdges: [],
    frontWater: Number.NEGATIVE_INFINITY,
    kh: 0,
    kv: 0,
  });
}

/** The circle of a centre and a radius where it cuts the slope off: leaves in front of the toe, else on the slope; undefined where it does not. */
export function circleOnSlope(
  { height, run }: PlainSlope,
  x: number,
  z: number,
  radius: number,
): SlipCircle | undefined {
  const half = (level: number): number => Math.sqrt(radius * radius - (z - level) ** 2);
  const entryX = x + half(height);
  if (!(entryX >= run) || z < height) return undefined;
  const entry = { x, z, radius, entryX, entryZ: height };
  const atToe = half(0);
  if (x - atToe <= 0 && x + atToe > 0) return { ...entry, exitX: x - atToe, exitZ: 0 };
  if (run === 0) {
    const exitZ = z - Math.sqrt(radius * radius - x * x);
    return exitZ >= 0 && exitZ < height ? { ...entry, exitX: 0, exitZ } : undefined;
  }
  // the line through toe and crest meets the circle twice; the arc lies between the lower meeting and the crest's level
  const slope = height / run;
  const [a, b, c] = [1 + slope * slope, -(x + slope * z), x * x + z * z - radius * radius];
  const root = b * b - a * c;
  const exitX = (-b - Math.sqrt(root)) / a;
  return exitX >= 0 && exitX < run ? { ...entry, exitX, exitZ: slope * exitX } : undefined;
}

export function slopeFactor(profile: Profile, arc: Arc, circle: SlipCircle | undefined): number {
  if (circle === undefined) return Number.POSITIVE_INFINITY;
  layArc(profile, circle, arc);
  return circleFactor(arc, 1.5);
}

/** Smallest factor over circles no deeper than `lowest` (below the toe, or at it), from a mesh of centres and depths. */
export function smallestOnSlope(slope: PlainSlope, lowest: number): { factor: number; circle: SlipCircle } {
  const profile = slopeProfile(slope);
  const arc = makeArc(profile);
  const { height, run } = slope;
  const circleOf = (at: ArrayLike<number>): SlipCircle | undefined =>
    circleOnSlope(slope, at[0], at[1], at[1] - Math.max(at[2], lowest));
  const f = (at: ArrayLike<number>): number => slopeFactor(profile, arc, circleOf(at));
  const nodes: number[][] = [];
  for (let i = 0; i <= 12; i++)
    for (let k = 0; k <= 12; k++)
      for (let d = 0; d <= 6; d++)
        nodes.push([run * 1.2 - (height + run) * (i / 12) * 1.4, height * (1 + (k / 6) ** 2), lowest * (d / 6)]);
  const starts = nodes
    .map((at) => ({ at, value: f(at) }))
    .sort((one, other) => one.value - other.value)
    .slice(0, 8);
  let best = { x: Float64Array.from(starts[0].at), value: starts[0].value };
  for (const { at } of starts) {
    let found = descend(f, at, [height / 8, height / 8, height / 8], 1e-9, 400);
    for (let round = 0; round < 4; round++)
      found = descend(f, found.x, [-height / 20, height / 20, height / 20], 1e-9, 400);
    if (found.value < best.value) best = { x: Float64Array.from(found.x), value: found.value };
  }
  return { factor: best.value, circle: circleOf(best.x) as SlipCircle };
}
