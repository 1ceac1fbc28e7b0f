import { baseWidth, type DeepSeatedGround, loweredFront, virtualTop, wallHeight } from "./ground.ts";

/** Points and limits that a circle has to respect. */
export interface CircleLimits {
  readonly height: number;
  /** Corners of base and key, x and z: a circle runs below them or touches them. */
  readonly cornersX: Float64Array;
  readonly cornersZ: Float64Array;
  readonly heelX: number;
  readonly heelTop: number;
  readonly surfaceTangent: number;
  readonly farthestEntry: number;
  /** Level at which circles leave; below 0 they may leave through the face under the toe too. */
  readonly exitLevel: number;
  /** Length of the way on which circles leave: down the face under the toe, if there is one, then along the ground. */
  readonly exitWay: number;
  /** Levels that circles may be tangent to, from the top down: boundaries below the underside, last the firm level. */
  readonly levels: Float64Array;
}

export function circleLimits(ground: DeepSeatedGround): CircleLimits {
  const { wall, behind, below } = ground;
  const { key } = wall;
  const [height, width] = [wallHeight(wall), baseWidth(wall)];
  const firm = ground.firmLevel ?? -height;
  const corners = [
    [0, 0],
    [width, 0],
    ...(key === undefined
      ? []
      : [
          [key.fromToe, -key.depth],
          [key.fromToe + key.width, -key.depth],
        ]),
  ];
  const exitLevel = loweredFront(ground);
  const boundaries = [...below, ...behind.layers].flatMap(({ bottom }) => (bottom === undefined ? [] : [bottom]));
  const levels = boundaries.map((z) => Math.min(Math.max(z, firm), 0)).sort((a, b) => b - a);
  return {
    height,
    cornersX: Float64Array.from(corners, ([x]) => x),
    cornersZ: Float64Array.from(corners, ([, z]) => z),
    heelX: width,
    heelTop: virtualTop(ground),
    surfaceTangent: Math.tan(behind.slope),
    farthestEntry: width + 4 * height,
    exitLevel,
    exitWay: Math.max(-exitLevel, 0) + 3 * height,
    levels: Float64Array.from([...levels, firm]),
  };
}
