import { normalQuantile } from "../numeric/normal.ts";
import { completeMarginal, requireFinite, requirePositive } from "./complete-marginal.ts";
import type { Marginal } from "./marginal.ts";

/**
 * Triangular distribution; the peak may stand on an end.
 *
 * Density: f(x) = 2 (x − from)/((to − from)(peak − from)) up to the peak, 2 (to − x)/((to − from)(to − peak)) beyond
 */
export function triangular(parameters: {
  readonly from: number;
  readonly peak: number;
  readonly to: number;
}): Marginal {
  // parameters
  const { from, peak, to } = parameters;
  const width = to - from;
  for (const [name, value] of Object.entries({ from, peak, to })) requireFinite("triangular", name, value);
  requirePositive("triangular", "to - from", width);
  if (!(peak >= from && peak <= to))
    throw new RangeError(`triangular: peak is ${peak}, must lie between ${from} and ${to}`);
  const rising = peak - from;
  const falling = to - peak;

  // moments
  const mean = (from + peak + to) / 3;
  const sd = Math.sqrt((width * width - rising * falling) / 18);

  // evaluation
  const belowPeak = rising / width;
  const abovePeak = falling / width;
  const leftTail = (x: number): number => (x <= from ? 0 : ((x - from) / width) * ((x - from) / rising));
  const rightTail = (x: number): number => (x >= to ? 0 : ((to - x) / width) * ((to - x) / falling));
  return completeMarginal({
    kind: "triangular",
    mean,
    sd,
    lowest: from,
    highest: to,
    kinks: rising > 0 && falling > 0 ? [normalQuantile(belowPeak)] : [],
    pdf: (x) => {
      if (x < from || x > to) return 0;
      return (2 / width) * (x === peak ? 1 : x < peak ? (x - from) / rising : (to - x) / falling);
    },
    cdf: (x) => (x < peak ? leftTail(x) : 1 - rightTail(x)),
    ccdf: (x) => (x < peak ? 1 - leftTail(x) : rightTail(x)),
    quantile: (p) => (p < belowPeak ? from + Math.sqrt(p * width * rising) : to - Math.sqrt((1 - p) * width * falling)),
    upperQuantile: (q) =>
      q < abovePeak ? to - Math.sqrt(q * width * falling) : from + Math.sqrt((1 - q) * width * rising),
  });
}
