import { expect, test } from "vitest";
import { bullets, figure, htmlTable, paragraph, section } from "../../src/report/markup.ts";

test("a table escapes its words, heads its rows, and carries what it is sorted by", () => {
  const html = htmlTable(
    [{ heading: "A & b" }, { heading: "n", numeric: true }],
    [["<i>", { text: "1 in 2", value: 0.5 }]],
    { caption: "<c>", sortable: true, states: ["sliding"] },
  );
  expect(html).toBe(
    '<div class="scroll" tabindex="0" role="region" aria-label="A &#38; b"><table class="sortable short"><caption>&#60;c&#62;</caption><thead><tr><th scope="col">A &#38; b</th><th scope="col" class="n">n</th></tr></thead><tbody><tr data-state="sliding"><th scope="row">&#60;i&#62;</th><td class="n" data-value="0.5">1 in 2</td></tr></tbody></table></div>',
  );
});

test("a section is headed by its title and reached by its id", () => {
  expect(section("wall", "The wall", paragraph("x"))).toEqual({
    id: "wall",
    title: "The wall",
    html: '<section id="wall" aria-labelledby="wall-heading"><h2 id="wall-heading">The wall</h2><p>x</p></section>',
  });
});

test("a figure keeps its caption and its limit state", () => {
  const html = figure({ svg: "<svg/>", title: "T", text: "<t>", state: "bearing" });
  expect(html).toMatch(/^<figure data-state="bearing">.*<figcaption><b>T\.<\/b> &#60;t&#62;<\/figcaption><\/figure>$/);
  expect(bullets(["<a>"])).toBe("<ul><li>&#60;a&#62;</li></ul>");
});
