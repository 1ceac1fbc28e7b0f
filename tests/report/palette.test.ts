import { describe, expect, test } from "vitest";
import { kebab, nightPalette, palette, paletteCss, soilTints, withVariables } from "../../src/report/palette.ts";

/** Contrast of two colours; Web Content Accessibility Guidelines 2.1, relative luminance and contrast ratio. */
function contrast(a: string, b: string): number {
  const luminance = (colour: string): number => {
    const [r, g, b] = [1, 3, 5].map((place) => {
      const part = Number.parseInt(colour.slice(place, place + 2), 16) / 255;
      return part <= 0.04045 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4;
    });
    return 0.2126 * r + 0.7152 * g + 0.0722 * b;
  };
  const [light, dark] = [luminance(a), luminance(b)].sort((x, y) => y - x);
  return (light + 0.05) / (dark + 0.05);
}

describe.each([
  ["by day", palette],
  ["at night", nightPalette],
] as const)("colours %s", (_, colours) => {
  test.each(["ink", "muted", "main", "fail", "water", "target"] as const)("text in %s can be read on paper", (role) => {
    expect(contrast(colours[role], colours.paper)).toBeGreaterThanOrEqual(4.5);
    expect(contrast(colours[role], colours.wash)).toBeGreaterThanOrEqual(4.5);
  });

  test("words on every soil can be read", () => {
    for (const [role, colour] of Object.entries(colours))
      if (role.startsWith("soil")) expect(contrast(colours.ink, colour), role).toBeGreaterThanOrEqual(4.5);
  });

  test("what must be told apart differs in lightness too", () => {
    expect(contrast(colours.main, colours.soft)).toBeGreaterThan(1.5);
    expect(contrast(colours.fail, colours.failSoft)).toBeGreaterThan(1.5);
    expect(contrast(colours.water, colours.waterSoft)).toBeGreaterThan(1.5);
  });
});

describe("the palette", () => {
  test("every colour is one role alone, so that a drawing's colours can become variables", () => {
    const colours = Object.values(palette);
    expect(new Set(colours).size).toBe(colours.length);
    expect(withVariables(`fill="${palette.failSoft}" stroke="#123456"`)).toBe(
      `fill="var(--fail-soft)" stroke="#123456"`,
    );
    expect(kebab("failSoft")).toBe("fail-soft");
    expect(paletteCss(palette)).toContain(`--fail-soft:${palette.failSoft}`);
    expect(new Set(soilTints).size).toBe(8);
  });
});
