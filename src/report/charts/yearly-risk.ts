import type { PeriodAssessment } from "../../results.ts";
import { oneIn, probabilityText, superscript } from "../number.ts";
import { markWords } from "../page-svg.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";
import { yearsText } from "../wording.ts";

/** So many failures a year make a bar of its own worth drawing; with fewer, years are taken together. */
const failuresPerBar = 20;

/** Probability of failing in each year of the period, given that the wall stood until then; the mean over years drawn together. */
export function yearlyRiskChart({ years, failures, yearlyGivenSurvival }: PeriodAssessment): Chart {
  const together =
    [1, 2, 5, 10, 20, 50].find((run) => failures * run >= failuresPerBar * years && years / run <= 50) ?? 10;
  const known = groups(yearlyGivenSurvival, together);
  const most = Math.max(...known.map((row) => row.probability), 1e-300);
  const power = most > 0.1 || most <= 1e-300 ? 0 : Math.floor(Math.log10(most));
  const values = known.map(({ year, probability }) => ({
    year,
    shown: probability / 10 ** power,
    tip: markWords(
      `Year ${year}: ${probability === 0 ? "none seen" : `${oneIn(probability)} a year`}, given that it stood until then`,
    ),
  }));
  const [first, last] = [known[0], known.at(-1)];
  return {
    id: "yearly-risk",
    title: `Failing in each of ${yearsText(years)}, given that the wall stood until then`,
    alternative:
      first === undefined || last === undefined
        ? "No year is known."
        : `In year ${first.year} ${probabilityText(first.probability)} a year, in year ${last.year} ${probabilityText(last.probability)} a year.`,
    spec: {
      data: { values },
      height: 130,
      mark: { type: "bar", color: palette.main, binSpacing: 1 },
      encoding: {
        x: {
          field: "year",
          type: "ordinal",
          sort: null,
          axis: { title: "Year", labelAngle: 0, labelOverlap: true, grid: false, ticks: false },
        },
        y: {
          field: "shown",
          type: "quantitative",
          axis: { title: `Probability${power === 0 ? "" : `, × 10${superscript(power)}`}`, tickCount: 4 },
        },
        description: { field: "tip" },
      },
    },
  };
}

interface YearRow {
  /** "7", or "6 to 10". */
  readonly year: string;
  readonly probability: number;
}

function groups(yearly: readonly (number | null)[], together: number): readonly YearRow[] {
  const rows: YearRow[] = [];
  for (let from = 0; from < yearly.length; from += together) {
    const part = yearly.slice(from, from + together).flatMap((probability) => probability ?? []);
    if (part.length === 0) break;
    const probability = part.reduce((sum, value) => sum + value, 0) / part.length;
    rows.push({ year: part.length === 1 ? `${from + 1}` : `${from + 1} to ${from + part.length}`, probability });
  }
  return rows;
}
