import { readFileSync } from "node:fs";
import { expect, test } from "vitest";
import { cautions } from "../src/cautions.ts";

const text = cautions.join(" ");

test.each([
  "external stability of one wall section in plane strain",
  "reinforced concrete",
  "settlement",
  "freeze–thaw",
  "scour",
  "piping",
  "compaction pressure",
  "clogging of drains",
  "softening with time",
  "tie-backs",
  "construction stages",
  "Human error",
  "licensed engineer",
  "target set by the code or the authority governs",
])("the cautions that every output carries name: %s", (words) => {
  expect(text).toContain(words);
});

test("the README carries them too", () => {
  const readme = readFileSync(new URL("../README.md", import.meta.url), "utf8").replace(/\s+/g, " ");
  for (const words of [
    "does not design the reinforced concrete",
    "compaction pressure, clogging of drains",
    "human error",
    "licensed engineer decide",
  ])
    expect(readme).toContain(words);
});
