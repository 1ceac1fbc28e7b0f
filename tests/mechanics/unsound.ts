import type { Evaluated } from "./evaluate-wall.ts";

/** Everything an evaluation computed that is not a finite number, by name; factors outside 0 to 1000 too. */
export function unsound({ kernel, workspace, forces, pressure, base, limitStates }: Evaluated): string[] {
  const columns = kernel.names.filter((_, slot) => !Number.isFinite(workspace.columns[slot][0]));
  const shown: string[] = [];
  JSON.stringify({ forces, pressure, base, limitStates }, (key, value) => {
    if (typeof value === "number" && !Number.isFinite(value)) shown.push(key);
    return value;
  });
  const factors = Object.entries(limitStates)
    .filter(([, state]) => !(state.factorOfSafety >= 0 && state.factorOfSafety <= 1000))
    .map(([name, state]) => `${name} ${state.factorOfSafety}`);
  return [...columns, ...shown, ...factors];
}
