import { expect, test } from "vitest";
import { factorHistogram } from "../../../src/report/charts/factor-histogram.ts";
import { handMade } from "../hand-made.ts";

interface Layers {
  readonly layer: readonly {
    readonly data: { readonly values: readonly { from: number; to: number; share: number; failed: boolean }[] };
  }[];
}

const sliding = handMade.assess.limitStates.sliding!;

test("bars below 1 are marked as failed, and shares are of all samples", () => {
  const bars = (factorHistogram("sliding", sliding).spec as unknown as Layers).layer[1].data.values;
  expect(bars.map((bar) => bar.failed)).toEqual([true, false, false, false, false, false]);
  expect(bars[0].share).toBeCloseTo(0.4, 10);
});

test("samples beyond the last bar are named in words", () => {
  expect(factorHistogram("sliding", sliding).alternative).toContain(
    "0.58\u202f% of the samples lie above the last bar",
  );
});
