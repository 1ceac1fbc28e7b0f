/** Study → the vector of unknowns and the limit states over it: the one bridge between the two halves. */
import type { Kernel } from "./mechanics/kernel.ts";
import { prepareWall } from "./mechanics/prepare-wall.ts";
import { jointSpace } from "./probability/joint-space.ts";
import type { JointSpace, Marginal } from "./probability/marginal.ts";
import { marginalOf } from "./probability/marginal-of.ts";
import { quantitiesOf } from "./study/quantities.ts";
import type { Study, UncertainQuantity } from "./study/study.ts";
import { type WallStates, wallStates } from "./wall-states.ts";

export interface Model {
  readonly study: Study;
  readonly kernel: Kernel;
  readonly space: JointSpace;
  readonly states: WallStates;
}

export interface ModelUnknown {
  readonly path: string;
  readonly label: string;
  readonly unit: string;
  readonly quantity: UncertainQuantity;
  readonly marginal: Marginal;
}

/** The uncertain quantities that the wall's calculation asks for, in the order of the study. */
export function unknownsOf(study: Study, kernel: Kernel): readonly ModelUnknown[] {
  const used = new Set(kernel.inputs.map((input) => input.path));
  return quantitiesOf(study).flatMap(({ path, label, quantity, field }) =>
    typeof quantity === "number" || !used.has(path)
      ? []
      : [{ path, label, unit: field.dimension, quantity, marginal: marginalOf(quantity.distribution) }],
  );
}

/** Whether anything in the study rests on the split of a variable into knowledge and nature. */
export function needsSplit(study: Study): boolean {
  return (
    study.evidence.length > 0 ||
    quantitiesOf(study).some(({ quantity }) => typeof quantity !== "number" && quantity.yearly)
  );
}

/**
 * @param shared a space that holds the study's unknowns and perhaps more; built from the study where absent
 * @throws StudyError where correlations have no joint distribution
 */
export function buildModel(study: Study, shared?: JointSpace, capacity?: number): Model {
  const kernel = prepareWall(study);
  const space = shared ?? spaceOf(study, kernel);
  return { study, kernel, space, states: wallStates(kernel, space, capacity) };
}

export function spaceOf(study: Study, kernel: Kernel, split: boolean = needsSplit(study)): JointSpace {
  const unknowns = unknownsOf(study, kernel).map(({ path, marginal, quantity }) => ({
    path,
    marginal,
    knowledge: quantity.knowledge,
    yearly: quantity.yearly,
  }));
  const known = new Set(unknowns.map((unknown) => unknown.path));
  const correlations = study.correlations.filter(({ between }) => between.every((path) => known.has(path)));
  return jointSpace(unknowns, correlations, split);
}
