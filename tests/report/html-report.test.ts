import { describe, expect, test } from "vitest";
import { htmlReport } from "../../src/report/html-report.ts";
import { gallery, reportInput } from "./gallery.ts";

/** Tags that are opened and closed, void ones left out; the page is our own, so a simple reader does. */
function unbalanced(html: string): readonly string[] {
  const open: string[] = [];
  const faults: string[] = [];
  const body = html.replace(/<style>[\s\S]*?<\/style>/g, "").replace(/<!doctype html>/, "");
  for (const [, close, name, rest] of body.matchAll(/<(\/?)([a-zA-Z][a-zA-Z0-9]*)((?:"[^"]*"|[^">])*)>/g)) {
    if (["meta", "br", "img", "link", "input"].includes(name) || rest.endsWith("/")) continue;
    if (close === "") open.push(name);
    else if (open.pop() !== name) faults.push(name);
  }
  return [...faults, ...open];
}

describe("the report", () => {
  test.each(Object.entries(gallery))(
    "renders: %s",
    async (_, tree) => {
      const html = await htmlReport(await reportInput(tree));
      expect(unbalanced(html)).toEqual([]);
      expect(html).not.toMatch(/NaN|undefined|Infinity|\[object/);
      // nothing is fetched, nothing is run
      expect(html).not.toMatch(/<script|<img|<link|<iframe| on[a-z]+="/i);
      expect(
        html.match(/https?:\/\/[^"'\s<]+/g)?.filter((address) => !address.startsWith("http://www.w3.org/")) ?? [],
      ).toEqual([]);
      expect(html).toContain("default-src 'none'".replaceAll("'", "&#39;"));
      for (const title of [
        "The wall",
        "What drives it",
        "How it was computed",
        "What was put in",
        "How far to trust this number",
        "Cautions",
      ])
        expect(html).toContain(`<h2>${title}</h2>`);
      expect(html).toContain("licensed engineer decide");
    },
    30_000,
  );

  test("opens with the answer, names seed and version, and every picture has words", async () => {
    const html = await htmlReport(await reportInput(gallery.plain));
    const main = html.slice(html.indexOf("<main>"));
    expect(main.indexOf("The probability that the wall fails by")).toBeLessThan(400);
    expect(html).toMatch(/toehold \d+\.\d+\.\d+ · seed “gallery”/);
    const pictures = [...html.matchAll(/<svg ([^>]*)>/g)].map((match) => match[1]);
    const main_pictures = pictures.filter((attributes) => !attributes.includes('aria-hidden="true"'));
    expect(main_pictures.length).toBeGreaterThan(8);
    for (const attributes of main_pictures) expect(attributes).toMatch(/aria-label="[^"]{20,}/);
    expect(html.length).toBeLessThan(1_500_000);
  });

  test("says when a run was stopped, when none failed, and when all did", async () => {
    const stop = new AbortController();
    stop.abort();
    const long = { ...gallery.plain, assessment: { seed: "gallery", samples: 100_000, precision: 0 } };
    expect(await htmlReport(await reportInput(long, stop.signal))).toContain("This run was stopped before its end");
    expect(await htmlReport(await reportInput(gallery["zero failures"]))).toContain(
      "That shows only that the probability is below",
    );
    expect(await htmlReport(await reportInput(gallery["certain failure"]))).toContain(
      "Every one of 6000 samples failed",
    );
  });

  test("keeps the words of the study as words", async () => {
    const html = await htmlReport(await reportInput(gallery["hostile words"]));
    expect(html).not.toContain("<script>alert");
    expect(html).not.toContain("<svg onload");
    expect(html).toContain("&#60;script&#62;alert");
  });

  test("shows US units throughout", async () => {
    const html = await htmlReport(await reportInput(gallery["US units"]));
    expect(html).toContain("lb/ft³");
    const shown = html.replace(/<table><thead><tr><th scope="col">Symbol[\s\S]*?<\/table>/, "");
    expect(shown).not.toMatch(/\d kN\/m|\d kPa/);
  });
});
