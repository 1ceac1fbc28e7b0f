/** Variance functions: how much of a soil's point-to-point scatter is left after averaging over a length. */
import { normalCdf } from "../numeric/normal.ts";

export type VarianceFunction = "simple" | "exponential" | "gaussian" | "triangular";

/**
 * Variance reduction Γ²(L), the variance of the average over a length L divided by the variance at a point:
 *
 *   Γ²(L) = (2/L) ∫₀ᴸ (1 − τ/L) ρ(τ) dτ
 *
 * with the correlation ρ at distance τ and δ its scale of fluctuation, δ = 2 ∫₀^∞ ρ dτ (so the integral over the whole
 * line of each model is δ):
 *
 *   exponential  ρ = e^(−2τ/δ)       Γ² = [x − 1 + e^(−x)]·2/x², x = 2L/δ
 *   gaussian     ρ = e^(−π(τ/δ)²)    Γ² = (1/r)·erf(√π r) − (1 − e^(−π r²))/(π r²), r = L/δ
 *   triangular   ρ = 1 − τ/δ, τ < δ  Γ² = 1 − r/3 up to r = 1, then (1/r)(1 − 1/(3r))
 *   simple       Γ² = min(1, δ/L)
 *
 * @param averagedOver L ≥ 0, m
 * @param scaleOfFluctuation δ > 0, m
 * @returns Γ² in (0, 1]; relative error below 1e-9 (series where the closed forms cancel); tests/outside/variance-reduction
 * @source JCSS Probabilistic Model Code, part 3.7 (2006), eq. 3.7.3.7–13; Vanmarcke (1977), J. Geotech. Eng. Div. ASCE 103(11)
 */
export function varianceReduction(model: VarianceFunction, averagedOver: number, scaleOfFluctuation: number): number {
  const r = averagedOver / scaleOfFluctuation;
  switch (model) {
    case "simple":
      return Math.min(1, 1 / r);
    case "exponential":
      return exponentialReduction(2 * r);
    case "gaussian":
      return gaussianReduction(r);
    case "triangular":
      return r <= 1 ? 1 - r / 3 : (1 - 1 / (3 * r)) / r;
  }
}

function exponentialReduction(x: number): number {
  if (x < 1e-3) return 1 - x / 3 + (x * x) / 12;
  return (2 * (x + Math.expm1(-x))) / (x * x);
}

/** erf(√π r) = 2 Φ(√(2π) r) − 1 */
function gaussianReduction(r: number): number {
  const square = Math.PI * r * r;
  if (r < 1e-2) return 1 - square / 6 + (square * square) / 30;
  return (2 * normalCdf(Math.sqrt(2 * Math.PI) * r) - 1) / r + Math.expm1(-square) / square;
}
