import { findRoot } from "../numeric/root.ts";
import { hermiteSeries, normalRule } from "./hermite-series.ts";
import type { Marginal } from "./marginal.ts";

/*
 * Nataf's joint distribution: every variable is X = x(U) of a standard normal U, and the U are jointly normal. Asked for
 * is the correlation r of two U that gives the X the ordinary (Pearson) correlation ρ of the study.
 *
 * With the marginals in Hermite polynomials (hermite-series.ts) Mehler's formula turns the double integral
 * ρ(r) = E[(X₁ − μ₁)(X₂ − μ₂)]/(σ₁σ₂) into a power series,
 *
 *   ρ(r) = Σ aₙ bₙ rⁿ,  what is left out after N terms is below |r|^(N+1) √(rest₁ rest₂)
 *
 * which rises with r, because both x(u) rise.
 *
 * A. Nataf (1962), C. R. Acad. Sci. 225, 42–43; P.-L. Liu and A. Der Kiureghian (1986), Prob. Eng. Mech. 1, 105–112 (whose
 * fitted formulas are not used).
 */

/** The correlation of the normals, and a bound on its error; or the correlations that the two distributions allow. */
export type NatafCorrelation =
  | { readonly possible: true; readonly coefficient: number; readonly error: number }
  | { readonly possible: false; readonly range: readonly [number, number] };

/**
 * Correlation r of the normals for a wanted correlation ρ of the variables.
 *
 * Closed forms where there are some; otherwise to 1e-9 for |r| ≤ 0.99, whatever kinks and jumps the marginals have (the
 * bound grows beyond that where they have some, and is returned).
 *
 * @param rho in [−1, 1]
 */
export function correlationOfNormals(a: Marginal, b: Marginal, rho: number): NatafCorrelation {
  if (rho === 0) return { possible: true, coefficient: 0, error: 0 };
  const end = Math.sign(rho);
  const atEnd = closedRange(a, b) ? { rho: 0, error: 2 } : correlationOfVariables(a, b, end);
  if (Math.abs(rho) > Math.abs(atEnd.rho) - atEnd.error) {
    const range = attainableCorrelation(a, b);
    if (rho < range[0] - 1e-9 || rho > range[1] + 1e-9) return { possible: false, range };
  }
  const closed = closedForm(a, b, rho);
  if (closed !== undefined) return { possible: true, coefficient: Math.min(Math.max(closed, -1), 1), error: 1e-14 };
  return solveSeries(a, b, rho);
}

/** Least and largest correlation that two variables with these distributions can have: all by one U, opposite or alike. */
export function attainableCorrelation(a: Marginal, b: Marginal): [number, number] {
  const range = closedRange(a, b);
  if (range !== undefined) return range;
  const extreme = (sign: number): number => {
    const joined = (from: readonly number[], to: readonly number[]): number[] => [
      ...from,
      ...to.map((at) => sign * at),
    ];
    const breaks = { kinks: joined(a.kinks, b.kinks), jumps: joined(a.jumps, b.jumps) };
    const { u, weight } = normalRule([a, b], breaks, 0.5);
    let sum = 0;
    for (let i = 0; i < u.length; i++) {
      const first = (a.quantileOfNormal(u[i]) - a.mean) / a.sd;
      const second = (b.quantileOfNormal(sign * u[i]) - b.mean) / b.sd;
      sum += weight[i] * first * second;
    }
    return sum;
  };
  return [Math.max(-1, extreme(-1)), Math.min(1, extreme(1))];
}

/** ρ of the variables for r of their normals, with the bound on what is left out. */
export function correlationOfVariables(
  a: Marginal,
  b: Marginal,
  r: number,
  terms = 64,
): { rho: number; error: number } {
  const first = hermiteSeries(a, terms);
  const second = hermiteSeries(b, terms);
  const n = Math.min(first.coefficients.length, second.coefficients.length);
  let rho = 0;
  for (let k = n - 1; k >= 1; k--) rho = (rho + first.coefficients[k] * second.coefficients[k]) * r;
  return { rho, error: Math.abs(r) ** n * Math.sqrt(first.rest * second.rest) };
}

function solveSeries(a: Marginal, b: Marginal, rho: number): NatafCorrelation {
  for (let terms = 64; ; terms *= 4) {
    const miss = (r: number): number => correlationOfVariables(a, b, r, terms).rho - rho;
    // the truncated series may fall short of a correlation that only r = ±1 reaches
    const end = Math.sign(rho);
    const coefficient = miss(end) * end < 0 ? end : findRoot(miss, 0, end, 1e-13).x;
    const { error } = correlationOfVariables(a, b, coefficient, terms);
    const slope = Math.abs(miss(coefficient) - miss(coefficient * 0.999)) / (0.001 * Math.abs(coefficient));
    const bound = error / slope + 1e-10;
    if (bound < 5e-10 || terms >= 4096) return { possible: true, coefficient, error: Math.min(bound, 2) };
  }
}

/** r where a formula gives it: two normals, two lognormals, a normal and a lognormal, two uniforms. */
function closedForm(a: Marginal, b: Marginal, rho: number): number | undefined {
  if (a.kind === "normal" && b.kind === "normal") return rho;
  const first = logSdOf(a);
  const second = logSdOf(b);
  const variation = (logSd: number): number => Math.sqrt(Math.expm1(logSd * logSd));
  if (first !== undefined && second !== undefined) {
    return Math.log1p(rho * variation(first) * variation(second)) / (first * second);
  }
  if (first !== undefined && b.kind === "normal") return (rho * variation(first)) / first;
  if (second !== undefined && a.kind === "normal") return (rho * variation(second)) / second;
  if (a.kind === "uniform" && b.kind === "uniform") return 2 * Math.sin((Math.PI * rho) / 6);
  return undefined;
}

function closedRange(a: Marginal, b: Marginal): [number, number] | undefined {
  if (a.kind === b.kind && (a.kind === "normal" || a.kind === "uniform")) return [-1, 1];
  const first = logSdOf(a);
  const second = logSdOf(b);
  if (first === undefined || second === undefined) return undefined;
  const product = Math.sqrt(Math.expm1(first * first) * Math.expm1(second * second));
  return [Math.expm1(-first * second) / product, Math.expm1(first * second) / product];
}

/** Standard deviation of ln(X − shift) of a lognormal variable, read off its curve. */
function logSdOf(m: Marginal): number | undefined {
  if (m.kind !== "lognormal") return undefined;
  return Math.log((m.quantileOfNormal(1) - m.lowest) / (m.quantileOfNormal(0) - m.lowest));
}
