import { expect, test } from "vitest";
import { sheetBlocks } from "../../src/report/sheet-blocks.ts";
import { handMade } from "./hand-made.ts";

test("lines under headings of one kind that alternate are brought together, and none goes missing", () => {
  const blocks = sheetBlocks(handMade.check.sheet);
  expect(blocks.map((block) => [block.heading, block.lines.length])).toEqual([
    ["Outline", 1],
    ["Earth pressure, Fill", 2],
    ["Earth pressure, Sand", 1],
  ]);
});

test("headings of another kind between two alike keep them apart", () => {
  const line = handMade.check.sheet[0];
  const sheet = ["Base", "Sliding", "Base"].map((heading) => ({ ...line, heading }));
  expect(sheetBlocks(sheet).map((block) => block.heading)).toEqual(["Base", "Sliding", "Base"]);
});
