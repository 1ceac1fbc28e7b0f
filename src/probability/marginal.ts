/**
 * One uncertain quantity on its own. Units are the quantity's own (degrees for angles); u is standard normal.
 *
 * Accuracy every member promises: quantile and upperQuantile to 1e-12 relative (of the distance from the nearer end of the
 * support, where there is one) for probabilities down to 1e-15; the laws they share are one property test.
 */
export interface Marginal {
  /** The word of the study file: normal, lognormal, … */
  readonly kind: string;
  readonly mean: number;
  readonly sd: number;
  /** Ends of the support, ±Infinity where there is none. */
  readonly lowest: number;
  readonly highest: number;
  /** u at which x(u) is not smooth (mode of a triangular); excludes jumps. Ascending. */
  readonly kinks: readonly number[];
  /** u at which x(u) jumps (gap in a mixture). Ascending. */
  readonly jumps: readonly number[];
  pdf(x: number): number;
  cdf(x: number): number;
  /** 1 − cdf, accurate in the upper tail. */
  ccdf(x: number): number;
  /** x with cdf(x) = p, p in (0, 1). */
  quantile(p: number): number;
  /** x with ccdf(x) = q, accurate for small q. */
  upperQuantile(q: number): number;
  /** x(u) = F⁻¹(Φ(u)), accurate in both tails. Rises with u. */
  quantileOfNormal(u: number): number;
  /** u(x) = Φ⁻¹(F(x)), the inverse; ±Infinity outside the support. */
  normalOfQuantile(x: number): number;
}

/** A named uncertain quantity of a study. */
export interface Unknown {
  readonly path: string;
  readonly marginal: Marginal;
  /** κ after correlation; 1 where nothing rests on the split. */
  readonly knowledge: number;
  readonly yearly: boolean;
}

/**
 * How a vector of unknowns is drawn: coordinates are independent standard normals, u = rows · z, x = marginal(u).
 *
 * A study without evidence, yearly values or an investigation has one coordinate per unknown. Where the split into
 * knowledge and nature matters there are up to two. Keys never depend on the position of a variable in the study, so
 * adding one changes no draw of the others.
 */
export interface JointSpace {
  readonly unknowns: readonly Unknown[];
  readonly coordinates: readonly Coordinate[];
  /** unknowns × coordinates, row-major by unknown; each row has unit length (shorter where results have been seen). */
  readonly rows: readonly Float64Array[];
  /** u = offset + row·z of each unknown, where results have moved what is believed; 0 where absent. */
  readonly offsets?: readonly number[];
}

export interface Coordinate {
  /** Names the stream: the path, with `/nature` appended for a nature part that has its own coordinate. */
  readonly key: string;
  readonly part: "knowledge" | "nature";
  /** Drawn anew each year: the nature of a yearly variable. */
  readonly yearly: boolean;
}
