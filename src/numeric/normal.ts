// biome-ignore-all lint/correctness/noPrecisionLoss: coefficients keep the digits of their table
/**
 * The standard normal distribution, accurate in both tails.
 *
 * Written out here rather than taken from a library of erfc: the detour over z/√2 loses z²·1e-16 in the tail, and the
 * small tails are what this program is for. Relative errors below are checked in tests/outside/normal-tail.
 */

const inverseRootTwoPi = 0.3989422804014327; // 1/√(2π)
const logRootTwoPi = 0.9189385332046728; // ln √(2π)

/** Beyond this |z| the tail probability is no longer a normal floating point number (2e-308). */
export const normalTailLimit = 37.5;

/**
 * exp(−z²/2) with z² split, so that the error does not grow with z²: the leading part of z has few enough bits for its
 * square to be exact.
 */
function gaussian(z: number): number {
  if (Math.abs(z) > 39) return 0; // exp(−760) underflows; ±∞ has no head
  const head = Math.trunc(z * 16) / 16;
  return Math.exp(-0.5 * head * head) * Math.exp(-0.5 * (z - head) * (z + head));
}

/** φ(z) = exp(−z²/2)/√(2π), relative error below 1e-15 for |z| ≤ 37. */
export function normalPdf(z: number): number {
  return inverseRootTwoPi * gaussian(z);
}

/** ln φ(z). */
export function logNormalPdf(z: number): number {
  return -logRootTwoPi - 0.5 * z * z;
}

// Cody's coefficients for (Φ(z) − ½)/z as a ratio of polynomials in z², |z| ≤ 0.67448975
const centreTop = [
  0.065682337918207449113, 2.2352520354606839287, 161.02823106855587881, 1067.6894854603709582, 18154.981253343561249,
];
const centreBottom = [1, 47.20258190468824187, 976.09855173777669322, 10260.932208618978205, 45507.789335026729956];
// for (1 − Φ(z))·exp(z²/2), 0.67448975 < z ≤ √32
const middleTop = [
  1.0765576773720192317e-8, 0.39894151208813466764, 8.8831497943883759412, 93.506656132177855979, 597.27027639480026226,
  2494.5375852903726711, 6848.1904505362823326, 11602.651437647350124, 9842.7148383839780218,
];
const middleBottom = [
  1, 22.266688044328115691, 235.38790178262499861, 1519.377599407554805, 6485.558298266760755, 18615.571640885098091,
  34900.952721145977266, 38912.003286093271411, 19685.429676859990727,
];
// for the correction to the asymptotic tail φ(z)/z, in 1/z², z > √32
const tailTop = [
  0.02307344176494017303, 0.21589853405795699, 0.1274011611602473639, 0.022235277870649807, 0.001421619193227893466,
  2.9112874951168792e-5,
];
const tailBottom = [
  1, 1.28426009614491121, 0.468238212480865118, 0.0659881378689285515, 0.00378239633202758244, 7.29751555083966205e-5,
];

/** Horner's rule, highest power first. */
function polynomial(coefficients: readonly number[], x: number): number {
  let sum = coefficients[0];
  for (let i = 1; i < coefficients.length; i++) sum = sum * x + coefficients[i];
  return sum;
}

/** (1 − Φ(z))·exp(z²/2) for z > 0.67448975, the tail with its steep factor taken out. */
function scaledUpper(z: number): number {
  if (z <= 5.656854249492381) return polynomial(middleTop, z) / polynomial(middleBottom, z);
  const w = 1 / (z * z);
  return (inverseRootTwoPi - (w * polynomial(tailTop, w)) / polynomial(tailBottom, w)) / z;
}

/** Φ(z) − ½ for |z| ≤ 0.67448975. */
function centralPart(z: number): number {
  const w = z * z;
  return (z * polynomial(centreTop, w)) / polynomial(centreBottom, w);
}

/**
 * 1 − Φ(z), the chance that a standard normal exceeds z; relative error below 1e-15 for z ≤ 37.5 (2e-308).
 *
 * @source W. J. Cody (1969), Rational Chebyshev approximations for the error function, Math. Comp. 23, 631–637;
 *   coefficients as in Algorithm 715, ACM Trans. Math. Softw. 19 (1993), 22–32 (from memory, checked to all digits)
 */
export function normalUpper(z: number): number {
  if (Math.abs(z) <= 0.67448975) return 0.5 - centralPart(z);
  return z > 0 ? scaledUpper(z) * gaussian(z) : 1 - scaledUpper(-z) * gaussian(z);
}

/** Φ(z), the chance that a standard normal stays below z; relative error below 1e-15 for z ≥ −37.5. */
export function normalCdf(z: number): number {
  if (Math.abs(z) <= 0.67448975) return 0.5 + centralPart(z);
  return z < 0 ? scaledUpper(-z) * gaussian(z) : 1 - scaledUpper(z) * gaussian(z);
}

/** ln(1 − Φ(z)), for every z: does not underflow. */
export function logNormalUpper(z: number): number {
  if (z <= 0.67448975) return Math.log1p(-normalCdf(z));
  return Math.log(scaledUpper(z)) - 0.5 * z * z;
}

/** ln Φ(z), for every z. */
export function logNormalCdf(z: number): number {
  return logNormalUpper(-z);
}

// Wichura's coefficients, highest power first
const quantileCentreTop = [
  2509.0809287301226727, 33430.575583588128105, 67265.770927008700853, 45921.953931549871457, 13731.693765509461125,
  1971.5909503065514427, 133.14166789178437745, 3.387132872796366608,
];
const quantileCentreBottom = [
  5226.495278852854561, 28729.085735721942674, 39307.89580009271061, 21213.794301586595867, 5394.1960214247511077,
  687.1870074920579083, 42.313330701600911252, 1,
];
const quantileNearTop = [
  7.7454501427834140764e-4, 0.0227238449892691845833, 0.24178072517745061177, 1.27045825245236838258,
  3.64784832476320460504, 5.7694972214606914055, 4.6303378461565452959, 1.42343711074968357734,
];
const quantileNearBottom = [
  1.05075007164441684324e-9, 5.475938084995344946e-4, 0.0151986665636164571966, 0.14810397642748007459,
  0.68976733498510000455, 1.6763848301838038494, 2.05319162663775882187, 1,
];
const quantileFarTop = [
  2.01033439929228813265e-7, 2.71155556874348757815e-5, 0.0012426609473880784386, 0.026532189526576123093,
  0.29656057182850489123, 1.7848265399172913358, 5.4637849111641143699, 6.6579046435011037772,
];
const quantileFarBottom = [
  2.04426310338993978564e-15, 1.4215117583164458887e-7, 1.8463183175100546818e-5, 7.868691311456132591e-4,
  0.0148753612908506148525, 0.13692988092273580531, 0.59983220655588793769, 1,
];

/** Φ⁻¹ for |p − ½| ≤ 0.425, given p − ½. */
function centralQuantile(distance: number): number {
  const r = 0.180625 - distance * distance;
  return (distance * polynomial(quantileCentreTop, r)) / polynomial(quantileCentreBottom, r);
}

/** z with 1 − Φ(z) = q, for q < 0.075 given as √(−ln q). */
function tailQuantile(r: number): number {
  if (r <= 5) return polynomial(quantileNearTop, r - 1.6) / polynomial(quantileNearBottom, r - 1.6);
  return polynomial(quantileFarTop, r - 5) / polynomial(quantileFarBottom, r - 5);
}

/**
 * Φ⁻¹(p), p in [0, 1]; relative error below 1e-15 down to p = 1e-300. −∞ at 0, +∞ at 1.
 *
 * @throws RangeError where p is no probability
 * @source M. J. Wichura (1988), Algorithm AS 241, Applied Statistics 37, 477–484, function PPND16 (from memory, checked)
 */
export function normalQuantile(p: number): number {
  if (!(p >= 0 && p <= 1)) throw new RangeError(`${p} is no probability`);
  const distance = p - 0.5;
  if (Math.abs(distance) <= 0.425) return centralQuantile(distance);
  if (p === 0) return Number.NEGATIVE_INFINITY;
  if (p === 1) return Number.POSITIVE_INFINITY;
  return distance < 0 ? -tailQuantile(Math.sqrt(-Math.log(p))) : tailQuantile(Math.sqrt(-Math.log(1 - p)));
}

/** z with 1 − Φ(z) = q, accurate for small q; +∞ at 0. */
export function normalUpperQuantile(q: number): number {
  return -normalQuantile(q);
}
