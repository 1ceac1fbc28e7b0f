import { createHash } from "node:crypto";
import { describe, expect, test } from "vitest";
import { htmlReport } from "../../src/report/html-report.ts";
import { contentPolicy } from "../../src/report/policy.ts";
import { handMade } from "./hand-made.ts";

const hash = (text: string): string => `'sha256-${createHash("sha256").update(text).digest("base64")}'`;

describe("the page's policy", () => {
  test("names style and script by hash and allows nothing else", async () => {
    expect(await contentPolicy("a{}", "1")).toBe(
      `default-src 'none'; style-src ${hash("a{}")}; script-src ${hash("1")}; base-uri 'none'; form-action 'none'`,
    );
  });

  test("fits what stands in the page to the letter", async () => {
    const html = await htmlReport(handMade);
    const inside = (tag: string): string => new RegExp(`<${tag}>([\\s\\S]*?)</${tag}>`).exec(html)?.[1] ?? "";
    const policy = /Content-Security-Policy" content="([^"]*)"/.exec(html)?.[1].replaceAll("&#39;", "'");
    expect(policy).toContain(`style-src ${hash(inside("style"))};`);
    expect(policy).toContain(`script-src ${hash(inside("script"))};`);
    expect(policy).not.toMatch(/unsafe|\*|https?:/);
  });
});
