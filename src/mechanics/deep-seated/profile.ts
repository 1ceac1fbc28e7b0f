import { columnAt, frontRun, type WaterLevels, waterLevels, waterLineAt } from "./column.ts";
import { baseWidth, crestOfBack, type DeepSeatedGround, wallHeight } from "./ground.ts";
import { momentTo, weightTo, type Zone, zonesOf } from "./zone.ts";

/**
 * The ground cut by vertical lines into bands in which everything above a circle is a polynomial in x: no change of ground,
 * load, wall or water line inside. With Γ and M of the band's zone, the mass above a point (x, z) is
 *
 *   mass0 + mass1 x − Γ(z),   its moment   moment0 + moment1 x + moment2 x² − M(z),
 *
 * Γ and M saturated where z is below the water line water0 + water1 x. Above that line they are moist, and what the ground
 * below it weighs more is added: lift0 + lift1 x, liftMoment0 + … (both 0 where dry).
 */
export interface Profile {
  readonly bands: number;
  /** bands + 1, ascending. */
  readonly edges: Float64Array;
  readonly zones: readonly Zone[];
  /** bands × 2 or × 3, row-major: coefficients of 1, x, x². */
  readonly mass: Float64Array;
  readonly load: Float64Array;
  readonly moment: Float64Array;
  /** water0 is −∞ where dry. */
  readonly water: Float64Array;
  readonly lift: Float64Array;
  readonly liftMoment: Float64Array;
  readonly lines: readonly { readonly x: number; readonly force: number }[];
  /** Where strips begin and end. */
  readonly loadEdges: readonly number[];
  /** Level of the water in front, whose pressure acts on the end face; −∞ where dry. */
  readonly frontWater: number;
  readonly kh: number;
  readonly kv: number;
}

/** What a profile is made from: functions of x, smooth between the edges. Sloping ground without a wall can be given too. */
export interface ProfileSource {
  readonly edges: readonly number[];
  zoneAt(x: number): Zone;
  columnAt(x: number): { readonly mass: number; readonly moment: number; readonly load: number };
  waterLineAt(x: number): number;
  readonly lines: Profile["lines"];
  readonly loadEdges: readonly number[];
  readonly frontWater: number;
  readonly kh: number;
  readonly kv: number;
}

export function profileOf(source: ProfileSource): Profile {
  const edges = distinct(source.edges);
  const bands = edges.length - 1;
  const make = (terms: number): Float64Array => new Float64Array(bands * terms);
  const [mass, load, water, lift] = [make(2), make(2), make(2), make(2)];
  const [moment, liftMoment] = [make(3), make(3)];
  const zones: Zone[] = [];
  for (let j = 0; j < bands; j++) {
    const [from, to] = [edges[j], edges[j + 1]];
    const middle = 0.5 * (from + to);
    const zone = source.zoneAt(middle);
    zones.push(zone);
    // Three points inside the band determine a polynomial of second degree; nothing is asked on an edge.
    const xs = [from + (to - from) / 6, middle, to - (to - from) / 6];
    const columns = xs.map((x) => source.columnAt(x));
    const of = (key: "mass" | "moment" | "load"): number[] => columns.map((column) => column[key]);
    straight(mass, j, xs, of("mass"));
    straight(load, j, xs, of("load"));
    parabola(moment, j, xs, of("moment"));
    const lines = xs.map((x) => source.waterLineAt(x));
    if (lines[1] === Number.NEGATIVE_INFINITY) {
      water[2 * j] = Number.NEGATIVE_INFINITY;
      continue;
    }
    straight(water, j, xs, lines);
    const above = 1e9;
    const wetter = (of: typeof weightTo): number[] =>
      lines.map((level) => of(zone, level, above) - of(zone, level, Number.NEGATIVE_INFINITY));
    straight(lift, j, xs, wetter(weightTo));
    parabola(liftMoment, j, xs, wetter(momentTo));
  }
  const { lines, loadEdges, frontWater, kh, kv } = source;
  return {
    bands,
    edges: Float64Array.from(edges),
    zones,
    mass,
    load,
    moment,
    water,
    lift,
    liftMoment,
    lines,
    loadEdges,
    frontWater,
    kh,
    kv,
  };
}

/** Ascending, and none closer than rounding to the one before: such a band has no weight. */
function distinct(edges: readonly number[]): readonly number[] {
  const sorted = [...edges].sort((a, b) => a - b);
  const least = 1e-10 * (sorted[sorted.length - 1] - sorted[0]);
  return sorted.filter((x, i) => i === 0 || x - sorted[i - 1] > least);
}

/** Coefficients of the straight line through the outer two of three points. */
function straight(into: Float64Array, band: number, x: readonly number[], y: readonly number[]): void {
  const slope = (y[2] - y[0]) / (x[2] - x[0]);
  into[2 * band] = y[1] - slope * x[1];
  into[2 * band + 1] = slope;
}

/** Coefficients of the parabola through three points evenly apart (Newton's form, multiplied out). */
function parabola(into: Float64Array, band: number, x: readonly number[], y: readonly number[]): void {
  const first = (y[1] - y[0]) / (x[1] - x[0]);
  const second = ((y[2] - y[1]) / (x[2] - x[1]) - first) / (x[2] - x[0]);
  into[3 * band] = y[0] - first * x[0] + second * x[0] * x[1];
  into[3 * band + 1] = first - second * (x[0] + x[1]);
  into[3 * band + 2] = second;
}

/** Bands of a wall between the farthest exit and the farthest entry. */
export function wallProfile(ground: DeepSeatedGround): Profile {
  const zones = zonesOf(ground);
  const levels = waterLevels(ground);
  const width = baseWidth(ground.wall);
  const crest = crestOfBack(ground.wall);
  return profileOf({
    edges: wallEdges(ground, levels),
    zoneAt: (x) => (x < 0 ? zones.front : x > width ? zones.behind : zones.under),
    columnAt: (x) => columnAt(ground, zones, levels, x),
    waterLineAt: (x) => waterLineAt(ground, levels, x),
    lines: ground.loads.lines.map(({ force, at }) => ({ x: crest + at, force })),
    loadEdges: stripEdges(ground),
    frontWater: levels.front,
    kh: ground.earthquake.kh,
    kv: ground.earthquake.kv,
  });
}

function stripEdges(ground: DeepSeatedGround): readonly number[] {
  const crest = crestOfBack(ground.wall);
  return ground.loads.strips.flatMap(({ from, width }) => [crest + from, crest + from + width]);
}

/** Every x at which something changes, between the ends of the search and a little beyond them. */
function wallEdges(ground: DeepSeatedGround, levels: WaterLevels): readonly number[] {
  const { wall, behind, below, front, loads } = ground;
  const [height, width, crest] = [wallHeight(wall), baseWidth(wall), crestOfBack(wall)];
  const [from, to] = [-3.01 * height, width + 4.01 * height];
  const [foot, face] = [wall.toe + wall.footWidth, wall.toe + frontRun(wall)];
  const levelsBehind = [...behind.layers.map(({ bottom }) => bottom ?? Number.NaN), levels.behind];
  const onSlope = (z: number): number => crest + (z - height) / Math.tan(behind.slope);
  const onBack = (z: number): number => foot - ((z - wall.thickness) * wall.backRun) / wall.stemHeight;
  const onFace = (z: number): number => wall.toe + ((z - wall.thickness) * (face - wall.toe)) / wall.stemHeight;
  const { key } = wall;
  const [lineFront, lineBehind] = [
    waterLineAt(ground, levels, 1e-12 * width),
    waterLineAt(ground, levels, width * (1 - 1e-12)),
  ];
  const onLine = (z: number): number => (width * (z - lineFront)) / (lineBehind - lineFront);
  const inside = [
    ...[0, wall.toe, face, crest, foot, width],
    ...(key === undefined ? [] : [key.fromToe, key.fromToe + key.width, onLine(-key.depth)]),
    ...levelsBehind.flatMap((z) => [onSlope(z), onBack(z)]),
    ...[front.level, levels.front].map(onFace),
    ...[0, ...below.map(({ bottom }) => bottom ?? Number.NaN)].map(onLine),
    ...stripEdges(ground),
    ...loads.lines.map(({ at }) => crest + at),
  ];
  return [from, ...inside.filter((x) => x > from && x < to), to];
}
