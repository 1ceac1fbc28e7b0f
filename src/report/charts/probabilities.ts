import type { AssessResult } from "../../results.ts";
import { capitalised, limitStateWords } from "../display.ts";
import { estimateSentence } from "../number.ts";
import { palette } from "../palette.ts";
import type { Chart } from "../render-chart.ts";

/** Probability of each limit state and of any of them, with its interval, on a logarithmic axis, against the target. */
export function probabilityChart(result: AssessResult): Chart {
  const named = [
    ...Object.entries(result.limitStates).map(([name, state]) => ({
      name: capitalised(limitStateWords[name] ?? name),
      mc: state.monteCarlo,
    })),
    { name: "Any of these", mc: result.system.monteCarlo },
  ];
  const least = Math.min(
    ...named
      .flatMap(({ mc }) => [mc.interval[0], mc.interval[1], mc.probability])
      .concat(result.target?.probability ?? 1)
      .filter((p) => p > 0),
  );
  const floor = 10 ** Math.floor(Math.log10(least) - 0.3);
  const values = named.map(({ name, mc }) => ({
    name,
    probability: mc.failures === 0 ? null : mc.probability,
    low: Math.max(mc.interval[0], floor),
    high: mc.interval[1],
    none: mc.failures === 0,
  }));
  const scale = { type: "log", domain: [floor, 1] };
  const x = {
    type: "quantitative",
    scale,
    title: "Probability of failure",
    axis: { format: "~e", grid: true, tickCount: 6 },
  };
  const y = { field: "name", type: "nominal", sort: null, title: null };
  const target =
    result.target === undefined
      ? []
      : [
          {
            data: { values: [{ target: result.target.probability }] },
            mark: { type: "rule", color: palette.target, strokeDash: [6, 3], strokeWidth: 2 },
            encoding: { x: { field: "target", ...x } },
          },
          {
            data: { values: [{ target: result.target.probability }] },
            mark: {
              type: "text",
              color: palette.target,
              align: "left",
              dx: 5,
              baseline: "top",
              fontSize: 12,
              text: "target",
            },
            encoding: { x: { field: "target", ...x }, y: { value: 0 } },
          },
        ];
  return {
    id: "probabilities",
    title: "Probability of each kind of failure, with its 95 % interval",
    alternative: named.map(({ name, mc }) => `${name}: ${estimateSentence(mc)}`).join(". "),
    spec: {
      data: { values },
      width: 520,
      height: { step: 38 },
      layer: [
        {
          mark: { type: "rule", strokeWidth: 7, color: palette.soft, strokeCap: "round" },
          encoding: { x: { field: "low", ...x }, x2: { field: "high" }, y },
        },
        {
          transform: [{ filter: "!datum.none" }],
          mark: { type: "point", filled: true, size: 90, color: palette.main, opacity: 1 },
          encoding: { x: { field: "probability", ...x }, y },
        },
        {
          transform: [{ filter: "datum.none" }],
          mark: {
            type: "text",
            text: "none seen, so below this",
            align: "left",
            dx: 8,
            color: palette.muted,
            fontSize: 12,
          },
          encoding: { x: { field: "high", ...x }, y },
        },
        ...target,
      ],
    },
  };
}
