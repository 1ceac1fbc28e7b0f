import type { BaseResult, CheckResult, Force, LimitStateCheck, PressurePoint, Section } from "../results.ts";
import type { LimitStateName, Study } from "../study/study.ts";
import { type Columns, type ForceSlots, type Kernel, mark } from "./kernel.ts";
import { waterPressureBehind } from "./stages/earth-pressure.ts";

/** What a run with one sample says, without the parts that need probability. */
export type ReadOut = Pick<CheckResult, "forces" | "pressure" | "base" | "limitStates" | "marks">;

export function readOut(kernel: Kernel, columns: Columns): ReadOut {
  return {
    forces: kernel.forces.map((row) => force(row, columns)).filter((row) => row.horizontal !== 0 || row.vertical !== 0),
    pressure: pressureDiagram(kernel, columns),
    base: baseResult(kernel, columns),
    limitStates: limitStates(kernel, columns),
    marks: markWords(columns[kernel.marks][0]),
  };
}

function force(row: ForceSlots, c: Columns): Force {
  const at = (slot: number | undefined): number => (slot === undefined ? 0 : c[slot][0]);
  const [horizontal, vertical] = [at(row.horizontal), at(row.vertical)];
  const x = vertical !== 0 && row.momentX !== undefined ? at(row.momentX) / vertical : at(row.x);
  const carrier = row.horizontal === undefined ? vertical : horizontal;
  const z = carrier !== 0 && row.momentZ !== undefined ? at(row.momentZ) / carrier : at(row.z);
  return { name: row.name, group: row.group, horizontal, vertical, x, z };
}

/** Both sides of every break point from the top down; more points between where a curve wants them. */
function pressureDiagram(kernel: Kernel, c: Columns): readonly PressurePoint[] {
  const places = kernel.places;
  const top = c[places.planeTop][0];
  const water = places.waterOnPlane === undefined ? 0 : c[places.waterOnPlane][0];
  const gradient = c[places.gradient][0];
  const crackWater = places.crackWater === undefined ? undefined : c[places.crackWater][0];
  const foot = places.crack === undefined ? undefined : c[places.crack][0];
  const points: PressurePoint[] = [];
  for (const part of kernel.pressure) {
    const [from, to] = [c[part.top][0], c[part.bottom][0]];
    const length = from - to;
    if (length <= 0) continue;
    const [s0, s1] = [c[part.stressTop][0], c[part.stressBottom][0]];
    const levels = [
      from,
      ...inner(from, to, foot, kernel.loadPressure.length > 0 || curved(part.pressure, c, s0, s1)),
      to,
    ];
    levels.forEach((z, place) => {
      const verticalEffective = s0 + ((s1 - s0) * (from - z)) / length;
      // At the foot of a full crack the water pressure falls: the level just below it is shown at the foot itself.
      const side = place === 0 ? -1e-9 : 1e-9;
      points.push({
        z,
        verticalEffective,
        horizontal: part.pressure(c, verticalEffective),
        water: waterPressureBehind(crackWater === z ? z + side : z, water, gradient, top, crackWater),
        loads: kernel.loadPressure.reduce((sum, load) => sum + load(c, top - z), 0),
        soil: part.soil,
      });
    });
  }
  return points;
}

function curved(pressure: (c: Columns, stress: number) => number, c: Columns, s0: number, s1: number): boolean {
  const middle = pressure(c, 0.5 * (s0 + s1));
  const chord = 0.5 * (pressure(c, s0) + pressure(c, s1));
  return Math.abs(middle - chord) > 1e-6 * Math.max(1, Math.abs(chord));
}

function inner(from: number, to: number, foot: number | undefined, fine: boolean): readonly number[] {
  const levels = new Set<number>();
  if (foot !== undefined && foot < from && foot > to) levels.add(foot);
  if (fine) for (let k = 1; k < 16; k++) levels.add(from + ((to - from) * k) / 16);
  return [...levels].sort((a, b) => b - a);
}

/** Pressure under the base: trapezium within the middle third, else a triangle without tension; null without contact. */
export function basePressures(
  normal: number,
  resultantX: number,
  width: number,
): { readonly toe: number; readonly heel: number } | null {
  if (!(normal > 0) || !(resultantX > 0) || !(resultantX < width)) return null;
  const eccentricity = width / 2 - resultantX;
  if (Math.abs(eccentricity) <= width / 6) {
    const even = normal / width;
    return { toe: even * (1 + (6 * eccentricity) / width), heel: even * (1 - (6 * eccentricity) / width) };
  }
  const peak = (2 * normal) / (3 * Math.min(resultantX, width - resultantX));
  return eccentricity > 0 ? { toe: peak, heel: 0 } : { toe: 0, heel: peak };
}

function baseResult(kernel: Kernel, c: Columns): BaseResult {
  const at = (name: string): number => c[kernel.places[name]][0];
  const [normal, width, resultantX] = [at("normal"), at("width"), at("resultantX")];
  const pressures = basePressures(normal, resultantX, width);
  const placed = normal > 0 && Number.isFinite(resultantX);
  return {
    vertical: normal,
    horizontal: at("driving"),
    resultantX: placed ? resultantX : null,
    eccentricity: placed ? width / 2 - resultantX : null,
    effectiveWidth: Math.max(at("effectiveWidth"), 0),
    pressureToe: pressures?.toe ?? null,
    pressureHeel: pressures?.heel ?? null,
  };
}

function limitStates(kernel: Kernel, c: Columns): Partial<Record<LimitStateName, LimitStateCheck>> {
  const finite = (value: number): number => (Number.isFinite(value) ? value : 0);
  return Object.fromEntries(
    kernel.limitStates.map(({ limitState, factor, resisting, driving, unit }) => [
      limitState,
      { factorOfSafety: c[factor][0], resisting: finite(c[resisting][0]), driving: finite(c[driving][0]), unit },
    ]),
  );
}

/** The words of the result file for the bits of a mark. */
export function markWords(bits: number): readonly string[] {
  const words: string[] = [];
  if (bits & mark.slopeUnstable) words.push("slope_unstable");
  if (bits & mark.lostContact) words.push("lost_contact");
  if (bits & mark.capped) words.push("capped");
  if (bits & mark.outOfRange) words.push("out_of_range");
  return words;
}

/** The wall as it stands at the values of a run, for drawing. */
export function sectionOf(study: Study, kernel: Kernel, c: Columns): Section {
  const { places } = kernel;
  const at = (name: string): number => c[places[name]][0];
  const input = new Map(kernel.inputs.map((entry) => [entry.path, entry]));
  const value = (path: string): number => {
    const entry = input.get(path);
    return entry === undefined ? 0 : c[entry.slot][0] / entry.scale;
  };
  const soil = (key: string): { soil: string; name: string } => ({ soil: key, name: study.soils[key].name });
  const { front, behind, below } = study.ground;
  return {
    baseWidth: at("width"),
    toe: at("toe"),
    footWidth: at("footWidth"),
    heel: at("heel"),
    baseThickness: at("thickness"),
    stemHeight: at("stemHeight"),
    crestWidth: at("crestWidth"),
    backRun: at("backRun"),
    frontRun: at("frontRun"),
    ...(places.keyDepth === undefined
      ? {}
      : { key: { fromToe: at("keyFromToe"), width: at("keyWidth"), depth: at("keyDepth") } }),
    slope: (at("slope") * 180) / Math.PI,
    plane: places.planeTop === places.crestLevel ? "wall_back" : "virtual_back",
    planeTop: at("planeTop"),
    layers: behind.layers.map((layer, place) => ({
      ...soil(layer.soil),
      ...(places[`layer${place}`] === undefined ? {} : { bottom: at(`layer${place}`) }),
    })),
    below: soil(below.soil),
    front: {
      level: at("frontLevel"),
      ...soil(front.soil),
      ignoreTop: value("ground.front.ignore_top"),
      toeSoil: front.toeSoil,
      passive: value("ground.front.mobilised") > 0,
    },
    water: {
      ...(places.waterBehind === undefined ? {} : { behind: at("waterBehind") }),
      ...(places.waterFront === undefined ? {} : { front: at("waterFront") }),
      flow: study.water.flow,
    },
    ...(study.loads.surcharge === undefined ? {} : { surcharge: value("loads.surcharge.pressure") }),
    strips: study.loads.strips.map((_, place) => ({
      pressure: value(`loads.strips.${place}.pressure`),
      from: value(`loads.strips.${place}.from`),
      width: value(`loads.strips.${place}.width`),
    })),
    lines: study.loads.lines.map((_, place) => ({
      force: value(`loads.lines.${place}.force`),
      at: value(`loads.lines.${place}.at`),
    })),
    undersideLevel: value("wall.underside_level"),
    ...(places.circleRadius !== undefined && at("circleRadius") > 0
      ? {
          circle: {
            x: at("circleX"),
            z: at("circleZ"),
            radius: at("circleRadius"),
            entryX: at("circleEntryX"),
            exitX: at("circleExitX"),
          },
        }
      : {}),
  };
}
