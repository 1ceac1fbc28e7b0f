import fc from "fast-check";
import type { Distribution } from "../../src/study/study.ts";

/** A thousand steps from one number to the other: plain values, as studies have them. */
const between = (min: number, max: number): fc.Arbitrary<number> =>
  fc.integer({ min: 0, max: 1000 }).map((step) => min + ((max - min) * step) / 1000);
const mean = between(-50, 50);
const positive = between(0.5, 60);
const variation = between(0.02, 0.8);

const normal = fc.record({ mean, sd: between(0.01, 20) }).map((p): Distribution => ({ kind: "normal", ...p }));
const lognormal = fc
  .record({ over: positive, variation, shift: between(-20, 20) })
  .map((p): Distribution => ({ kind: "lognormal", mean: p.shift + p.over, sd: p.over * p.variation, shift: p.shift }));
const truncated = fc.record({ mean, sd: between(0.1, 10), start: between(-6, 5), width: between(0.05, 6) }).map(
  (p): Distribution => ({
    kind: "truncated_normal",
    mean: p.mean,
    sd: p.sd,
    from: p.mean + p.sd * p.start,
    to: p.mean + p.sd * (p.start + p.width),
  }),
);
const uniform = fc
  .record({ from: mean, width: between(0.01, 30) })
  .map((p): Distribution => ({ kind: "uniform", from: p.from, to: p.from + p.width }));
const triangular = fc
  .record({ from: mean, width: between(0.01, 30), peak: fc.oneof(between(0.02, 0.98), fc.constantFrom(0, 1)) })
  .map((p): Distribution => {
    const to = p.from + p.width;
    const peak = p.peak === 1 ? to : p.from + p.peak * p.width;
    return { kind: "triangular", from: p.from, peak, to };
  });
const betaWithSpread = (most: number): fc.Arbitrary<Distribution> =>
  fc.record({ from: mean, width: between(0.1, 30), at: between(0.05, 0.95), spread: between(0.03, most) }).map(
    (p): Distribution => ({
      kind: "beta",
      from: p.from,
      to: p.from + p.width,
      mean: p.from + p.at * p.width,
      sd: p.spread * p.width * Math.sqrt(p.at * (1 - p.at)),
    }),
  );
const beta = betaWithSpread(0.85);
const gumbel = fc.record({ mean, sd: between(0.01, 20) }).map((p): Distribution => ({ kind: "gumbel", ...p }));
const weibull = fc
  .record({ shape: between(0.6, 12), scale: positive, shift: between(-20, 20) })
  .map((p): Distribution => ({ kind: "weibull", ...p }));
const gamma = fc
  .record({ mean: positive, variation: between(0.02, 1.6) })
  .map((p): Distribution => ({ kind: "gamma", mean: p.mean, sd: p.mean * p.variation }));
const measured = fc
  .record({
    values: fc.array(between(20, 45), { minLength: 4, maxLength: 12 }),
    as: fc.constantFrom("normal" as const, "lognormal" as const),
    varianceReduction: between(0.05, 1),
  })
  .filter(({ values }) => Math.max(...values) - Math.min(...values) > 0.5)
  .map((p): Distribution => ({ kind: "measured", ...p }));
const mixture = fc
  .record({
    share: between(0.05, 0.95),
    parts: fc.tuple(
      fc.oneof(triangular, uniform, normal, betaWithSpread(0.3)),
      fc.oneof(triangular, gumbel, uniform, lognormal),
    ),
  })
  .map(
    (p): Distribution => ({
      kind: "mixture",
      parts: [
        { share: p.share, of: p.parts[0] },
        { share: 1 - p.share, of: p.parts[1] },
      ],
    }),
  );

/** Random members of every kind, within the ranges that ground, water and loads call for. A new kind is one line here. */
export const members: Readonly<Record<Distribution["kind"], fc.Arbitrary<Distribution>>> = {
  normal,
  lognormal,
  truncated_normal: truncated,
  uniform,
  triangular,
  beta,
  gumbel,
  weibull,
  gamma,
  mixture,
  measured,
};
