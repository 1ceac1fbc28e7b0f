import { columnwise } from "../columnwise.ts";
import type { Slot } from "../kernel.ts";
import type { KernelBuilder } from "../kernel-builder.ts";

/** Slots of the wall's outline (mechanics of section and axes: x from the tip of the toe, z from the underside). */
export interface Outline {
  readonly toe: Slot;
  readonly heel: Slot;
  readonly thickness: Slot;
  readonly stemHeight: Slot;
  readonly footWidth: Slot;
  readonly crestWidth: Slot;
  readonly frontRun: Slot;
  readonly backRun: Slot;
  /** B. */
  readonly width: Slot;
  /** Level of the crest of the back face, t + h. */
  readonly crestLevel: Slot;
  /** x of the foot of the back face. */
  readonly footX: Slot;
  /** x of the crest of the back face. */
  readonly crestX: Slot;
  /** tan θ of the back face, run over height. */
  readonly backTangent: Slot;
  /** Run of the front face per metre of height. */
  readonly frontTangent: Slot;
  readonly slope: Slot;
  readonly slopeTangent: Slot;
  /** Top of the virtual back. */
  readonly virtualTop: Slot;
  readonly hasBase: boolean;
  readonly sloping: boolean;
}

const height = (thickness: number, stem: number): number => thickness + stem;
/** x of the crest of the back face: toe + foot − run of the back. */
const crestOfBack = (footX: number, backRun: number): number => footX - backRun;
/** What foot and back leave for the front face; a sample that would overhang stands upright. */
const frontRunOf = (foot: number, crest: number, backRun: number): number => Math.max(foot - crest - backRun, 0);
const ratio = (run: number, rise: number): number => run / rise;
/** z_v = z_crest + (B − x_crest) tan β. */
const topOfVirtualBack = (crestLevel: number, width: number, crestX: number, slopeTangent: number): number =>
  crestLevel + (width - crestX) * slopeTangent;

export function prepareOutline(b: KernelBuilder): Outline {
  const heading = "Outline";
  const hasBase = b.has("wall.base.toe");
  const zero = b.constant(0);
  const part = (key: string): Slot => (hasBase ? b.input(`wall.base.${key}`) : zero);
  const [toe, heel, thickness] = [part("toe"), part("heel"), part("thickness")];
  const stem = (key: string): Slot => b.input(`wall.stem.${key}`);
  const [stemHeight, crestWidth, footWidth, backRun] = [
    stem("height"),
    stem("crest_width"),
    stem("foot_width"),
    stem("back_run"),
  ];
  const slope = b.input("ground.behind.slope");

  const frontRun = b.formula("front run", frontRunOf, [footWidth, crestWidth, backRun]);
  const footX = b.sum("foot of the back face", [{ slot: toe }, { slot: footWidth }]);
  const width = b.sum("base width", [{ slot: footX }, { slot: heel }]);
  const crestLevel = b.formula("crest level", height, [thickness, stemHeight]);
  const crestX = b.formula("crest of the back face", crestOfBack, [footX, backRun]);
  const backTangent = b.formula("batter of the back", ratio, [backRun, stemHeight]);
  const frontTangent = b.formula("batter of the front", ratio, [frontRun, stemHeight]);
  const slopeTangent = b.formula("tan slope", Math.tan, [slope]);
  const virtualTop = b.formula("top of the virtual back", topOfVirtualBack, [crestLevel, width, crestX, slopeTangent]);

  b.step(heading, width, "B", "width of the base", "{toe} + {foot} + {heel}", { toe, foot: footWidth, heel }, "m");
  b.step(
    heading,
    crestLevel,
    "z_c",
    "level of the crest above the underside",
    "{t} + {h}",
    { t: thickness, h: stemHeight },
    "m",
  );
  Object.assign(b.places, {
    width,
    crestLevel,
    crestX,
    footX,
    toe,
    heel,
    thickness,
    stemHeight,
    footWidth,
    crestWidth,
    frontRun,
    backRun,
    slope,
  });
  return {
    toe,
    heel,
    thickness,
    stemHeight,
    footWidth,
    crestWidth,
    frontRun,
    backRun,
    width,
    crestLevel,
    footX,
    crestX,
    backTangent,
    frontTangent,
    slope,
    slopeTangent,
    virtualTop,
    hasBase,
    sloping: !b.isCertainly("ground.behind.slope", 0),
  };
}

// Loops written out one by one, so that each is compiled for its own formula.
columnwise(frontRunOf, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = frontRunOf(a[i], b[i], c[i]);
});
columnwise(height, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = height(a[i], b[i]);
});
columnwise(crestOfBack, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = crestOfBack(a[i], b[i]);
});
columnwise(ratio, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = ratio(a[i], b[i]);
});
columnwise(topOfVirtualBack, (y, n, a, b, c, d) => {
  for (let i = 0; i < n; i++) y[i] = topOfVirtualBack(a[i], b[i], c[i], d[i]);
});
