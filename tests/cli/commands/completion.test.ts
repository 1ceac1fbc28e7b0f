import { expect, test } from "vitest";
import { runWith } from "../fake-io.ts";

test.each(["bash", "zsh", "fish"])("toehold completion %s knows every command of the help", async (shell) => {
  const { code, out } = await runWith(["completion", shell]);
  expect(code).toBe(0);
  const help = (await runWith(["--help"])).out;
  const commands = [...help.slice(help.indexOf("Commands:")).matchAll(/^ {2}(\w+) \[options\]/gm)].map(
    ([, name]) => name,
  );
  expect(commands).toEqual(expect.arrayContaining(["check", "assess", "report", "schema", "new", "completion"]));
  for (const name of commands) expect(out).toMatch(new RegExp(`\\b${name}\\b`));
});

test("another shell is wrong usage that names those there are", async () => {
  const ran = await runWith(["completion", "tcsh"]);
  expect(ran.code).toBe(2);
  expect(ran.err).toContain("Allowed choices are bash, zsh, fish");
});
