import { clopperPearson } from "../numeric/clopper-pearson.ts";
import type { JointSpace } from "../probability/marginal.ts";
import { fillNormals } from "../probability/streams.ts";
import { type Agreement, keepAgreeing } from "./block-tally.ts";
import type { LimitStates } from "./limit-states.ts";
import { spread } from "./monte-carlo.ts";

export interface PeriodPlan {
  readonly seed: string;
  readonly years: number;
  /** Most evaluations: years × periods. */
  readonly evaluations: number;
  /** Coefficient of variation at which sampling stops; 0 uses all evaluations. */
  readonly precision: number;
  /** Where there is evidence: periods that do not agree with it are dropped. Hangs on nothing yearly. */
  readonly agrees?: Agreement;
  readonly signal?: AbortSignal;
  readonly onProgress?: (done: number, of: number) => void;
}

export interface PeriodResult {
  readonly years: number;
  /** Probability that the wall fails in any of the years. */
  readonly probability: number;
  readonly standardError: number;
  /** 95 % Clopper–Pearson, on whole periods. */
  readonly interval: readonly [number, number];
  readonly periods: number;
  /** The same with those that did not agree with the evidence. */
  readonly drawn: number;
  readonly failures: number;
  /** Periods whose first failure falls in each year, from the first on. */
  readonly firstFailures: readonly number[];
  readonly evaluations: number;
  readonly complete: boolean;
}

/** Periods of one block: small, since each costs as many evaluations as it has years. */
const periodBlock = 1024;

/**
 * Probability of failure in a period of T years, E[1 − (1 − p)^T] with p the probability of one year given all that stays the same.
 *
 * Whole periods are drawn: what is not yearly once, the yearly coordinates anew each year; the period fails in the first year in which
 * any limit state does. So the estimate is a share of periods, with a Clopper–Pearson interval, and ground that is weak this year is
 * weak next year. (1 − (1 − E p)^T would take the years as independent, and the largest value of each variable over T years
 * would let two yearly loads reach theirs in the same moment; both are wrong.)
 *
 * Stops at checkpoints of 1, 2, 4, … blocks; the same seed gives the same bits.
 */
export async function periodProbability(
  states: LimitStates,
  space: JointSpace,
  plan: PeriodPlan,
): Promise<PeriodResult> {
  const most = Math.max(1, Math.floor(plan.evaluations / plan.years));
  const firstFailures = new Array<number>(plan.years).fill(0);
  let [drawn, periods, failures, evaluations, block, nextLook] = [0, 0, 0, 0, 0, 1];
  let complete = true;
  const counter = createPeriodCounter(states, space, plan, firstFailures);
  while (drawn < most) {
    await new Promise((resolve) => setTimeout(resolve, 0));
    if (plan.signal?.aborted && block > 0) {
      complete = false;
      break;
    }
    const count = Math.min(periodBlock, most - drawn);
    const found = counter(block, count);
    drawn += count;
    periods += found.periods;
    failures += found.failures;
    evaluations += found.evaluations;
    block++;
    plan.onProgress?.(drawn * plan.years, most * plan.years);
    if (block !== nextLook) continue;
    nextLook *= 2;
    if (plan.precision > 0 && spread(failures, periods) <= plan.precision) break;
  }
  const probability = periods === 0 ? 0 : failures / periods;
  return {
    years: plan.years,
    probability,
    standardError: periods === 0 ? 0 : Math.sqrt((probability * (1 - probability)) / periods),
    interval: periods === 0 ? [0, 1] : clopperPearson(failures, periods),
    periods,
    drawn,
    failures,
    firstFailures,
    evaluations,
    complete,
  };
}

/** Counts one block of periods; a tile whose periods have all failed is not followed further. */
function createPeriodCounter(
  states: LimitStates,
  space: JointSpace,
  plan: PeriodPlan,
  firstFailures: number[],
): (block: number, count: number) => { failures: number; evaluations: number; periods: number } {
  const { capacity, names } = states;
  const z = space.coordinates.map(() => new Float64Array(periodBlock));
  const tiles = Array.from({ length: Math.ceil(periodBlock / capacity) }, (_, tile) =>
    z.map((column) => column.subarray(tile * capacity, Math.min((tile + 1) * capacity, periodBlock))),
  );
  const factors = names.map(() => new Float64Array(capacity));
  const marks = new Uint8Array(capacity);
  const failed = new Uint8Array(periodBlock);
  const draw = (yearly: boolean, purpose: string, block: number, count: number): void => {
    space.coordinates.forEach((coordinate, j) => {
      if (coordinate.yearly === yearly) fillNormals(plan.seed, purpose, coordinate.key, block, z[j], count);
    });
  };
  const lasting = space.coordinates.flatMap((coordinate, j) => (coordinate.yearly ? [] : [z[j]]));
  const keep = new Uint8Array(periodBlock);
  return (block, drawn) => {
    failed.fill(0);
    draw(false, "period", block, drawn);
    const count = plan.agrees === undefined ? drawn : keepAgreeing(z, drawn, capacity, plan.agrees, keep, lasting);
    let [failures, evaluations] = [0, 0];
    for (let year = 0; year < plan.years && failures < count; year++) {
      draw(true, `period, year ${year}`, block, count);
      for (let tile = 0; tile * capacity < count; tile++) {
        const start = tile * capacity;
        const n = Math.min(capacity, count - start);
        if (allFailed(failed, start, n)) continue;
        states.evaluate(tiles[tile], n, factors, marks, false);
        evaluations += n;
        const fresh = noteFailures(factors, n, failed, start);
        firstFailures[year] += fresh;
        failures += fresh;
      }
    }
    return { failures, evaluations, periods: count };
  };
}

function allFailed(failed: Uint8Array, start: number, n: number): boolean {
  for (let i = start; i < start + n; i++) if (failed[i] === 0) return false;
  return true;
}

/** Marks the periods that fail now and counts those that had not failed before. */
function noteFailures(factors: readonly Float64Array[], n: number, failed: Uint8Array, start: number): number {
  let fresh = 0;
  for (let i = 0; i < n; i++) {
    if (failed[start + i] !== 0) continue;
    for (let k = 0; k < factors.length; k++) {
      if (factors[k][i] < 1) {
        failed[start + i] = 1;
        fresh++;
        break;
      }
    }
  }
  return fresh;
}

/** Probability of failing in each year, given that the wall stood until then; null once no period stands. */
export function yearlyGivenSurvival(
  result: Pick<PeriodResult, "firstFailures" | "periods">,
): readonly (number | null)[] {
  let standing = result.periods;
  return result.firstFailures.map((failures) => {
    const chance = standing > 0 ? failures / standing : null;
    standing -= failures;
    return chance;
  });
}
