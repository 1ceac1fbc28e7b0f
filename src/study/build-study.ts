/** The checked tree of a study file -> the plain data of `study.ts`: values read, defaults filled in, keys in camelCase. */
import { buildAssessment } from "./build-assessment.ts";
import { buildDecision, buildEvidence } from "./build-decision.ts";
import { defaults } from "./defaults.ts";
import { fieldOfPath } from "./fields.ts";
import type { Findings } from "./findings.ts";
import { isRecord, valueAt } from "./paths.ts";
import { readQuantity } from "./read-quantity.ts";
import type { Correlation, Ground, Layer, Loads, Model, Quantity, Soil, Study, Units, Wall, Water } from "./study.ts";

/** Reads values out of a tree by path; where the schema has already complained it gives a default or NaN, so reading goes on. */
export interface TreeReader {
  readonly tree: unknown;
  readonly units: Units;
  readonly findings: Findings;
  /** Sources by path, filled on the way. */
  readonly sources: Record<string, string>;
  has(path: string): boolean;
  /** The value, its default, or NaN. */
  quantity(path: string): Quantity;
  /** The value, or undefined where it is not given. */
  maybe(path: string): Quantity | undefined;
  text(path: string, fallback: string): string;
  flag(path: string, fallback: boolean): boolean;
  number(path: string): number | undefined;
  choice<T extends string>(path: string, allowed: readonly T[], fallback: T): T;
  list(path: string): readonly unknown[];
}

export function treeReader(tree: unknown, findings: Findings): TreeReader {
  const sources: Record<string, string> = {};
  const at = (path: string): unknown => valueAt(tree, path);
  const units: Units = at("units") === "us" ? "us" : "metric";
  const maybe = (path: string): Quantity | undefined => {
    const raw = at(path);
    if (raw === undefined || raw === null) return undefined;
    const field = fieldOfPath(path);
    if (field === undefined) throw new RangeError(`${path} is no numeric field`);
    const reading = readQuantity(raw, path, field, { units, findings });
    if (reading.source !== undefined) sources[path] = reading.source;
    return reading.quantity;
  };
  return {
    tree,
    units,
    findings,
    sources,
    has: (path) => at(path) !== undefined,
    maybe,
    quantity: (path) => maybe(path) ?? fieldOfPath(path)?.default ?? Number.NaN,
    text: (path, fallback) => asType(at(path), "string", fallback),
    flag: (path, fallback) => asType(at(path), "boolean", fallback),
    number: (path) => (typeof at(path) === "number" ? (at(path) as number) : undefined),
    choice: (path, allowed, fallback) => allowed.find((word) => word === at(path)) ?? fallback,
    list: (path) => (Array.isArray(at(path)) ? (at(path) as unknown[]) : []),
  };
}

function asType<T>(value: unknown, type: "string" | "boolean", fallback: T): T {
  return typeof value === type ? (value as T) : fallback;
}

/**
 * Everything the tree says, checks between values left to `cross-checks.ts`.
 *
 * @param document the tree as it is kept for changes
 */
export function buildStudy(reader: TreeReader, file: string, document: unknown): Study {
  const decision = buildDecision(reader);
  return {
    title: reader.text("title", defaults.title),
    notes: reader.text("notes", ""),
    units: reader.units,
    wall: buildWall(reader),
    soils: buildSoils(reader),
    ground: buildGround(reader),
    water: buildWater(reader),
    loads: buildLoads(reader),
    model: buildModel(reader),
    correlations: buildCorrelations(reader),
    assessment: buildAssessment(reader),
    evidence: buildEvidence(reader),
    ...(decision && { decision }),
    sources: reader.sources,
    document,
    file,
    notices: reader.findings.notices,
  };
}

function buildWall(read: TreeReader): Wall {
  const q = read.quantity;
  return {
    stem: {
      height: q("wall.stem.height"),
      crestWidth: q("wall.stem.crest_width"),
      footWidth: q("wall.stem.foot_width"),
      backRun: q("wall.stem.back_run"),
    },
    ...(read.has("wall.base") && {
      base: { toe: q("wall.base.toe"), heel: q("wall.base.heel"), thickness: q("wall.base.thickness") },
    }),
    ...(read.has("wall.shear_key") && {
      shearKey: {
        depth: q("wall.shear_key.depth"),
        width: q("wall.shear_key.width"),
        fromToe: q("wall.shear_key.from_toe"),
      },
    }),
    unitWeight: q("wall.unit_weight"),
    undersideLevel: q("wall.underside_level"),
    ...(read.has("wall.sliding_friction") && {
      slidingFriction: {
        ...given("ratio", read.maybe("wall.sliding_friction.ratio")),
        ...given("angle", read.maybe("wall.sliding_friction.angle")),
        adhesion: q("wall.sliding_friction.adhesion"),
      },
    }),
  };
}

/** `{ key: value }`, or nothing where the value is not given. */
function given<K extends string, V>(key: K, value: V | undefined): { [P in K]?: V } {
  return value === undefined ? {} : ({ [key]: value } as { [P in K]?: V });
}

function buildSoils(read: TreeReader): Readonly<Record<string, Soil>> {
  const soils = valueAt(read.tree, "soils");
  if (!isRecord(soils)) return {};
  return Object.fromEntries(
    Object.keys(soils)
      .filter((key) => isRecord(soils[key]) && !key.includes("."))
      .map((key) => [key, buildSoil(read, key)]),
  );
}

function buildSoil(read: TreeReader, key: string): Soil {
  const path = `soils.${key}`;
  const drainage = read.choice(`${path}.drainage`, ["drained", "undrained"], defaults.drainage);
  return {
    name: read.text(`${path}.name`, key),
    unitWeight: read.quantity(`${path}.unit_weight`),
    ...given("saturatedUnitWeight", read.maybe(`${path}.saturated_unit_weight`)),
    frictionAngle: read.maybe(`${path}.friction_angle`) ?? (drainage === "undrained" ? 0 : Number.NaN),
    cohesion: read.quantity(`${path}.cohesion`),
    drainage,
    ...given("undrainedStrength", read.maybe(`${path}.undrained_strength`)),
    ...given("overconsolidationRatio", read.maybe(`${path}.overconsolidation_ratio`)),
  };
}

function buildGround(read: TreeReader): Ground {
  const layersBelow = buildLayers(read, "ground.below.layers");
  const below = read.text("ground.below.soil", layersBelow[0]?.soil ?? "");
  return {
    behind: { slope: read.quantity("ground.behind.slope"), layers: buildLayers(read, "ground.behind.layers") },
    below: { soil: below, layers: layersBelow, ...given("firmLevel", read.maybe("ground.below.firm_level")) },
    front: {
      ...given("level", read.maybe("ground.front.level")),
      soil: read.text("ground.front.soil", below),
      mobilised: read.quantity("ground.front.mobilised"),
      ignoreTop: read.quantity("ground.front.ignore_top"),
      toeSoil: read.flag("ground.front.toe_soil", defaults.toeSoil),
      inOverturning: read.flag("ground.front.in_overturning", defaults.inOverturning),
    },
  };
}

function buildLayers(read: TreeReader, path: string): readonly Layer[] {
  return read.list(path).map((_, i) => ({
    soil: read.text(`${path}.${i}.soil`, ""),
    ...given("bottom", read.maybe(`${path}.${i}.bottom`)),
  }));
}

function buildWater(read: TreeReader): Water {
  return {
    ...(read.has("water.behind") && { behind: { level: read.quantity("water.behind.level") } }),
    ...(read.has("water.front") && { front: { level: read.quantity("water.front.level") } }),
    flow: read.choice("water.flow", ["hydrostatic", "seepage"], defaults.flow),
  };
}

function buildLoads(read: TreeReader): Loads {
  const q = read.quantity;
  const onHeel = (path: string): boolean => read.flag(`${path}.on_heel`, defaults.onHeel);
  return {
    ...(read.has("loads.surcharge") && {
      surcharge: { pressure: q("loads.surcharge.pressure"), onHeel: onHeel("loads.surcharge") },
    }),
    strips: read.list("loads.strips").map((_, i) => {
      const path = `loads.strips.${i}`;
      return {
        pressure: q(`${path}.pressure`),
        from: q(`${path}.from`),
        width: q(`${path}.width`),
        onHeel: onHeel(path),
      };
    }),
    lines: read.list("loads.lines").map((_, i) => {
      const path = `loads.lines.${i}`;
      return { force: q(`${path}.force`), at: q(`${path}.at`), onHeel: onHeel(path) };
    }),
    ...(read.has("loads.earthquake") && { earthquake: { kh: q("loads.earthquake.kh"), kv: q("loads.earthquake.kv") } }),
  };
}

function buildModel(read: TreeReader): Model {
  const plane = read.has("model.plane")
    ? read.choice("model.plane", ["virtual_back", "wall_back"], "virtual_back")
    : undefined;
  return {
    earthPressure: read.choice("model.earth_pressure", ["rankine", "coulomb", "at_rest"], defaults.earthPressure),
    ...given("plane", plane),
    wallFriction: read.quantity("model.wall_friction"),
    bearing: read.choice("model.bearing", ["vesic", "en1997", "meyerhof"], defaults.bearing),
    tensionCrack: read.choice("model.tension_crack", ["dry", "water"], defaults.tensionCrack),
    factors: {
      earthThrust: read.quantity("model.factors.earth_thrust"),
      baseResistance: read.quantity("model.factors.base_resistance"),
      bearingCapacity: read.quantity("model.factors.bearing_capacity"),
      deepSeated: read.quantity("model.factors.deep_seated"),
    },
  };
}

function buildCorrelations(read: TreeReader): readonly Correlation[] {
  return read.list("correlations").map((_, i) => ({
    between: [read.text(`correlations.${i}.between.0`, ""), read.text(`correlations.${i}.between.1`, "")] as const,
    coefficient: read.number(`correlations.${i}.coefficient`) ?? Number.NaN,
  }));
}
