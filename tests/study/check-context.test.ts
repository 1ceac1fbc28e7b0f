import { expect, test } from "vitest";
import { treeReader } from "../../src/study/build-study.ts";
import { checkContext, meanOutline } from "../../src/study/check-context.ts";
import { everything, fixture, noPlaces, read } from "./fixtures/read.ts";

test("the outline at the means has levels of the site", () => {
  const study = read(everything);
  const context = checkContext(study, treeReader(study.document, noPlaces()), false);
  const outline = meanOutline(context);
  expect(outline).toMatchObject({
    baseWidth: expect.closeTo(3.7, 12),
    height: expect.closeTo(5.5, 12),
    heel: 2.4,
    underside: 100,
    crest: 105.5,
  });
  expect(outline.surface).toBeCloseTo(105.5 + 2.5 / 6, 12); // (heel + back run)·tan β at 1v:6h
});

test("values are said in the study's units, and what is not there is no number", () => {
  const study = read(fixture("gravity"));
  const context = checkContext(study, treeReader(study.document, noPlaces()), false);
  expect(context.say(3.048, "length")).toBe("10 ft");
  expect(context.say(0.5, "ratio")).toBe("0.5");
  expect(context.mean(undefined)).toBeNaN();
  expect(context.mean(study.wall.slidingFriction?.angle)).toBe(27);
  expect(meanOutline(context)).toMatchObject({ baseWidth: expect.closeTo(5 * 0.3048, 12), heel: 0 });
});
