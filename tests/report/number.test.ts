import { describe, expect, test } from "vitest";
import {
  betweenText,
  grouped,
  indexText,
  oneIn,
  probabilityText,
  scientific,
  shareText,
  shiftText,
  significant,
  threeFigures,
} from "../../src/report/number.ts";

const plain = (text: string): string => text.replaceAll("\u202f", " ");

describe("numbers as an engineer writes them", () => {
  test.each([
    [0, "0"],
    [1.9651, "1.97"],
    [-1.9651, "−1.97"],
    [104.449, "104"],
    [0.04406, "0.0441"],
    [99.96, "100"],
    [12_345.6, "12 300"],
    [1064, "1060"],
    [-123_456, "−123 000"],
    [4.2e-7, "4.20 × 10⁻⁷"],
    [Number.NaN, "–"],
  ])("%d has three figures: %s", (value, text) => {
    expect(plain(threeFigures(value))).toBe(text);
  });

  test("powers of ten are raised, and groups of three are kept together", () => {
    expect(plain(scientific(4.24e-3))).toBe("4.2 × 10⁻³");
    expect(plain(grouped(131_072))).toBe("131 072");
    expect(grouped(9999)).toBe("9999");
    expect(significant(0.5, 2)).toBe("0.50");
  });

  test.each([
    [4.8e-3, "1 in 208", "4.8 × 10⁻³"],
    [0.0123, "1 in 81", "1.2 × 10⁻²"],
    [7.2e-5, "1 in 13 900", "7.2 × 10⁻⁵"],
    [0.25, "25 %", "0.25"],
    [0.999, "99.9 %", "above 0.99"],
    [0.9999, "above 99.9 %", "above 0.99"],
    [1, "100 %", "1"],
    [2.5e-8, "1 in 40 000 000", "2.5 × 10⁻⁸"],
    [2.5e-9, "1 in 4.0 × 10⁸", "2.5 × 10⁻⁹"],
    [1e-13, "below 1 in 10¹²", "below 10⁻¹²"],
    [0, "none seen", "0"],
  ])("a probability of %d is %s, and %s", (p, words, number) => {
    expect(plain(oneIn(p))).toBe(words);
    expect(plain(probabilityText(p))).toBe(number);
  });

  test("no index above 7 is a finding, and none is no finding", () => {
    expect(indexText(3.104)).toBe("3.10");
    expect(indexText(-0.5)).toBe("−0.50");
    expect(indexText(7.2)).toBe("above 7");
    expect(indexText(null)).toBe("–");
  });

  test("shares below 0.1 % are not spelled out", () => {
    expect(plain(shareText(0.422))).toBe("42 %");
    expect(plain(shareText(1e-6))).toBe("below 0.1 %");
    expect(plain(shareText(0))).toBe("0 %");
    expect(plain(shareText(1))).toBe("100 %");
  });

  test("a range names the likelier end first, in per cent the smaller, and no end that is no finding", () => {
    expect(plain(betweenText([1 / 255, 1 / 225]))).toBe("between 1 in 225 and 1 in 255");
    expect(plain(betweenText([0.09, 0.12]))).toBe("between 9 % and 12 %");
    expect(plain(betweenText([0, 2.8e-5]))).toBe("at most 1 in 35 700");
    expect(plain(betweenText([0.9994, 1]))).toBe("between 99.9 % and 100 %");
  });

  test("a shift is given to a tenth of a standard deviation, with its sign", () => {
    expect(shiftText(1.72)).toBe("+1.7");
    expect(shiftText(-0.21)).toBe("−0.2");
    expect(shiftText(-0.03)).toBe("0");
  });
});
