/** A result as the result file has it: keys in snake_case, paths and names of limit states left as they are. */
export function resultJson(result: object): string {
  return `${JSON.stringify(resultTree(result), null, 2)}\n`;
}

/** Numbers that are not finite have no place in JSON and become null. */
export function resultTree(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(resultTree);
  if (typeof value === "number") return Number.isFinite(value) ? value : null;
  if (typeof value !== "object" || value === null) return value;
  return Object.fromEntries(Object.entries(value).map(([key, entry]) => [fileKey(key), resultTree(entry)]));
}

/** reliabilityIndex → reliability_index; a key with a dot is a path of the study and keeps its letters. */
export function fileKey(key: string): string {
  if (key.includes(".") || !/^[a-z][A-Za-z0-9]*$/.test(key)) return key;
  return key.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`);
}
