import { expect, test } from "vitest";
import { deepSeated } from "../../../src/mechanics/deep-seated/deep-seated.ts";
import { ordinaryGround, undrained } from "./random-ground.ts";

const messages = (ground: Parameters<typeof deepSeated>[0]): string =>
  deepSeated(ground)
    .notes.map(({ path, message }) => `${path}: ${message}`)
    .join("\n");

test("notes say where the smallest lies at an end of the search, and that no crack is assumed", () => {
  const deep = ordinaryGround({
    behind: { slope: 0, layers: [{ soil: undrained(60) }] },
    below: [{ soil: undrained(60), bottom: -5 }, { soil: undrained(5) }],
    front: { level: 0, ignoreTop: 0, toeSoil: true, soil: undrained(60) },
    water: {},
  });
  expect(messages(deep)).toContain("no tension crack");
  expect(messages(deep)).toContain("the firm level that is assumed");
  expect(messages({ ...deep, firmLevel: -5.5 })).not.toContain("the firm level that is assumed");
  expect(messages({ ...deep, firmLevel: -60 })).toMatch(/farthest entry|farthest exit/);
  expect(messages(ordinaryGround())).toBe("");
});
