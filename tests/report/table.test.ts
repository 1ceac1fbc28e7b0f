import { describe, expect, test } from "vitest";
import { lengthOf, textTable, wrap } from "../../src/report/table.ts";

const columns = [{ heading: "Name" }, { heading: "Value", align: "right" as const }, { heading: "Remark", spare: 1 }];
const rows = [
  ["Stem", "52.1", "concrete"],
  ["A name that is rather long for its column", "7", "–"],
];

describe("tables for a terminal", () => {
  test("stand in aligned columns, numbers to the right", () => {
    expect(textTable(columns, [rows[0]], 80).split("\n")).toEqual([
      "Name  Value  Remark",
      "────  ─────  ────────",
      "Stem   52.1  concrete",
    ]);
  });

  test("drop the column that can be spared, then break the first, and never run over the width", () => {
    const narrow = textTable(columns, rows, 30);
    expect(narrow).not.toContain("Remark");
    for (const line of narrow.split("\n")) expect(lengthOf(line)).toBeLessThanOrEqual(30);
    for (const word of ["rather", "long", "column"]) expect(narrow).toContain(word);
  });

  test("text breaks at spaces, hangs on its indent and keeps the one it came with", () => {
    expect(wrap("• one two three", 9, "  ")).toEqual(["• one two", "  three"]);
    expect(wrap("    a b", 5, "      ")).toEqual(["    a", "      b"]);
  });
});
