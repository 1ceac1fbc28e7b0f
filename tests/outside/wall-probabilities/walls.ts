/** Invented walls of many kinds, each a base with some values set anew, made common or rare in their failure by the heel. */
import { buildModel, type Model } from "../../../src/model.ts";
import { readStudy } from "../../../src/study/read-study.ts";

const base = `
title: A wall of the battery (invented)
wall:
  stem: { height: 5.0, crest_width: 0.3, foot_width: 0.5 }
  base: { toe: 0.8, heel: 3.0, thickness: 0.5 }
  unit_weight: { normal: { mean: 24, sd: 0.7 } }
  sliding_friction: { ratio: { normal: { mean: 0.85, sd: 0.06 } } }
soils:
  fill: { unit_weight: { normal: { mean: 19, sd: 0.95 } }, saturated_unit_weight: 21, friction_angle: { lognormal: { mean: 36, sd: 2 } } }
  sand: { unit_weight: { normal: { mean: 18, sd: 0.9 } }, saturated_unit_weight: 20, friction_angle: { normal: { mean: 34, sd: 2.2 } } }
ground:
  behind: { layers: [ { soil: fill, bottom: 2.5 }, { soil: sand } ] }
  below: { soil: sand }
  front: { level: 1.0 }
water: { behind: { level: { normal: { mean: 1.2, sd: 0.5 } } }, front: { level: 0.5 } }
loads: { surcharge: { pressure: { gumbel: { mean: 8, sd: 2.5 } } } }
model: { factors: { earth_thrust: { lognormal: { mean: 1, sd: 0.1 } }, bearing_capacity: { lognormal: { mean: 1, sd: 0.15 } } } }
assessment: { limit_states: [sliding, overturning, bearing], seed: battery }
`;

export type Settings = Readonly<Record<string, string>>;

/** The base wall with values set anew, written as in a study file. */
export const wallWith = (settings: Settings): Model =>
  buildModel(readStudy(base, { set: Object.entries(settings).map(([path, value]) => [path, value] as const) }));

/** Ten unknowns of mixed kinds, eight pairs of them correlated: the wall of the cost in evaluations. */
export const tenUnknowns: Settings = {
  "wall.sliding_friction.ratio": "{ uniform: { from: 0.8, to: 0.95 } }",
  "soils.fill.friction_angle": "{ lognormal: { mean: 36, sd: 1.8 } }",
  "soils.sand.friction_angle": "{ truncated_normal: { mean: 35, sd: 1.8, from: 25, to: 45 } }",
  "water.behind.level": "{ triangular: { from: 0.3, peak: 1.2, to: 3.2 } }",
  "loads.surcharge.pressure": "{ gumbel: { mean: 10, sd: 3 } }",
  correlations: `[
    { between: [soils.fill.unit_weight, soils.fill.friction_angle], coefficient: 0.4 },
    { between: [soils.sand.unit_weight, soils.sand.friction_angle], coefficient: 0.4 },
    { between: [soils.fill.unit_weight, soils.sand.unit_weight], coefficient: 0.3 },
    { between: [soils.fill.friction_angle, soils.sand.friction_angle], coefficient: 0.3 },
    { between: [water.behind.level, loads.surcharge.pressure], coefficient: 0.2 },
    { between: [soils.sand.friction_angle, wall.sliding_friction.ratio], coefficient: 0.3 },
    { between: [model.factors.earth_thrust, model.factors.bearing_capacity], coefficient: -0.2 },
    { between: [loads.surcharge.pressure, model.factors.earth_thrust], coefficient: 0.1 } ]`,
};

/** Drains work, or are blocked: nothing between the two. */
export const drains: Settings = {
  "water.behind.level":
    "{ mixture: [ { share: 0.97, of: { uniform: { from: 0.2, to: 0.8 } } }, { share: 0.03, of: { triangular: { from: 2.5, peak: 3.2, to: 4.2 } } } ] }",
};

/** Water about the surface of the ground, beyond which it rises no further: a kink at 5.5 m. */
export const kinked: Settings = {
  "soils.fill.friction_angle": "{ normal: { mean: 38, sd: 1 } }",
  "soils.sand.friction_angle": "{ normal: { mean: 36, sd: 1.5 } }",
  "water.behind.level": "{ normal: { mean: 4.9, sd: 0.3 } }",
};

/** A weak contact of the base, or weak ground below it: two ways to fail that share little. */
export const twoPoints: Settings = {
  "wall.sliding_friction.ratio": "{ normal: { mean: 0.85, sd: 0.1 } }",
  "model.factors.bearing_capacity": "{ lognormal: { mean: 1, sd: 0.45 } }",
  "soils.sand.friction_angle": "{ normal: { mean: 35, sd: 1.2 } }",
};

export const twentyUnknowns: Settings = {
  "wall.base.thickness": "{ normal: { mean: 0.5, sd: 0.01 } }",
  "wall.base.toe": "{ normal: { mean: 0.8, sd: 0.02 } }",
  "soils.fill.saturated_unit_weight": "{ normal: { mean: 21, sd: 0.6 } }",
  "soils.sand.saturated_unit_weight": "{ normal: { mean: 20, sd: 0.6 } }",
  "soils.rock":
    "{ unit_weight: { normal: { mean: 21, sd: 0.8 } }, saturated_unit_weight: { normal: { mean: 22.5, sd: 0.6 } }, friction_angle: { normal: { mean: 38, sd: 2 } } }",
  "ground.behind.layers":
    "[ { soil: rock, bottom: { normal: { mean: 4.2, sd: 0.2 } } }, { soil: fill, bottom: { normal: { mean: 2.4, sd: 0.25 } } }, { soil: sand } ]",
  "model.factors.base_resistance": "{ lognormal: { mean: 1, sd: 0.07 } }",
};

/** Kinds of the battery. */
export const kinds: Readonly<Record<string, Settings>> = {
  plain: {},
  "ten unknowns, correlated": tenUnknowns,
  drains,
  kinked,
  "two points": twoPoints,
  "twenty unknowns": twentyUnknowns,
  "cohesive fill, cracked": {
    "soils.fill.cohesion": "{ lognormal: { mean: 6, sd: 2.5 } }",
    "soils.fill.friction_angle": "{ normal: { mean: 28, sd: 2 } }",
    "model.tension_crack": "water",
  },
  "gravity wall": {
    "wall.stem": "{ height: 4.0, crest_width: 0.6, foot_width: 2.2, back_run: 0.3 }",
    "wall.base": "{ toe: 0.3, heel: 0.5, thickness: 0.6 }",
    "ground.behind.layers": "[ { soil: fill, bottom: 2.0 }, { soil: sand } ]",
  },
  "sloping fill, coulomb": {
    "ground.behind": "{ slope: 12, layers: [ { soil: fill } ] }",
    water: "{}",
    "model.earth_pressure": "coulomb",
    "model.wall_friction": "{ normal: { mean: 12, sd: 2 } }",
  },
  earthquake: {
    "loads.earthquake": "{ kh: { lognormal: { mean: 0.06, sd: 0.025 } } }",
    "ground.behind.layers": "[ { soil: fill } ]",
    water: "{}",
    "model.earth_pressure": "coulomb",
    "model.wall_friction": "12",
  },
  "clay below, undrained": {
    "soils.clay": "{ unit_weight: 19, drainage: undrained, undrained_strength: { lognormal: { mean: 105, sd: 28 } } }",
    "ground.below.soil": "clay",
    "wall.sliding_friction": "{ adhesion: { lognormal: { mean: 65, sd: 17 } } }",
  },
  "strip and line load": {
    "loads.surcharge.pressure": "{ uniform: { from: 0, to: 10 } }",
    "loads.strips": "[ { pressure: { gumbel: { mean: 25, sd: 8 } }, from: 0.8, width: 1.5 } ]",
    "loads.lines": "[ { force: { normal: { mean: 15, sd: 4 } }, at: 1.2 } ]",
  },
  "front counted": {
    "ground.front":
      "{ level: { normal: { mean: 1.1, sd: 0.15 } }, soil: sand, mobilised: { uniform: { from: 0.2, to: 0.5 } }, ignore_top: 0.3 }",
  },
  "seepage and key": {
    "wall.shear_key": "{ depth: 0.5, width: 0.4, from_toe: 1.2 }",
    "water.flow": "seepage",
    "water.behind.level": "{ weibull: { shape: 3, scale: 1.9, shift: 0.5 } }",
  },
  "measured strength": {
    "soils.sand.friction_angle": "{ measured: [33.1, 35.4, 34.2, 36.0, 33.8, 34.6, 35.1, 34.9] }",
    "water.behind.level": "{ beta: { from: 0, to: 5, mean: 1.2, sd: 0.5 } }",
  },
};

/** One wall of the battery. */
export interface NamedWall {
  readonly kind: string;
  /** m; it makes failure common or rare. */
  readonly heel: number;
}

export const modelOf = ({ kind, heel }: NamedWall): Model => wallWith({ ...kinds[kind], "wall.base.heel": `${heel}` });

/** The five on which intervals are held against the truth, with about one failure in 200. */
export const fiveWalls: readonly NamedWall[] = [
  { kind: "plain", heel: 2.4 },
  { kind: "kinked", heel: 4.4 },
  { kind: "two points", heel: 2.4 },
  { kind: "drains", heel: 2.6 },
  { kind: "twenty unknowns", heel: 2.5 },
];

const pair = (kind: string, common: number, rare: number): readonly NamedWall[] => [
  { kind, heel: common },
  { kind, heel: rare },
];

/** Two of each kind: failure at least about once in 5000, and once in 100 000 to 100 million. */
export const thirtyWalls: readonly NamedWall[] = [
  ...pair("plain", 2.6, 4.4),
  ...pair("ten unknowns, correlated", 2.6, 4),
  ...pair("drains", 3, 4.4),
  ...pair("kinked", 4.6, 5.8),
  ...pair("two points", 2.6, 4.4),
  ...pair("twenty unknowns", 2.8, 4),
  ...pair("cohesive fill, cracked", 2.6, 3.6),
  ...pair("gravity wall", 0.9, 2.2),
  ...pair("sloping fill, coulomb", 2, 3.4),
  ...pair("earthquake", 2.6, 5.2),
  ...pair("clay below, undrained", 2, 3),
  ...pair("strip and line load", 2.6, 4.2),
  ...pair("front counted", 2.8, 4.4),
  ...pair("seepage and key", 2.8, 4.4),
  ...pair("measured strength", 2.4, 3.6),
];

/** The wall with ten unknowns: one failure in a million, and in a hundred million. */
export const rareWalls: readonly NamedWall[] = [
  { kind: "ten unknowns, correlated", heel: 3.87 },
  { kind: "ten unknowns, correlated", heel: 4.6 },
];

/** Bearing fails with working drains, in weak ground, or with blocked ones. */
export const drainsWall: NamedWall = { kind: "drains", heel: 3 };
