import { expect, test } from "vitest";
import { unionOfModes } from "../../../src/reliability/system-from-points.ts";
import { readCases } from "../cases.ts";

test("the union of equally correlated modes agrees with the table, and lies within its bounds", () => {
  const rows = readCases(new URL("cases.csv", import.meta.url));
  expect(rows.length).toBe(40);
  for (const { n, beta, rho, Pf_series } of rows) {
    const modes = Array.from({ length: Number(n) }, (_, i) => i);
    const correlation = modes.map((i) => modes.map((j) => (i === j ? 1 : Number(rho))));
    const found = unionOfModes(
      modes.map(() => Number(beta)),
      correlation,
    );
    const exact = Number(Pf_series);
    // five of its own standard errors: a right estimate is outside once in 1.7 million
    expect(Math.abs(found.probability - exact), `${n} ${beta} ${rho}`).toBeLessThan(
      5 * found.standardError + 5e-9 * exact,
    );
    for (const [low, high] of [found.cornell, found.ditlevsen]) {
      expect(low).toBeLessThan(exact * (1 + 1e-8));
      expect(high).toBeGreaterThan(exact * (1 - 1e-8));
    }
  }
});

test("bounds of four different modes agree to the printed digits", () => {
  const correlation = [
    [1, 0.6, 0.3, 0.2],
    [0.6, 1, 0.5, 0.1],
    [0.3, 0.5, 1, 0.4],
    [0.2, 0.1, 0.4, 1],
  ];
  const found = unionOfModes([2.5, 2.8, 3.0, 3.2], correlation);
  expect(Math.abs(found.cornell[0] - 6.209665e-3)).toBeLessThan(0.51e-9);
  expect(Math.abs(found.cornell[1] - 1.080183e-2)).toBeLessThan(0.51e-8);
  // the printed 9.992851e-3 is cut off, not rounded: see source.md
  expect(Math.abs(found.ditlevsen[0] - 9.992851871157e-3)).toBeLessThan(1e-14);
  expect(Math.abs(found.ditlevsen[1] - 1.0096757e-2)).toBeLessThan(0.51e-9);
  expect(Math.abs(found.probability - 1.0028879e-2)).toBeLessThan(5 * found.standardError + 0.51e-9);
});
