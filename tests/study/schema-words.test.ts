import { expect, test } from "vitest";
import { about, flag, group, quantity, text, words } from "../../src/study/schema-words.ts";

test("a key says what it is, its default and an example", () => {
  expect(about("Words", 3)).toEqual({ description: "Words", examples: [3] });
  expect(flag("On the heel", false).meta()).toEqual({ description: "On the heel", examples: [true], default: false });
  expect(words("Units", ["metric", "us"], "metric").meta()).toEqual({
    description: "Units",
    examples: ["us"],
    default: "metric",
  });
  expect(text("Title", "Bay 3").meta()).toEqual({ description: "Title", examples: ["Bay 3"] });
  expect(group("Wall", {}).meta()).toEqual({ description: "Wall" });
});

test("a group takes no stranger, and a quantity may be left out where its row says so", () => {
  expect(group("Wall", { a: flag("A", true) }).safeParse({ b: 1 }).success).toBe(false);
  expect(quantity("wall.base.heel").safeParse(undefined).success).toBe(false);
  expect(quantity("wall.stem.back_run").safeParse(undefined).success).toBe(true);
  expect(quantity("wall.base.heel").safeParse(null).success).toBe(false);
  expect(quantity("wall.base.heel").safeParse({ any: "thing" }).success).toBe(true);
  expect(() => quantity("wall.base.heal")).toThrow(RangeError);
});
