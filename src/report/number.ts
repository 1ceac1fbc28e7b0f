/** Numbers as an engineer writes them. */

/** Narrow and not to be broken: what belongs together stays on one line. */
const thin = "\u202f";
const minus = "−";

/** Three significant figures, without an exponent between 0.001 and 1 000 000; a true minus sign. */
export function threeFigures(value: number): string {
  return significant(value, 3);
}

export function significant(value: number, figures: number): string {
  if (!Number.isFinite(value)) return "–";
  if (value === 0) return "0";
  const size = Math.floor(Math.log10(Math.abs(Number(value.toPrecision(figures)))));
  if (size < -3 || size > 5) return scientific(value, figures).replace("-", minus);
  if (size >= figures) return `${value < 0 ? minus : ""}${grouped(Math.abs(Number(value.toPrecision(figures))))}`;
  return value.toFixed(Math.max(0, figures - 1 - size)).replace("-", minus);
}

/** 4.2 × 10⁻³, with the given number of figures. */
export function scientific(value: number, figures = 2): string {
  const [digits, power] = value.toExponential(figures - 1).split("e");
  return `${digits.replace("-", minus)}${thin}×${thin}10${superscript(Number(power))}`;
}

/** −3 as it is written above a 10. */
export function superscript(power: number): string {
  const digits = "⁰¹²³⁴⁵⁶⁷⁸⁹";
  return [...String(power)].map((digit) => (digit === "-" ? "⁻" : digits[Number(digit)])).join("");
}

/** No probability below this is told apart from zero. */
export const leastProbability = 1e-12;
/** From here on a probability reads as per cent, and the whole of a range with it. */
const likely = 0.0995;

/** "1 in 240": two or three figures, so that no precision is pretended; per cent where it is likely. */
export function oneIn(probability: number): string {
  if (probability <= 0) return "none seen";
  if (probability < leastProbability) return `below 1 in 10¹²`;
  if (probability >= likely) return percentText(probability);
  const count = Number((1 / probability).toPrecision(probability > 0.01 ? 2 : 3));
  return count < 1e8 ? `1 in ${grouped(count)}` : `1 in ${scientific(count, 2)}`;
}

function percentText(probability: number): string {
  const percent = 100 * probability;
  if (percent === 100) return `100${thin}%`;
  if (percent >= 99.95) return `above 99.9${thin}%`;
  return `${percent < 1 || percent > 99 ? percent.toFixed(1) : Math.round(percent)}${thin}%`;
}

/** "between 1 in 225 and 1 in 255", the likelier end first; in per cent, the smaller first, where one end is likely. */
export function betweenText([low, high]: readonly [number, number]): string {
  if (high >= likely) return `between ${low <= 0 ? `0${thin}%` : percentText(low)} and ${percentText(high)}`;
  if (high > 0 && high < leastProbability) return oneIn(high);
  if (low < leastProbability) return `at most ${oneIn(high)}`;
  return `between ${oneIn(high)} and ${oneIn(low)}`;
}

/** 12 400: digits in groups of three. */
export function grouped(count: number): string {
  const whole = Math.round(count);
  if (whole < 10_000) return String(whole);
  return String(whole).replace(/\B(?=(\d{3})+$)/g, thin);
}

/** 4.2 × 10⁻³; plain decimals from 0.1 up. */
export function probabilityText(probability: number): string {
  if (probability <= 0) return "0";
  if (probability < leastProbability) return `below 10⁻¹²`;
  if (probability >= likely)
    return probability === 1 ? "1" : probability > 0.995 ? "above 0.99" : significant(probability, 2);
  return scientific(probability, 2);
}

/** "4.4 × 10⁻³ to 5.2 × 10⁻³". */
export const intervalText = ([low, high]: readonly [number, number]): string =>
  `${probabilityText(low)} to ${probabilityText(high)}`;

/** An index of reliability, two decimals; none above 7 is a finding. */
export function indexText(index: number | null): string {
  if (index === null || !Number.isFinite(index)) return "–";
  if (index > 7) return "above 7";
  return index.toFixed(2).replace("-", minus);
}

/** A share of a whole in per cent: two figures, nothing below 0.1 %. */
export function shareText(share: number): string {
  const percent = 100 * share;
  if (Math.abs(percent) < 0.1) return percent === 0 ? `0${thin}%` : `below 0.1${thin}%`;
  return `${significant(percent, Math.abs(percent) >= 99.5 ? 3 : 2)}${thin}%`;
}

/** A shift in standard deviations with its sign: +1.7, −0.2; finer than a tenth it is noise. */
export function shiftText(value: number): string {
  const text = value.toFixed(1);
  if (Number(text) === 0) return "0";
  return value > 0 ? `+${text}` : text.replace("-", minus);
}
