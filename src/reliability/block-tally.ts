import type { JointSpace } from "../probability/marginal.ts";
import { standInOf } from "../probability/marginal-table.ts";
import { fillNormals, streamBlock } from "../probability/streams.ts";
import type { Columns, LimitStates } from "./limit-states.ts";

/** What is to be counted: plain data, so that a worker can be handed it. */
export interface SamplingPlan {
  readonly seed: string;
  readonly purpose: string;
  /** Most samples of the run; the last block may be partial. */
  readonly samples: number;
  /** Per limit state: the factor that sums are taken about, and the edges of its histogram (ascending). */
  readonly centres: readonly number[];
  readonly edges: readonly (readonly number[])[];
}

/** What one block of samples adds to a limit state, or to the system. */
export interface StateTally {
  failures: number;
  /** Failures among the samples not marked slope_unstable. */
  stableFailures: number;
  /** Samples whose factor is neither at the cap nor 0, with sums of F − centre and its square. */
  counted: number;
  sum: number;
  sumSquares: number;
  /** Bins between the edges, then samples below the first and above the last. */
  readonly histogram: number[];
  below: number;
  above: number;
  readonly picture: PictureTally;
}

/** Values of the unknowns among the failures that a block looks at: at most `picturesPerBlock` of them, the first ones. */
export interface PictureTally {
  failures: number;
  /** Per unknown: sums of x − mean and its square, and counts in the bins of u (see `pictureEdges`). */
  readonly sums: number[];
  readonly squares: number[];
  readonly bins: number[][];
}

export interface BlockTally {
  readonly block: number;
  /** Samples that count: all that were drawn, or those among them that agree with what has been seen. */
  readonly samples: number;
  readonly drawn: number;
  /** Samples not marked slope_unstable. */
  stable: number;
  readonly marks: { slopeUnstable: number; lostContact: number; capped: number; outOfRange: number };
  readonly states: readonly StateTally[];
  readonly system: StateTally;
  /** Values of the unknowns among the first samples that agree with what has been seen, failing or not; absent without evidence. */
  readonly believed?: PictureTally;
}

/**
 * Brings samples to where results have moved what is believed, in place, and says which agree with what has been seen: sets
 * keep[i] to 1 or 0 for the first n. Those that do are independent samples of what is believed afterwards.
 */
export type Agreement = (z: Columns, n: number, keep: Uint8Array) => void;

export const picturesPerBlock = 256;
/** Bins of the failure picture in u: a quarter of a standard deviation wide, the outermost open. */
export const pictureEdges: readonly number[] = Array.from({ length: 41 }, (_, k) => k / 4 - 5);
const pictureBins = pictureEdges.length - 1;

export interface BlockCounter {
  /** Draws, evaluates and counts one block. The result is the same on any worker. */
  tally(block: number): BlockTally;
}

const [slopeUnstable, lostContact, capped, outOfRange] = [1, 2, 4, 8];
const factorCap = 1e3;

/**
 * Makes the columns once; each block then allocates nothing but its tally.
 *
 * @param agrees where there is evidence: samples that do not agree are dropped, and count nowhere
 */
export function createBlockCounter(
  states: LimitStates,
  space: JointSpace,
  plan: SamplingPlan,
  agrees?: Agreement,
): BlockCounter {
  const { dimension, capacity, names, keys } = states;
  const z = keys.map(() => new Float64Array(streamBlock));
  const tiles = Array.from({ length: Math.ceil(streamBlock / capacity) }, (_, tile) =>
    z.map((column) => column.subarray(tile * capacity, Math.min((tile + 1) * capacity, streamBlock))),
  );
  const factors = names.map(() => new Float64Array(capacity));
  const marks = new Uint8Array(capacity);
  const failed = new Uint8Array(capacity);
  const point = createFailurePoint(space);
  const keep = new Uint8Array(streamBlock);
  return {
    tally(block) {
      const drawn = Math.min(streamBlock, plan.samples - block * streamBlock);
      if (!(block >= 0 && drawn > 0))
        throw new RangeError(`block ${block} lies outside a run of ${plan.samples} samples`);
      for (let j = 0; j < dimension; j++) fillNormals(plan.seed, plan.purpose, keys[j], block, z[j], drawn);
      const samples = agrees === undefined ? drawn : keepAgreeing(z, drawn, capacity, agrees, keep);
      const tally = {
        ...emptyTally(block, samples, drawn, space, plan),
        ...(agrees === undefined ? {} : { believed: believedPicture(z, samples, space, point) }),
      };
      for (let tile = 0; tile * capacity < samples; tile++) {
        const n = Math.min(capacity, samples - tile * capacity);
        states.evaluate(tiles[tile], n, factors, marks, false);
        failed.fill(0, 0, n);
        countMarks(marks, n, tally);
        for (let k = 0; k < names.length; k++)
          countState(factors[k], n, marks, failed, tally.states[k], plan.centres[k], plan.edges[k]);
        countSystem(failed, marks, n, tally.system);
        drawPictures(tiles[tile], factors, failed, n, point, tally);
      }
      return tally;
    },
  };
}

/**
 * Moves the samples that agree with what has been seen to the front of the columns.
 *
 * @returns how many there are
 */
export function keepAgreeing(
  z: Columns,
  drawn: number,
  capacity: number,
  agrees: Agreement,
  keep: Uint8Array,
  moved: readonly Float64Array[] = z as readonly Float64Array[],
): number {
  for (let start = 0; start < drawn; start += capacity) {
    const n = Math.min(capacity, drawn - start);
    agrees(
      z.map((column) => column.subarray(start, start + n)),
      n,
      keep.subarray(start, start + n),
    );
  }
  let kept = 0;
  for (let i = 0; i < drawn; i++) {
    if (keep[i] === 0) continue;
    for (const column of moved) column[kept] = column[i];
    kept++;
  }
  return kept;
}

function believedPicture(z: Columns, samples: number, space: JointSpace, point: FailurePoint): PictureTally {
  const picture = emptyPicture(space);
  for (let i = 0; i < Math.min(samples, picturesPerBlock); i++) {
    point.lookAt(z, i);
    addToPicture(picture, point);
  }
  return picture;
}

function countMarks(marks: Uint8Array, n: number, tally: BlockTally): void {
  let [unstable, lost, atCap, out] = [0, 0, 0, 0];
  for (let i = 0; i < n; i++) {
    const bits = marks[i];
    if (bits === 0) continue;
    if (bits & slopeUnstable) unstable++;
    if (bits & lostContact) lost++;
    if (bits & capped) atCap++;
    if (bits & outOfRange) out++;
  }
  tally.stable += n - unstable;
  tally.marks.slopeUnstable += unstable;
  tally.marks.lostContact += lost;
  tally.marks.capped += atCap;
  tally.marks.outOfRange += out;
}

/** Counts failures, sums and the histogram of one limit state, and notes in `failed` which samples fail. */
function countState(
  factor: Float64Array,
  n: number,
  marks: Uint8Array,
  failed: Uint8Array,
  state: StateTally,
  centre: number,
  edges: readonly number[],
): void {
  const { histogram } = state;
  const bins = edges.length - 1;
  const [first, last] = [edges[0], edges[bins]];
  const perUnit = bins / (last - first);
  let { failures, stableFailures, counted, sum, sumSquares, below, above } = state;
  for (let i = 0; i < n; i++) {
    const f = factor[i];
    if (f < 1) {
      failures++;
      failed[i] = 1;
      if ((marks[i] & slopeUnstable) === 0) stableFailures++;
    }
    if (f > 0 && f < factorCap) {
      counted++;
      const off = f - centre;
      sum += off;
      sumSquares += off * off;
    }
    if (f < first) below++;
    else if (f >= last) above++;
    else histogram[Math.min(((f - first) * perUnit) | 0, bins - 1)]++;
  }
  Object.assign(state, { failures, stableFailures, counted, sum, sumSquares, below, above });
}

function countSystem(failed: Uint8Array, marks: Uint8Array, n: number, system: StateTally): void {
  let [failures, stable] = [0, 0];
  for (let i = 0; i < n; i++) {
    if (failed[i] === 0) continue;
    failures++;
    if ((marks[i] & slopeUnstable) === 0) stable++;
  }
  system.failures += failures;
  system.stableFailures += stable;
}

/**
 * x of the unknowns at the first failures of the block, for each limit state and the system. A sample that several of them
 * want is looked at once.
 */
function drawPictures(
  z: Columns,
  factors: Columns,
  failed: Uint8Array,
  n: number,
  point: FailurePoint,
  tally: BlockTally,
): void {
  const last = factors.length;
  const full = (k: number): boolean => (k < last ? tally.states[k] : tally.system).picture.failures >= picturesPerBlock;
  const open = Array.from({ length: last + 1 }, (_, k) => k).filter((k) => !full(k));
  if (open.length === 0) return;
  for (let i = 0; i < n; i++) {
    if (failed[i] === 0) continue;
    let known = false;
    for (const k of open) {
      const { picture } = k < last ? tally.states[k] : tally.system;
      if (picture.failures >= picturesPerBlock || (k < last && !(factors[k][i] < 1))) continue;
      if (!known) point.lookAt(z, i);
      known = true;
      addToPicture(picture, point);
    }
  }
}

/** Distance from the mean, and bin of u, of every unknown at one sample. */
interface FailurePoint {
  readonly off: Float64Array;
  readonly bin: Int32Array;
  lookAt(z: Columns, i: number): void;
}

function createFailurePoint({ unknowns, rows, offsets }: JointSpace): FailurePoint {
  const off = new Float64Array(unknowns.length);
  const bin = new Int32Array(unknowns.length);
  const quantiles = unknowns.map(({ marginal }) => standInOf(marginal));
  return {
    off,
    bin,
    lookAt(z, i) {
      for (let v = 0; v < unknowns.length; v++) {
        const row = rows[v];
        let u = offsets?.[v] ?? 0;
        for (let j = 0; j < row.length; j++) if (row[j] !== 0) u += row[j] * z[j][i];
        off[v] = quantiles[v](u) - unknowns[v].marginal.mean;
        bin[v] = Math.min(Math.max(Math.floor((u - pictureEdges[0]) * 4), 0), pictureBins - 1);
      }
    },
  };
}

function addToPicture(picture: PictureTally, { off, bin }: FailurePoint): void {
  picture.failures++;
  for (let v = 0; v < off.length; v++) {
    picture.sums[v] += off[v];
    picture.squares[v] += off[v] * off[v];
    picture.bins[v][bin[v]]++;
  }
}

function emptyPicture(space: JointSpace): PictureTally {
  return {
    failures: 0,
    sums: space.unknowns.map(() => 0),
    squares: space.unknowns.map(() => 0),
    bins: space.unknowns.map(() => new Array<number>(pictureBins).fill(0)),
  };
}

function emptyTally(block: number, samples: number, drawn: number, space: JointSpace, plan: SamplingPlan): BlockTally {
  const state = (bins: number): StateTally => ({
    failures: 0,
    stableFailures: 0,
    counted: 0,
    sum: 0,
    sumSquares: 0,
    histogram: new Array<number>(bins).fill(0),
    below: 0,
    above: 0,
    picture: emptyPicture(space),
  });
  return {
    block,
    samples,
    drawn,
    stable: 0,
    marks: { slopeUnstable: 0, lostContact: 0, capped: 0, outOfRange: 0 },
    states: plan.edges.map((edges) => state(edges.length - 1)),
    system: state(0),
  };
}
