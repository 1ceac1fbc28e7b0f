import type { PeriodAssessment } from "../../results.ts";
import { oneIn, probabilityText, superscript } from "../number.ts";
import { markWords } from "../page-svg.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";
import { yearsText } from "../wording.ts";

/** Probability of failing in each year of the period, given that the wall stood until then. */
export function yearlyRiskChart({ years, yearlyGivenSurvival }: PeriodAssessment): Chart {
  const known = yearlyGivenSurvival.flatMap((probability, k) =>
    probability === null ? [] : [{ year: k + 1, probability }],
  );
  const most = Math.max(...known.map((row) => row.probability), 1e-300);
  const power = most > 0.1 || most <= 1e-300 ? 0 : Math.floor(Math.log10(most));
  const values = known.map(({ year, probability }) => ({
    year,
    shown: probability / 10 ** power,
    tip: markWords(
      `Year ${year}: ${probability === 0 ? "none seen" : oneIn(probability)}, given that it stood until then`,
    ),
  }));
  const [first, last] = [known[0], known.at(-1)];
  return {
    id: "yearly-risk",
    title: `Failing in each of ${yearsText(years)}, given that the wall stood until then`,
    alternative:
      first === undefined || last === undefined
        ? "No year is known."
        : `In the first year ${probabilityText(first.probability)}, in year ${last.year} ${probabilityText(last.probability)}.`,
    spec: {
      data: { values },
      height: 130,
      mark: { type: "bar", color: palette.main, binSpacing: 1 },
      encoding: {
        x: {
          field: "year",
          type: "ordinal",
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
