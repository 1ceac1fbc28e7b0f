/** Strength factors: from the values of a check to design values. */
import { quantitiesOf } from "../study/quantities.ts";
import type { Quantity, Study } from "../study/study.ts";
import type { PartialFactors } from "./partial-factors.ts";

const degree = Math.PI / 180;

/** φ_d = atan(tan φ/γ), degrees. */
export function designFrictionAngle(frictionAngleDeg: number, factor: number): number {
  return Math.atan(Math.tan(frictionAngleDeg * degree) / factor) / degree;
}

/**
 * The design value of one quantity, in the study's unit (angles in degrees).
 *
 *   friction angles of soils, of the base and of the wall's back   tan φ_d = tan φ/γ
 *   cohesion, adhesion, undrained strength, unit weights of soils  X_d = X/γ
 *
 * The ratio of base friction to φ′ stays: base friction follows φ′_d. The wall's own unit weight and everything else stay too.
 */
export function designValue(path: string, value: number, { strength }: PartialFactors): number {
  const [head, , key] = path.split(".");
  if (head === "soils") {
    if (key === "friction_angle") return designFrictionAngle(value, strength.tanFrictionAngle);
    if (key === "cohesion") return value / strength.cohesion;
    if (key === "undrained_strength") return value / strength.undrainedStrength;
    if (key === "unit_weight" || key === "saturated_unit_weight") return value / strength.unitWeight;
    return value;
  }
  if (path === "wall.sliding_friction.angle" || path === "model.wall_friction")
    return designFrictionAngle(value, strength.tanFrictionAngle);
  if (path === "wall.sliding_friction.adhesion") return value / strength.cohesion;
  return value;
}

/**
 * The study with every quantity at its design value, none of them uncertain any more.
 *
 * @param values what uncertain quantities are taken at, by path, before factors; all of them must be there
 * @param loads `factored`: surcharge, strips and lines times the variable action factor too. For deep-seated failure alone,
 *   whose loads enter no list of forces.
 * @throws RangeError where the value of an uncertain quantity is missing
 */
export function designStudy(
  study: Study,
  values: Readonly<Record<string, number>>,
  factors: PartialFactors,
  loads: "as they are" | "factored" = "as they are",
): Study {
  const copy = structuredClone({ ...study, correlations: [], evidence: [] }) as Study;
  for (const { path, quantity } of quantitiesOf(study)) {
    const value = typeof quantity === "number" ? quantity : values[path];
    if (value === undefined) throw new RangeError(`no value for ${path}`);
    const times = loads === "factored" && isVariableLoad(path) ? factors.actions.variable : 1;
    setQuantity(copy, path, times * designValue(path, value, factors));
  }
  // a saturated unit weight that is left out follows the moist one before factors, not after
  for (const [name, soil] of Object.entries(study.soils))
    if (soil.saturatedUnitWeight === undefined)
      setQuantity(
        copy,
        `soils.${name}.saturated_unit_weight`,
        (numberOf(soil.unitWeight, values[`soils.${name}.unit_weight`]) + 2) / factors.strength.unitWeight,
      );
  return copy;
}

const isVariableLoad = (path: string): boolean =>
  /^loads\.(surcharge\.pressure|strips\.\d+\.pressure|lines\.\d+\.force)$/.test(path);

const numberOf = (quantity: Quantity, value: number): number => (typeof quantity === "number" ? quantity : value);

/** Keys of the file are camelCase in the study, but for the names of soils. */
function setQuantity(study: Study, path: string, value: number): void {
  const keys = path.split(".").map((key, place, all) => (all[0] === "soils" && place === 1 ? key : camelCase(key)));
  const last = keys.pop() as string;
  const parent = keys.reduce<unknown>((here, key) => (here as Record<string, unknown>)[key], study);
  (parent as Record<string, unknown>)[last] = value;
}

const camelCase = (key: string): string => key.replace(/_(\w)/g, (_, letter: string) => letter.toUpperCase());
