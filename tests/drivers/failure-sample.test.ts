import { expect, test } from "vitest";
import { belongs, failureSample } from "../../src/drivers/failure-sample.ts";
import { normalCdf } from "../../src/numeric/normal.ts";
import { findDesignPoints } from "../../src/reliability/design-points.ts";
import { failureCentres, mixtureOf, wholeMove } from "../../src/reliability/failure-mixture.ts";
import { standardSpace, statesOfMargins } from "../reliability/straight-line.ts";

const states = statesOfMargins(2, { sliding: (u) => 2 - u[0], bearing: (u) => 2.5 - u[1] });

function probabilityOf(sample: ReturnType<typeof failureSample>, event: number | "system"): [number, number] {
  let [sum, square] = [0, 0];
  sample.weights.forEach((weight, i) => {
    if (!belongs(sample.failed[i], event)) return;
    sum += weight;
    square += weight * weight;
  });
  const p = sum / sample.drawn;
  return [p, Math.sqrt((square / sample.drawn - p * p) / sample.drawn)];
}

test("plain and weighted samples give the probability of each limit state and of the system", () => {
  const points = findDesignPoints(states, standardSpace(2), "sample").states.flatMap((state) => state.points);
  const mixture = mixtureOf(failureCentres(points), wholeMove);
  const [a, b] = [normalCdf(-2), normalCdf(-2.5)];
  for (const parts of [[], mixture]) {
    const sample = failureSample(states, parts, { seed: "sample", samples: 20_000 });
    expect(sample.z[0].length).toBe(sample.weights.length);
    for (const [event, expected] of [
      [0, a],
      [1, b],
      ["system", a + b - a * b],
    ] as const) {
      const [p, error] = probabilityOf(sample, event);
      expect(Math.abs(p - expected)).toBeLessThan(4.9 * error); // one seed in a million fails
      expect(error).toBeLessThan(0.1 * expected);
    }
  }
});

test("every sample kept fails, and only those limit states that are marked", () => {
  const sample = failureSample(states, [], { seed: "marks", samples: 5000 });
  sample.failed.forEach((bits, i) => {
    expect(belongs(bits, 0)).toBe(sample.z[0][i] > 2);
    expect(belongs(bits, 1)).toBe(sample.z[1][i] > 2.5);
    expect(belongs(bits, "system")).toBe(true);
  });
});

test("the same seed gives the same bits", () => {
  const of = () => failureSample(states, [], { seed: "same", samples: 3000 });
  expect(of()).toEqual(of());
});
