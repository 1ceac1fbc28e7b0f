import { describe, expect, test } from "vitest";
import { probabilityChart } from "../../src/report/charts/probabilities.ts";
import { type Chart, renderChart } from "../../src/report/render-chart.ts";
import { handMade } from "./hand-made.ts";

const bars = (values: object): Chart => ({
  id: "x",
  title: "x",
  alternative: "x",
  spec: {
    data: values,
    mark: "bar",
    encoding: { x: { field: "a", type: "quantitative" }, y: { field: "b", type: "nominal" } },
  },
});

describe("drawing a chart", () => {
  test("gives one SVG element without script, style attribute or address", async () => {
    const svg = await renderChart(probabilityChart(handMade.assess));
    expect(svg).toMatch(/^<svg [\s\S]*<\/svg>$/);
    expect(svg).not.toMatch(/<script| style=| on[a-z]+="/);
    expect(svg.match(/https?:[^"]*/g)?.filter((address) => !address.startsWith("http://www.w3.org/"))).toEqual([]);
  });

  test("loads nothing: data behind an address stays away", async () => {
    const fetched: unknown[] = [];
    const before = globalThis.fetch;
    globalThis.fetch = (async (address: unknown) => {
      fetched.push(address);
      return new Response("[]");
    }) as typeof fetch;
    try {
      await renderChart(bars({ url: "https://example.invalid/data.json" }));
    } finally {
      globalThis.fetch = before;
    }
    expect(fetched).toEqual([]);
  });

  test("the same chart gives the same picture, and keeps whole labels", async () => {
    const chart = bars({ values: [{ a: 1, b: "Friction angle of slightly gravelly silty sand" }] });
    const svg = await renderChart(chart);
    expect(await renderChart(chart)).toBe(svg);
    expect(svg).toContain("Friction angle of slightly gravelly silty sand");
  });

  test("fills the width of the page's column", async () => {
    const width = Number(/width="(\d+)"/.exec(await renderChart(probabilityChart(handMade.assess)))?.[1]);
    expect(width).toBeGreaterThan(860);
    expect(width).toBeLessThan(920);
  });
});
