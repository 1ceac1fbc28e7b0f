/**
 * The wall and the ground around it as plain numbers, for deep-seated failure: everything that can move the factor.
 *
 * Local axes as everywhere in mechanics: x from the tip of the toe towards the retained ground, z up from the underside of
 * the base. m, kN, kPa, kN/m³ per metre run, radians. All levels are local. Nothing here is clamped by the caller except to
 * its physical range: layers out of order, levels above a surface and the like are taken as the comments say.
 *
 *        surface from the crest of the back face at `slope`
 *                      ┌──┐────────  behind.layers, from the top down
 *     front.level      │  │          (the last gives way to below at z = 0, if its top is there or higher)
 *   ───────┐┌──────────┘  └───────┐
 *          ││       base          │  ← virtual back x = B
 *          └┴──┬──┬───────────────┘  z = 0
 *              └──┘ key              below, from the top down, under the base, in front and (from z = 0) behind
 *   ═══════════════════════════════  firmLevel: no circle goes deeper
 */
export interface DeepSeatedGround {
  readonly wall: DeepSeatedWall;
  readonly behind: {
    /** Slope of the surface from the crest on, rad, 0 or more. */
    readonly slope: number;
    readonly layers: readonly DeepSeatedLayer[];
  };
  /** From the underside down. */
  readonly below: readonly DeepSeatedLayer[];
  /** Left out: the height h + t below the underside. */
  readonly firmLevel?: number;
  readonly front: {
    /** Level of the ground in front. */
    readonly level: number;
    /** Taken as dug away in front of the toe (not over it): no weight, no strength; circles leave at the lowered ground. */
    readonly ignoreTop: number;
    /** Whether the soil over the toe, up to `level`, is a weight. */
    readonly toeSoil: boolean;
    /** Above the underside; below it stands `below`. */
    readonly soil: DeepSeatedSoil;
  };
  /**
   * Water levels, as they are (below the underside too). Behind, no higher than the top of the virtual back; in front, no
   * higher than the crest. Pore pressure γw·(level − z), not below 0: `behind` from x = B on, `front` up to x = 0, a straight
   * line between them under the base. Soil below that level is saturated. A side left out is dry, and the line takes the
   * underside there. Soil over the heel is saturated below `behind`, soil over the toe below `front`.
   */
  readonly water: { readonly behind?: number; readonly front?: number };
  readonly loads: {
    /** From the crest of the back face to where a circle enters, kPa of horizontal area. */
    readonly surcharge: number;
    /** `from` and `at` count from the crest of the back face. */
    readonly strips: readonly { readonly pressure: number; readonly from: number; readonly width: number }[];
    readonly lines: readonly { readonly force: number; readonly at: number }[];
  };
  /** kh towards the front; kv > 0 lightens. Of soil and wall; loads and free water have no inertia. */
  readonly earthquake: { readonly kh: number; readonly kv: number };
}

/** Outline of the wall; toe = heel = thickness = 0 without a base slab. The front face runs in by what is left of the foot. */
export interface DeepSeatedWall {
  readonly stemHeight: number;
  readonly crestWidth: number;
  readonly footWidth: number;
  readonly backRun: number;
  readonly toe: number;
  readonly heel: number;
  readonly thickness: number;
  readonly unitWeight: number;
  readonly key?: { readonly fromToe: number; readonly width: number; readonly depth: number };
}

export interface DeepSeatedLayer {
  readonly soil: DeepSeatedSoil;
  /**
   * Absent on the last of a list, which has none. A bottom above that of the layer over it leaves no thickness.
   */
  readonly bottom?: number;
}

export interface DeepSeatedSoil {
  /** Above water. */
  readonly unitWeight: number;
  /** Below water. */
  readonly saturatedUnitWeight: number;
  /** Effective, rad; 0 for an undrained soil. */
  readonly frictionAngle: number;
  /** Effective; the undrained strength of an undrained soil. */
  readonly cohesion: number;
}

/** B: toe, foot of the stem and heel. */
export function baseWidth(wall: DeepSeatedWall): number {
  return wall.toe + wall.footWidth + wall.heel;
}

/** h + t, the height that the limits of the search are counted in. */
export function wallHeight(wall: DeepSeatedWall): number {
  return wall.stemHeight + wall.thickness;
}

/** x of the crest of the back face. */
export function crestOfBack(wall: DeepSeatedWall): number {
  return wall.toe + wall.footWidth - wall.backRun;
}

/** z_v, where the virtual back meets the surface. */
export function virtualTop(ground: DeepSeatedGround): number {
  const { wall, behind } = ground;
  return wallHeight(wall) + (baseWidth(wall) - crestOfBack(wall)) * Math.tan(behind.slope);
}

/** The ground in front as a circle finds it: the ignored top is dug away. */
export function loweredFront(ground: DeepSeatedGround): number {
  return ground.front.level - ground.front.ignoreTop;
}
