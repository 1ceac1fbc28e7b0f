import type { LimitStates } from "../reliability/limit-states.ts";
import {
  applyForm,
  type DecisionProblem,
  type LikelihoodPart,
  type LinearForm,
  type SeenResults,
} from "./decision-problem.ts";
import { type ResultSite, resultSite } from "./result-site.ts";

/** z = centre + matrix·z′, row-major by z; z′ are independent standard normals of what is believed after the results. */
interface AffineMap {
  readonly centre: Float64Array;
  readonly matrix: readonly Float64Array[];
}

/**
 * The same problem after results of tests, by Bayes' rule on the knowledge part.
 *
 * For normal variables the posterior of z is normal, so the coordinates are simply set anew, z = μ + A·z′, and nothing is
 * left to weigh: the result equals the conjugate formula 1/σ″² = 1/σ′² + 1/(e²/n + t²). For others the coordinates follow
 * the normal that fits the posterior of each, and the exact likelihood divided by that normal becomes a weight.
 *
 * Samples of z′ need no search for where the posterior lies, however far the results have moved it.
 */
export function conditionOnResults(problem: DecisionProblem, results: readonly SeenResults[]): DecisionProblem {
  if (results.length === 0) return problem;
  const dimension = problem.keys.length;
  let map: AffineMap = { centre: new Float64Array(dimension), matrix: identity(dimension) };
  const sites: ResultSite[] = [];
  for (const place of new Set(results.map((one) => one.variable))) {
    const variable = problem.variables[place];
    if (!(variable.knowledge > 0)) throw new RangeError(`nothing can be learned about ${variable.path}`);
    const own = results.filter((one) => one.variable === place);
    const before = mapped(variable.known, map);
    const sd = Math.hypot(...before.row);
    const site = resultSite(variable, place, own, { mean: before.offset, sd });
    sites.push(site);
    map = withSite(map, before, site);
  }
  const corrections: readonly LikelihoodPart[] = sites.flatMap(({ variable, logCorrection }) =>
    logCorrection === undefined ? [] : [{ form: mapped(problem.variables[variable].known, map), logCorrection }],
  );
  const { likelihood } = problem;
  const inner = likelihood === undefined ? undefined : mappedColumns(map);
  return {
    ...problem,
    options: problem.options.map((option) => ({ ...option, states: mappedStates(option.states, map) })),
    survivals: problem.survivals.map((states) => mappedStates(states, map)),
    variables: problem.variables.map((variable) => ({
      ...variable,
      image: mapped(variable.image, map),
      known: mapped(variable.known, map),
    })),
    standIns: problem.standIns.map((variable) => ({ ...variable, image: mapped(variable.image, map) })),
    ...(corrections.length === 0 && likelihood === undefined
      ? {}
      : {
          likelihood: (z, n, out) => {
            if (likelihood !== undefined && inner !== undefined) likelihood(inner(z, n), n, out);
            for (const { form, logCorrection } of corrections) {
              const k = new Float64Array(n);
              applyForm(form, z, n, k);
              for (let i = 0; i < n; i++) out[i] *= Math.exp(logCorrection(k[i]));
            }
          },
          ...(likelihood === undefined ? { likelihoodParts: corrections } : {}),
        }),
  };
}

function identity(n: number): Float64Array[] {
  return Array.from({ length: n }, (_, i) => {
    const row = new Float64Array(n);
    row[i] = 1;
    return row;
  });
}

/** The form in z′ of a form in z. */
function mapped(form: LinearForm, { centre, matrix }: AffineMap): LinearForm {
  const row = new Float64Array(form.row.length);
  let { offset } = form;
  form.row.forEach((weight, j) => {
    if (weight === 0) return;
    offset += weight * centre[j];
    matrix[j].forEach((entry, c) => {
      row[c] += weight * entry;
    });
  });
  return { offset, row };
}

/**
 * One more normal factor on k = m + s·(e·z′), e of unit length: e·z′ gets precision 1 + τ s² and mean s(ν − τ m)/(1 + τ s²),
 * the directions across e stay as they are.
 */
function withSite(map: AffineMap, known: LinearForm, { precision, shift }: ResultSite): AffineMap {
  const size = Math.hypot(...known.row);
  const e = known.row.map((weight) => weight / size);
  const gain = 1 + precision * size * size;
  const centre = (size * (shift - precision * known.offset)) / gain;
  const shrink = 1 / Math.sqrt(gain) - 1;
  const along = map.matrix.map((row) => row.reduce((sum, entry, c) => sum + entry * e[c], 0));
  return {
    centre: map.centre.map((value, i) => value + along[i] * centre),
    matrix: map.matrix.map((row, i) => row.map((entry, c) => entry + shrink * along[i] * e[c])),
  };
}

/** Columns of z from columns of z′; coordinates that the map leaves alone are passed on as they are. */
function mappedColumns(map: AffineMap): (z: readonly Float64Array[], n: number) => readonly Float64Array[] {
  const forms = map.matrix.map((row, i): LinearForm | undefined => {
    const alone = map.centre[i] === 0 && row.every((entry, c) => entry === (c === i ? 1 : 0));
    return alone ? undefined : { offset: map.centre[i], row };
  });
  let scratch = forms.map(() => new Float64Array(0));
  return (z, n) => {
    if (n > 0 && forms.some((form, i) => form !== undefined && scratch[i].length < n))
      scratch = forms.map((form) => new Float64Array(form === undefined ? 0 : n));
    return forms.map((form, i) => {
      if (form === undefined) return z[i];
      applyForm(form, z, n, scratch[i]);
      return scratch[i];
    });
  };
}

function mappedStates(states: LimitStates, map: AffineMap): LimitStates {
  const columns = mappedColumns(map);
  return {
    ...states,
    get evaluations() {
      return states.evaluations;
    },
    evaluate: (z, n, factors, marks, exact) => states.evaluate(columns(z, n), n, factors, marks, exact),
    evaluateAt: (x, n, factors, marks) => states.evaluateAt(x, n, factors, marks),
  };
}
