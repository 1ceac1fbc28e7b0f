import { readFile } from "node:fs/promises";
import { join } from "node:path";
import { describe, expect, test } from "vitest";
import { few, jsonOf, newFolder, runWith, valueIn, yard } from "../fake-io.ts";

describe("toehold assess", () => {
  test("says how likely each failure is in a sentence, and what drives it", async () => {
    const ran = await runWith(["assess", yard, ...few]);
    expect(ran).toMatchObject({ code: 0, err: "" });
    expect(ran.out).toMatch(
      /The wall fails by sliding, overturning or bearing failure: about 1 in \d+; between 1 in \d+ and/,
    );
    expect(ran.out).toContain("What drives it");
    expect(ran.out).toContain("Cautions");
  });

  test("no failure among the samples never reads as safe", async () => {
    const ran = await runWith(["assess", yard, ...few, "--set", "water.behind.level=0"]);
    expect(ran.out).toContain("Overturning: no failure in 20");
    expect(ran.out).not.toMatch(/\bsafe\b/i);
  });

  test("gives the keys of the result file", async () => {
    const result = await jsonOf(["assess", yard, "--json", ...few]);
    const sliding = valueIn(result, "limit_states", "sliding");
    const keys = (...path: string[]): string[] => Object.keys(valueIn(sliding, ...path) as object);
    expect(keys("monte_carlo")).toEqual(
      expect.arrayContaining(
        "probability standard_error interval failures samples reliability_index factor_mean factor_sd counts".split(
          " ",
        ),
      ),
    );
    expect(keys("monte_carlo", "counts")).toEqual("slope_unstable lost_contact capped out_of_range".split(" "));
    expect(keys("first_order_second_moment")).toEqual(
      expect.arrayContaining(
        "mean sd reliability_index_normal reliability_index_lognormal probability_normal probability_lognormal contributions".split(
          " ",
        ),
      ),
    );
    expect(keys("drivers", "0")).toEqual(
      expect.arrayContaining("path share adverse knowledge shift_given_failure".split(" ")),
    );
    expect(valueIn(result, "system", "bounds")).toHaveLength(2);
    expect(valueIn(result, "run")).toMatchObject({
      complete: true,
      seed: "yard-wall",
      sampling: { evaluations: 20_000 },
    });
  });

  test("the same seed gives the same bits, another seed other ones", async () => {
    const resultOf = async (...args: string[]): Promise<unknown> => {
      const { run: _, ...result } = (await jsonOf(["assess", yard, "--json", ...few, ...args])) as { run: unknown };
      return result;
    };
    const first = await resultOf();
    expect(await resultOf()).toEqual(first);
    const failures = (result: unknown): unknown =>
      valueIn(result, "limit_states", "sliding", "monte_carlo", "failures");
    expect(failures(await resultOf("--seed", "another"))).not.toBe(failures(first));
    expect(valueIn(await resultOf("--seed", "0"), "seed")).toBe("0");
  });

  test("--all shows every measure, and narrow terminals do not break the lines", async () => {
    const ran = await runWith(["assess", yard, "--all", ...few], { width: 60 });
    expect(ran.out).toContain("First-order second-moment");
    expect(ran.out.split("\n").filter((line) => [...line].length > 60)).toEqual([]);
  });

  test("a run stopped by the user keeps what it has, says so and ends with 130", async () => {
    const signal = AbortSignal.abort();
    const args = ["assess", yard, "--precision", "0"];
    const result = await jsonOf([...args, "--json"], { signal });
    expect(valueIn(result, "run")).toMatchObject({ complete: false, sampling: { evaluations: 16_384 } });
    const text = await runWith(args, { signal });
    expect(text.code).toBe(130);
    expect(text.out).toContain("Stopped by the user before the end");
  });

  test("--json with -o writes the result there and leaves standard output empty", async () => {
    const file = join(newFolder(), "result.json");
    expect(await runWith(["assess", yard, ...few, "--json", "-o", file])).toEqual({ code: 0, out: "", err: "" });
    expect(valueIn(JSON.parse(await readFile(file, "utf8")), "kind")).toBe("assess");
  });

  test.each(["plain", "latin_hypercube", "sobol", "importance", "subset", "directional"])(
    "--method %s makes the best estimate with that method, and checks it by another",
    async (method) => {
      const best = valueIn(await jsonOf(["assess", yard, "--json", ...few, "--method", method]), "best_estimate");
      expect(valueIn(best, "method")).toBe(method);
      const [low, high] = valueIn(best, "interval") as [number, number];
      expect(low).toBeGreaterThan(0);
      expect(high).toBeLessThan(1);
      expect(valueIn(best, "cross_check", "agrees")).toBe(true);
    },
  );

  test("first-order reliability stands beside sampling, with its design point", async () => {
    const sliding = valueIn(await jsonOf(["assess", yard, "--json", ...few]), "limit_states", "sliding");
    const first = valueIn(sliding, "first_order_reliability");
    const importance = Object.values(valueIn(first, "importance") as Record<string, number>);
    expect(valueIn(first, "converged")).toBe(true);
    expect(importance.reduce((sum, share) => sum + share, 0)).toBeCloseTo(1, 9);
    expect(Object.keys(valueIn(first, "design_point") as object)).toContain("water.behind.level");
  });
});
