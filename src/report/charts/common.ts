import type { AssessResult } from "../../results.ts";
import { shortened } from "../shortened.ts";
import { textWidth } from "../text-width.ts";

/** Charts that stand alone fill the page's column, pixels. */
export const chartWidth = 880;

/** Rows of a chart of variables: more do not fit a page; the table below it has them all. */
export const mostRows = 14;

/** Words for a path, cut where they are too long for an axis. */
export function labelsOf(result: Pick<AssessResult, "variables">, most = 44): (path: string) => string {
  const labels = new Map(result.variables.map((variable) => [variable.path, variable.label]));
  return (path) => shortened(labels.get(path) ?? path, most);
}

/** Pixels that the longest of the labels takes beside an axis. */
export const labelRoom = (labels: readonly string[]): number =>
  Math.ceil(Math.max(0, ...labels.map((words) => textWidth(words)))) + 12;

/** Decades of a logarithmic axis of probabilities, from the one below the least to 1. */
export function decades(least: number): { readonly floor: number; readonly values: readonly number[] } {
  const lowest = Math.min(Math.floor(Math.log10(Math.max(least, 1e-12)) - 0.15), -2);
  const values = Array.from({ length: 1 - lowest }, (_, k) => Number(`1e${lowest + k}`));
  return { floor: values[0], values };
}

/** Labels of such an axis: the number above, how often below. */
export const decadeLabels = `[["1", "certain"], ["0.1", "1 in 10"], ["10⁻²", "1 in 100"], ["10⁻³", "1 in 1000"], ["10⁻⁴", "1 in 10 000"], ["10⁻⁵", "1 in 100 000"], ["10⁻⁶", "1 in 10⁶"], ["10⁻⁷", "1 in 10⁷"], ["10⁻⁸", "1 in 10⁸"], ["10⁻⁹", "1 in 10⁹"], ["10⁻¹⁰", "1 in 10¹⁰"], ["10⁻¹¹", "1 in 10¹¹"], ["10⁻¹²", "1 in 10¹²"], ["10⁻¹³", "1 in 10¹³"]][round(-log(datum.value) / LN10)]`;

/** Labels of an axis of money: thousands apart by a thin space, as in the text. */
export const moneyLabels = "replace(format(datum.value, ',.0f'), regexp(',', 'g'), '\u202f')";
