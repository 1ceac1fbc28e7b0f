import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { buildModel } from "../src/model.ts";
import { fillNormals } from "../src/probability/streams.ts";
import { readDocument, readStudy } from "../src/study/read-study.ts";
import { gallery } from "./report/gallery.ts";

const root = new URL("../", import.meta.url).pathname;
const studies = {
  "two soils": readStudy(readFileSync(`${root}studies/two-soils-high-water/study.yaml`, "utf8")),
  "sloping fill": readStudy(readFileSync(`${root}studies/sloping-fill-us/study.yaml`, "utf8")),
  "the wall of the speed tests": readStudy(readFileSync(`${root}tests/bench/bench.yaml`, "utf8")),
  ...Object.fromEntries(Object.entries(gallery).map(([name, tree]) => [name, readDocument(tree)])),
};

describe("limit states of a wall", () => {
  test.each(Object.entries(studies))("tables stand in for the formulas to 1e-7 of a factor: %s", (_, study) => {
    const { states, space } = buildModel(study);
    const n = states.capacity;
    const z = states.keys.map((key, j) => {
      const column = new Float64Array(n);
      fillNormals("tables", "test", key, j, column, n);
      // a few samples beyond the reach of the tables
      column[0] = 6.5;
      column[1] = -6.5;
      return column;
    });
    const columns = (): Float64Array[] => states.names.map(() => new Float64Array(n));
    const [exact, tabled] = [columns(), columns()];
    const [exactMarks, tabledMarks] = [new Uint8Array(n), new Uint8Array(n)];
    states.evaluate(z, n, exact, exactMarks, true);
    states.evaluate(z, n, tabled, tabledMarks, false);
    expect([...tabledMarks]).toEqual([...exactMarks]);
    for (let k = 0; k < states.names.length; k++)
      for (let i = 0; i < n; i++) expect(Math.abs(tabled[k][i] - exact[k][i]) / (1 + exact[k][i])).toBeLessThan(1e-7);
    expect(states.evaluations).toEqual({ exact: n, batched: n });
    expect(space.coordinates).toHaveLength(states.dimension);
  });

  test("at given values are those of the same values drawn", () => {
    const { states, space } = buildModel(studies["two soils"]);
    const one = states.keys.map((_, j) => Float64Array.of(0.3 * j - 1));
    const x = space.unknowns.map((unknown, v) =>
      Float64Array.of(
        unknown.marginal.quantileOfNormal(space.rows[v].reduce((sum, weight, j) => sum + weight * one[j][0], 0)),
      ),
    );
    const factors = (): Float64Array[] => states.names.map(() => new Float64Array(1));
    const [drawn, given] = [factors(), factors()];
    const marks = new Uint8Array(1);
    states.evaluate(one, 1, drawn, marks, true);
    states.evaluateAt(x, 1, given, marks);
    expect(given).toEqual(drawn);
  });

  test("a sample outside its physical range is taken at the limit and marked", () => {
    const study = readDocument({
      ...gallery.plain,
      loads: { surcharge: { pressure: { normal: { mean: 10, sd: 10 } } } },
    });
    const { states, space } = buildModel(study);
    const place = space.unknowns.findIndex((unknown) => unknown.path === "loads.surcharge.pressure");
    const at = (pressure: number): { factors: number[]; mark: number } => {
      const out = states.names.map(() => new Float64Array(1));
      const marks = new Uint8Array(1);
      states.evaluateAt(
        space.unknowns.map((unknown, v) => Float64Array.of(v === place ? pressure : unknown.marginal.mean)),
        1,
        out,
        marks,
      );
      return { factors: out.map((column) => column[0]), mark: marks[0] };
    };
    expect(at(-5)).toEqual({ factors: at(0).factors, mark: 8 });
    expect(at(0).mark).toBe(0);
    const z = states.keys.map(() => Float64Array.of(-2, 2));
    for (const exact of [true, false]) {
      const marks = new Uint8Array(2);
      states.evaluate(
        z,
        2,
        states.names.map(() => new Float64Array(2)),
        marks,
        exact,
      );
      expect([...marks]).toEqual([8, 0]);
    }
  });

  test("more samples than the block holds are refused", () => {
    const { states } = buildModel(studies["two soils"]);
    expect(() => states.evaluate([], states.capacity + 1, [], new Uint8Array(1), true)).toThrow(RangeError);
  });
});
