/** The walls that a decision looks at: the study as it stands, each option, and what was survived. */
import type { Kernel } from "./mechanics/kernel.ts";
import { prepareWall } from "./mechanics/prepare-wall.ts";
import { isRecord, valueAt } from "./study/paths.ts";
import { quantitiesOf } from "./study/quantities.ts";
import { studyWith } from "./study/read-study.ts";
import type { Evidence, Study, UncertainQuantity } from "./study/study.ts";

/** An uncertain input of one wall that is not the study's own variable: averaged over, never learned. */
export interface StandIn {
  /** Name in the shared space; alike in two options where they set the same distribution. */
  readonly name: string;
  readonly quantity: UncertainQuantity;
}

export interface WallCase {
  readonly study: Study;
  readonly kernel: Kernel;
  /** By path. */
  readonly standIns: ReadonlyMap<string, StandIn>;
  /** Number of the entry of evidence, where the case is what was survived. */
  readonly event?: number;
}

export type OwnVariables = ReadonlyMap<string, UncertainQuantity>;

export function ownVariables(study: Study): OwnVariables {
  return new Map(
    quantitiesOf(study).flatMap(({ path, quantity }) =>
      typeof quantity === "number" ? [] : [[path, quantity] as const],
    ),
  );
}

/** Paths of the uncertain inputs of a wall. */
export function uncertainPaths({ kernel }: Pick<WallCase, "kernel">): string[] {
  return kernel.inputs.flatMap(({ path, fixed }) => (fixed === undefined ? [path] : []));
}

/** The study with an option's change; what it leaves as it was stays the study's own variable. */
export function optionCase(study: Study, change: Readonly<Record<string, unknown>>, own: OwnVariables): WallCase {
  const changed = Object.keys(change).length === 0 ? study : studyWith(study, change, { notAvailable: [] });
  const kernel = prepareWall(changed);
  return {
    study: changed,
    kernel,
    standIns: standInsOf(changed, kernel, (path, quantity) => {
      const original = own.get(path);
      return original !== undefined && alike(original, quantity) ? undefined : `${path} = ${core(quantity)}`;
    }),
  };
}

/** The study with the observed values in place, in the units of the file. An observed distribution is of that event alone. */
export function survivalCase(
  study: Study,
  entry: Extract<Evidence, { kind: "survived" }>,
  event: number,
  own: OwnVariables,
): WallCase {
  const raw = valueAt(study.document, `evidence.${event}.survived`);
  const changed = studyWith(study, isRecord(raw) ? raw : {}, { notAvailable: [] });
  const kernel = prepareWall(changed);
  const observed = new Set(Object.keys(entry.under));
  return {
    study: changed,
    kernel,
    event,
    standIns: standInsOf(changed, kernel, (path) =>
      observed.has(path) || !own.has(path) ? `${path} in evidence.${event}` : undefined,
    ),
  };
}

function standInsOf(
  study: Study,
  kernel: Kernel,
  nameOf: (path: string, quantity: UncertainQuantity) => string | undefined,
): Map<string, StandIn> {
  const used = new Set(uncertainPaths({ kernel }));
  return new Map(
    quantitiesOf(study).flatMap(({ path, quantity }) => {
      if (typeof quantity === "number" || !used.has(path)) return [];
      const name = nameOf(path, quantity);
      return name === undefined ? [] : [[path, { name, quantity }] as const];
    }),
  );
}

function alike(a: UncertainQuantity, b: UncertainQuantity): boolean {
  return core(a) === core(b);
}

function core({ distribution, yearly, knowledge }: UncertainQuantity): string {
  return JSON.stringify([distribution, yearly, knowledge ?? null]);
}
