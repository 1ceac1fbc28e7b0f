/** The coordinates that all walls of a decision share: the study's own variables, and what stands in for some of them. */
import type { CoordinateRole } from "./decision/decision-problem.ts";
import { type OwnVariables, type StandIn, uncertainPaths, type WallCase } from "./decision-cases.ts";
import { jointSpace } from "./probability/joint-space.ts";
import type { Coordinate, JointSpace } from "./probability/marginal.ts";
import { marginalOf } from "./probability/marginal-of.ts";
import type { Notice, Study } from "./study/study.ts";

export interface DecisionSpace extends JointSpace {
  readonly roles: readonly CoordinateRole[];
  readonly notices: readonly Notice[];
  /** Name of a path's unknown in a wall: its own, a stand-in, or its own with the years of an event. */
  nameIn(wall: WallCase, path: string): string;
}

/**
 * Own variables that any wall, any evidence or any investigation asks for, then stand-ins on coordinates of their own, then,
 * for every event survived, the own variables once more with yearly coordinates of that event: past years are not next year.
 *
 * @throws StudyError where correlations or shares of knowledge have no joint distribution
 */
export function decisionSpace(study: Study, own: OwnVariables, walls: readonly WallCase[]): DecisionSpace {
  const base = ownSpace(study, own, walls);
  let space: GrowingSpace = {
    ...base,
    roles: base.coordinates.map(({ part, yearly }): CoordinateRole => (yearly ? "yearly" : part)),
  };
  for (const { standIns, event } of walls)
    for (const standIn of standIns.values()) space = withStandIn(space, standIn, event !== undefined);
  const shared = space;
  const ownCount = base.unknowns.length;
  for (const { event } of walls) if (event !== undefined) space = withFreshYears(space, shared, ownCount, event);
  return {
    ...space,
    notices: base.notices,
    nameIn({ standIns, event }, path) {
      const standIn = standIns.get(path);
      if (standIn !== undefined) return standIn.name;
      return event === undefined ? path : freshName(path, event);
    },
  };
}

type GrowingSpace = JointSpace & { readonly roles: readonly CoordinateRole[] };

function ownSpace(study: Study, own: OwnVariables, walls: readonly WallCase[]) {
  const wanted = new Set([
    ...walls.flatMap((wall) => uncertainPaths(wall).filter((path) => !wall.standIns.has(path))),
    ...study.evidence.flatMap((entry) => (entry.kind === "results" ? [entry.of] : [])),
    ...(study.decision?.investigations ?? []).flatMap(({ informs }) => informs.map(({ path }) => path)),
  ]);
  const unknowns = [...own].flatMap(([path, { distribution, knowledge, yearly }]) =>
    wanted.has(path) ? [{ path, marginal: marginalOf(distribution), knowledge, yearly }] : [],
  );
  const correlations = study.correlations.filter(({ between }) => between.every((path) => wanted.has(path)));
  return jointSpace(unknowns, correlations, true);
}

/** One more variable: the part that is the same in every year, and the part that is drawn anew. */
function withStandIn(space: GrowingSpace, { name, quantity }: StandIn, past: boolean): GrowingSpace {
  if (space.unknowns.some(({ path }) => path === name)) return space;
  const lasting = quantity.yearly && !past ? (quantity.knowledge ?? 0) : 1;
  const parts: readonly (Coordinate & { readonly weight: number })[] = [
    { key: name, part: "nature", yearly: false, weight: Math.sqrt(lasting) },
    { key: lasting > 0 ? `${name}/nature` : name, part: "nature", yearly: true, weight: Math.sqrt(1 - lasting) },
  ];
  const kept = parts.filter(({ weight }) => weight > 0);
  const before = space.coordinates.length;
  const row = new Float64Array(before + kept.length);
  kept.forEach(({ weight }, k) => {
    row[before + k] = weight;
  });
  const unknown = { path: name, marginal: marginalOf(quantity.distribution), knowledge: 0, yearly: quantity.yearly };
  return {
    unknowns: [...space.unknowns, unknown],
    coordinates: [...space.coordinates, ...kept.map(({ weight: _, ...coordinate }) => coordinate)],
    rows: [...space.rows.map((old) => widened(old, row.length)), row],
    roles: [...space.roles, ...kept.map(({ yearly }): CoordinateRole => (yearly ? "yearly" : "nature"))],
  };
}

function withFreshYears(space: GrowingSpace, shared: GrowingSpace, ownCount: number, event: number): GrowingSpace {
  const yearly = shared.roles.map((_, j) => j).filter((j) => shared.roles[j] === "yearly");
  const start = space.coordinates.length;
  const coordinates = [
    ...space.coordinates,
    ...yearly.map(
      (j): Coordinate => ({ key: freshName(shared.coordinates[j].key, event), part: "nature", yearly: false }),
    ),
  ];
  const fresh = shared.rows.slice(0, ownCount).map((old) => {
    const row = widened(old, coordinates.length);
    yearly.forEach((j, y) => {
      row[start + y] = row[j];
      row[j] = 0;
    });
    return row;
  });
  const renamed = shared.unknowns.slice(0, ownCount).map((one) => ({ ...one, path: freshName(one.path, event) }));
  return {
    unknowns: [...space.unknowns, ...renamed],
    coordinates,
    rows: [...space.rows.map((row) => widened(row, coordinates.length)), ...fresh],
    roles: [...space.roles, ...yearly.map((): CoordinateRole => "nature")],
  };
}

function freshName(name: string, event: number): string {
  return `${name}, in evidence.${event}`;
}

function widened(row: Float64Array, length: number): Float64Array {
  const wide = new Float64Array(length);
  wide.set(row);
  return wide;
}
