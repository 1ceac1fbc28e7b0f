import { waterUnitWeight } from "../kernel.ts";
import {
  baseWidth,
  crestOfBack,
  type DeepSeatedGround,
  type DeepSeatedWall,
  loweredFront,
  virtualTop,
  wallHeight,
} from "./ground.ts";
import { momentTo, weightTo, type Zones } from "./zone.ts";

/** What stands on one vertical line, down to where the ground of its zone begins, as if that ground reached down to z = 0. */
export interface Column {
  /** Soil and wall, kPa: what the earthquake shakes. */
  mass: number;
  /** ∫ γ z dz of soil and wall, kN/m per metre. */
  moment: number;
  /** Surcharge, strips and free water, kPa. */
  load: number;
}

/** Water levels as the calculation takes them; −∞ where a side is dry. */
export interface WaterLevels {
  readonly behind: number;
  readonly front: number;
}

export function waterLevels(ground: DeepSeatedGround): WaterLevels {
  const { water, wall } = ground;
  return {
    behind: Math.min(water.behind ?? Number.NEGATIVE_INFINITY, virtualTop(ground)),
    front: Math.min(water.front ?? Number.NEGATIVE_INFINITY, wallHeight(wall)),
  };
}

/** Level of the water that pore pressure follows at x, the straight line under the base; −∞ where dry. */
export function waterLineAt(ground: DeepSeatedGround, levels: WaterLevels, x: number): number {
  const width = baseWidth(ground.wall);
  if (x >= width) return levels.behind;
  if (x <= 0) return levels.front;
  const [dryBehind, dryFront] = [levels.behind === Number.NEGATIVE_INFINITY, levels.front === Number.NEGATIVE_INFINITY];
  if (dryBehind && dryFront) return Number.NEGATIVE_INFINITY;
  const [behind, front] = [dryBehind ? 0 : levels.behind, dryFront ? 0 : levels.front];
  return front + ((behind - front) * x) / width;
}

/** Level of the front (left) side of the stem at x: the top of the slab, then the face, for x in [0, toe + front run]. */
function frontOutline(wall: DeepSeatedWall, x: number): number {
  const run = frontRun(wall);
  return wall.thickness + (run > 0 ? (wall.stemHeight * Math.max(x - wall.toe, 0)) / run : 0);
}

/** Level of the back side of wall and slab at x, for x from the crest of the back face to the heel. */
function backOutline(wall: DeepSeatedWall, x: number): number {
  const foot = wall.toe + wall.footWidth;
  return wall.thickness + (x < foot && wall.backRun > 0 ? (wall.stemHeight * (foot - x)) / wall.backRun : 0);
}

/** What foot, crest and back leave for the front face; not below 0. */
export function frontRun(wall: DeepSeatedWall): number {
  return Math.max(wall.footWidth - wall.crestWidth - wall.backRun, 0);
}

/** The column at x, not on an edge of anything. */
export function columnAt(ground: DeepSeatedGround, zones: Zones, levels: WaterLevels, x: number): Column {
  const column = { mass: 0, moment: 0, load: loadAt(ground, x) };
  const width = baseWidth(ground.wall);
  if (x < 0) addFront(ground, zones, levels, column);
  else if (x > width) addBehind(ground, zones, levels, x, column);
  else addOverBase(ground, zones, levels, x, column);
  return column;
}

function addFront(ground: DeepSeatedGround, zones: Zones, levels: WaterLevels, column: Column): void {
  const level = loweredFront(ground);
  column.mass += weightTo(zones.front, level, levels.front);
  column.moment += momentTo(zones.front, level, levels.front);
  column.load += waterUnitWeight * Math.max(levels.front - level, 0);
}

function addBehind(ground: DeepSeatedGround, zones: Zones, levels: WaterLevels, x: number, column: Column): void {
  const surface = surfaceAt(ground, x);
  column.mass += weightTo(zones.behind, surface, levels.behind);
  column.moment += momentTo(zones.behind, surface, levels.behind);
}

function addOverBase(ground: DeepSeatedGround, zones: Zones, levels: WaterLevels, x: number, column: Column): void {
  const { wall } = ground;
  const { key } = wall;
  const face = wall.toe + frontRun(wall);
  const crest = crestOfBack(wall);
  const bottom = key !== undefined && x > key.fromToe && x < key.fromToe + key.width ? -key.depth : 0;
  const line = waterLineAt(ground, levels, x);
  column.mass += weightTo(zones.under, bottom, line);
  column.moment += momentTo(zones.under, bottom, line);
  const top = x < face ? frontOutline(wall, x) : x > crest ? backOutline(wall, x) : wallHeight(wall);
  column.mass += wall.unitWeight * (top - bottom);
  column.moment += (wall.unitWeight * (top * top - bottom * bottom)) / 2;
  if (x > crest) addSoil(column, zones.behind, top, surfaceAt(ground, x), levels.behind);
  if (x < face) {
    const soil = ground.front.toeSoil ? Math.min(Math.max(ground.front.level, top), wallHeight(wall)) : top;
    addSoil(column, zones.front, top, soil, levels.front);
    column.load += waterUnitWeight * Math.max(levels.front - soil, 0);
  }
}

function addSoil(column: Column, zone: Zones["behind"], from: number, to: number, water: number): void {
  column.mass += weightTo(zone, to, water) - weightTo(zone, from, water);
  column.moment += momentTo(zone, to, water) - momentTo(zone, from, water);
}

/** Level of the surface from the crest of the back face on. */
export function surfaceAt(ground: DeepSeatedGround, x: number): number {
  return wallHeight(ground.wall) + (x - crestOfBack(ground.wall)) * Math.tan(ground.behind.slope);
}

/** Surcharge and strips at x, kPa. */
function loadAt(ground: DeepSeatedGround, x: number): number {
  const behindCrest = x - crestOfBack(ground.wall);
  if (behindCrest < 0) return 0;
  const { surcharge, strips } = ground.loads;
  return strips.reduce(
    (sum, { pressure, from, width }) => sum + (behindCrest > from && behindCrest < from + width ? pressure : 0),
    surcharge,
  );
}
