import { describe, expect, test } from "vitest";
import { htmlReport } from "../../src/report/html-report.ts";
import { gallery, reportInput } from "./gallery.ts";
import { handMade } from "./hand-made.ts";

/** Tags that are opened and closed, void ones left out; the page is our own, so a simple reader does. */
function unbalanced(html: string): readonly string[] {
  const open: string[] = [];
  const faults: string[] = [];
  const body = html
    .replace(/<style>[\s\S]*?<\/style>/g, "")
    .replace(/<script>[\s\S]*?<\/script>/g, "")
    .replace(/<!doctype html>/, "");
  for (const [, close, name, rest] of body.matchAll(/<(\/?)([a-zA-Z][a-zA-Z0-9]*)((?:"[^"]*"|[^">])*)>/g)) {
    if (["meta", "br", "img", "link", "input"].includes(name) || rest.endsWith("/")) continue;
    if (close === "") open.push(name);
    else if (open.pop() !== name) faults.push(name);
  }
  return [...faults, ...open];
}

/** Pages that several tests look at are made once. */
const made = new Map<string, Promise<string>>();
function page(name: string): Promise<string> {
  const html = made.get(name) ?? reportInput(gallery[name]).then(htmlReport);
  made.set(name, html);
  return html;
}

const withoutOwnScript = (html: string): string => html.replace(/<script>"use strict";[\s\S]*?<\/script>/, "");

const titles = [
  "The answer",
  "The wall",
  "What drives it",
  "How it was computed",
  "The calculation, step by step",
  "What was put in",
  "How far to trust this number",
  "Cautions",
];

describe("the report", () => {
  test.each(Object.keys(gallery))(
    "renders: %s",
    async (name) => {
      const html = await page(name);
      expect(unbalanced(html)).toEqual([]);
      expect(withoutOwnScript(html)).not.toMatch(/NaN|undefined|Infinity|\[object/);
      // nothing is fetched, nothing foreign is run, nothing is styled past the policy
      expect(withoutOwnScript(html)).not.toMatch(/<script|<img|<link|<iframe|<[^>]* (?:on[a-z]+|style)="/i);
      expect(
        html.match(/https?:\/\/[^"'\s<]+/g)?.filter((address) => !address.startsWith("http://www.w3.org/")) ?? [],
      ).toEqual([]);
      const places = titles.map((title) => html.indexOf(`-heading">${title}</h2>`));
      expect(places).toEqual([...places].sort((a, b) => a - b));
      expect(Math.min(...places)).toBeGreaterThan(0);
      expect(html).toContain("licensed engineer decide");
    },
    30_000,
  );

  test("every id of the page stands once, and every reference has its target", async () => {
    const html = await htmlReport({ ...handMade, atFailure: handMade.check });
    const ids = [...html.matchAll(/ id="([^"]+)"/g)].map((match) => match[1]);
    expect(ids.filter((id, place) => ids.indexOf(id) !== place)).toEqual([]);
    const wanted = [
      ...[...html.matchAll(/url\(#([^)]+)\)/g)].map((match) => match[1]),
      ...[...html.matchAll(/href="#([^"]+)"/g)].map((match) => match[1]),
      ...[...html.matchAll(/aria-labelledby="([^"]+)"/g)].flatMap((match) => match[1].split(" ")),
    ];
    expect(wanted.length).toBeGreaterThan(20);
    expect(wanted.filter((id) => !ids.includes(id))).toEqual([]);
  });

  test("opens with the answer, names seed and version, and every picture has words", async () => {
    const html = await page("plain");
    const main = html.slice(html.indexOf("<main>"));
    expect(main.indexOf("is the probability that the wall fails by sliding")).toBeLessThan(400);
    expect(html).toMatch(/toehold \d+\.\d+\.\d+ · seed “gallery”/);
    const pictures = [...html.matchAll(/<svg ([^>]*)>/g)].map((match) => match[1]);
    const spoken = pictures.filter((attributes) => !attributes.includes('aria-hidden="true"'));
    expect(spoken.length).toBeGreaterThan(8);
    for (const attributes of spoken) expect(attributes).toMatch(/aria-label="[^"]{20,}|aria-labelledby="[^"]+"/);
    expect(html.length).toBeLessThan(1_500_000);
  });

  test("says when a run was stopped, when none failed, and when all did", async () => {
    const stop = new AbortController();
    stop.abort();
    const long = { ...gallery.plain, assessment: { seed: "gallery", samples: 100_000, precision: 0 } };
    expect(await htmlReport(await reportInput(long, stop.signal))).toContain("This run was stopped before its end");
    const none = await page("zero failures");
    expect(none).toContain("no failure in 6000 samples, which shows only that it is rarer than");
    expect(none).not.toMatch(/\bsafe\b/i);
    expect(await page("certain failure")).toContain("in all of 6000 samples");
  });

  test("keeps the words of the study as words", async () => {
    const html = await page("hostile words");
    expect(html).not.toContain("<script>alert");
    expect(html).not.toContain("<svg onload");
    expect(html).not.toContain("<img src=x");
    expect(html).toContain("&#60;script&#62;alert");
    expect(html.match(/<\/style>/g)).toHaveLength(1);
  });

  test("shows US units throughout", async () => {
    const html = await page("US units");
    expect(html).toContain("lb/ft³");
    expect(html).not.toMatch(/\d kN\/m|\d kPa|\d m</);
  });

  test("shows the wall at its likeliest failure where that was computed", async () => {
    expect(await htmlReport({ ...handMade, atFailure: handMade.check })).toContain("The wall at a typical failure");
    expect(await htmlReport(handMade)).not.toContain("The wall at a typical failure");
  });
});
