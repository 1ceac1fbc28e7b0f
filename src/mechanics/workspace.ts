import type { Columns, Kernel, Slot, Stage } from "./kernel.ts";
import { stagesFor } from "./kernel-builder.ts";

/** A kernel with columns of its own: made once, run as often as wanted, allocating nothing. */
export interface Workspace {
  readonly kernel: Kernel;
  readonly columns: Columns;
  readonly capacity: number;
  /** Runs the coefficients' formulas and the stages on the first `count` entries of the input columns. */
  run(count: number): void;
  /** Whether anything wanted rests on this slot. */
  needs(slot: Slot): boolean;
  /** The same without the coefficients, for a caller that has filled them from tables. */
  runStages(count: number): void;
}

/**
 * @param capacity largest count of one run
 * @param wanted slots to compute; stages that none of them needs are left out. All where absent.
 */
export function createWorkspace(kernel: Kernel, capacity: number, wanted?: readonly Slot[]): Workspace {
  const stages = wanted === undefined ? kernel.stages : neededStages(kernel, wanted);
  const needed = new Set(stages.flatMap((stage) => stage.reads).concat(wanted ?? []));
  const coefficients =
    wanted === undefined
      ? kernel.coefficients
      : kernel.coefficients.filter((coefficient) => needed.has(coefficient.into));
  const columns = Array.from({ length: kernel.slots }, () => new Float64Array(capacity));
  for (const { slot, value } of kernel.constants) columns[slot].fill(value);
  const marks = columns[kernel.marks];
  const runStages = (count: number): void => {
    marks.fill(kernel.constantMarks, 0, count);
    for (let s = 0; s < stages.length; s++) stages[s].run(columns, count);
  };
  return {
    kernel,
    columns,
    capacity,
    runStages,
    needs: (slot) => wanted === undefined || needed.has(slot),
    run(count) {
      for (let k = 0; k < coefficients.length; k++) {
        const { value } = coefficients[k];
        const [from, into] = [columns[coefficients[k].from], columns[coefficients[k].into]];
        for (let i = 0; i < count; i++) into[i] = value(from[i]);
      }
      runStages(count);
    },
  };
}

/** Stages that the wanted slots rest on, found from the last to the first; the marks always count. */
export function neededStages(kernel: Kernel, wanted: readonly Slot[]): readonly Stage[] {
  return stagesFor(kernel.stages, [...wanted, kernel.marks]);
}

/** Slots of the factors of safety: what sampling wants. */
export function factorSlots(kernel: Kernel): readonly Slot[] {
  return kernel.limitStates.map((state) => state.factor);
}
