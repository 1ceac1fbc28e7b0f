import { clopperPearson } from "../numeric/clopper-pearson.ts";
import { CompensatedSum } from "../numeric/compensated-sum.ts";
import { normalUpperQuantile } from "../numeric/normal.ts";
import { streamBlock } from "../probability/streams.ts";
import type { ConvergencePoint, Histogram, MonteCarloResult } from "../results.ts";
import { type BlockTally, type PictureTally, pictureEdges, type SamplingPlan, type StateTally } from "./block-tally.ts";

/** Where blocks are counted: in this thread, or by workers. Tallies may be asked for ahead and come back in any order. */
export interface BlockRunner {
  /** Blocks that may be in hand at once. */
  readonly ahead: number;
  tally(block: number): Promise<BlockTally>;
  /** Lets go of what was started for the run; blocks still in hand are never answered. */
  close?(): Promise<void>;
}

export interface MonteCarloOptions {
  /** Coefficient of variation of the system's estimate at which sampling stops; 0 uses all samples. */
  readonly precision: number;
  readonly onProgress?: (done: number, of: number) => void;
  readonly signal?: AbortSignal;
}

/** A merged picture of one limit state or the system. */
export interface StateTotals {
  failures: number;
  stableFailures: number;
  counted: number;
  readonly sum: CompensatedSum;
  readonly sumSquares: CompensatedSum;
  readonly histogram: number[];
  below: number;
  above: number;
  readonly picture: {
    failures: number;
    readonly sums: CompensatedSum[];
    readonly squares: CompensatedSum[];
    readonly bins: number[][];
  };
  readonly convergence: ConvergencePoint[];
}

export interface MonteCarloRun {
  /** Samples that count, and all that were drawn: more where there is evidence that some do not agree with. */
  readonly samples: number;
  readonly drawn: number;
  readonly stable: number;
  readonly marks: BlockTally["marks"];
  readonly states: readonly StateTotals[];
  readonly system: StateTotals;
  /** What is believed with the evidence, failing or not; empty without evidence. */
  readonly believed: StateTotals["picture"];
  /** false when it was stopped from outside; what is here equals a run of `samples` samples. */
  readonly complete: boolean;
}

/**
 * Plain Monte Carlo sampling in blocks, merged in block order alone.
 *
 * The stop rule looks at merged prefixes of 1, 2, 4, … blocks: it stops where the coefficient of variation of the system's
 * estimate, √((1 − p)/(n p)), is at or below `precision`. Blocks that ran ahead of a stop are thrown away and not counted, so
 * the result depends neither on the number of workers nor on their speed, and a stopped run equals a fixed run of that size.
 */
export async function monteCarlo(
  plan: SamplingPlan,
  runner: BlockRunner,
  options: MonteCarloOptions,
): Promise<MonteCarloRun> {
  const blocks = Math.ceil(plan.samples / streamBlock);
  const waiting = new Map<number, Promise<BlockTally>>();
  const run = emptyRun(plan);
  let asked = 0;
  let nextLook = 1;
  for (let block = 0; block < blocks; block++) {
    while (asked < blocks && asked < block + runner.ahead) {
      const promise = runner.tally(asked);
      // A block thrown away must not bring the process down when its worker ends.
      promise.catch(() => undefined);
      waiting.set(asked++, promise);
    }
    const tally = await waiting.get(block);
    if (tally === undefined) throw new RangeError(`block ${block} was never asked for`);
    waiting.delete(block);
    if (options.signal?.aborted && block > 0) {
      run.complete = false;
      break;
    }
    mergeInto(run, tally);
    options.onProgress?.(run.drawn, plan.samples);
    if (worthShowing(block + 1) || block + 1 === blocks) notePoint(run);
    if (block + 1 !== nextLook) continue;
    nextLook *= 2;
    if (options.precision > 0 && spread(run.system.failures, run.samples) <= options.precision) break;
  }
  if (run.system.convergence.at(-1)?.samples !== run.samples) notePoint(run);
  return run;
}

/** Coefficient of variation of a plain estimate; infinite without failures. */
export function spread(failures: number, samples: number): number {
  return failures === 0 ? Number.POSITIVE_INFINITY : Math.sqrt((1 - failures / samples) / failures);
}

/** Points of the convergence chart: every block to 8, then at steps of about a fifth, and at every look of the stop rule. */
function worthShowing(blocks: number): boolean {
  if (blocks <= 8 || Number.isInteger(Math.log2(blocks))) return true;
  const step = Math.floor(5 * Math.log2(blocks));
  return step !== Math.floor(5 * Math.log2(blocks - 1));
}

type MutableRun = { -readonly [K in keyof MonteCarloRun]: MonteCarloRun[K] };

function emptyRun(plan: SamplingPlan): MutableRun {
  const state = (bins: number): StateTotals => ({
    failures: 0,
    stableFailures: 0,
    counted: 0,
    sum: new CompensatedSum(),
    sumSquares: new CompensatedSum(),
    histogram: new Array<number>(bins).fill(0),
    below: 0,
    above: 0,
    picture: { failures: 0, sums: [], squares: [], bins: [] },
    convergence: [],
  });
  return {
    samples: 0,
    drawn: 0,
    stable: 0,
    marks: { slopeUnstable: 0, lostContact: 0, capped: 0, outOfRange: 0 },
    states: plan.edges.map((edges) => state(edges.length - 1)),
    system: state(0),
    believed: { failures: 0, sums: [], squares: [], bins: [] },
    complete: true,
  };
}

function mergeInto(run: MutableRun, tally: BlockTally): void {
  run.samples += tally.samples;
  run.drawn += tally.drawn;
  if (tally.believed !== undefined) mergePicture(run.believed, tally.believed);
  run.stable += tally.stable;
  run.marks.slopeUnstable += tally.marks.slopeUnstable;
  run.marks.lostContact += tally.marks.lostContact;
  run.marks.capped += tally.marks.capped;
  run.marks.outOfRange += tally.marks.outOfRange;
  run.states.forEach((state, k) => {
    mergeState(state, tally.states[k]);
  });
  mergeState(run.system, tally.system);
}

function mergeState(into: StateTotals, from: StateTally): void {
  into.failures += from.failures;
  into.stableFailures += from.stableFailures;
  into.counted += from.counted;
  into.sum.add(from.sum);
  into.sumSquares.add(from.sumSquares);
  into.below += from.below;
  into.above += from.above;
  from.histogram.forEach((count, bin) => {
    into.histogram[bin] += count;
  });
  mergePicture(into.picture, from.picture);
}

function mergePicture(into: StateTotals["picture"], from: PictureTally): void {
  into.failures += from.failures;
  from.sums.forEach((sum, v) => {
    into.sums[v] ??= new CompensatedSum();
    into.squares[v] ??= new CompensatedSum();
    into.bins[v] ??= new Array<number>(pictureEdges.length - 1).fill(0);
    into.sums[v].add(sum);
    into.squares[v].add(from.squares[v]);
    from.bins[v].forEach((count, bin) => {
      into.bins[v][bin] += count;
    });
  });
}

function notePoint(run: MutableRun): void {
  for (const state of [...run.states, run.system]) {
    if (run.samples === 0) continue;
    const interval = clopperPearson(state.failures, run.samples);
    state.convergence.push({ samples: run.samples, probability: state.failures / run.samples, interval });
  }
}

/** Estimate, standard error and 95 % Clopper–Pearson interval of one limit state (or the system, without `centre`). */
export function monteCarloResult(run: MonteCarloRun, state: StateTotals, centre?: number): MonteCarloResult {
  const { samples } = run;
  // where no sample agrees with the evidence nothing is known
  const probability = samples === 0 ? 0 : state.failures / samples;
  const moments = centre === undefined ? { mean: null, sd: null } : momentsAbout(state, centre);
  return {
    probability,
    standardError: samples === 0 ? 0 : Math.sqrt((probability * (1 - probability)) / samples),
    interval: samples === 0 ? [0, 1] : clopperPearson(state.failures, samples),
    failures: state.failures,
    samples,
    reliabilityIndex: state.failures === 0 || state.failures === samples ? null : normalUpperQuantile(probability),
    factorMean: moments.mean,
    factorSd: moments.sd,
    counts: { ...run.marks },
    ...(run.stable < samples
      ? { probabilityAmongStable: run.stable === 0 ? 0 : state.stableFailures / run.stable }
      : {}),
  };
}

function momentsAbout(state: StateTotals, centre: number): { mean: number | null; sd: number | null } {
  const { counted } = state;
  if (counted === 0) return { mean: null, sd: null };
  const shift = state.sum.value / counted;
  const variance = counted > 1 ? (state.sumSquares.value - counted * shift * shift) / (counted - 1) : 0;
  return { mean: centre + shift, sd: Math.sqrt(Math.max(variance, 0)) };
}

export function histogramOf(state: StateTotals, edges: readonly number[]): Histogram {
  return { edges, counts: state.histogram, below: state.below, above: state.above };
}

/** Sixty bins about the factor's likely range, with an edge at 1 so that the failed part ends there. */
export function histogramEdges(mean: number, sd: number): readonly number[] {
  const spreadOf = sd > 0 && Number.isFinite(sd) ? sd : Math.max(0.1 * Math.abs(mean), 0.01);
  const width = niceStep((9 * spreadOf) / 60);
  const lowest = Math.max(mean - 4.5 * spreadOf, 0);
  const start = 1 - Math.ceil((1 - lowest) / width - 1e-9) * width;
  return Array.from({ length: 61 }, (_, k) => start + k * width);
}

/** The nearest of 1, 2, 2.5, 5 × 10ⁿ that is not smaller. */
function niceStep(step: number): number {
  const size = 10 ** Math.floor(Math.log10(step));
  const factor = [1, 2, 2.5, 5, 10].find((candidate) => candidate * size >= step - 1e-12 * size) ?? 10;
  return factor * size;
}
