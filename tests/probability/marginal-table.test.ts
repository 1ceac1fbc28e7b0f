import { describe, expect, test } from "vitest";
import { marginalOf } from "../../src/probability/marginal-of.ts";
import {
  brokenCells,
  createLocation,
  evaluateTable,
  fitTable,
  locate,
  lookUp,
  standInOf,
  tableNodes,
  tableReach,
  tabulate,
} from "../../src/probability/marginal-table.ts";
import { fillUniforms } from "../../src/probability/streams.ts";
import type { Distribution } from "../../src/study/study.ts";

/** The distributions of the study format's page, and harder relatives. */
const distributions: [string, Distribution][] = [
  ["normal", { kind: "normal", mean: 34, sd: 2.72 }],
  ["lognormal", { kind: "lognormal", mean: 34, sd: 2.7, shift: 0 }],
  ["truncated normal", { kind: "truncated_normal", mean: 34, sd: 2.7, from: 28, to: 42 }],
  ["uniform", { kind: "uniform", from: 0.5, to: 2.5 }],
  ["triangular", { kind: "triangular", from: 0, peak: 0.8, to: 3 }],
  ["beta", { kind: "beta", from: 0, to: 4, mean: 1.2, sd: 0.6 }],
  ["gumbel", { kind: "gumbel", mean: 1.4, sd: 0.5 }],
  ["weibull", { kind: "weibull", shape: 1.8, scale: 1.2, shift: 0 }],
  ["gamma", { kind: "gamma", mean: 1.2, sd: 0.4 }],
  [
    "mixture with a gap",
    {
      kind: "mixture",
      parts: [
        { share: 0.9, of: { kind: "triangular", from: 0, peak: 0.4, to: 1 } },
        { share: 0.1, of: { kind: "triangular", from: 1.5, peak: 3, to: 4.5 } },
      ],
    },
  ],
  [
    "measured as lognormal",
    { kind: "measured", values: [33.1, 35.4, 31.8, 36], as: "lognormal", varianceReduction: 1 },
  ],
  ["measured as normal", { kind: "measured", values: [33.1, 35.4, 31.8, 36], as: "normal", varianceReduction: 0.4 }],
  ["lopsided beta", { kind: "beta", from: 0, to: 4, mean: 0.5, sd: 0.8 }],
  ["wide lognormal", { kind: "lognormal", mean: 10, sd: 12, shift: -2 }],
  [
    "mixture of narrow parts",
    {
      kind: "mixture",
      parts: [
        { share: 0.7, of: { kind: "normal", mean: 1, sd: 0.02 } },
        { share: 0.3, of: { kind: "uniform", from: 2, to: 2.1 } },
      ],
    },
  ],
];

const n = 8_000;
const u = new Float64Array(n);
fillUniforms("table", "test", "u", 0, u, n);
for (let i = 0; i < n; i++) u[i] = 13 * u[i] - 6.5; // evenly, so that both tails and the outside are tried
const [found, location, unbroken] = [new Float64Array(n), createLocation(n), brokenCells([])];

describe.each(distributions)("%s", (_, distribution) => {
  const marginal = marginalOf(distribution);
  const table = tabulate(marginal.quantileOfNormal, marginal);

  test("the table is within 1.3e-9 of its function, measured by the spread or the distance from the middle", () => {
    locate(u, n, unbroken, location);
    lookUp(table.cubics, location, u, n, table.standIn, found);
    const middle = marginal.quantileOfNormal(0);
    let worst = { error: 0, u: 0 };
    for (let i = 0; i < n; i++) {
      const exact = marginal.quantileOfNormal(u[i]);
      const error = Math.abs(found[i] - exact) / (marginal.sd + Math.abs(exact - middle));
      if (!(error <= worst.error)) worst = { error, u: u[i] };
    }
    expect(worst.error, `u = ${worst.u}`).toBeLessThan(1.3e-9);
  });

  test("a table that stands alone gives the same", () => {
    const alone = new Float64Array(n);
    evaluateTable(table, u, n, alone);
    locate(u, n, unbroken, location);
    lookUp(table.cubics, location, u, n, table.standIn, found);
    expect(alone).toEqual(found);
  });

  test("few samples fall outside the cells that serve", () => {
    let weight = 0;
    const width = 1 / 64;
    for (let k = 0; k < table.cubics.length / 4; k++) {
      const middle = (k - 0.5) * width - tableReach;
      if (Number.isNaN(table.cubics[4 * k])) weight += width * Math.exp(-0.5 * middle * middle) * 0.39894;
    }
    expect(weight).toBeLessThan(distribution.kind === "mixture" ? 0.2 : 0.01);
  });
});

test("a function that hangs on one unknown shares the places and has broken cells of its own", () => {
  const marginal = marginalOf({ kind: "lognormal", mean: 34, sd: 3, shift: 0 });
  const x = tabulate(marginal.quantileOfNormal, marginal);
  const pressure = (angle: number): number => Math.tan(Math.PI / 4 - (angle * Math.PI) / 360) ** 2;
  const capped = (angle: number): number => Math.min(pressure(angle), 0.3);
  const kink = marginal.normalOfQuantile((Math.asin(0.7 / 1.3) * 180) / Math.PI); // Ka = 0.3
  const y = tabulate((v) => capped(x.standIn(v)), { kinks: [kink], jumps: [] });
  locate(u, n, unbroken, location);
  lookUp(y.cubics, location, u, n, y.standIn, found);
  for (let i = 0; i < n; i++) expect(found[i]).toBeCloseTo(capped(marginal.quantileOfNormal(u[i])), 9);
});

test("the stand-in of a marginal is made once, and serves every wall that holds it to a range of its own", () => {
  const marginal = marginalOf({ kind: "gamma", mean: 1.2, sd: 0.4 });
  const x = standInOf(marginal);
  expect(standInOf(marginal)).toBe(x);
  const end = marginal.normalOfQuantile(2);
  const held = tabulate((v) => 10 * Math.min(x(v), 2), { kinks: [end], jumps: [] });
  evaluateTable(held, u, n, found);
  for (let i = 0; i < n; i += 7) {
    expect(found[i]).toBeCloseTo(10 * Math.min(marginal.quantileOfNormal(u[i]), 2), 7);
  }
});

test("a kink that nobody named is found by the check of the cells", () => {
  const y = (v: number): number => Math.max(v, 0.503) ** 2;
  const table = tabulate(y, { kinks: [], jumps: [] });
  locate(u, n, unbroken, location);
  lookUp(table.cubics, location, u, n, table.standIn, found);
  for (let i = 0; i < n; i++) expect(found[i]).toBeCloseTo(y(u[i]), 8);
});

test("a cubic is fitted exactly, and beyond the reach the function is asked", () => {
  const cubic = (v: number): number => 2 - v + 0.3 * v ** 2 - 0.01 * v ** 3;
  const values = fitTable(tableNodes().map(cubic));
  const at = Float64Array.of(-6, -5.999, 0, 0.0078, 3.2, 5.9999, 6, -7, 40);
  locate(at, at.length, brokenCells([3.2]), location);
  lookUp(values, location, at, at.length, () => -99, found);
  for (const i of [0, 1, 2, 3, 5]) expect(found[i]).toBeCloseTo(cubic(at[i]), 12);
  expect([4, 6, 7, 8].map((i) => found[i])).toEqual([-99, -99, -99, -99]);
});
