import type { SlipCircle } from "../../../src/mechanics/deep-seated/circle.ts";
import type { DeepSeatedGround, DeepSeatedLayer, DeepSeatedSoil } from "../../../src/mechanics/deep-seated/ground.ts";

/*
 * Bishop's simplified method by plain slices, written straight from the words of the method and on purpose not from the
 * source: every slice asks, level by level, what stands there. Slow.
 */

interface Stuff {
  /** kN/m³ */
  readonly weight: number;
  readonly inertia: boolean;
  readonly soil?: DeepSeatedSoil;
}

const gammaWater = 9.81;

function layerOf(layers: readonly DeepSeatedLayer[], z: number): DeepSeatedSoil {
  for (const layer of layers) if (layer.bottom === undefined || z > layer.bottom) return layer.soil;
  return layers[layers.length - 1].soil;
}

/** Soil behind the virtual back or over the heel at a level. */
function soilBehind(g: DeepSeatedGround, z: number): DeepSeatedSoil {
  const { layers } = g.behind;
  const topOfLast = Math.min(Number.POSITIVE_INFINITY, ...layers.slice(0, -1).map((layer) => layer.bottom as number));
  if (z < 0 && topOfLast >= 0) return layerOf(g.below, z);
  for (const layer of layers) if (layer.bottom === undefined || z > layer.bottom) return layer.soil;
  throw new RangeError(`no layer at ${z}`);
}

interface Shape {
  B: number;
  top: number;
  crest: number;
  foot: number;
  face: number;
  zv: number;
  waterBehind: number | undefined;
  waterFront: number | undefined;
}

function shapeOf(g: DeepSeatedGround): Shape {
  const w = g.wall;
  const B = w.toe + w.footWidth + w.heel;
  const foot = w.toe + w.footWidth;
  const crest = foot - w.backRun;
  const top = w.thickness + w.stemHeight;
  const zv = top + (B - crest) * Math.tan(g.behind.slope);
  return {
    B,
    top,
    crest,
    foot,
    face: crest - w.crestWidth,
    zv,
    waterBehind: g.water.behind === undefined ? undefined : Math.min(g.water.behind, zv),
    waterFront: g.water.front === undefined ? undefined : Math.min(g.water.front, top),
  };
}

export function waterLevelAt(g: DeepSeatedGround, x: number): number | undefined {
  const s = shapeOf(g);
  if (x > s.B) return s.waterBehind;
  if (x < 0) return s.waterFront;
  if (s.waterBehind === undefined && s.waterFront === undefined) return undefined;
  const [a, b] = [s.waterFront ?? 0, s.waterBehind ?? 0];
  return a + ((b - a) * x) / s.B;
}

const moistOrSaturated = (soil: DeepSeatedSoil, wet: boolean): number =>
  wet ? soil.saturatedUnitWeight : soil.unitWeight;

/** What is at a point; undefined is air. */
export function stuffAt(g: DeepSeatedGround, x: number, z: number): Stuff | undefined {
  const s = shapeOf(g);
  const w = g.wall;
  const under = (level: number | undefined): boolean => level !== undefined && z < level;
  const asSoil = (soil: DeepSeatedSoil, level: number | undefined): Stuff => ({
    weight: moistOrSaturated(soil, under(level)),
    inertia: true,
    soil,
  });
  const water = (level: number | undefined): Stuff | undefined =>
    under(level) ? { weight: gammaWater, inertia: false } : undefined;
  if (x < 0) {
    if (z > g.front.level - g.front.ignoreTop) return water(s.waterFront);
    return asSoil(z > 0 ? g.front.soil : layerOf(g.below, z), s.waterFront);
  }
  if (x > s.B) {
    if (z > s.top + (x - s.crest) * Math.tan(g.behind.slope)) return undefined;
    return asSoil(soilBehind(g, z), s.waterBehind);
  }
  if (z < 0) {
    const key = w.key;
    if (key && x > key.fromToe && x < key.fromToe + key.width && z > -key.depth)
      return { weight: w.unitWeight, inertia: true };
    return asSoil(layerOf(g.below, z), waterLevelAt(g, x));
  }
  if (z < w.thickness) return { weight: w.unitWeight, inertia: true };
  const up = z - w.thickness;
  const left = w.toe + ((s.face - w.toe) * up) / w.stemHeight;
  const right = s.foot - (w.backRun * up) / w.stemHeight;
  if (z < s.top && x > left && x < right) return { weight: w.unitWeight, inertia: true };
  if (x < left && z < s.top) {
    if (g.front.toeSoil && z < g.front.level) return asSoil(g.front.soil, s.waterFront);
    return water(s.waterFront);
  }
  if (x > s.crest && z < s.top + (x - s.crest) * Math.tan(g.behind.slope))
    return asSoil(soilBehind(g, z), s.waterBehind);
  return undefined;
}

/** All levels at which the stuff on the vertical at x may change. */
function levelsAt(g: DeepSeatedGround, x: number): number[] {
  const s = shapeOf(g);
  const w = g.wall;
  const bottoms = [...g.behind.layers, ...g.below].flatMap((layer) => layer.bottom ?? []);
  return [
    ...bottoms,
    0,
    w.thickness,
    s.top,
    s.top + (x - s.crest) * Math.tan(g.behind.slope),
    w.thickness + ((x - w.toe) * w.stemHeight) / (s.face - w.toe),
    w.thickness + ((s.foot - x) * w.stemHeight) / w.backRun,
    g.front.level,
    g.front.level - g.front.ignoreTop,
    -(w.key?.depth ?? 0),
    ...[s.waterBehind, s.waterFront, waterLevelAt(g, x)].flatMap((level) => level ?? []),
  ].filter(Number.isFinite);
}

export interface Column {
  /** Soil and wall, kPa. */
  mass: number;
  moment: number;
  /** Loads and free water, kPa. */
  load: number;
}

/** What stands on the vertical at x from a level up. */
export function columnOf(g: DeepSeatedGround, x: number, base: number): Column {
  const s = shapeOf(g);
  const column = { mass: 0, moment: 0, load: 0 };
  const levels = [...new Set(levelsAt(g, x).filter((z) => z > base))].sort((a, b) => a - b);
  let foot = base;
  for (const head of levels) {
    const stuff = stuffAt(g, x, 0.5 * (foot + head));
    if (stuff?.inertia) {
      column.mass += stuff.weight * (head - foot);
      column.moment += (stuff.weight * (head * head - foot * foot)) / 2;
    } else if (stuff) column.load += stuff.weight * (head - foot);
    foot = head;
  }
  if (x > s.crest) {
    column.load += g.loads.surcharge;
    for (const strip of g.loads.strips)
      if (x > s.crest + strip.from && x < s.crest + strip.from + strip.width) column.load += strip.pressure;
  }
  return column;
}

export interface SliceResult {
  readonly factor: number;
  readonly resisting: number;
  readonly driving: number;
  /** Least m_α where there is friction. */
  readonly leastTilt: number;
}

export function thinSlices(g: DeepSeatedGround, circle: SlipCircle, count: number): SliceResult {
  const s = shapeOf(g);
  const { kh, kv } = g.earthquake;
  const slices: {
    sin: number;
    cos: number;
    length: number;
    weight: number;
    u: number;
    cohesion: number;
    tan: number;
  }[] = [];
  // slices of equal arc, so that a steep entry is not cut coarsely
  const angleAt = (x: number, z: number): number => Math.atan2(x - circle.x, circle.z - z);
  const [start, end] = [angleAt(circle.exitX, circle.exitZ), angleAt(circle.entryX, circle.entryZ)];
  const edgeAt = (i: number): number =>
    i === count ? circle.entryX : circle.x + circle.radius * Math.sin(start + ((end - start) * i) / count);
  let driving = 0;
  for (let i = 0; i < count; i++) {
    const [from, to] = [edgeAt(i), edgeAt(i + 1)];
    const width = to - from;
    const x = 0.5 * (from + to);
    const sin = (x - circle.x) / circle.radius;
    const cos = Math.sqrt(1 - sin * sin);
    const base = circle.z - circle.radius * cos;
    const { mass, moment, load } = columnOf(g, x, base);
    let weight = (mass * (1 - kv) + load) * width;
    for (const line of g.loads.lines) {
      const at = s.crest + line.at;
      if (at > from && (at <= to || (i === count - 1 && at <= to + 1e-6))) weight += line.force;
    }
    const level = waterLevelAt(g, x);
    const u = level === undefined ? 0 : Math.max(gammaWater * (level - base), 0);
    const soil = stuffAt(g, x, base - 1e-9)?.soil;
    if (soil === undefined) throw new RangeError(`no soil at ${x}, ${base}`);
    slices.push({
      sin,
      cos,
      length: (circle.radius * (end - start)) / count,
      weight,
      u,
      cohesion: soil.cohesion,
      tan: Math.tan(soil.frictionAngle),
    });
    driving += weight * (x - circle.x) + kh * (mass * circle.z - moment) * width;
  }
  const pond = (s.waterFront ?? Number.NEGATIVE_INFINITY) - circle.exitZ;
  if (pond > 0) driving -= ((gammaWater * pond * pond) / 2) * (circle.z - circle.exitZ - pond / 3);
  const at = (factor: number): { resisting: number; tilt: number } => {
    let resisting = 0;
    let tilt = Number.POSITIVE_INFINITY;
    for (const { sin, cos, length, weight, u, cohesion, tan } of slices) {
      const m = cos + (sin * tan) / factor;
      if (tan > 0) tilt = Math.min(tilt, m);
      const normal = (weight - u * length * cos - (cohesion * length * sin) / factor) / m;
      resisting += circle.radius * (cohesion * length + Math.max(normal, 0) * tan);
    }
    return { resisting, tilt };
  };
  let factor = 1;
  for (let i = 0; i < 300; i++) {
    const next = at(factor).resisting / driving;
    if (Math.abs(next - factor) < 1e-13) break;
    factor = next;
  }
  const last = at(factor);
  return { factor, resisting: last.resisting, driving, leastTilt: last.tilt };
}
