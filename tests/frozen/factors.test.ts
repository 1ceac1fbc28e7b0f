import { existsSync, readdirSync, readFileSync, writeFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { buildModel } from "../../src/model.ts";
import { fillNormals } from "../../src/probability/streams.ts";
import { readStudy } from "../../src/study/read-study.ts";

/**
 * Unchanged, not right: factors of safety of 200 seeded samples as they were before the loop was made faster. They are
 * written anew with FREEZE=1 where a change of the mechanics is meant.
 */
const samples = 200;
const folder = new URL("./factors/", import.meta.url);
const root = new URL("../../", import.meta.url);
const studies = [
  ...readdirSync(new URL("studies/", root)).map((name) => [name, new URL(`studies/${name}/study.yaml`, root)] as const),
  ["bench", new URL("tests/bench/bench.yaml", root)] as const,
].filter(([, file]) => existsSync(file));

describe.each(studies)("%s", (name, file) => {
  const text = readFileSync(file, "utf8").replace(/^ *limit_states:.*deep_seated.*$/m, "");
  const { states } = buildModel(readStudy(text), undefined, 256);
  const frozen = new URL(`${name}.csv`, folder);
  const z = states.keys.map((key) => {
    const column = new Float64Array(256);
    fillNormals("frozen", "frozen factors", key, 0, column, samples);
    return column;
  });
  const factors = states.names.map(() => new Float64Array(256));

  test.each([["the formulas", true] as const, ["the tables", false] as const])(
    "factors of safety by %s are what they were, to 1e-9",
    (_, exact) => {
      states.evaluate(z, samples, factors, new Uint8Array(256), exact);
      const rows = Array.from({ length: samples }, (_, i) => factors.map((column) => column[i]));
      if (process.env.FREEZE === "1" && exact)
        writeFileSync(frozen, `${[states.names, ...rows].map((row) => row.join(",")).join("\n")}\n`);
      const [head, ...lines] = readFileSync(frozen, "utf8").trim().split("\n");
      expect(head).toBe(states.names.join(","));
      expect(lines).toHaveLength(samples);
      const worst = lines.flatMap((line, i) =>
        line.split(",").map((was, k) => Math.abs(rows[i][k] - Number(was)) / Math.max(1, Math.abs(Number(was)))),
      );
      expect(Math.max(...worst)).toBeLessThan(1e-9);
    },
  );
});
