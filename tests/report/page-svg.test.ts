import { describe, expect, test } from "vitest";
import { markWords, pageSvg } from "../../src/report/page-svg.ts";
import { palette } from "../../src/report/palette.ts";

const chart = { title: "What <it> shows", alternative: "In words" };

describe("a chart in the page", () => {
  test("has one text alternative, colours as variables, and words of marks as titles", () => {
    const svg = pageSvg(
      `<svg width="1"><g role="graphics-object" aria-roledescription="group"><path aria-label="${markWords("1 in 240", "sliding")}" role="graphics-symbol" d="M0" fill="${palette.main}"/></g></svg>`,
      chart,
    );
    expect(svg).toBe(
      `<svg role="img" aria-label="What &#60;it&#62; shows. In words" width="1"><g><path data-state="sliding" d="M0" fill="var(--main)"><title>1 in 240</title></path></g></svg>`,
    );
  });

  test("a mark without a limit state keeps its words alone", () => {
    expect(pageSvg(`<svg ><line x2="1" aria-label="target"/></svg>`, chart)).toContain(
      `<line x2="1"><title>target</title></line>`,
    );
  });
});
