/**
 * Bounds on the probability that any of several limit states fails, from their own probabilities alone.
 *
 *   max p_k ≤ P(any) ≤ min(1, Σ p_k), whatever their dependence
 *
 * @source C. A. Cornell (1967), Bounds on the reliability of structural systems, ASCE J. Struct. Div. 93(ST1), 171–200
 */
export function systemBounds(probabilities: readonly number[]): readonly [number, number] {
  const sum = probabilities.reduce((total, p) => total + p, 0);
  return [Math.max(0, ...probabilities), Math.min(1, sum)];
}
