/** Random studies with certain values, as trees in the words of the study file. All of it is invented. */

/** Uniform numbers in [0, 1) from a seed: the 32-bit mixing of a counter, good enough to draw test cases. */
export function drawsOf(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x9e3779b9) >>> 0;
    let x = state;
    x = Math.imul(x ^ (x >>> 16), 0x21f0aaad);
    x = Math.imul(x ^ (x >>> 15), 0x735a2d97);
    return ((x ^ (x >>> 15)) >>> 0) / 2 ** 32;
  };
}

export interface SoilTree {
  unit_weight: number;
  saturated_unit_weight: number;
  friction_angle?: number;
  cohesion?: number;
  drainage?: "undrained";
  undrained_strength?: number;
  overconsolidation_ratio?: number;
}

export interface LayerTree {
  soil: string;
  bottom?: number;
}

export interface StudyTree {
  wall: {
    stem: { height: number; crest_width: number; foot_width: number; back_run: number };
    base?: { toe: number; heel: number; thickness: number };
    shear_key?: { depth: number; width: number; from_toe: number };
    unit_weight: number;
    sliding_friction: { ratio?: number; angle?: number; adhesion: number };
    underside_level?: number;
  };
  soils: Record<string, SoilTree>;
  ground: {
    behind: { slope: number; layers: LayerTree[] };
    below: { soil: string };
    front: {
      level: number;
      soil: string;
      mobilised: number;
      ignore_top: number;
      toe_soil: boolean;
      in_overturning: boolean;
    };
  };
  water: { behind?: { level: number }; front?: { level: number }; flow: "hydrostatic" | "seepage" };
  loads: {
    surcharge?: { pressure: number; on_heel: boolean };
    strips: { pressure: number; from: number; width: number; on_heel: boolean }[];
    lines: { force: number; at: number; on_heel: boolean }[];
    earthquake?: { kh: number; kv: number };
  };
  model: {
    earth_pressure: "rankine" | "coulomb" | "at_rest";
    wall_friction?: number;
    bearing: "vesic" | "en1997" | "meyerhof";
    tension_crack: "dry" | "water";
    factors: { earth_thrust: number; base_resistance: number; bearing_capacity: number };
  };
  assessment: { limit_states: string[]; eccentricity_limit: number };
}

/** "usual": what an engineer draws. "wide": over most of what the schema lets through, ends of ranges included. */
export type Breadth = "usual" | "wide";

/** Ranges by breadth; a wide draw takes one of the two ends now and then. */
const ranges = {
  height: [1.5, 9, 0.01, 100],
  crest: [0.2, 0.6, 0.01, 100],
  run: [0, 1.2, 0, 100],
  toe: [0, 1.5, 0, 100],
  heel: [0, 4.5, 0, 100],
  thickness: [0.25, 0.9, 0.01, 100],
  keyDepth: [0.2, 1, 0.01, 100],
  wallWeight: [22, 25, 1, 40],
  ratio: [0.5, 1, 0, 1.5],
  angle: [15, 35, 0, 60],
  adhesion: [0, 10, 0, 10000],
  unitWeight: [15, 21, 1, 40],
  friction: [20, 42, 0, 60],
  cohesion: [1, 25, 0, 10000],
  strength: [20, 150, 0, 10000],
  ocr: [1, 6, 1, 100],
  slope: [0, 20, 0, 60],
  share: [0, 1, 0, 1],
  ignore: [0, 0.6, 0, 100],
  pressure: [2, 40, 0, 10000],
  distance: [0, 5, 0, 100],
  width: [0.3, 3, 0.01, 100],
  force: [5, 60, 0, 100000],
  kh: [0.02, 0.25, 0, 1],
  kv: [-0.1, 0.1, -0.5, 0.5],
  wallFriction: [0, 25, 0, 60],
  factor: [0.7, 1.4, 0, 10],
} as const satisfies Record<string, readonly [number, number, number, number]>;

export function randomStudy(seed: number, breadth: Breadth = "usual"): StudyTree {
  const next = drawsOf(seed);
  const chance = (probability: number): boolean => next() < probability;
  const pick = <T>(choices: readonly T[]): T => choices[Math.floor(next() * choices.length)];
  const usual = (name: keyof typeof ranges): number => ranges[name][0] + (ranges[name][1] - ranges[name][0]) * next();
  const draw = (name: keyof typeof ranges): number => {
    if (breadth === "usual" || chance(0.5)) return usual(name);
    const [, , low, high] = ranges[name];
    return chance(0.25) ? pick([low, high]) : low + (high - low) * next() ** pick([1, 4]);
  };

  const soil = (): SoilTree => {
    const unitWeight = draw("unitWeight");
    return {
      unit_weight: unitWeight,
      saturated_unit_weight:
        breadth === "wide" && chance(0.3) ? draw("unitWeight") : Math.min(unitWeight + 2 * next(), 40),
      ...(chance(0.15)
        ? { drainage: "undrained", undrained_strength: draw("strength") }
        : { friction_angle: draw("friction"), cohesion: chance(0.6) ? 0 : draw("cohesion") }),
    };
  };
  const soils: Record<string, SoilTree> = { fill: soil(), clay: soil(), sand: soil(), below: soil() };

  const hasBase = chance(0.85);
  const [height, crestWidth, run] = [draw("height"), draw("crest"), chance(0.5) ? 0 : draw("run")];
  const frontRun = chance(0.4) ? 0 : draw("run");
  const fits = Math.min(1, 99 / (crestWidth + run + frontRun)); // no dimension above 100 m
  const [crest, backRun] = [Math.max(crestWidth * fits, 0.01), run * fits];
  const foot = crest + backRun + frontRun * fits;
  const base = { toe: draw("toe"), heel: chance(0.1) ? 0 : draw("heel"), thickness: draw("thickness") };
  const width = foot + (hasBase ? base.toe + base.heel : 0);
  const crestLevel = height + (hasBase ? base.thickness : 0);
  const slope = chance(0.5) ? 0 : draw("slope");
  const surface = crestLevel + ((hasBase ? base.heel : 0) + backRun) * Math.tan((slope * Math.PI) / 180);
  const keyWidth = Math.max(Math.min(draw("crest"), width), 0.01);
  const earthPressure = pick(["rankine", "rankine", "coulomb", "coulomb", "at_rest"] as const);
  if (earthPressure === "at_rest" && chance(0.5))
    for (const name of Object.keys(soils)) soils[name].overconsolidation_ratio = draw("ocr");

  const layers: LayerTree[] = pick([["fill"], ["fill", "clay"], ["fill", "clay", "sand"]]).map((name) => ({
    soil: name,
  }));
  let level = surface;
  for (const layer of layers.slice(0, -1)) {
    level -= next() * 0.7 * crestLevel;
    layer.bottom = level;
  }
  const tree: StudyTree = {
    wall: {
      stem: { height, crest_width: crest, foot_width: foot, back_run: backRun },
      ...(hasBase ? { base } : {}),
      ...(chance(0.3)
        ? {
            shear_key: { depth: draw("keyDepth"), width: keyWidth, from_toe: Math.min(width - keyWidth, 100) * next() },
          }
        : {}),
      unit_weight: draw("wallWeight"),
      sliding_friction: {
        ...(chance(0.6) ? { ratio: draw("ratio") } : { angle: draw("angle") }),
        adhesion: chance(0.6) ? 0 : draw("adhesion"),
      },
    },
    soils,
    ground: {
      behind: { slope, layers },
      below: { soil: pick(["below", "sand"]) },
      front: {
        level: chance(0.3) ? 0 : crestLevel * 0.4 * next(),
        soil: pick(["below", "fill"]),
        mobilised: chance(0.5) ? 0 : draw("share"),
        ignore_top: chance(0.5) ? 0 : draw("ignore"),
        toe_soil: chance(0.7),
        in_overturning: chance(0.3),
      },
    },
    water: {
      ...(chance(0.6) ? { behind: { level: chance(0.15) ? -2 * next() : (surface + 0.5) * next() } } : {}),
      ...(chance(0.4) ? { front: { level: chance(0.2) ? -2 * next() : crestLevel * 0.6 * next() } } : {}),
      flow: chance(0.4) ? "seepage" : "hydrostatic",
    },
    loads: {
      ...(chance(0.5) ? { surcharge: { pressure: draw("pressure"), on_heel: chance(0.4) } } : {}),
      strips: Array.from({ length: chance(0.3) ? 1 + Math.floor(2 * next()) : 0 }, () => ({
        pressure: draw("pressure"),
        from: draw("distance"),
        width: draw("width"),
        on_heel: chance(0.4),
      })),
      lines: Array.from({ length: chance(0.3) ? 1 + Math.floor(2 * next()) : 0 }, () => ({
        force: draw("force"),
        at: draw("distance"),
        on_heel: chance(0.4),
      })),
      ...(chance(0.3) ? { earthquake: { kh: draw("kh"), kv: chance(0.5) ? 0 : draw("kv") } } : {}),
    },
    model: {
      earth_pressure: earthPressure,
      ...(earthPressure === "coulomb" ? { wall_friction: draw("wallFriction") } : {}),
      bearing: pick(["vesic", "en1997", "meyerhof"] as const),
      tension_crack: pick(["dry", "water"] as const),
      factors: chance(0.5)
        ? { earth_thrust: 1, base_resistance: 1, bearing_capacity: 1 }
        : { earth_thrust: draw("factor"), base_resistance: draw("factor"), bearing_capacity: draw("factor") },
    },
    assessment: { limit_states: ["sliding", "overturning", "bearing", "eccentricity"], eccentricity_limit: 0.333 },
  };
  return chance(0.2) ? atSiteLevel(tree, 40 + 10 * next()) : tree;
}

/** The same wall with every level raised: counted from a datum so much lower. */
export function atSiteLevel(tree: StudyTree, rise: number): StudyTree {
  const raised = structuredClone(tree);
  raised.wall.underside_level = (tree.wall.underside_level ?? 0) + rise;
  raised.ground.front.level += rise;
  for (const layer of raised.ground.behind.layers) if (layer.bottom !== undefined) layer.bottom += rise;
  for (const pond of [raised.water.behind, raised.water.front]) if (pond) pond.level += rise;
  return raised;
}
