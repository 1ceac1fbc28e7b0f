import { describe, expect, test } from "vitest";
import { closing, heading, terminalSafe } from "../../src/report/terminal.ts";

const plain = { width: 40, colour: false };

describe("text for a terminal", () => {
  test("headings are bold only where colour is on", () => {
    expect(heading("Notes", plain)).toBe("Notes");
    expect(heading("Notes", { ...plain, colour: true })).toBe("\u001b[1mNotes\u001b[22m");
  });

  test("words of a study cannot steer the terminal; our own marks pass", () => {
    expect(terminalSafe("\u001b[1mTitle\u001b[22m \u001b]0;x\u0007\u001b[2J\u009b31m end\n")).toBe(
      "\u001b[1mTitle\u001b[22m ]0;x[2J31m end\n",
    );
  });

  test("a note stands once, hung under its mark, and cautions come last", () => {
    const note = { path: "loads.surcharge", message: "is not counted as weight on the heel, see the sheet" };
    expect(closing([note, note], ["One caution."], plain).split("\n")).toEqual([
      "Notes",
      "• loads.surcharge: is not counted as",
      "  weight on the heel, see the sheet",
      "",
      "Cautions",
      "• One caution.",
    ]);
  });
});
