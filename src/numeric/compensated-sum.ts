/**
 * A sum whose rounding error does not grow with the number of terms.
 *
 * The error is below 2 units in the last place of Σ|x| for any number of terms met here. Two partial sums may be merged.
 *
 * @source A. Neumaier (1974), Rundungsfehleranalyse einiger Verfahren zur Summation endlicher Summen, ZAMM 54, 39–51
 */
export class CompensatedSum {
  private sum = 0;
  private lost = 0;

  add(x: number): void {
    const total = this.sum + x;
    // the smaller of the two has lost digits; these can be had back exactly
    this.lost += Math.abs(this.sum) >= Math.abs(x) ? this.sum - total + x : x - total + this.sum;
    this.sum = total;
  }

  /** As if the other's terms had been added here. */
  merge(other: CompensatedSum): void {
    this.add(other.sum);
    this.lost += other.lost;
  }

  get value(): number {
    return this.sum + this.lost;
  }
}

/** Sum of the first n entries of a list, compensated. */
export function compensatedSum(terms: ArrayLike<number>, n: number = terms.length): number {
  const sum = new CompensatedSum();
  for (let i = 0; i < n; i++) sum.add(terms[i]);
  return sum.value;
}
