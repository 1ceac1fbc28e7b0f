import type { Layer, Study } from "../../study/study.ts";
import type { CirclePlace } from "../deep-seated/circle.ts";
import { deepSeated } from "../deep-seated/deep-seated.ts";
import type { DeepSeatedGround, DeepSeatedLayer, DeepSeatedSoil } from "../deep-seated/ground.ts";
import { deepSeatedNear, knownPlaces } from "../deep-seated/near.ts";
import type { DeepSeatedResult } from "../deep-seated/result.ts";
import { type Columns, factorCap, mark, type Slot } from "../kernel.ts";
import type { KernelBuilder } from "../kernel-builder.ts";
import type { LayerSlots, SoilSlots } from "./layers.ts";
import type { Outline } from "./outline.ts";

/** A quantity of the ground as a column; undefined where the study has none. */
interface GroundSlots {
  readonly reads: readonly Slot[];
  /** The ground of sample i as plain numbers. */
  groundOf(columns: Columns, i: number): DeepSeatedGround;
}

const local = (level: number, underside: number): number => level - underside;
const product = (a: number, b: number): number => a * b;

/**
 * Deep-seated failure as a limit state.
 *
 * One sample is searched in full. A block is not: each sample re-evaluates the circles found at the mean values, with their
 * neighbours; the error this makes is measured in tests/mechanics/deep-seated/near.test.ts.
 */
export function prepareDeepSeated(
  b: KernelBuilder,
  study: Study,
  o: Outline,
  layers: readonly LayerSlots[],
  soilOf: (key: string) => SoilSlots,
): void {
  const slots = groundSlots(b, study, o, layers, soilOf);
  const factor = b.input("model.factors.deep_seated");
  const [raw, resisting, driving, circleX, circleZ, radius, entryX, exitX] = [
    "deep-seated factor alone",
    "deep-seated resisting alone",
    "deep-seated driving",
    "circle x",
    "circle z",
    "circle radius",
    "circle entry",
    "circle exit",
  ].map((name) => b.slot(name));
  let places: readonly CirclePlace[] | undefined;
  b.stage({
    name: "deep-seated failure",
    reads: slots.reads,
    writes: [raw, resisting, driving, circleX, circleZ, radius, entryX, exitX],
    run(c, count) {
      for (let i = 0; i < count; i++) {
        const ground = slots.groundOf(c, i);
        let found: DeepSeatedResult;
        if (count === 1) found = deepSeated(ground);
        else {
          places ??= knownPlaces([meanGround(b, slots, c)]);
          found = places.length === 0 ? deepSeated(ground) : deepSeatedNear(ground, places);
        }
        c[raw][i] = found.factor;
        c[resisting][i] = found.resisting;
        c[driving][i] = found.driving;
        c[circleX][i] = found.circle?.x ?? 0;
        c[circleZ][i] = found.circle?.z ?? 0;
        c[radius][i] = found.circle?.radius ?? 0;
        c[entryX][i] = found.circle?.entryX ?? 0;
        c[exitX][i] = found.circle?.exitX ?? 0;
      }
    },
  });
  const factored = b.slot("factor of safety, deep_seated");
  const resistingFactored = b.formula("deep-seated resisting", product, [resisting, factor]);
  b.stage({
    name: "deep_seated",
    reads: [raw, factor, b.marks],
    writes: [factored, b.marks],
    run(c, count) {
      for (let i = 0; i < count; i++) {
        const f = c[raw][i] >= factorCap ? factorCap : Math.min(c[raw][i] * c[factor][i], factorCap);
        c[factored][i] = f;
        if (f >= factorCap) c[b.marks][i] |= mark.capped;
      }
    },
  });
  b.limitStates.push({
    limitState: "deep_seated",
    factor: factored,
    resisting: resistingFactored,
    driving,
    unit: "kNm/m",
  });
  Object.assign(b.places, { circleX, circleZ, circleRadius: radius, circleEntryX: entryX, circleExitX: exitX });
  b.notes.push((columns) => deepSeated(slots.groundOf(columns, 0)).notes);
  const heading = "Deep-seated failure";
  const source = "Bishop (1955), simplified method, in the limit of thin slices";
  b.step(
    heading,
    circleX,
    "x_c",
    "centre of the critical circle, from the tip of the toe",
    "smallest factor over all circles below the base",
    {},
    "m",
  );
  b.step(heading, circleZ, "z_c", "centre of the critical circle, above the underside", "of the same circle", {}, "m");
  b.step(heading, radius, "R", "its radius", "of the same circle", {}, "m");
  b.step(
    heading,
    driving,
    "M_driving",
    "driving moment about the centre",
    "Σ W·x and loads, earthquake, less water on the end face",
    {},
    "kNm/m",
  );
  b.step(
    heading,
    resisting,
    "M_resisting",
    "resisting moment about the centre",
    "R·Σ (c′·b + N′·tan φ′)/m_α",
    {},
    "kNm/m",
    source,
  );
  b.step(
    heading,
    factored,
    "F",
    "factor of safety against deep-seated failure",
    "{f}·{M_resisting}/{M_driving}",
    { f: factor, M_resisting: resisting, M_driving: driving },
    "–",
    source,
  );
}

/** The ground at the means: where the circles of a block come from, the same for any block and any worker. */
function meanGround(b: KernelBuilder, slots: GroundSlots, columns: Columns): DeepSeatedGround {
  const means = columns.map((column) => Float64Array.of(column[0]));
  for (const { slot, mean } of b.varyingInputs()) means[slot][0] = mean;
  b.runBefore(slots.reads, means);
  return slots.groundOf(means, 0);
}

function groundSlots(
  b: KernelBuilder,
  study: Study,
  o: Outline,
  layers: readonly LayerSlots[],
  soilOf: (key: string) => SoilSlots,
): GroundSlots {
  const underside = b.input("wall.underside_level");
  const levelOf = (path: string): Slot => b.formula(`${path}, local`, local, [b.input(path), underside]);
  const optional = (there: boolean, path: string, level = true): Slot | undefined =>
    there ? (level ? levelOf(path) : b.input(path)) : undefined;
  const belowLayers: readonly Layer[] =
    study.ground.below.layers.length > 0 ? study.ground.below.layers : [{ soil: study.ground.below.soil }];
  const below = belowLayers.map((layer, place) => ({
    soil: soilOf(layer.soil),
    bottom: optional(layer.bottom !== undefined, `ground.below.layers.${place}.bottom`),
  }));
  const frontSoil = soilOf(study.ground.front.soil);
  const firm = optional(study.ground.below.firmLevel !== undefined, "ground.below.firm_level");
  const frontLevel = optional(study.ground.front.level !== undefined, "ground.front.level");
  const water = {
    behind: optional(study.water.behind !== undefined, "water.behind.level"),
    front: optional(study.water.front !== undefined, "water.front.level"),
  };
  const surcharge = optional(study.loads.surcharge !== undefined, "loads.surcharge.pressure", false);
  const shaken = study.loads.earthquake !== undefined;
  const [kh, kv] = [optional(shaken, "loads.earthquake.kh", false), optional(shaken, "loads.earthquake.kv", false)];
  const key =
    study.wall.shearKey === undefined
      ? undefined
      : ["from_toe", "width", "depth"].map((part) => b.input(`wall.shear_key.${part}`));
  const strips = study.loads.strips.map((_, place) =>
    ["pressure", "from", "width"].map((part) => b.input(`loads.strips.${place}.${part}`)),
  );
  const lines = study.loads.lines.map((_, place) =>
    ["force", "at"].map((part) => b.input(`loads.lines.${place}.${part}`)),
  );
  const ignoreTop = b.input("ground.front.ignore_top");
  const unitWeight = b.input("wall.unit_weight");
  const soilReads = (soil: SoilSlots): Slot[] => [soil.moist, soil.saturated, soil.frictionAngle, soil.cohesion];
  const given = (slot: Slot | undefined): Slot[] => (slot === undefined ? [] : [slot]);
  const reads = [
    ...[o.stemHeight, o.crestWidth, o.footWidth, o.backRun, o.toe, o.heel, o.thickness, unitWeight, o.slope, ignoreTop],
    ...layers.flatMap((layer) => [...soilReads(layer.soil), ...given(layer.givenBottom)]),
    ...below.flatMap((layer) => [...soilReads(layer.soil), ...given(layer.bottom)]),
    ...soilReads(frontSoil),
    ...[firm, frontLevel, water.behind, water.front, surcharge, kh, kv].flatMap(given),
    ...(key ?? []),
    ...strips.flat(),
    ...lines.flat(),
  ];
  return {
    reads,
    groundOf(c, i) {
      const at = (slot: Slot): number => c[slot][i];
      const maybe = (slot: Slot | undefined): number | undefined => (slot === undefined ? undefined : c[slot][i]);
      const soilAt = (soil: SoilSlots): DeepSeatedSoil => ({
        unitWeight: at(soil.moist),
        saturatedUnitWeight: at(soil.saturated),
        frictionAngle: at(soil.frictionAngle),
        cohesion: at(soil.cohesion),
      });
      const layerAt = (soil: SoilSlots, bottom: Slot | undefined): DeepSeatedLayer => ({
        soil: soilAt(soil),
        ...(bottom === undefined ? {} : { bottom: at(bottom) }),
      });
      const [firmLevel, behind, front] = [maybe(firm), maybe(water.behind), maybe(water.front)];
      return {
        wall: {
          stemHeight: at(o.stemHeight),
          crestWidth: at(o.crestWidth),
          footWidth: at(o.footWidth),
          backRun: at(o.backRun),
          toe: at(o.toe),
          heel: at(o.heel),
          thickness: at(o.thickness),
          unitWeight: at(unitWeight),
          ...(key === undefined ? {} : { key: { fromToe: at(key[0]), width: at(key[1]), depth: at(key[2]) } }),
        },
        behind: { slope: at(o.slope), layers: layers.map((layer) => layerAt(layer.soil, layer.givenBottom)) },
        below: below.map((layer) => layerAt(layer.soil, layer.bottom)),
        ...(firmLevel === undefined ? {} : { firmLevel }),
        front: {
          level: Math.max(maybe(frontLevel) ?? 0, 0),
          ignoreTop: at(ignoreTop),
          toeSoil: study.ground.front.toeSoil,
          soil: soilAt(frontSoil),
        },
        water: { ...(behind === undefined ? {} : { behind }), ...(front === undefined ? {} : { front }) },
        loads: {
          surcharge: maybe(surcharge) ?? 0,
          strips: strips.map(([pressure, from, width]) => ({
            pressure: at(pressure),
            from: at(from),
            width: at(width),
          })),
          lines: lines.map(([force, place]) => ({ force: at(force), at: at(place) })),
        },
        earthquake: { kh: maybe(kh) ?? 0, kv: maybe(kv) ?? 0 },
      };
    },
  };
}
