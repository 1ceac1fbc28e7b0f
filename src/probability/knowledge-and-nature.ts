import { type Problem, StudyError } from "../errors.ts";
import { cholesky, solveWithFactor } from "../numeric/cholesky.ts";
import type { Notice } from "../study/study.ts";
import type { Coordinate, JointSpace } from "./marginal.ts";
import {
  type CorrelatedPair,
  correlationMatrix,
  factorByName,
  type StatedUnknown,
  worstPair,
} from "./normal-correlations.ts";

/*
 * Every standard normal splits into U = √κ·K + √(1 − κ)·A: K is knowledge (one true value for this wall, the same in every
 * year), A nature (varies, cannot be learned beforehand). The correlation r of two U is kept, whatever their shares:
 *
 * - two stated variables, both yearly or neither: their K and their A each carry r/(√(κᵢκⱼ) + √((1 − κᵢ)(1 − κⱼ)))
 * - a yearly one and one that is not: what they share is the same in every year, so the K alone carry r/√(κᵢκⱼ)
 * - a plain variable is Σ b·U_stated + rest, b by regression (of a yearly variable only its K); the rest is knowledge.
 *   So its κ falls by what it shares with the nature of the others.
 *
 * A variable is "stated" where the study states its share (scatter, measured, yearly), else "plain".
 */

interface Stated {
  /** Place in the list of unknowns. */
  readonly place: number;
  readonly kappa: number;
  readonly yearly: boolean;
}

/**
 * The space with knowledge and nature apart.
 *
 * @param pairs correlations of the normals
 * @param correlation the same as a matrix, unknowns × unknowns, positive semi-definite
 * @throws StudyError where a share allows no such correlation, with the pair named
 */
export function splitSpace(
  unknowns: readonly StatedUnknown[],
  pairs: readonly CorrelatedPair[],
  correlation: readonly Float64Array[],
): JointSpace & { readonly notices: readonly Notice[] } {
  const n = unknowns.length;
  const stated = unknowns.flatMap(({ knowledge, yearly }, place): Stated[] =>
    knowledge !== undefined || yearly ? [{ place, kappa: knowledge ?? 0, yearly }] : [],
  );
  const statedAt = new Map(stated.map((one) => [one.place, one]));
  const parts = partCorrelations(unknowns, pairs, statedAt);

  // Rows over 2n columns while building: column i is the knowledge of unknown i, column n + i its nature.
  const knowledge = partRows(
    unknowns,
    pairs,
    parts.knowledge,
    (i) => statedAt.has(i) && statedAt.get(i)!.kappa > 0,
    "knowledge",
    0,
  );
  const nature = partRows(
    unknowns,
    pairs,
    parts.nature,
    (i) => statedAt.has(i) && statedAt.get(i)!.kappa < 1,
    "nature",
    n,
  );
  const rows = unknowns.map(() => new Float64Array(2 * n));
  for (const { place, kappa } of stated) {
    for (let c = 0; c < 2 * n; c++) {
      rows[place][c] = Math.sqrt(kappa) * knowledge[place][c] + Math.sqrt(1 - kappa) * nature[place][c];
    }
  }
  addPlainRows(unknowns, pairs, correlation, stated, rows, knowledge);

  const shares = rows.map((row) => 1 - row.subarray(n).reduce((sum, x) => sum + x * x, 0));
  const columns = columnsInUse(unknowns, statedAt);
  return {
    unknowns: unknowns.map(({ path, marginal, yearly }, i) => ({
      path,
      marginal,
      yearly,
      knowledge: statedAt.get(i)?.kappa ?? shares[i],
    })),
    coordinates: columns.map(({ coordinate }) => coordinate),
    rows: rows.map((row) => Float64Array.from(columns, ({ column }) => row[column])),
    notices: unknowns.flatMap(({ path }, i) =>
      statedAt.has(i) || shares[i] > 1 - 1e-9
        ? []
        : [
            {
              path,
              message: `only ${Math.round(100 * shares[i])} % of its spread can be learned: the rest it shares with the nature of others`,
            },
          ],
    ),
  };
}

/** Correlations of the K and of the A that the pairs of stated variables call for. */
function partCorrelations(
  unknowns: readonly StatedUnknown[],
  pairs: readonly CorrelatedPair[],
  statedAt: ReadonlyMap<number, Stated>,
): { knowledge: CorrelatedPair[]; nature: CorrelatedPair[] } {
  const knowledge: CorrelatedPair[] = [];
  const nature: CorrelatedPair[] = [];
  const problems: Problem[] = [];
  for (const pair of pairs) {
    const first = statedAt.get(pair.first);
    const second = statedAt.get(pair.second);
    const yearly = [first, second].find((one) => one?.yearly);
    if (yearly && yearly.kappa === 0 && first?.yearly !== second?.yearly) {
      problems.push(
        refusal(
          unknowns,
          pair,
          `${unknowns[yearly.place].path} shares only what is known of it, and its knowledge is 0`,
        ),
      );
      continue;
    }
    if (!first || !second) continue;
    const known = Math.sqrt(first.kappa * second.kappa);
    const common = first.yearly === second.yearly;
    const share = common ? known + Math.sqrt((1 - first.kappa) * (1 - second.kappa)) : known;
    const coefficient = pair.coefficient / share;
    if (!(Math.abs(coefficient) <= 1 + 1e-12)) {
      const parts = common ? "their knowledge and their nature" : "their knowledge, which alone they share,";
      problems.push(
        refusal(
          unknowns,
          pair,
          `with shares of knowledge of ${first.kappa.toPrecision(3)} and ${second.kappa.toPrecision(3)}, ${parts} would need a correlation of ${coefficient.toPrecision(3)}`,
        ),
      );
      continue;
    }
    knowledge.push({ ...pair, coefficient });
    if (common) nature.push({ ...pair, coefficient });
  }
  if (problems.length > 0) throw new StudyError(problems);
  return { knowledge, nature };
}

function refusal(unknowns: readonly StatedUnknown[], pair: CorrelatedPair, why: string): Problem {
  return {
    path: pair.path,
    message: `${unknowns[pair.first].path} and ${unknowns[pair.second].path} cannot have a correlation of ${pair.stated}: ${why}`,
    hint: "make the shares of knowledge more alike, or the correlation weaker",
  };
}

/** Rows of one part (knowledge or nature) of the stated variables that have it; the others' rows are zero. */
function partRows(
  unknowns: readonly StatedUnknown[],
  pairs: readonly CorrelatedPair[],
  partPairs: readonly CorrelatedPair[],
  has: (i: number) => boolean,
  part: string,
  offset: number,
): Float64Array[] {
  const n = unknowns.length;
  const own = partPairs.filter(({ first, second }) => has(first) && has(second));
  const factored = factorByName(
    correlationMatrix(n, own),
    unknowns.map(({ path }) => path),
  );
  if ("direction" in factored) {
    const worst = worstPair(own, factored.direction)!;
    const stated = pairs.find((pair) => pair.path === worst.path)!;
    throw new StudyError([refusal(unknowns, stated, `the ${part} of the variables then has no joint distribution`)]);
  }
  return factored.rows.map((row, i) => {
    const wide = new Float64Array(2 * n);
    if (has(i)) wide.set(row, offset);
    return wide;
  });
}

/** Plain variables: regression on the stated ones, and a rest that is knowledge. Fills their rows. */
function addPlainRows(
  unknowns: readonly StatedUnknown[],
  pairs: readonly CorrelatedPair[],
  correlation: readonly Float64Array[],
  stated: readonly Stated[],
  rows: Float64Array[],
  knowledge: readonly Float64Array[],
): void {
  const n = unknowns.length;
  // what a plain variable may lean on: U of a variable that is not yearly, K of one that is
  const supports = stated.filter(({ yearly, kappa }) => !yearly || kappa > 0);
  const vectors = supports.map(({ place, yearly }) => (yearly ? knowledge[place] : rows[place]));
  const covariance = vectors.map((v) => Float64Array.from(vectors, (w) => dot(v, w)));
  const factored = cholesky(covariance);
  if (!factored.definite) throw new RangeError("covariance of rows that is not positive semi-definite");
  const isPlain = unknowns.map((_, i) => !stated.some(({ place }) => place === i));
  const rest = correlation.map((row) => Float64Array.from(row));
  for (let i = 0; i < n; i++) {
    if (!isPlain[i]) continue;
    const target = supports.map(({ place, yearly, kappa }) => correlation[i][place] / (yearly ? Math.sqrt(kappa) : 1));
    const weights = solveWithFactor(factored.factor, target);
    supports.forEach((_, s) => {
      for (let c = 0; c < 2 * n; c++) rows[i][c] += weights[s] * vectors[s][c];
    });
  }
  for (let i = 0; i < n; i++) {
    for (let j = 0; j < n; j++) {
      if (isPlain[i] && isPlain[j]) rest[i][j] -= dot(rows[i], rows[j]);
      else rest[i][j] = 0;
    }
  }
  const restRows = factorByName(
    rest,
    unknowns.map(({ path }) => path),
  );
  if ("direction" in restRows) {
    const involved = pairs.filter(({ first, second }) => isPlain[first] || isPlain[second]);
    const isTouched = ({ first, second }: CorrelatedPair): boolean =>
      restRows.direction[first] !== 0 || restRows.direction[second] !== 0;
    const worst = worstPair(involved, restRows.direction);
    const touching = involved.filter(isTouched).sort((a, b) => Math.abs(b.coefficient) - Math.abs(a.coefficient));
    const blamed = worst && isTouched(worst) && isPlain[worst.first] && isPlain[worst.second] ? worst : touching[0];
    throw new StudyError([
      refusal(unknowns, blamed, "of a yearly variable only its knowledge can be shared, and that does not suffice"),
    ]);
  }
  for (let i = 0; i < n; i++) {
    if (isPlain[i]) for (let c = 0; c < n; c++) rows[i][c] += restRows.rows[i][c];
  }
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += a[i] * b[i];
  return sum;
}

/** The columns that some unknown has, in the order of the study: knowledge first, then nature. */
function columnsInUse(
  unknowns: readonly StatedUnknown[],
  statedAt: ReadonlyMap<number, Stated>,
): { column: number; coordinate: Coordinate }[] {
  const n = unknowns.length;
  return unknowns.flatMap(({ path, yearly }, i) => {
    const kappa = statedAt.get(i)?.kappa ?? 1;
    const columns: { column: number; coordinate: Coordinate }[] = [];
    if (kappa > 0) columns.push({ column: i, coordinate: { key: path, part: "knowledge", yearly: false } });
    // a variable that is all nature keeps the key it has without the split
    const key = kappa > 0 ? `${path}/nature` : path;
    if (kappa < 1) columns.push({ column: n + i, coordinate: { key, part: "nature", yearly } });
    return columns;
  });
}
