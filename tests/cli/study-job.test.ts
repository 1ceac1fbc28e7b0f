import { Command } from "commander";
import { expect, test } from "vitest";
import { addJobOptions, type Job, runJob } from "../../src/cli/study-job.ts";
import type { CheckResult } from "../../src/results.ts";
import type { Study } from "../../src/study/study.ts";
import { fakeIo } from "./fake-io.ts";

/** A job that says what it was asked for. */
function recorder(): { readonly job: Job<CheckResult>; readonly asked: unknown[] } {
  const asked: unknown[] = [];
  const job: Job<CheckResult> = {
    beside: [],
    async compute(file, set) {
      asked.push([file, set]);
      return { study: {} as Study, result: { kind: "check", study: file } as CheckResult };
    },
    text: async ({ result }) => `text of ${result.study}`,
  };
  return { job, asked };
}

test("a job computes its study with the settings, and shows its text", async () => {
  const { job, asked } = recorder();
  const io = fakeIo();
  await runJob(job, "a.yaml", { set: [["x.y", "1"]] }, io, () => expect.unreachable());
  expect(asked).toEqual([["a.yaml", [["x.y", "1"]]]]);
  expect(io.written.out).toBe("text of a.yaml\n");
});

test("a second study is computed without the settings", async () => {
  const { job, asked } = recorder();
  const io = fakeIo();
  await runJob(job, "a.yaml", { set: [["x.y", "1"]], compare: "b.yaml", json: true }, io, () => expect.unreachable());
  expect(asked).toEqual([
    ["a.yaml", [["x.y", "1"]]],
    ["b.yaml", []],
  ]);
  expect(JSON.parse(io.written.out)).toEqual({
    kind: "check",
    study: "a.yaml",
    compared_with: { kind: "check", study: "b.yaml" },
  });
});

test("both studies from standard input is wrong usage", async () => {
  const { job, asked } = recorder();
  await expect(runJob(job, "-", { compare: "-" }, fakeIo(), () => undefined)).rejects.toThrow("only one of the two");
  expect(asked).toEqual([]);
});

test("commands with jobs take --compare and --watch", () => {
  expect(addJobOptions(new Command("x")).options.map(({ long }) => long)).toEqual(["--compare", "--watch"]);
});
