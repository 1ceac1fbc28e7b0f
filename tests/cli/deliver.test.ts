import { readFile } from "node:fs/promises";
import { join } from "node:path";
import { expect, test } from "vitest";
import { deliver } from "../../src/cli/deliver.ts";
import { fakeIo, newFolder } from "./fake-io.ts";

test("text goes to standard output, with a line end, where no file is named or it is -", async () => {
  for (const output of [undefined, "-"]) {
    const io = fakeIo();
    await deliver("text", output === undefined ? {} : { output }, [], io);
    expect(io.written).toMatchObject({ out: "text\n", err: "" });
  }
});

test("with a file, standard output says where; with --quiet or --json it says nothing", async () => {
  const output = join(newFolder(), "out.txt");
  const said = async (options: object): Promise<string> => {
    const io = fakeIo();
    await deliver("text", { output, ...options }, [], io);
    expect(await readFile(output, "utf8")).toBe("text\n");
    return io.written.out;
  };
  expect(await said({})).toBe(`Written to ${output}.\n`);
  expect(await said({ quiet: true })).toBe("");
  expect(await said({ json: true })).toBe("");
});

test("control characters are taken out of text, and left in JSON, which is data", async () => {
  const io = fakeIo();
  await deliver("a\u001b[2Jb", {}, [], io);
  expect(io.written.out).toBe("a\ufffd[2Jb\n");
  await deliver('"\u009b"', { json: true }, [], io);
  expect(io.written.out).toContain('"\u009b"');
});
