import { type ExitStretch, exitStretch } from "./circle.ts";
import { leftOut } from "./circle-factor.ts";
import type { CircleLimits } from "./circle-limits.ts";
import { factorAt, type Probe } from "./probe.ts";

/** Fineness of the grid that a search starts from. What it finds must not depend on it; a test holds that to 0.5 %. */
export interface SearchGrid {
  /** Entries behind the heel, denser near it; those at line loads come on top. */
  readonly entries: number;
  /** Exits in front of the toe, denser near it. */
  readonly exits: number;
  /** Depths between any two levels that circles may be tangent to. */
  readonly depths: number;
  /** Valleys of the grid that are followed down. */
  readonly starts: number;
}

export const defaultGrid: SearchGrid = { entries: 16, exits: 11, depths: 4, starts: 8 };

export interface Valley {
  /** Entry, exit, depth, as in CirclePlace. */
  readonly place: ArrayLike<number>;
  readonly factor: number;
}

/** Deepest first; of two that are all but the same place the deeper one. */
export function distinctValleys(valleys: readonly Valley[]): readonly Valley[] {
  const apart = [0.1, 0.15, 0.3];
  const kept: Valley[] = [];
  for (const valley of [...valleys].sort((one, other) => one.factor - other.factor))
    if (!kept.some(({ place }) => apart.every((least, i) => Math.abs(place[i] - valley.place[i]) < least)))
      kept.push(valley);
  return kept;
}

/** A node of a mesh, as a valley to start from. */
export interface Node extends Valley {
  /** Its index. */
  readonly at: number;
}

/** Factors on nodes of entry × exit × depth, row-major. */
export interface Mesh {
  readonly counts: readonly [number, number, number];
  readonly factors: Float64Array;
  readonly places: Float64Array;
  /** Planes to be searched on their own: all nodes whose index along the axis is this one. */
  readonly planes: readonly { readonly axis: number; readonly index: number }[];
}

/** Entries behind the heel at these x, in heights; what lies elsewhere is left out. */
function entriesAt({ limits }: Probe, xs: readonly number[]): readonly number[] {
  const far = (limits.farthestEntry - limits.heelX) / limits.height;
  return xs.map((x) => (x - limits.heelX) / limits.height).filter((entry) => entry > 0 && entry < far);
}

/** Entries at line loads, where the factor jumps. */
export function lineEntries(probe: Probe): readonly number[] {
  return entriesAt(
    probe,
    probe.profile.lines.map(({ x }) => x),
  );
}

/** Exits for an entry, denser near the toe; where there is a face under the toe, the first three are on it, the third at its foot. NaN: none there. */
function exitNodes(limits: CircleLimits, entry: number, count: number): readonly number[] {
  const entryX = limits.heelX + entry * limits.height;
  const stretch: ExitStretch = { from: 0, to: 0 };
  const even = (n: number, power: number, part: "face" | "ground"): number[] => {
    const open = exitStretch(limits, entryX, part, stretch);
    return Array.from({ length: n }, (_, i) =>
      open ? (stretch.from + (stretch.to - stretch.from) * (i / (n - 1)) ** power) / limits.height : Number.NaN,
    );
  };
  return [...(limits.exitLevel < 0 ? even(3, 1, "face") : []), ...even(count, 1.5, "ground")];
}

/** Depths from touching the base down to the last level, none twice, and which of them are whole numbers. */
function depthNodesOf(levels: Float64Array, depths: number): { nodes: readonly number[]; whole: readonly number[] } {
  const nodes = [0];
  const whole = [0];
  let above = 0;
  levels.forEach((level, i) => {
    if (!(level < above)) return;
    above = level;
    for (let k = 1; k <= depths; k++) nodes.push(i + k / depths);
    whole.push(nodes.length - 1);
  });
  return { nodes, whole };
}

export function layMesh(probe: Probe, grid: SearchGrid): Mesh {
  const { limits } = probe;
  const even = Array.from({ length: grid.entries }, (_, i) => 4 * ((i + 1) / grid.entries) ** 1.5);
  const special = [...lineEntries(probe), ...entriesAt(probe, probe.profile.loadEdges)];
  const entries = [...even, ...special].sort((a, b) => a - b);
  const face = limits.exitLevel < 0;
  const exits = grid.exits + (face ? 3 : 0);
  const { nodes: depthNodes, whole } = depthNodesOf(limits.levels, grid.depths);
  const depths = depthNodes.length;
  const count = entries.length * exits * depths;
  const factors = new Float64Array(count).fill(leftOut);
  const places = new Float64Array(3 * count);
  let at = 0;
  for (const entry of entries)
    for (const exit of exitNodes(limits, entry, grid.exits))
      for (const depth of depthNodes) {
        places.set([entry, exit, depth], 3 * at);
        if (!Number.isNaN(exit)) factors[at] = factorAt(probe, places.subarray(3 * at, 3 * at + 3));
        at++;
      }
  const planes = [
    ...[...special, 4].map((entry) => ({ axis: 0, index: entries.indexOf(entry) })),
    ...(face ? [{ axis: 1, index: 2 }] : []),
    ...whole.map((index) => ({ axis: 2, index })),
  ];
  return { counts: [entries.length, exits, depths], factors, places, planes };
}

/** Nodes that no neighbour lies below, best first; on a plane, no neighbour in that plane. */
export function valleysOf(mesh: Mesh, axis = -1, index = 0): readonly Node[] {
  const { counts, factors, places } = mesh;
  const found: Node[] = [];
  const from = (along: number): number => (along === axis ? index : 0);
  const to = (along: number): number => (along === axis ? index + 1 : counts[along]);
  for (let i = from(0); i < to(0); i++)
    for (let k = from(1); k < to(1); k++)
      for (let d = from(2); d < to(2); d++) {
        const at = (i * counts[1] + k) * counts[2] + d;
        if (factors[at] < leftOut && isValley(mesh, i, k, d, axis))
          found.push({ at, place: places.slice(3 * at, 3 * at + 3), factor: factors[at] });
      }
  return found.sort((a, b) => a.factor - b.factor);
}

function isValley({ counts, factors }: Mesh, i: number, k: number, d: number, axis: number): boolean {
  const own = (i * counts[1] + k) * counts[2] + d;
  const reach = (along: number): number => (along === axis ? 0 : 1);
  for (let ni = Math.max(i - reach(0), 0); ni <= Math.min(i + reach(0), counts[0] - 1); ni++)
    for (let nk = Math.max(k - reach(1), 0); nk <= Math.min(k + reach(1), counts[1] - 1); nk++)
      for (let nd = Math.max(d - reach(2), 0); nd <= Math.min(d + reach(2), counts[2] - 1); nd++) {
        const other = (ni * counts[1] + nk) * counts[2] + nd;
        // of equals the first stands for all
        if (factors[other] < factors[own] || (factors[other] === factors[own] && other < own)) return false;
      }
  return true;
}

/** The lowest nodes that lie at least three apart from one another in some direction: starts that the mesh is too coarse to show as valleys. */
export function lowNodes({ counts, factors, places }: Mesh, most: number): readonly Node[] {
  const order = Array.from(factors.keys())
    .filter((at) => factors[at] < leftOut)
    .sort((one, other) => factors[one] - factors[other]);
  const kept: (readonly [number, number, number, number])[] = [];
  for (const at of order) {
    if (kept.length === most) break;
    const [d, k, i] = [at % counts[2], Math.floor(at / counts[2]) % counts[1], Math.floor(at / counts[2] / counts[1])];
    if (kept.every(([, a, b, c]) => Math.abs(a - i) > 2 || Math.abs(b - k) > 2 || Math.abs(c - d) > 2))
      kept.push([at, i, k, d]);
  }
  return kept.map(([at]) => ({ at, place: places.slice(3 * at, 3 * at + 3), factor: factors[at] }));
}
