/** Which value of a dimension meets the target? */
import { cautions } from "./cautions.ts";
import { StudyError } from "./errors.ts";
import { buildModel, type Model } from "./model.ts";
import { normalUpperQuantile } from "./numeric/normal.ts";
import { findRoot } from "./numeric/root.ts";
import type { JointSpace } from "./probability/marginal.ts";
import { estimateProbability } from "./reliability/quick-estimate.ts";
import { factorsAt } from "./reliability/second-moment.ts";
import type { SizePoint, SizeResult } from "./results-size.ts";
import { fieldOfPath } from "./study/fields.ts";
import { labelAt, quantityAt } from "./study/quantities.ts";
import { studyWith } from "./study/read-study.ts";
import type { LimitStateName, Study } from "./study/study.ts";
import { displayUnit } from "./study/units.ts";
import { version } from "./version.ts";

/** A dimension and its range, in house units. */
export interface Vary {
  readonly path: string;
  readonly from: number;
  readonly to: number;
  readonly points?: number;
}

export interface SizeOptions {
  readonly vary: readonly [Vary] | readonly [Vary, Vary];
  readonly seed?: string;
  /** Coefficient of variation of each estimate. */
  readonly precision?: number;
  readonly samples?: number;
  readonly signal?: AbortSignal;
  readonly onProgress?: (done: number, of: number) => void;
  readonly clock?: () => number;
}

const usualPoints = { one: 21, two: 9 } as const;

/**
 * Probability and index along one dimension, or over two, all from the same draws (common random numbers: a stream belongs to the
 * variable, not to the wall), so that the curve is smooth; and the value at which the target is met.
 *
 * @throws StudyError where a path is not a number of the study, or a value makes a wall that cannot be
 */
export async function size(study: Study, options: SizeOptions): Promise<SizeResult> {
  const start = options.clock?.() ?? 0;
  const [first, second] = options.vary;
  for (const vary of options.vary) checkVary(study, vary);
  const seed = options.seed ?? study.assessment.seed;
  const count = second === undefined ? usualPoints.one : usualPoints.two;
  const values = spaced(first, first.points ?? count);
  const seconds = second === undefined ? [undefined] : spaced(second, second.points ?? count);
  let evaluations = 0;
  let shared: JointSpace | undefined;
  const at = (value: number, other: number | undefined): SizePoint => {
    const changes = {
      [first.path]: value,
      ...(second === undefined || other === undefined ? {} : { [second.path]: other }),
    };
    // The unknowns are the same at every point, so the first wall's space and its tables serve all.
    const model = buildModel(changed(study, changes), shared);
    shared = model.space;
    const estimate = estimateProbability(model.states, model.space, {
      seed,
      precision: options.precision ?? 0.05,
      samples: options.samples ?? study.assessment.samples,
    });
    evaluations += estimate.evaluations;
    const { probability, standardError, interval } = estimate;
    const reliabilityIndex = probability > 0 && probability < 1 ? normalUpperQuantile(probability) : null;
    return {
      value,
      ...(other === undefined ? {} : { second: other }),
      probability,
      standardError,
      interval,
      reliabilityIndex,
      factorAtMean: factorsAtMean(model),
    };
  };
  const points: SizePoint[] = [];
  let complete = true;
  for (const other of seconds) {
    for (const value of values) {
      await new Promise((resolve) => setTimeout(resolve, 0));
      if (options.signal?.aborted) complete = false;
      else points.push(at(value, other));
      options.onProgress?.(points.length, values.length * seconds.length);
    }
  }
  const { target } = study.assessment;
  const sized =
    target === undefined || second !== undefined
      ? {}
      : meetingTarget(points, target.probability, (value) => at(value, undefined));
  return {
    study: study.title,
    kind: "size",
    seed,
    ...described(study, first),
    ...(second === undefined ? {} : { second: described(study, second) }),
    ...(target === undefined
      ? {}
      : { target: { probability: target.probability, reliabilityIndex: target.reliabilityIndex } }),
    points,
    ...sized,
    warnings: [
      ...study.notices,
      ...(study.assessment.period === undefined
        ? []
        : [{ path: "assessment.period", message: "the curve is of one year, not of the period" }]),
      ...(study.evidence.length === 0
        ? []
        : [
            {
              path: "evidence",
              message:
                "the curve is of the beliefs before what has been seen: evidence is of the wall as it stands, not of another size, and is not weighed here",
            },
          ]),
    ],
    cautions,
    run: { version, seed, workers: 1, complete, sampling: { evaluations, seconds: (options.clock?.() ?? 0) - start } },
  };
}

function spaced({ from, to }: Vary, count: number): readonly number[] {
  return Array.from({ length: count }, (_, k) => (count === 1 ? from : from + ((to - from) * k) / (count - 1)));
}

function checkVary(study: Study, { path, from, to }: Vary): void {
  const field = fieldOfPath(path);
  const problem = (message: string, hint?: string): never => {
    throw new StudyError([{ path, message, ...(hint === undefined ? {} : { hint }) }], study.file);
  };
  if (field === undefined || quantityAt(study, path) === undefined)
    problem("is not a number of this study", "for example wall.base.heel");
  else if (!(from < to)) problem(`varies from ${from} to ${to}: the first must be the lower`);
  else if (from < field.lowest || to > field.highest)
    problem(`varies beyond its range, ${field.lowest} to ${field.highest}`);
}

/** The study with house values put in, in its own units. */
function changed(study: Study, changes: Readonly<Record<string, number>>): Study {
  return studyWith(
    study,
    Object.fromEntries(
      Object.entries(changes).map(([path, value]) => {
        const field = fieldOfPath(path);
        return [path, field === undefined ? value : value * displayUnit(field.dimension, study.units).factor];
      }),
    ),
  );
}

function described(
  study: Study,
  { path }: Vary,
): { readonly vary: string; readonly label: string; readonly unit: string } {
  const field = fieldOfPath(path);
  return {
    vary: path,
    label: labelAt(study, path) ?? path,
    unit: field === undefined ? "–" : displayUnit(field.dimension, "metric").unit,
  };
}

function factorsAtMean({ states, space }: Model): Partial<Record<LimitStateName, number>> {
  const [factors] = factorsAt(states, [space.unknowns.map((unknown) => unknown.marginal.mean)]);
  return Object.fromEntries(states.names.map((name, k) => [name, factors[k]]));
}

type Sized = Pick<SizeResult, "meetsTargetAt" | "meetsTargetSide" | "atTarget">;

/** The crossing nearest to the middle of the range, by root finding on the logarithm of the probability. */
function meetingTarget(points: readonly SizePoint[], target: number, at: (value: number) => SizePoint): Sized {
  const height = (point: SizePoint): number => Math.log(Math.max(point.probability, 1e-300) / target);
  const crossing = points.findIndex(
    (point, k) => k > 0 && Math.sign(height(point)) !== Math.sign(height(points[k - 1])),
  );
  if (crossing < 0) return { meetsTargetAt: null };
  const [before, after] = [points[crossing - 1], points[crossing]];
  const root = findRoot((value) => height(at(value)), before.value, after.value, 2e-3 * (after.value - before.value));
  return {
    meetsTargetAt: root.x,
    meetsTargetSide: height(after) < height(before) ? "above" : "below",
    atTarget: at(root.x),
  };
}
