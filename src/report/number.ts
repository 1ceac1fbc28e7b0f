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
  const text = size < -3 || size > 5 ? scientific(value, figures) : value.toFixed(Math.max(0, figures - 1 - size));
  return text.replace("-", minus);
}

/** 4.2 × 10⁻³, with the given number of figures. */
export function scientific(value: number, figures = 2): string {
  const [digits, power] = value.toExponential(figures - 1).split("e");
  return `${digits.replace("-", minus)}${thin}×${thin}10${superscript(Number(power))}`;
}

function superscript(power: number): string {
  const digits = "⁰¹²³⁴⁵⁶⁷⁸⁹";
  return [...String(power)].map((digit) => (digit === "-" ? "⁻" : digits[Number(digit)])).join("");
}

/** No probability below this is told apart from zero. */
export const leastProbability = 1e-12;

/** "1 in 240": rounded to two figures, so that no precision is pretended. */
export function oneIn(probability: number): string {
  if (probability <= 0) return "none seen";
  if (probability < leastProbability) return "below 1 in 10¹²";
  if (probability >= 0.995) return "nearly certain";
  if (probability > 0.095) return `${Math.round(probability * 100)}${thin}%`;
  const count = Number((1 / probability).toPrecision(probability > 0.01 ? 2 : 3));
  return `1 in ${grouped(count)}`;
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
  if (probability >= 0.0995) return significant(probability, 2);
  return scientific(probability, 2);
}

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

/** One sentence for an estimate: "about 1 in 240; between 1 in 225 and 1 in 255". Zero failures never read as safe. */
export function estimateSentence(estimate: {
  readonly probability: number;
  readonly interval: readonly [number, number];
  readonly failures: number;
  readonly samples: number;
}): string {
  const { probability, interval, failures, samples } = estimate;
  if (failures === 0)
    return `no failure in ${grouped(samples)} samples, which shows only that it is rarer than ${oneIn(interval[1])}`;
  if (failures === samples) return `failure in every one of ${grouped(samples)} samples`;
  return `about ${oneIn(probability)}; between ${oneIn(interval[1])} and ${oneIn(interval[0])}`;
}
