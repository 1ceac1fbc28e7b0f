import { describe, expect, test } from "vitest";
import { fieldOfPath } from "../../src/study/fields.ts";
import { brief, rangeText, readKey, readNumber, readValue } from "../../src/study/read-number.ts";
import { noPlaces } from "./fixtures/read.ts";

const field = (path: string) => fieldOfPath(path)!;

function refusal(raw: unknown, path: string, units: "metric" | "us" = "metric"): string {
  const findings = noPlaces();
  expect(readValue(raw, path, field(path), { units, findings })).toBeNaN();
  const [{ message, hint }] = findings.problems;
  return hint === undefined ? message : `${message} | ${hint}`;
}

describe("a value outside its range", () => {
  test.each<[unknown, string, string]>([
    [340, "soils.a.friction_angle", "340 is outside 0 to 60 degrees | did you mean 34.0?"],
    [61, "soils.a.friction_angle", "61 is outside 0 to 60 degrees"],
    [-33, "soils.a.friction_angle", "-33 is outside 0 to 60 degrees | did you mean 33?"],
    ["1.2 rad", "soils.a.friction_angle", "1.2 rad is outside 0 to 60 degrees"],
    [80, "wall.sliding_friction.ratio", "80 is outside 0 to 1.5 | did you mean 0.8? (80 % is 0.8)"],
    [18500, "soils.a.unit_weight", "18500 is outside 1 to 40 kN/m3 | did you mean 18.5?"],
    [0, "wall.stem.height", "0 is outside 0.01 to 100 m"],
    [99999, "ground.front.level", "99999 is outside -1000 to 10000 m | did you mean 9999.9?"],
  ])("%j at %s", (raw, path, message) => {
    expect(refusal(raw, path)).toBe(message);
  });

  test("the limits themselves are allowed", () => {
    for (const limit of [0, 60])
      expect(readValue(limit, "x", field("soils.a.friction_angle"), { units: "metric", findings: noPlaces() })).toBe(
        limit,
      );
  });
});

test("a key of a distribution is held to its type", () => {
  const read = (raw: unknown, type: Parameters<typeof readKey>[2]["type"]): string => {
    const findings = noPlaces();
    const value = readKey(raw, "x", { type }, field("soils.a.unit_weight"), { units: "metric", findings });
    return (
      findings.problems.map(({ message, hint }) => (hint === undefined ? message : `${message} | ${hint}`)).join() ||
      String(value)
    );
  };
  expect(read(0, "spread")).toBe("0 must be above 0; a certain number is written alone");
  expect(read("1 kN/m3", "spread")).toBe("1");
  expect(read("1 m", "spread")).toContain("whose unit is not one of this value's");
  expect(read(-1, "parent")).toBe("-1");
  expect(read(0, "positive")).toBe("0 must be above 0");
  expect(read(0, "nonnegative")).toBe("0");
  expect(read(-0.1, "nonnegative")).toBe("-0.1 must be 0 or more");
  expect(read(90, "share")).toBe("90 must be above 0 and at most 1 | did you mean 0.9?");
  expect(read(0, "share")).toBe("0 must be above 0 and at most 1");
  expect(read(0, "portion")).toBe("0");
  expect(read(20, "portion")).toBe("20 must be between 0 and 1 | did you mean 0.2?");
  expect(read(2.5, "count")).toBe("2.5 must be a whole number from 1");
  expect(read("2 ft", "length")).toBe("0.6096");
});

test("what is neither number nor text is named", () => {
  const findings = noPlaces();
  expect(readNumber({ a: 1 }, "x", "length", { units: "metric", findings })).toBeNaN();
  expect(findings.problems[0].message).toBe(
    "found a group of keys; a number, or a text with a number and a unit, is needed",
  );
});

test("ranges and numbers are written briefly, in the study's units", () => {
  expect(rangeText(field("soils.a.friction_angle"), "us")).toBe("0 to 60 degrees");
  expect(rangeText(field("wall.base.heel"), "us")).toBe("0 to 328.1 ft");
  expect(rangeText(field("loads.earthquake.kh"), "us")).toBe("0 to 1");
  expect([brief(2), brief(2.50001), brief(1234.56), brief(1e-7)]).toEqual(["2", "2.5", "1235", "1e-7"]);
});
