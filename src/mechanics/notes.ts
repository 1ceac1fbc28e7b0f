/** What an engineer should know about how her wall was taken, judged at the values of one run. Sentences, never refusals. */
import type { Notice, Study } from "../study/study.ts";
import type { Columns, Kernel } from "./kernel.ts";

interface Look {
  readonly study: Study;
  /** Value of an input at this run, in the study's unit (degrees); 0 where the study has none. */
  value(path: string): number;
  /** Value of a named place of the kernel. */
  place(name: string): number;
  has(path: string): boolean;
}

type Note = (look: Look) => Notice | undefined;

export function mechanicsNotes(study: Study, kernel: Kernel, columns: Columns): readonly Notice[] {
  const inputs = new Map(kernel.inputs.map((input) => [input.path, input]));
  const look: Look = {
    study,
    value: (path) => {
      const input = inputs.get(path);
      return input === undefined ? 0 : columns[input.slot][0] / input.scale;
    },
    place: (name) => (kernel.places[name] === undefined ? 0 : columns[kernel.places[name]][0]),
    has: (path) => inputs.has(path),
  };
  const onWall = kernel.places.planeTop === kernel.places.crestLevel;
  return [...notes(onWall).flatMap((note) => note(look) ?? []), ...kernel.notes.flatMap((note) => note(columns))];
}

function notes(onWall: boolean): readonly Note[] {
  return [
    ...(onWall ? [] : [shortHeel, steepWallFriction]),
    keyWithoutPassive,
    keyBelowUnderside,
    overHeel("strips", "from", onWall),
    overHeel("lines", "at", onWall),
    surchargeOnHeel,
    surchargeOffHeel,
    atRest,
    slopingRankine,
    shakenWater,
    shakenSigns,
    slopeAgainstFriction,
    floodedCrest,
    overturningAlone,
  ];
}

/** The softest soil's friction angle behind the wall, degrees; an undrained soil counts as 0. */
function softestBehind(look: Look): number {
  const angles = look.study.ground.behind.layers.map(({ soil }) =>
    look.study.soils[soil].drainage === "undrained" ? 0 : look.value(`soils.${soil}.friction_angle`),
  );
  return Math.min(...angles);
}

const shortHeel: Note = (look) => {
  const wanted = look.place("crestLevel") * Math.tan(Math.PI / 4 - (softestBehind(look) * Math.PI) / 360);
  const heel = look.place("width") - look.place("footX");
  if (heel >= wanted || look.study.model.earthPressure === "at_rest") return undefined;
  return {
    path: look.study.wall.base === undefined ? "wall.stem" : "wall.base.heel",
    message: `the heel is short: the wedge clears the stem only with a heel of ${wanted.toFixed(2)} m or more (level ground), and it is ${heel.toFixed(2)} m; pressure on the virtual back is then an approximation`,
  };
};

const steepWallFriction: Note = (look) => {
  if (look.study.model.earthPressure !== "coulomb") return undefined;
  const [friction, slope] = [look.value("model.wall_friction"), look.value("ground.behind.slope")];
  if (friction <= slope + 1e-9) return undefined;
  return {
    path: "model.wall_friction",
    message: `wall friction of ${friction.toFixed(1)}° on the virtual back is above the slope of ${slope.toFixed(1)}°: soil slides on soil there, and this lies on the unsafe side`,
  };
};

const keyWithoutPassive: Note = (look) =>
  look.study.wall.shearKey !== undefined && look.value("ground.front.mobilised") === 0
    ? {
        path: "wall.shear_key",
        message:
          "the shear key adds its weight alone: no passive resistance is counted, because ground.front.mobilised is 0",
      }
    : undefined;

const keyBelowUnderside: Note = (look) =>
  look.study.wall.shearKey !== undefined && look.value("ground.front.mobilised") > 0
    ? {
        path: "wall.shear_key",
        message:
          "passive resistance reaches down to the tip of the key; the driving pressure behind the key, below the underside, is left out",
      }
    : undefined;

function overHeel(list: "strips" | "lines", start: "from" | "at", onWall: boolean): Note {
  return (look) => {
    if (onWall) return undefined;
    const heel = look.place("width") - look.place("crestX");
    const place = look.study.loads[list].findIndex(
      (load, index) => !load.onHeel && look.value(`loads.${list}.${index}.${start}`) < heel,
    );
    if (place < 0) return undefined;
    return {
      path: `loads.${list}.${place}`,
      message:
        "what of this load stands over the heel, in front of the virtual back, gives no thrust and, without on_heel: true, no weight either: traffic must not help",
    };
  };
}

const surchargeOnHeel: Note = (look) =>
  look.study.loads.surcharge?.onHeel === true
    ? {
        path: "loads.surcharge",
        message:
          "the surcharge is counted as a weight on the heel too, as asked; make sure that it is there whenever it pushes",
      }
    : undefined;

const surchargeOffHeel: Note = (look) =>
  look.study.loads.surcharge?.onHeel === false
    ? {
        path: "loads.surcharge",
        message: "the surcharge pushes from behind the virtual back and is not counted as weight on the heel",
      }
    : undefined;

const atRest: Note = (look) =>
  look.study.model.earthPressure === "at_rest"
    ? {
        path: "model.earth_pressure",
        message: "earth pressure at rest describes a restrained wall; a wall that slides or tilts has left it",
      }
    : undefined;

const slopingRankine: Note = (look) => {
  if (look.study.model.earthPressure !== "rankine" || look.value("ground.behind.slope") === 0) return undefined;
  if (look.study.ground.behind.layers.length === 1 && look.study.water.behind === undefined) return undefined;
  return {
    path: "ground.behind.slope",
    message: "Rankine's sloping pressure with layers or water is an approximation",
  };
};

const shakenWater: Note = (look) =>
  look.study.loads.earthquake !== undefined && look.place("waterFront") > look.place("frontLevel")
    ? {
        path: "water.front.level",
        message: "free water in front moves in an earthquake; its dynamic pressure is not included",
      }
    : undefined;

const shakenSigns: Note = (look) =>
  look.study.loads.earthquake !== undefined
    ? { path: "loads.earthquake.kv", message: "try both signs of kv: either may be the worse" }
    : undefined;

const slopeAgainstFriction: Note = (look) => {
  const slope = look.value("ground.behind.slope");
  return slope > 0 && slope > softestBehind(look) && look.study.model.earthPressure !== "at_rest"
    ? {
        path: "ground.behind.slope",
        message: `the slope of ${slope.toFixed(1)}° is steeper than a soil behind the wall can bear (φ′ ${softestBehind(look).toFixed(1)}°): the slope itself is not stable`,
      }
    : undefined;
};

const floodedCrest: Note = (look) =>
  look.place("waterFront") > look.place("crestLevel")
    ? { path: "water.front.level", message: "water in front above the crest is taken at the crest" }
    : undefined;

const overturningAlone: Note = (look) =>
  look.study.assessment.limitStates.includes("eccentricity") && !look.study.assessment.limitStates.includes("bearing")
    ? {
        path: "assessment.limit_states",
        message:
          "overturning about the toe normally comes after bearing failure; bearing is not among the limit states",
      }
    : undefined;
