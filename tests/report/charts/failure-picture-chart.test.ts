import { expect, test } from "vitest";
import { failurePictureChart } from "../../../src/report/charts/failure-picture-chart.ts";
import { displayIn } from "../../../src/report/display.ts";
import { handMade } from "../hand-made.ts";

const { assess } = handMade;

test("the unknown that shifts most comes first, with its means in words", () => {
  const chart = failurePictureChart(assess, assess.system.failurePicture, displayIn("metric"));
  expect(chart?.alternative).toMatch(
    /^Friction angle of Medium sand: mean 28\.5° among failures, 32\.0° as believed \(−1\.4 standard deviations\); Water level/,
  );
});

test("there is no chart without failures", () => {
  expect(failurePictureChart(assess, [], displayIn("metric"))).toBeUndefined();
});
