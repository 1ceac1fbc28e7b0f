/**
 * Colours by role. Charts are drawn in the light ones; in the page each becomes a variable that dark mode redefines. Text and
 * marks keep a contrast of 4.5 to 1 or more on their paper; the pairs that must be told apart (likely and failing, earth and
 * water) differ in lightness as well as in hue, for colour blindness.
 */
export const palette = {
  ink: "#1c2a30",
  muted: "#53646c",
  grid: "#dbe1e0",
  paper: "#fffefb",
  main: "#0e6670",
  soft: "#9cc4c5",
  fail: "#b4421a",
  failSoft: "#efb79e",
  water: "#2a72ad",
  waterSoft: "#c4dcee",
  wall: "#6f7478",
  target: "#6a3d8f",
} as const;

export type Role = keyof typeof palette;

/** The same roles at night. */
export const nightPalette: Readonly<Record<Role, string>> = {
  ink: "#e9eeec",
  muted: "#a9b8b8",
  grid: "#38464a",
  paper: "#172024",
  main: "#5fc3c9",
  soft: "#2d6367",
  fail: "#ff9a70",
  failSoft: "#7c3a20",
  water: "#7db8ea",
  waterSoft: "#25445c",
  wall: "#9aa2a6",
  target: "#c8a2ec",
};

/** Soil tints from the top layer down: earth colours that differ in lightness. */
export const soilTints: readonly string[] = [
  "#e6d3ae",
  "#cfae7c",
  "#b98f63",
  "#ddc7a0",
  "#c3a58a",
  "#a98a5e",
  "#e9dcc3",
  "#bfa06b",
];

/** Turns the light colours of a drawing into the page's variables. */
export function withVariables(svg: string): string {
  return Object.entries(palette).reduce(
    (text, [role, colour]) => text.replaceAll(colour, `var(--${kebab(role)})`),
    svg,
  );
}

export const kebab = (role: string): string => role.replace(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`);

/** CSS of the variables. */
export function paletteCss(colours: Readonly<Record<Role, string>>): string {
  return Object.entries(colours)
    .map(([role, colour]) => `--${kebab(role)}:${colour}`)
    .join(";");
}
