/** Words cut where they are longer than their place, with an ellipsis. */
export function shortened(words: string, most: number): string {
  const letters = [...words];
  if (letters.length <= most) return words;
  return `${letters
    .slice(0, most - 1)
    .join("")
    .trimEnd()}…`;
}
