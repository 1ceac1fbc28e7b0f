/**
 * Colours by role. Drawings and charts are made in the light ones; in the page each becomes a variable that dark mode redefines.
 * Text and marks keep a contrast of 4.5 to 1 or more on their paper (a test computes it); the pairs that must be told apart
 * (believed and failing, earth and water) differ in lightness as well as in hue, for colour blindness.
 */
export const palette = {
  ink: "#1c2a30",
  muted: "#52636b",
  grid: "#dce2e0",
  paper: "#fffefb",
  wash: "#f1f3ee",
  main: "#0e6670",
  soft: "#93c1c3",
  fail: "#b0401a",
  failSoft: "#f0bda6",
  water: "#2567a3",
  waterSoft: "#c2dbef",
  wall: "#aab1b2",
  target: "#6a3d8f",
  soil0: "#ead8b2",
  soil1: "#d0b386",
  soil2: "#cbc6a6",
  soil3: "#e2c4a2",
  soil4: "#bda57b",
  soil5: "#dcd4c1",
  soil6: "#cca98c",
  soil7: "#efe5cd",
} as const;

export type Role = keyof typeof palette;

/** The same roles at night. */
export const nightPalette: Readonly<Record<Role, string>> = {
  ink: "#e9eeec",
  muted: "#a9b8b8",
  grid: "#36454a",
  paper: "#161f23",
  wash: "#1e2a2f",
  main: "#62c5cb",
  soft: "#2d6a6e",
  fail: "#ff9a70",
  failSoft: "#7c3a20",
  water: "#7db8ea",
  waterSoft: "#25445c",
  wall: "#7f898c",
  target: "#c8a2ec",
  soil0: "#4c422f",
  soil1: "#5b4a32",
  soil2: "#45463a",
  soil3: "#5a4633",
  soil4: "#403829",
  soil5: "#4c4941",
  soil6: "#54402f",
  soil7: "#38342b",
};

/** Tints of soils in the order in which they are met: earth colours that differ in lightness. */
export const soilTints: readonly string[] = [
  palette.soil0,
  palette.soil1,
  palette.soil2,
  palette.soil3,
  palette.soil4,
  palette.soil5,
  palette.soil6,
  palette.soil7,
];

/** Turns the light colours of a drawing into the page's variables. */
export function withVariables(svg: string): string {
  return svg.replace(/#[0-9a-f]{6}\b/g, (colour) => {
    const role = roles.get(colour);
    return role === undefined ? colour : `var(--${kebab(role)})`;
  });
}

const roles: ReadonlyMap<string, string> = new Map(Object.entries(palette).map(([role, colour]) => [colour, role]));

export const kebab = (role: string): string => role.replace(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`);

/** CSS of the variables. */
export function paletteCss(colours: Readonly<Record<Role, string>>): string {
  return Object.entries(colours)
    .map(([role, colour]) => `--${kebab(role)}:${colour}`)
    .join(";");
}
