import { expect, test } from "vitest";
import { withoutControls } from "../../src/cli/io.ts";

test("control characters that a study may bring are shown as a mark; line ends and tabs stay", () => {
  expect(withoutControls("a\u001b[2Jb\u0007c\rd\u009be\n\tf")).toBe("a\ufffd[2Jb\ufffdc\ufffdd\ufffde\n\tf");
});

test("where colour is on, bold and colours stay, and what moves the cursor or hides does not", () => {
  expect(withoutControls("\u001b[1mA\u001b[22m \u001b[31mB\u001b[39m", true)).toBe(
    "\u001b[1mA\u001b[22m \u001b[31mB\u001b[39m",
  );
  expect(withoutControls("\u001b[8mhidden \u001b[2Jgone \u001b]0;title\u0007", true)).not.toMatch(/\p{Cc}/u);
  expect(withoutControls("\u001b[1mA")).toBe("\ufffd[1mA");
});
