import type { Kernel } from "../../src/mechanics/kernel.ts";
import { prepareWall } from "../../src/mechanics/prepare-wall.ts";
import { type ReadOut, readOut } from "../../src/mechanics/read-out.ts";
import { createWorkspace } from "../../src/mechanics/workspace.ts";
import { fieldOfPath } from "../../src/study/fields.ts";
import { readDocument } from "../../src/study/read-study.ts";
import type { LimitStateName } from "../../src/study/study.ts";
import type { StudyTree } from "./random-study.ts";

/** Values by path, in the study's units; what is left out stands as drawn. */
export type Values = Readonly<Record<string, number>>;

export interface OpenWall {
  readonly kernel: Kernel;
  /** Every value that is not exactly 0 in the tree, by path. */
  readonly drawn: Values;
  /** The engine's answer with some values changed. */
  at(changes: Values): ReadOut;
  /** Factors of safety alone. */
  factorsAt(changes: Values): Readonly<Partial<Record<LimitStateName, number>>>;
}

/**
 * The wall of a tree with every value that is not 0 left open, so that one kernel answers for many values: reading and
 * preparing cost a hundred times a run. Values that are 0 stay certain, and what they switch off stays off.
 */
export function openWall(tree: StudyTree): OpenWall {
  const drawn: Record<string, number> = {};
  const open = (value: unknown, path: string): unknown => {
    if (typeof value === "number") {
      if (value === 0) return value;
      drawn[path] = value;
      const field = fieldOfPath(path);
      if (field === undefined) throw new RangeError(`${path} is not a number of a study`);
      const spread = 1e-6 * Math.abs(value);
      return { uniform: { from: Math.max(value - spread, field.lowest), to: Math.min(value + spread, field.highest) } };
    }
    if (Array.isArray(value)) return value.map((entry, place) => open(entry, `${path}.${place}`));
    if (typeof value !== "object" || value === null) return value;
    return Object.fromEntries(
      Object.entries(value).map(([key, entry]) => [key, open(entry, path === "" ? key : `${path}.${key}`)]),
    );
  };
  const { assessment, ...rest } = tree;
  const kernel = prepareWall(readDocument({ ...(open(rest, "") as object), assessment }));
  const workspace = createWorkspace(kernel, 1);
  const { columns } = workspace;
  const run = (changes: Values): void => {
    for (const path of Object.keys(changes)) if (!(path in drawn)) throw new RangeError(`${path} is not open`);
    for (const { path, slot, scale, lowest, highest, fixed } of kernel.inputs)
      if (fixed === undefined)
        columns[slot][0] = scale * Math.min(Math.max(changes[path] ?? drawn[path], lowest), highest);
    workspace.run(1);
  };
  return {
    kernel,
    drawn,
    at(changes) {
      run(changes);
      return readOut(kernel, columns);
    },
    factorsAt(changes) {
      run(changes);
      return Object.fromEntries(kernel.limitStates.map(({ limitState, factor }) => [limitState, columns[factor][0]]));
    },
  };
}
