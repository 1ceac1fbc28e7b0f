import type { LimitStateAssessment } from "../../results.ts";
import { limitStateName } from "../display.ts";
import { shareText, significant } from "../number.ts";
import { markWords } from "../page-svg.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";

interface Bar {
  readonly from: number;
  readonly to: number;
  readonly share: number;
  readonly failed: boolean;
  readonly tip: string;
}

/** Bars beyond this part of the samples are left off, and said to be. */
const shownShare = 0.998;

/** Histogram of the factor of safety over the samples; the failing side is tinted, the failed bars in their own colour. */
export function factorHistogram(name: string, state: LimitStateAssessment): Chart {
  const { bars, beyond } = barsOf(name, state);
  const { factorMean, factorSd, probability } = state.monteCarlo;
  const words = limitStateName(name);
  const low = Math.min(bars[0]?.from ?? 0, 0.9);
  const high = Math.max(bars.at(-1)?.to ?? 1, 1.1);
  const x = {
    type: "quantitative",
    scale: { domain: [low, high], nice: false, zero: false },
    axis: { title: "Factor of safety", grid: false, tickCount: 6 },
  };
  const middle =
    factorMean === null || factorSd === null
      ? "No sample has a factor between the limits."
      : `Mean ${significant(factorMean, 3)}, standard deviation ${significant(factorSd, 3)}.`;
  const above = beyond > 0 ? ` ${shareText(beyond)} of the samples lie above the last bar.` : "";
  return {
    id: `factor-${name}`,
    state: name,
    title: `${words}: factor of safety over the samples`,
    alternative: `${middle} ${probability === 0 ? "None" : shareText(probability)} below 1.${above}`,
    spec: {
      width: 286,
      height: 150,
      layer: [
        {
          data: { values: [{ low, one: 1 }] },
          mark: { type: "rect", color: palette.failSoft, opacity: 0.45, aria: false },
          encoding: { x: { field: "low", ...x }, x2: { field: "one" } },
        },
        {
          data: { values: bars },
          mark: { type: "bar", binSpacing: 0.6 },
          encoding: {
            x: { field: "from", ...x, bin: { binned: true } },
            x2: { field: "to" },
            y: {
              field: "share",
              type: "quantitative",
              scale: { domain: [0, 1.08 * Math.max(...bars.map((bar) => bar.share), 1e-9)], nice: false },
              axis: { title: "Samples, %", tickCount: 3, domain: false, ticks: false },
            },
            color: { condition: { test: "datum.failed", value: palette.fail }, value: palette.main },
            description: { field: "tip" },
          },
        },
        {
          data: { values: [{ one: 1 }] },
          mark: { type: "rule", color: palette.fail, strokeWidth: 1.5, aria: false },
          encoding: { x: { field: "one", ...x } },
        },
      ],
    },
  };
}

function barsOf(name: string, { histogram }: LimitStateAssessment): { bars: readonly Bar[]; beyond: number } {
  const { edges, counts, below, above } = histogram;
  const total = Math.max(counts.reduce((sum, count) => sum + count, 0) + below + above, 1);
  const first = Math.max(
    counts.findIndex((count) => count > 0),
    0,
  );
  let last = first;
  for (let sum = below, bin = first; bin < counts.length; bin++) {
    sum += counts[bin];
    if (counts[bin] > 0) last = bin;
    if (sum >= shownShare * total) break;
  }
  const bars = counts.slice(first, last + 1).map((count, k): Bar => {
    const [from, to] = [edges[first + k], edges[first + k + 1]];
    const share = (100 * count) / total;
    const tip = `Factor of safety ${significant(from, 3)} to ${significant(to, 3)}: ${shareText(count / total)} of the samples`;
    return { from, to, share, failed: to <= 1 + 1e-9, tip: markWords(tip, name) };
  });
  const after = counts.slice(last + 1).reduce((sum, count) => sum + count, 0) + above;
  return { bars, beyond: after / total };
}
