import { describe, expect, test } from "vitest";
import { cssString, escapeHtml, withoutControls } from "../../src/report/escape.ts";

describe("words of a study inside our own", () => {
  test("are never markup, in content or in an attribute", () => {
    expect(escapeHtml(`<b a="1" c='2'>&`)).toBe("&#60;b a=&#34;1&#34; c=&#39;2&#39;&#62;&#38;");
  });

  test("carry no control characters", () => {
    expect(withoutControls("a\u0000b\u001b[2Jc\nd")).toBe("ab[2Jc d");
    expect(escapeHtml("a\u0007b")).toBe("ab");
  });

  test("cannot leave a CSS string or the style element", () => {
    expect(cssString(`Wall "A"</style>`)).toBe('"Wall \\22 A\\22 \\3c \\2f style\\3e "');
    expect(cssString("Brücke\n3")).toBe('"Br\\fc cke 3"');
  });
});
