import { type ChildProcess, execFile, spawn } from "node:child_process";
import { once } from "node:events";
import { copyFile, mkdir, symlink } from "node:fs/promises";
import { join } from "node:path";
import { promisify } from "node:util";
import { expect, test } from "vitest";
import { newFolder, root, yard } from "./fake-io.ts";

const start = promisify(execFile);
const launcher = join(root, "bin/toehold.mjs");
const folder = newFolder();

test("works through a link, from any folder", async () => {
  const link = join(folder, "toehold");
  await symlink(launcher, link);
  const { stdout } = await start(process.execPath, [link, "check", yard, "--json"], { cwd: folder });
  expect(JSON.parse(stdout).kind).toBe("check");
});

test("ends with the code of the command", async () => {
  await expect(start(process.execPath, [launcher, "check", "no-such-file.yaml"])).rejects.toMatchObject({ code: 2 });
});

test("says what to do where nothing is built", async () => {
  await mkdir(join(folder, "bin"));
  const copy = join(folder, "bin/toehold.mjs");
  await copyFile(launcher, copy);
  await expect(start(process.execPath, [copy])).rejects.toMatchObject({
    code: 3,
    stderr: expect.stringContaining("not built yet: run `npm ci`"),
  });
});

const ended = async (child: ChildProcess): Promise<number | null> => (await once(child, "exit"))[0];

test("Ctrl-C in a long run shows what was computed so far, marked, and ends with 130", async () => {
  const child = spawn(process.execPath, [launcher, "assess", yard, "--json", "--precision", "0", "--samples", "1e9"]);
  let out = "";
  child.stdout.on("data", (part) => {
    out += part;
  });
  // A process that has not yet set its handler would be killed by the signal: it is given time, and killed if it never ends.
  const stopping = setTimeout(() => child.kill("SIGINT"), 4000);
  const killing = setTimeout(() => child.kill("SIGKILL"), 30_000);
  const code = await ended(child);
  clearTimeout(stopping);
  clearTimeout(killing);
  expect(code).toBe(130);
  expect(JSON.parse(out).run.complete).toBe(false);
});

test("a reader that closes early is no error", async () => {
  const { stdout } = await start("bash", [
    "-c",
    `set -o pipefail; "$0" "$1" check "$2" | head -n 1`,
    process.execPath,
    launcher,
    yard,
  ]);
  expect(stdout).toContain("Yard wall");
});
