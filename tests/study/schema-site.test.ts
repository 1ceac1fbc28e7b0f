import { expect, test } from "vitest";
import { ground, soilName, water } from "../../src/study/schema-site.ts";

test.each(["sand", "Ton_2", "sable-fin", "глина", "a"])("%s can be the name of a soil", (name) => {
  expect(soilName.safeParse(name).success).toBe(true);
});

test.each(["", "2nd", "soft clay", "a.b", "_x", "toString", "prototype"])("%j cannot", (name) => {
  expect(soilName.safeParse(name).success).toBe(false);
});

test("ground needs what lies behind and below, water needs nothing", () => {
  expect(ground.safeParse({ behind: { layers: [{ soil: "a" }] }, below: { soil: "a" } }).success).toBe(true);
  expect(ground.safeParse({ behind: { layers: [] }, below: { soil: "a" } }).success).toBe(false);
  expect(ground.safeParse({ below: { soil: "a" } }).success).toBe(false);
  expect(water.safeParse({}).success).toBe(true);
});
