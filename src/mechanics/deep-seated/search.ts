import { circleAt } from "./circle.ts";
import { distinctValleys, layMesh, lowNodes, type SearchGrid, type Valley, valleysOf } from "./mesh.ts";
import { descend } from "./nelder-mead.ts";
import { factorAt, type Probe } from "./probe.ts";

/**
 * The smallest factor over all admissible circles. A mesh over entry, exit and depth is laid; its valleys are followed down.
 * The factor bends or jumps on certain planes of that space (a load begins or ends at the entry, the circle is tangent to a
 * layer, touches the base, leaves at the foot of the face under the toe), and is often smallest on one: so the valleys of each
 * plane are followed down on it too.
 *
 * @returns the valleys, the deepest first; empty where there is no circle, or none that is not left out
 */
export function searchCircles(probe: Probe, grid: SearchGrid): readonly Valley[] {
  const mesh = layMesh(probe, grid);
  const inSpace = valleysOf(mesh);
  if (inSpace.length === 0) return [];
  const steps = [1.5 / grid.entries, 1.5 / grid.exits, 0.5 / grid.depths];
  const finer = steps.map((step) => 0.3 * step);
  const worthwhile = (start: Valley): boolean => start.factor <= 1.3 * inSpace[0].factor;
  const low = lowNodes(mesh, grid.starts).filter(({ at }) => !inSpace.some((valley) => valley.at === at));
  const found = [...inSpace.slice(0, grid.starts), ...low]
    .filter(worthwhile)
    .map((start) => roughlyDown(probe, start, steps));
  for (const { axis, index } of mesh.planes) {
    const onPlane = steps.map((step, i) => (i === axis ? 0 : step));
    const starts = valleysOf(mesh, axis, index).filter(worthwhile).slice(0, 2);
    found.push(...starts.map((start) => roughlyDown(probe, start, onPlane)));
  }
  const deepest = distinctValleys(found).slice(0, 5);
  const beside = deepest.flatMap((valley) => besideLevels(probe, valley));
  const ends = [
    ...deepest.map((valley) => followDown(probe, valley, finer)),
    ...beside.map((start) => followDown(probe, start, [finer[0], finer[1], 0])),
  ];
  const valleys = distinctValleys([...ends, ...found]);
  return distinctValleys([followDown(probe, valleys[0], finer), ...valleys.slice(1)]);
}

/** One short descent: enough to tell which valleys are worth more. */
function roughlyDown(probe: Probe, start: Valley, steps: readonly number[]): Valley {
  const end = descend((place) => factorAt(probe, place), start.place, steps, 1e-4, 80);
  return { place: withinLimits(probe, end.x), factor: end.value };
}

/** The circles of a valley's entry and exit that are tangent to the levels above and below it: the factor has a cusp there. */
function besideLevels(probe: Probe, { place }: Valley): readonly Valley[] {
  return [Math.floor(place[2]), Math.ceil(place[2])].map((depth) => {
    const tangent = [place[0], place[1], depth];
    return { place: tangent, factor: factorAt(probe, tangent) };
  });
}

/** Descends until starting anew gains less than 1 in 100 000. */
export function followDown(probe: Probe, start: Valley, steps: readonly number[]): Valley {
  const f = (place: Float64Array): number => factorAt(probe, place);
  let found = start;
  for (let round = 0; round < 6; round++) {
    const scale = (round % 2 === 0 ? 1 : -1) * 0.5 ** Math.min(round, 3);
    const next = descend(
      f,
      found.place,
      steps.map((step) => step * scale),
      1e-7,
      150,
    );
    const gain = found.factor - next.value;
    if (next.value < found.factor) found = { place: withinLimits(probe, next.x), factor: next.value };
    if (round > 0 && !(gain > 1e-5 * found.factor)) break;
  }
  return found;
}

/** The same circle, its place given by numbers inside the limits. */
function withinLimits(probe: Probe, place: ArrayLike<number>): Float64Array {
  const { limits, circle } = probe;
  circleAt(limits, place, circle);
  const down = Math.max(-circle.exitZ, 0);
  return Float64Array.of(
    (circle.entryX - limits.heelX) / limits.height,
    (down - circle.exitX) / limits.height,
    Math.min(Math.max(place[2], 0), limits.levels.length),
  );
}
