import { describe, expect, test } from "vitest";
import {
  distributionForms,
  distributionKinds,
  scatterKeys,
  uncertainSchema,
} from "../../src/study/distribution-keys.ts";
import { fieldOfPath } from "../../src/study/fields.ts";
import { readQuantity } from "../../src/study/read-quantity.ts";
import type { Distribution } from "../../src/study/study.ts";
import { noPlaces } from "./fixtures/read.ts";

describe("the table of distributions", () => {
  test("holds the kinds of the format, and no other", () => {
    expect([...distributionKinds].sort()).toEqual([
      "beta",
      "gamma",
      "gumbel",
      "lognormal",
      "measured",
      "mixture",
      "normal",
      "range",
      "triangular",
      "truncated_normal",
      "uniform",
      "weibull",
    ]);
  });

  test.each(Object.keys(distributionForms))("%s is read from the examples of its own keys", (kind) => {
    const keys = Object.entries(distributionForms[kind].keys).filter(([name]) => name !== "cov");
    const given: Record<string, number> = Object.fromEntries(keys.map(([name, { example }]) => [name, example]));
    const findings = noPlaces();
    const { quantity } = readQuantity(
      { [kind]: given },
      "soils.sand.friction_angle",
      fieldOfPath("soils.sand.friction_angle")!,
      { units: "metric", findings },
    );
    expect(findings.problems).toEqual([]);
    const read: Distribution["kind"] = (quantity as { distribution: Distribution }).distribution.kind;
    expect(read).toBe(kind === "range" ? "normal" : kind);
  });

  test("lets scatter stand in for the spread exactly where there is a mean and a spread", () => {
    for (const [kind, { keys, scatter }] of Object.entries(distributionForms))
      expect(scatter === true, kind).toBe("mean" in keys && "sd" in keys);
  });

  test("gives every key a description, and optional ones a default or a twin", () => {
    for (const { keys } of [...Object.values(distributionForms), { keys: scatterKeys }]) {
      for (const [name, key] of Object.entries(keys)) {
        expect(key.description.length, name).toBeGreaterThan(3);
        if (!key.required)
          expect(
            key.default !== undefined || ["sd", "cov", "scale_of_fluctuation", "averaged_over"].includes(name),
            name,
          ).toBe(true);
      }
    }
  });
});

test("a schema of a kind is made once", () => {
  expect(uncertainSchema("normal")).toBe(uncertainSchema("normal"));
  expect(uncertainSchema("normal")).not.toBe(uncertainSchema("normal", true));
  expect(Object.keys(uncertainSchema("normal").shape)).toEqual(["normal", "scatter", "source", "yearly", "knowledge"]);
  expect(Object.keys(uncertainSchema("mixture", true).shape)).toEqual(["mixture"]);
});
