import { readFile, rename, rm, writeFile } from "node:fs/promises";
import { join } from "node:path";
import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { run } from "../../src/cli/main.ts";
import { type FakeIo, fakeIo, newFolder, yard } from "./fake-io.ts";

let study: string;
let text: string;
let stop: AbortController;
let io: FakeIo;
let running: Promise<number>;

beforeEach(async () => {
  study = join(newFolder(), "study.yaml");
  text = await readFile(yard, "utf8");
  await writeFile(study, text);
  stop = new AbortController();
  io = fakeIo({ signal: stop.signal });
});
afterEach(async () => {
  stop.abort();
  await running;
});

/** Waits until so many results or complaints were shown and the watch is at rest again. */
async function shownTimes(count: number): Promise<void> {
  const times = (): number => io.written.out.split(`Watching ${study}`).length - 1;
  const end = Date.now() + 20_000;
  while (times() < count && Date.now() < end) await new Promise((resolve) => setTimeout(resolve, 20));
  expect(times()).toBe(count);
}

describe("--watch", () => {
  test("shows the result, then what changed at every save, and ends with 130", async () => {
    running = run(["check", study, "--watch"], io);
    await shownTimes(1);
    expect(io.written.out).toContain("Calculation");
    io.written.out = "";
    await writeFile(study, text.replace("heel: 3.0", "heel: 3.6"));
    await shownTimes(1);
    expect(io.written.out).toMatch(/Path +before +now\n.*\nwall\.base\.heel +3 +3\.6\n/);
    expect(io.written.out).toMatch(/Factor of safety, sliding +1\.97 +2\.\d\d +\+\d+ %/);
    expect(io.written.out).not.toContain("Calculation");
    stop.abort();
    expect(await running).toBe(130);
    expect(io.written.err).toBe("");
  });

  test("a wrong study is told and waited out, and the next sound one compared with the last", async () => {
    running = run(["check", study, "--watch"], io);
    await shownTimes(1);
    await writeFile(study, text.replace("heel: 3.0", "heel: wide"));
    await shownTimes(2);
    expect(io.written.err).toContain("wall.base.heel");
    await writeFile(study, text.replace("heel: 3.0", "heel: 2.7"));
    await shownTimes(3);
    expect(io.written.out).toMatch(/wall\.base\.heel +3 +2\.7\n/);
  });

  test("sees a file that an editor replaces, and waits while it is away or empty", async () => {
    running = run(["check", study, "--watch"], io);
    await shownTimes(1);
    await writeFile(study, "");
    await rm(study);
    await new Promise((resolve) => setTimeout(resolve, 450));
    await writeFile(`${study}.new`, text.replace("toe: 0.9", "toe: 1.1"));
    await rename(`${study}.new`, study);
    await shownTimes(2);
    expect(io.written.out).toMatch(/wall\.base\.toe +0\.9 +1\.1\n/);
    expect(io.written.err).toBe("");
  });

  test("watches an assessment too, and settings from the command line stay", async () => {
    running = run(["assess", study, "--watch", "--set", "wall.base.toe=1.2", "--samples", "20000"], io);
    await shownTimes(1);
    await writeFile(study, text.replace("heel: 3.0", "heel: 3.6"));
    await shownTimes(2);
    expect(io.written.out).toContain("Any of these");
    expect(io.written.out).not.toMatch(/wall\.base\.toe +/);
  });
});

test.each([
  [["check", "nowhere.yaml", "--watch"], "cannot read nowhere.yaml"],
  [["check", "-", "--watch"], "cannot stand with a study from standard input"],
  [["assess", yard, "--watch", "--json"], "cannot stand with --json"],
  [["check", yard, "--watch", "--compare", yard], "cannot stand with --compare"],
  [["check", yard, "--watch", "-o", "x.txt"], "cannot stand with -o"],
])("%j is wrong usage and does not wait", async (args, words) => {
  running = run(args, io);
  expect(await running).toBe(2);
  expect(io.written.err).toContain(words);
});
