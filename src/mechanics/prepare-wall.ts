/**
 * Study → kernel. All branching on what a study has happens here, once; none is in the loops.
 *
 *   outline → plane → water → parts of the plane → thrust
 *                   ↘ weights over the base ↘
 *             front → passive, surcharge  →  sums at the base → limit states
 */
import { distributionMean } from "../study/moments.ts";
import { quantitiesOf } from "../study/quantities.ts";
import type { Study } from "../study/study.ts";
import { columnwise } from "./columnwise.ts";
import type { Kernel, Slot } from "./kernel.ts";
import { type InputField, KernelBuilder } from "./kernel-builder.ts";
import { prepareBase } from "./stages/base.ts";
import { prepareBearing } from "./stages/bearing.ts";
import { prepareDeepSeated } from "./stages/deep-seated.ts";
import { prepareCrack, preparePlaneParts, pressureAt } from "./stages/earth-pressure.ts";
import { prepareEarthThrust, prepareSlopeMarks } from "./stages/earth-thrust.ts";
import { prepareFrontGround, prepareFrontSurcharge, preparePassive } from "./stages/front.ts";
import { clamp, prepareLayers, prepareSoil, type SoilSlots } from "./stages/layers.ts";
import type { Ledger } from "./stages/ledger.ts";
import { prepareSurcharge, prepareSurchargeWeight, prepareSurfaceLoads } from "./stages/loads.ts";
import { prepareOutline } from "./stages/outline.ts";
import { type PlaneOfPressure, preparePlane, preparePressureLaw } from "./stages/pressure-law.ts";
import { prepareEccentricity, prepareOverturning, prepareSliding } from "./stages/sliding.ts";
import { prepareHeelSoil, prepareToeSoil } from "./stages/soil-over-base.ts";
import { prepareWallWeight } from "./stages/wall-weight.ts";
import { prepareUplift, prepareWaterBehind, prepareWaterFront, prepareWaterLevels } from "./stages/water.ts";

export function inputFields(study: Study): readonly InputField[] {
  return quantitiesOf(study).map(({ path, quantity, field }) => ({
    path,
    lowest: field.lowest,
    highest: field.highest,
    angle: field.dimension === "angle" || field.dimension === "slope",
    ...(typeof quantity === "number" ? { fixed: quantity } : {}),
    mean: typeof quantity === "number" ? quantity : distributionMean(quantity.distribution),
  }));
}

/**
 * The plane the pressure acts on: as the study says; else the real back face for Coulomb where there is no base or the heel is
 * no longer than a tenth of the wall's height, judged at the means; the virtual back elsewhere.
 */
export function planeKind(study: Study, meanOf: (path: string) => number): PlaneOfPressure["kind"] {
  if (study.model.plane !== undefined) return study.model.plane;
  if (study.model.earthPressure !== "coulomb") return "virtual_back";
  if (study.wall.base === undefined) return "wall_back";
  const height = meanOf("wall.stem.height") + meanOf("wall.base.thickness");
  return meanOf("wall.base.heel") <= 0.1 * height ? "wall_back" : "virtual_back";
}

/** @throws RangeError where the study breaks a promise that reading it keeps (a soil that is not there, no base friction) */
export function prepareWall(study: Study): Kernel {
  const b = new KernelBuilder(inputFields(study));
  const soils = new Map<string, SoilSlots>();
  const soilOf = (key: string): SoilSlots => {
    const known = soils.get(key);
    if (known !== undefined) return known;
    const soil = prepareSoil(b, study, key);
    soils.set(key, soil);
    return soil;
  };
  const ledger: Ledger = { weights: [], pushes: [] };
  const o = prepareOutline(b);
  const plane = preparePlane(
    b,
    o,
    planeKind(study, (path) => b.meanOf(path)),
    study.model.earthPressure,
  );
  const frontLevel = prepareFrontLevel(b, study);
  const ponds = prepareWaterLevels(b, o, plane.top, frontLevel, study.water.flow === "seepage");
  const layers = prepareLayers(b, study, soilOf);
  const surcharge = prepareSurcharge(b, o, plane);
  const hasWater = ponds.behind !== undefined;
  const laws = layers.map((layer) => preparePressureLaw(b, o, plane, layer.soil, `Earth pressure, ${layer.soil.name}`));
  const parts = preparePlaneParts(b, plane, layers, laws, ponds, surcharge);
  const crack = prepareCrack(b, plane, parts);
  if (crack !== undefined) {
    b.places.crack = crack;
    b.step(
      "Earth pressure",
      crack,
      "z_crack",
      "level at which the pressure first turns positive",
      "from the surface down",
      {},
      "m",
    );
  }
  prepareSlopeMarks(b, o, plane, parts);
  const onWall = plane.kind === "wall_back";
  const crackWater = study.model.tensionCrack === "water" ? crack : undefined;
  prepareWaterBehind(b, ledger, o, ponds, {
    top: plane.top,
    ...(onWall ? { backTangent: o.backTangent } : {}),
    ...(crackWater === undefined ? {} : { crack: crackWater }),
  });
  prepareWaterFront(b, ledger, ponds, frontLevel);
  const thrust = prepareEarthThrust(b, ledger, o, plane, parts, surcharge, hasWater, ponds.gradient);
  prepareWallWeight(b, ledger, o);
  if (!onWall) prepareHeelSoil(b, ledger, o, layers, ponds);
  const frontSoil = soilOf(study.ground.front.soil);
  prepareToeSoil(b, ledger, o, frontSoil, ponds, frontLevel, study.ground.front.toeSoil);
  prepareSurchargeWeight(b, ledger, study, o, plane);
  prepareSurfaceLoads(b, ledger, study, o, plane);
  const front = prepareFrontGround(b, frontLevel, frontSoil, ponds);
  const passive = preparePassive(b, front);
  const uplift = prepareUplift(b, o, ponds, frontLevel);
  const base = prepareBase(b, ledger, o, thrust, uplift, study.ground.front.inOverturning ? passive : undefined);
  const below = soilOf(study.ground.below.soil);
  const wanted = new Set(study.assessment.limitStates);
  if (wanted.has("sliding")) prepareSliding(b, study, o, base, below, passive);
  if (wanted.has("overturning")) prepareOverturning(b, base);
  if (wanted.has("bearing")) prepareBearing(b, study, base, below, ponds, prepareFrontSurcharge(b, front));
  if (wanted.has("eccentricity")) prepareEccentricity(b, o, base, study.assessment.eccentricityLimit ?? Number.NaN);
  if (wanted.has("deep_seated")) prepareDeepSeated(b, study, o, layers, soilOf);
  b.limitStates.sort(
    (one, two) =>
      study.assessment.limitStates.indexOf(one.limitState) - study.assessment.limitStates.indexOf(two.limitState),
  );

  b.places.planeTop = plane.top;
  b.places.frontLevel = frontLevel;
  b.places.gradient = ponds.gradient;
  if (ponds.behind !== undefined) b.places.waterOnPlane = ponds.behind;
  if (crackWater !== undefined) b.places.crackWater = crackWater;
  layers.forEach((layer, place) => {
    if (layer.givenBottom !== undefined) b.places[`layer${place}`] = layer.givenBottom;
  });
  const factor = b.input("model.factors.earth_thrust");
  for (const part of parts) {
    const { law } = part;
    b.pressure.push({
      soil: part.layer.soil.key,
      top: part.top,
      bottom: part.bottom,
      stressTop: part.stressTop,
      stressBottom: part.stressBottom,
      pressure: (c, stress) =>
        Math.max(pressureAt(c, law, stress), 0) * c[plane.direction.horizontal][0] * c[factor][0],
    });
  }
  return b.build();
}

const local = (level: number, underside: number): number => level - underside;
const aboveUnderside = (level: number, crest: number): number => clamp(level, 0, crest);

/** Local level of the ground in front; the underside where the study gives none. */
function prepareFrontLevel(b: KernelBuilder, study: Study): Slot {
  if (study.ground.front.level === undefined) return b.constant(0);
  const level = b.formula("ground in front, local", local, [
    b.input("ground.front.level"),
    b.input("wall.underside_level"),
  ]);
  const slot = b.formula("ground in front", aboveUnderside, [level, b.constant(1e6)]);
  b.step("Outline", slot, "z_g", "level of the ground in front above the underside", "{z}", { z: slot }, "m");
  return slot;
}

// Loops written out one by one, so that each is compiled for its own formula.
columnwise(local, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = local(a[i], b[i]);
});
columnwise(aboveUnderside, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = aboveUnderside(a[i], b[i]);
});
