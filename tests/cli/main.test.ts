import { execFile } from "node:child_process";
import { mkdtemp, readdir, readFile, symlink, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { promisify } from "node:util";
import { beforeAll, describe, expect, test } from "vitest";
import { type Ran, runWith } from "./fake-io.ts";

const root = new URL("../../", import.meta.url).pathname;
const yard = join(root, "studies/two-soils-high-water/study.yaml");
const few = ["--samples", "20000", "--precision", "0"];
let folder: string;

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), "toehold-"));
});

/** A result as a reader in another program sees it: no types of ours. */
// biome-ignore lint/suspicious/noExplicitAny: that is what JSON.parse gives
const json = (ran: Ran): any => JSON.parse(ran.out);

describe("toehold check", () => {
  test("prints factors, forces, the calculation and the cautions, and ends with 0 whatever the wall's fate", async () => {
    const ran = await runWith([
      "check",
      yard,
      "--set",
      "water.behind.level=4.5",
      "--set",
      "wall.sliding_friction.ratio=0.3",
    ]);
    expect(ran.code).toBe(0);
    expect(ran.err).toBe("");
    for (const words of [
      "Factor of safety",
      "At these values the wall fails by sliding.",
      "Soil over the heel",
      "tan²(45° − φ/2)",
      "Cautions",
      "licensed engineer",
    ])
      expect(ran.out).toContain(words);
  });

  test("gives the keys of the result file with --json, and nothing else", async () => {
    const result = json(await runWith(["check", yard, "--json"]));
    expect(Object.keys(result)).toEqual(
      expect.arrayContaining([
        "study",
        "kind",
        "warnings",
        "cautions",
        "values",
        "forces",
        "pressure",
        "base",
        "limit_states",
        "sheet",
      ]),
    );
    expect(result.kind).toBe("check");
    expect(result.values["soils.fill.friction_angle"]).toBe(37);
    expect(Object.keys(result.base)).toEqual([
      "vertical",
      "horizontal",
      "resultant_x",
      "eccentricity",
      "effective_width",
      "pressure_toe",
      "pressure_heel",
    ]);
    expect(Object.keys(result.limit_states.sliding)).toEqual(["factor_of_safety", "resisting", "driving", "unit"]);
    expect(Object.keys(result.sheet[0])).toEqual(
      expect.arrayContaining(["symbol", "text", "formula", "value", "unit"]),
    );
  });

  test("--at cautious is harder on the wall than the means, and --at FILE takes values by path", async () => {
    const factor = async (...args: string[]): Promise<number> =>
      json(await runWith(["check", yard, "--json", ...args])).limit_states.sliding.factor_of_safety;
    const mean = await factor();
    expect(await factor("--at", "cautious")).toBeLessThan(mean);
    const file = join(folder, "values.yaml");
    await writeFile(file, "water.behind.level: 3.2\n");
    expect(await factor("--at", file)).toBeLessThan(mean);
    await writeFile(file, "water.behind.lvel: 3.2\n");
    const wrong = await runWith(["check", yard, "--at", file]);
    expect(wrong.code).toBe(1);
    expect(wrong.err).toContain("water.behind.lvel");
  });

  test("reads a study from standard input", async () => {
    const ran = await runWith(["check", "-", "--json"], { input: await readFile(yard, "utf8") });
    expect(ran.code).toBe(0);
    expect(json(ran).kind).toBe("check");
  });
});

describe("toehold assess", () => {
  test("says how likely each failure is in a sentence, and what drives it", async () => {
    const ran = await runWith(["assess", yard, ...few]);
    expect(ran.code).toBe(0);
    expect(ran.out).toMatch(
      /The wall fails by sliding, overturning or bearing failure: about 1 in \d+; between 1 in \d+ and/,
    );
    expect(ran.out).toContain("What drives it");
    expect(ran.out).toContain("Overturning: no failure in 20");
    expect(ran.out).not.toMatch(/\bsafe\b/);
  });

  test("gives the keys of the result file, the same bits for the same seed and others for another", async () => {
    const first = await runWith(["assess", yard, "--json", ...few]);
    const { run, ...result } = json(first);
    const { run: again, ...same } = json(await runWith(["assess", yard, "--json", ...few]));
    expect(same).toEqual(result);
    const other = json(await runWith(["assess", yard, "--json", "--seed", "another", ...few]));
    expect(other.limit_states.sliding.monte_carlo.failures).not.toBe(result.limit_states.sliding.monte_carlo.failures);
    expect(run).toMatchObject({ complete: true, sampling: { evaluations: 20_000 } });
    expect(again.version).toBe(run.version);
    expect(Object.keys(result.limit_states.sliding.monte_carlo)).toEqual(
      expect.arrayContaining([
        "probability",
        "standard_error",
        "interval",
        "failures",
        "samples",
        "reliability_index",
        "factor_mean",
        "factor_sd",
        "counts",
      ]),
    );
    expect(Object.keys(result.limit_states.sliding.monte_carlo.counts)).toEqual([
      "slope_unstable",
      "lost_contact",
      "capped",
      "out_of_range",
    ]);
    expect(Object.keys(result.limit_states.sliding.first_order_second_moment)).toEqual(
      expect.arrayContaining([
        "mean",
        "sd",
        "reliability_index_normal",
        "reliability_index_lognormal",
        "probability_normal",
        "probability_lognormal",
        "contributions",
      ]),
    );
    expect(Object.keys(result.limit_states.sliding.drivers[0])).toEqual(
      expect.arrayContaining(["path", "share", "adverse", "knowledge", "shift_given_failure"]),
    );
    expect(result.system.bounds).toHaveLength(2);
  });

  test("--all shows every measure, and narrow terminals do not break the lines", async () => {
    const ran = await runWith(["assess", yard, "--all", ...few], { width: 60 });
    expect(ran.out).toContain("First-order second-moment");
    const long = ran.out.split("\n").filter((line) => [...line].length > 60);
    expect(long).toEqual([]);
  });

  test("a run stopped by the user keeps what it has, says so and ends with 130", async () => {
    const stop = new AbortController();
    stop.abort();
    const ran = await runWith(["assess", yard, "--json", "--precision", "0"], { signal: stop.signal });
    expect(ran.code).toBe(130);
    expect(json(ran).run).toMatchObject({ complete: false, sampling: { evaluations: 16_384 } });
  });
});

describe("toehold report, schema and new", () => {
  test("report writes one page, and says where", async () => {
    const page = join(folder, "page.html");
    const ran = await runWith(["report", yard, "-o", page, ...few]);
    expect(ran.code).toBe(0);
    expect(ran.out).toContain(`The report is in ${page}`);
    expect(await readFile(page, "utf8")).toMatch(/^<!doctype html>/);
    expect((await readdir(folder)).filter((name) => name.startsWith("."))).toEqual([]);
  });

  test("report never writes over the study", async () => {
    const study = join(folder, "own.yaml");
    const text = await readFile(yard, "utf8");
    await writeFile(study, text);
    const ran = await runWith(["report", study, "-o", study, ...few]);
    expect(ran).toMatchObject({ code: 2, out: "" });
    expect(await readFile(study, "utf8")).toBe(text);
  });

  test("schema prints JSON Schema", async () => {
    expect(json(await runWith(["schema"]))).toHaveProperty("properties.wall");
  });

  test.each(["metric", "us"])(
    "new writes a commented study in %s units that runs as it is, and never writes over one",
    async (units) => {
      const target = join(folder, `new-${units}`);
      const made = await runWith(["new", target, "--units", units]);
      expect(made.code).toBe(0);
      const file = join(target, "study.yaml");
      const checked = json(await runWith(["check", file, "--json"]));
      for (const state of Object.values<{ factor_of_safety: number }>(checked.limit_states))
        expect(state.factor_of_safety).toBeGreaterThan(1);
      expect((await runWith(["assess", file, ...few])).code).toBe(0);
      const again = await runWith(["new", target]);
      expect(again).toMatchObject({ code: 2 });
      expect(again.err).toContain("is there already");
    },
  );
});

describe("two studies, a watched file, completion", () => {
  test("--compare sets two studies side by side, in text and as an array in JSON", async () => {
    const other = join(root, "studies/creek-side-wall/study.yaml");
    const checked = await runWith(["check", yard, "--compare", other]);
    expect(checked.code).toBe(0);
    expect(checked.out).toContain("Factors of safety, side by side");
    expect(checked.out).toMatch(/Uncertain values that differ[\s\S]*water\.behind\.level/);
    const assessed = await runWith(["assess", yard, "--compare", yard, ...few]);
    expect(assessed.out).toContain("Probability (index), side by side");
    expect(assessed.out).toContain("Their uncertain values have the same means.");
    const both = JSON.parse((await runWith(["check", yard, "--compare", other, "--json"])).out);
    expect(both.map((result: { study: string }) => result.study)).toEqual([
      "Yard wall, bay 3 (invented)",
      "Creek-side wall (invented)",
    ]);
  });

  test("--watch runs again when the file is saved, shows what changed and a mistake, and ends with the user", async () => {
    const file = join(folder, "watched.yaml");
    const text = await readFile(yard, "utf8");
    await writeFile(file, text);
    const stop = new AbortController();
    let [out, err] = ["", ""];
    const until = async (found: () => boolean): Promise<void> => {
      for (let tries = 0; tries < 200 && !found(); tries++) await new Promise((resolve) => setTimeout(resolve, 50));
      expect(found()).toBe(true);
    };
    const watching = runWith(["check", file, "--watch"], {
      signal: stop.signal,
      out: (part) => {
        out += part;
      },
      err: (part) => {
        err += part;
      },
    });
    await until(() => err.includes("Watching"));
    await writeFile(file, text.replace("height: 5.0", "height: 5.2"));
    await until(() => out.includes("side by side"));
    expect(out).toMatch(/before +now/);
    await writeFile(file, text.replace("height: 5.0", "height: -1"));
    await until(() => err.includes("wall.stem.height"));
    stop.abort();
    expect((await watching).code).toBe(0);
  });

  test.each(["bash", "zsh", "fish"])("completion for %s names every command and its options", async (shell) => {
    const ran = await runWith(["completion", shell]);
    expect(ran.code).toBe(0);
    for (const word of [
      "check",
      "assess",
      "report",
      "schema",
      "new",
      shell === "fish" ? "-l precision" : "--precision",
    ])
      expect(ran.out).toContain(word);
    expect((await runWith(["completion", "tcsh"])).code).toBe(2);
  });

  test("the bash completion is a script that bash accepts and that completes", async () => {
    const { out } = await runWith(["completion", "bash"]);
    const { stdout } = await promisify(execFile)("bash", [
      "-c",
      `${out}\nCOMP_WORDS=(toehold assess --pre); COMP_CWORD=2; _toehold; echo "\${COMPREPLY[@]}"`,
    ]);
    expect(stdout.trim()).toBe("--precision");
  });
});

describe("what goes wrong", () => {
  test("a wrong study ends with 1, the line and a caret, and writes nothing", async () => {
    const file = join(folder, "wrong.yaml");
    await writeFile(file, (await readFile(yard, "utf8")).replace("height: 5.0", "height: -5.0"));
    const page = join(folder, "never.html");
    const ran = await runWith(["report", file, "-o", page]);
    expect(ran.code).toBe(1);
    expect(ran.out).toBe("");
    expect(ran.err).toMatch(/wrong\.yaml:\d+:\d+ wall\.stem\.height: /);
    expect(ran.err).toMatch(/\n {2}\d+ \| .*height: -5\.0.*\n +\| +\^\n/);
    expect(ran.err).toContain("nothing was written");
    expect(await readdir(folder)).not.toContain("never.html");
  });

  test.each([
    [["check"], "missing required argument"],
    [["chekc", yard], "unknown command 'chekc'"],
    [["check", yard, "--jsn"], "unknown option '--jsn'"],
    [["check", "no-such-file.yaml"], "cannot read no-such-file.yaml: no such file or folder"],
    [["check", yard, "--set", "water"], "write it as path=value"],
    [["assess", yard, "--samples", "many"], "it must be a whole number"],
    [["assess", yard, "--precision", "2"], "it must be a number from 0 to 1"],
    [["assess", yard, "--method", "magic"], "Allowed choices are plain"],
    [["check", yard, "-o", "no-such-folder/x.txt"], "cannot write no-such-folder/x.txt"],
  ])("%j ends with 2 and says why", async (args, words) => {
    const ran = await runWith(args);
    expect(ran.code).toBe(2);
    expect(ran.err).toContain(words);
  });

  test("--help and --version end with 0", async () => {
    expect(await runWith(["--version"])).toMatchObject({ code: 0, out: "0.1.0\n" });
    const help = await runWith(["assess", "--help"]);
    expect(help.code).toBe(0);
    expect(help.out).toContain("Examples:");
  });
});

describe("the launcher", () => {
  const start = promisify(execFile);

  test("works through a link, from any folder", async () => {
    const link = join(folder, "toehold");
    await symlink(join(root, "bin/toehold.mjs"), link);
    const { stdout } = await start(process.execPath, [link, "check", yard, "--json"], { cwd: folder });
    expect(JSON.parse(stdout).kind).toBe("check");
  });

  test("ends with the code of the command", async () => {
    await expect(
      start(process.execPath, [join(root, "bin/toehold.mjs"), "check", "no-such-file.yaml"]),
    ).rejects.toMatchObject({ code: 2 });
  });
});
