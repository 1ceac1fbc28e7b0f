import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { integrate, panels } from "../../src/numeric/gauss-legendre.ts";
import { normalPdf } from "../../src/numeric/normal.ts";
import type { Marginal } from "../../src/probability/marginal.ts";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import { members } from "./members.ts";

const ulp = 2.3e-16;
const chances = [1e-15, 1e-12, 1e-9, 1e-6, 1e-3, 0.02, 0.2, 0.45];

/** How far x may be off: 1e-12 of the distance from the end of the support (or of the sd), and the rounding of x itself. */
function allowance(m: Marginal, x: number): number {
  const distances = [x - m.lowest, m.highest - x].filter(Number.isFinite);
  return 1e-12 * Math.min(...distances, Math.abs(x - m.mean) + m.sd) + 2 * ulp * (Math.abs(x) + largestEnd(m));
}

/** Ends of the support enter the arithmetic with their own rounding. */
function largestEnd(m: Marginal): number {
  return Math.max(...[m.lowest, m.highest, m.mean].filter(Number.isFinite).map(Math.abs));
}

/** A quantile that rounds to an end of the support (or of a mixture's last part) has lost its chance. */
function atEnd(m: Marginal, x: number): boolean {
  if (m.cdf(x) === 0 || m.ccdf(x) === 0) return true;
  return x - m.lowest <= 4 * ulp * largestEnd(m) || m.highest - x <= 4 * ulp * largestEnd(m);
}

/** ∫ pdf over [from, to], in the logarithm of the distance from an end, where the density may be infinite. */
function massBetween(m: Marginal, from: number, to: number): number {
  const low = Number.isFinite(m.lowest) ? m.lowest : undefined;
  const high = Number.isFinite(m.highest) ? m.highest : undefined;
  if (low !== undefined && (high === undefined || to - low < high - to)) {
    return integrate((t) => m.pdf(low + Math.exp(t)) * Math.exp(t), Math.log(from - low), Math.log(to - low), 24);
  }
  if (high === undefined) return integrate(m.pdf, from, to, 24);
  return integrate((t) => m.pdf(high - Math.exp(t)) * Math.exp(t), Math.log(high - to), Math.log(high - from), 24);
}

describe.each(Object.entries(members))("%s", (_kind, arbitrary) => {
  const check = (law: (m: Marginal) => void, numRuns = 16): void =>
    fc.assert(
      fc.property(arbitrary, (distribution) => law(marginalOf(distribution))),
      { numRuns, seed: 20240607, endOnFailure: true },
    );

  test("the chance of a quantile is the chance asked for, in both tails", () => {
    check((m) => {
      for (const p of chances) {
        // a change of x by its allowance changes the chance by as much as the density there says, at the most
        const low = m.quantile(p);
        const high = m.upperQuantile(p);
        const margin = (x: number): number =>
          Math.max(m.pdf(x), m.pdf(x - allowance(m, x)), m.pdf(x + allowance(m, x)));
        const steepLow = Math.abs(m.cdf(low + allowance(m, low)) - m.cdf(low - allowance(m, low)));
        const steepHigh = Math.abs(m.ccdf(high + allowance(m, high)) - m.ccdf(high - allowance(m, high)));
        expect(Math.abs(m.cdf(low) - p)).toBeLessThanOrEqual(
          2e-13 * p + Math.max(steepLow, margin(low) * allowance(m, low)),
        );
        expect(Math.abs(m.ccdf(high) - p)).toBeLessThanOrEqual(
          2e-13 * p + Math.max(steepHigh, margin(high) * allowance(m, high)),
        );
      }
    });
  });

  test("the quantile undoes the chance", () => {
    check((m) => {
      for (const p of chances) {
        for (const x of [m.quantile(p), m.upperQuantile(p)]) {
          if (atEnd(m, x) || m.pdf(x) * m.sd < 1e-16) continue; // a gap: any point in it has the same chance
          const back = m.cdf(x) < 0.5 ? m.quantile(m.cdf(x)) : m.upperQuantile(m.ccdf(x));
          const chance = Math.min(m.cdf(x), m.ccdf(x));
          expect(Math.abs(back - x)).toBeLessThanOrEqual(2 * allowance(m, x) + (4e-14 * chance) / m.pdf(x));
        }
      }
    });
  });

  test("both tails add up to one and the chance rises", () => {
    check((m) => {
      let last = 0;
      for (let u = -8; u <= 8; u += 0.23) {
        const x = m.quantileOfNormal(u);
        expect(Math.abs(m.cdf(x) + m.ccdf(x) - 1)).toBeLessThan(1e-13);
        if (atEnd(m, x)) continue;
        expect(m.cdf(x)).toBeGreaterThanOrEqual(last * (1 - 1e-13) - m.pdf(x) * allowance(m, x));
        last = m.cdf(x);
      }
      if (Number.isFinite(m.lowest)) expect(m.cdf(m.lowest)).toBe(0);
      if (Number.isFinite(m.highest)) expect(m.ccdf(m.highest)).toBe(0);
    });
  });

  test("images in standard normal space rise and are undone, in both tails", () => {
    check((m) => {
      let last = Number.NEGATIVE_INFINITY;
      for (let u = -7.9; u <= 7.9; u += 0.31) {
        const x = m.quantileOfNormal(u);
        expect(x).toBeGreaterThanOrEqual(last - allowance(m, x));
        last = x;
        if (atEnd(m, x)) continue;
        if (m.pdf(x) * m.sd < 1e-30 && m.pdf(x) * m.sd < 1e-3 * normalPdf(u)) continue; // in a gap
        expect(Math.abs(m.normalOfQuantile(x) - u)).toBeLessThanOrEqual(
          2e-13 * Math.max(1, Math.abs(u)) + (2 * allowance(m, x) * m.pdf(x)) / normalPdf(u),
        );
      }
    });
  });

  test("the density is the slope of the chance", () => {
    check((m) => {
      for (const u of [-3.1, -1.7, -0.6, 0.4, 1.3, 2.9]) {
        const from = m.quantileOfNormal(u);
        const to = m.quantileOfNormal(u + 0.05);
        const breaks = [...m.kinks, ...m.jumps].filter((at) => at > u && at < u + 0.05);
        if (breaks.length > 0 || atEnd(m, from) || atEnd(m, to)) continue;
        const rise = u < 0 ? m.cdf(to) - m.cdf(from) : m.ccdf(from) - m.ccdf(to);
        const integral = massBetween(m, from, to);
        expect(Math.abs(integral - rise)).toBeLessThanOrEqual(1e-10 * rise + m.pdf(from) * 8 * ulp * largestEnd(m));
      }
    });
  });

  test("mean and sd are the moments of the distribution", () => {
    check((m) => {
      const points = panels(-15, 15, [...m.kinks, ...m.jumps], m.kind === "mixture" ? 0.04 : 0.25);
      const moment = (f: (x: number) => number): number =>
        points
          .slice(1)
          .reduce(
            (sum, to, i) => sum + integrate((u) => f(m.quantileOfNormal(u)) * normalPdf(u), points[i], to, 12),
            0,
          );
      const mean = moment((x) => x);
      const sd = Math.sqrt(moment((x) => (x - m.mean) ** 2));
      // x(u) of a mixture may rise a hundredfold within a panel between two parts; its exact moments have their own test
      const tolerance = m.kind === "mixture" ? 1e-3 : m.kind === "measured" ? 1e-6 : 1e-9;
      expect(Math.abs(mean - m.mean) / m.sd).toBeLessThan(tolerance + (1e-14 * Math.abs(m.mean)) / m.sd);
      expect(Math.abs(sd / m.sd - 1)).toBeLessThan(tolerance);
    }, 5);
  });

  test("between its kinks and jumps x(u) has no others", () => {
    check((m) => {
      if (m.kind === "mixture") return; // rises steeply between parts far apart; tests of its own
      const breaks = [...m.kinks, ...m.jumps];
      const isClear = (u: number): boolean => breaks.every((at) => Math.abs(at - u) > 0.011);
      for (let u = -4; u <= 4; u += 0.01) {
        if (!isClear(u)) continue;
        const step = m.quantileOfNormal(u + 0.005) - m.quantileOfNormal(u - 0.005);
        expect(step).toBeLessThan(0.15 * (Math.abs(m.quantileOfNormal(u) - m.mean) + m.sd));
      }
    }, 4);
  });
});
