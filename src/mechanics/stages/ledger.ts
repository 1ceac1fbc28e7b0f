import type { ForceSlots, Slot } from "../kernel.ts";
import type { KernelBuilder } from "../kernel-builder.ts";

/** A vertical load and its moments: weight, weight · x about the toe, weight · z about the underside. */
export interface Weight {
  readonly name: string;
  readonly group: ForceSlots["group"];
  readonly weight: Slot;
  readonly momentX: Slot;
  /** Weight times height of the centroid: only the earthquake and the list of forces ask for it. */
  readonly momentZ?: Slot;
  readonly z?: Slot;
  /** Wall, key and soil over the heel shake; soil over the toe, surcharge and water do not. */
  readonly shakes: boolean;
}

/** A horizontal push: force, and its moment about the underside; negative where it resists. */
export interface Push {
  /** Symbol in the sums of the sheet. */
  readonly name: string;
  readonly force: Slot;
  readonly moment: Slot;
  readonly sign: 1 | -1;
}

/**
 * What the stages of the wall leave for the sums at the base. Vertical loads stabilise; pushes drive; each is also
 * a row of the list of forces, so the list and the sums cannot differ.
 */
export interface Ledger {
  readonly weights: Weight[];
  readonly pushes: Push[];
}

export function addWeight(b: KernelBuilder, ledger: Ledger, entry: Weight): void {
  ledger.weights.push(entry);
  b.forces.push({
    name: entry.name,
    group: entry.group,
    vertical: entry.weight,
    momentX: entry.momentX,
    ...(entry.momentZ === undefined ? {} : { momentZ: entry.momentZ }),
    ...(entry.z === undefined ? {} : { z: entry.z }),
  });
}
