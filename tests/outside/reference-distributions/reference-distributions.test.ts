import cephes from "cephes";
import R from "lib-r-math.js";
import { describe, expect, test } from "vitest";
import type { Marginal } from "../../../src/probability/marginal.ts";
import { marginalOf } from "../../../src/probability/marginal-of.ts";
import type { Distribution } from "../../../src/study/study.ts";

await cephes.compiled;
const incompleteBeta = cephes.incbet;

/** What the reference says: density and both tails. */
interface Reference {
  pdf(x: number): number;
  tail(x: number, lower: boolean): number;
}

const grid: [Distribution, Reference][] = [];
const add = (distribution: Distribution, pdf: Reference["pdf"], tail: Reference["tail"]): void => {
  grid.push([distribution, { pdf, tail }]);
};

for (const [mean, sd] of [
  [0, 1],
  [34, 2.7],
  [-12, 0.03],
]) {
  add(
    { kind: "normal", mean, sd },
    (x) => R.dnorm(x, mean, sd),
    (x, lower) => R.pnorm(x, mean, sd, lower),
  );
  const scale = (sd * Math.sqrt(6)) / Math.PI;
  const mode = mean - 0.5772156649015329 * scale;
  const s = (x: number): number => Math.exp(-(x - mode) / scale);
  add(
    { kind: "gumbel", mean, sd },
    (x) => (R.dexp(s(x), 1) * s(x)) / scale,
    (x, lower) => R.pexp(s(x), 1, !lower),
  );
}
for (const variation of [0.02, 0.1, 0.5, 1.5]) {
  const logSd = Math.sqrt(Math.log1p(variation ** 2));
  const logMean = Math.log(20) - logSd ** 2 / 2;
  for (const shift of [0, -5]) {
    add(
      { kind: "lognormal", mean: 20 + shift, sd: 20 * variation, shift },
      (x) => R.dlnorm(x - shift, logMean, logSd),
      (x, lower) => R.plnorm(x - shift, logMean, logSd, lower),
    );
  }
  const shape = 1 / variation ** 2;
  add(
    { kind: "gamma", mean: 20, sd: 20 * variation },
    (x) => R.dgamma(x, shape, shape / 20),
    (x, lower) => R.pgamma(x, shape, shape / 20, undefined, lower),
  );
}
for (const shape of [0.7, 1, 2, 8]) {
  add(
    { kind: "weibull", shape, scale: 3, shift: 1 },
    (x) => R.dweibull(x - 1, shape, 3),
    (x, lower) => R.pweibull(x - 1, shape, 3, lower),
  );
}
for (const [a, b] of [
  [2, 5],
  [0.8, 0.6],
  [1, 1],
  [40, 3],
  [300, 500],
]) {
  const sd = 4 * Math.sqrt((a * b) / ((a + b) ** 2 * (a + b + 1)));
  add(
    { kind: "beta", from: 0, to: 4, mean: (4 * a) / (a + b), sd },
    (x) => R.dbeta(x / 4, a, b) / 4,
    (x, lower) => (lower ? incompleteBeta(a, b, x / 4) : incompleteBeta(b, a, (4 - x) / 4)),
  );
}
add(
  { kind: "uniform", from: 0, to: 2.5 },
  (x) => R.dunif(x, 0, 2.5),
  (x, lower) => R.punif(x, 0, 2.5, lower),
);
add(
  { kind: "triangular", from: 0, peak: 3, to: 3 },
  (x) => R.dbeta(x / 3, 2, 1) / 3,
  (x, lower) => (lower ? incompleteBeta(2, 1, x / 3) : incompleteBeta(1, 2, (3 - x) / 3)),
);
add(
  { kind: "triangular", from: 0, peak: 0, to: 3 },
  (x) => R.dbeta(x / 3, 1, 2) / 3,
  (x, lower) => (lower ? incompleteBeta(1, 2, x / 3) : incompleteBeta(2, 1, (3 - x) / 3)),
);
for (const [from, to] of [
  [-0.5, 1.5],
  [-8, 0.3],
  [1.2, 40],
]) {
  const mass = from > 0 ? R.pnorm(from, 0, 1, false) - R.pnorm(to, 0, 1, false) : R.pnorm(to) - R.pnorm(from);
  add(
    { kind: "truncated_normal", mean: 0, sd: 1, from, to },
    (x) => R.dnorm(x) / mass,
    (x, lower) => (lower ? R.pnorm(x) - R.pnorm(from) : R.pnorm(x, 0, 1, false) - R.pnorm(to, 0, 1, false)) / mass,
  );
}
for (const values of [
  [33.1, 35.4, 31.8, 36],
  [10, 12, 9, 11, 15, 8, 13, 12, 10, 9, 11],
]) {
  const n = values.length;
  const mean = values.reduce((a, b) => a + b) / n;
  const scale = Math.sqrt((values.reduce((sum, x) => sum + (x - mean) ** 2, 0) / (n - 1)) * (1 + 1 / n));
  add(
    { kind: "measured", values, as: "normal", varianceReduction: 1 },
    (x) => R.dt((x - mean) / scale, n - 1) / scale,
    (x, lower) => {
      const t = ((x - mean) / scale) * (lower ? -1 : 1);
      const tail = 0.5 * incompleteBeta((n - 1) / 2, 0.5, (n - 1) / (n - 1 + t * t));
      return t > 0 ? tail : 1 - tail;
    },
  );
}
add(
  {
    kind: "mixture",
    parts: [
      { share: 0.9, of: { kind: "weibull", shape: 2, scale: 1, shift: 0 } },
      { share: 0.1, of: { kind: "normal", mean: 4, sd: 0.5 } },
    ],
  },
  (x) => 0.9 * R.dweibull(x, 2, 1) + 0.1 * R.dnorm(x, 4, 0.5),
  (x, lower) => 0.9 * R.pweibull(x, 2, 1, lower) + 0.1 * R.pnorm(x, 4, 0.5, lower),
);

const chances = [1e-15, 1e-12, 1e-9, 1e-6, 1e-4, 0.01, 0.2, 0.5];

/** Tails of truncated normals come from a difference here, whose digits go where the tail is small beside what is cut. */
function tolerance(kind: string, chance: number): number {
  return kind === "truncated_normal" ? 1e-11 * chance + 3e-15 : 1e-11 * chance;
}

describe.each(grid)("%j", (distribution, reference) => {
  const marginal: Marginal = marginalOf(distribution);

  test("quantiles have the reference's chance in their tail", () => {
    for (const p of chances) {
      for (const lower of [true, false]) {
        const x = lower ? marginal.quantile(p) : marginal.upperQuantile(p);
        const rounding = 4e-16 * (Math.abs(x) + Math.abs(marginal.mean)) * marginal.pdf(x);
        expect(Math.abs(reference.tail(x, lower) - p), `p = ${p}, ${lower}`).toBeLessThan(
          tolerance(distribution.kind, p) + rounding,
        );
      }
    }
  });

  test("density and both tails agree from one end to the other", () => {
    for (const p of chances) {
      for (const x of [marginal.quantile(p), marginal.upperQuantile(p)]) {
        if (x === marginal.lowest || x === marginal.highest) continue; // the density may be infinite there
        const rounding = 4e-16 * (Math.abs(x) + Math.abs(marginal.mean)) * marginal.pdf(x);
        for (const lower of [true, false]) {
          const expected = reference.tail(x, lower);
          const found = lower ? marginal.cdf(x) : marginal.ccdf(x);
          expect(Math.abs(found - expected), `x = ${x}, ${lower}`).toBeLessThanOrEqual(
            tolerance(distribution.kind, expected) + rounding,
          );
        }
        // x/width rounds before the reference sees it, which matters near an end
        const distance = Math.min(x - marginal.lowest, marginal.highest - x);
        const allowed = 2e-11 + (8e-16 * Math.abs(x)) / distance;
        expect(Math.abs(marginal.pdf(x) / reference.pdf(x) - 1), `density at ${x}`).toBeLessThan(allowed);
      }
    }
  });
});
