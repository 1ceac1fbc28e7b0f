import type { Study } from "../../study/study.ts";
import { columnwise } from "../columnwise.ts";
import {
  lineLoadMoment,
  lineLoadPressure,
  lineLoadThrust,
  stripLoadMoment,
  stripLoadPressure,
  stripLoadThrust,
} from "../formulas/surface-loads.ts";
import type { Slot } from "../kernel.ts";
import type { KernelBuilder } from "../kernel-builder.ts";
import { addWeight, type Ledger } from "./ledger.ts";
import type { Outline } from "./outline.ts";
import type { PlaneOfPressure } from "./pressure-law.ts";

const product = (a: number, b: number): number => a * b;
const runOverHeel = (width: number, crestX: number): number => width - crestX;
const middle = (a: number, b: number): number => 0.5 * (a + b);

/** Vertical stress that the surcharge adds at the top of the plane: q; on a real back face q cosθ cosβ / cos(θ − β), as the wedge demands. */
export function prepareSurcharge(b: KernelBuilder, o: Outline, plane: PlaneOfPressure): Slot {
  if (!b.has("loads.surcharge.pressure")) return b.constant(0);
  const pressure = b.input("loads.surcharge.pressure");
  if (plane.kind === "virtual_back") return pressure;
  const slot = b.formula("surcharge on the back face", surchargeOnBack, [pressure, plane.inclination, o.slope]);
  b.step(
    "Loads",
    slot,
    "q_back",
    "surcharge as it acts on the real back face",
    "{q}·cos {θ}·cos {β}/cos({θ} − {β})",
    { q: pressure, θ: plane.inclination, β: o.slope },
    "kPa",
  );
  return slot;
}

const surchargeOnBack = (pressure: number, inclination: number, slope: number): number =>
  (pressure * Math.cos(inclination) * Math.cos(slope)) / Math.cos(inclination - slope);

/** The surcharge standing on the heel, from the crest of the back face to the virtual back; a weight without inertia. */
export function prepareSurchargeWeight(
  b: KernelBuilder,
  ledger: Ledger,
  study: Study,
  o: Outline,
  plane: PlaneOfPressure,
): void {
  if (!study.loads.surcharge?.onHeel || plane.kind === "wall_back") return;
  const run = b.formula("run over the heel", runOverHeel, [o.width, o.crestX]);
  const weight = b.formula("surcharge on the heel", product, [b.input("loads.surcharge.pressure"), run]);
  const momentX = b.formula("moment of the surcharge on the heel", product, [
    weight,
    b.formula("middle of the heel", middle, [o.width, o.crestX]),
  ]);
  addWeight(b, ledger, {
    name: "Surcharge on the heel",
    group: "surcharge",
    weight,
    momentX,
    z: o.crestLevel,
    shakes: false,
  });
  b.step(
    "Loads",
    weight,
    "Q_heel",
    "surcharge on the heel, as asked",
    "{q}·{run}",
    { q: b.input("loads.surcharge.pressure"), run },
    "kN/m",
  );
}

/** Distance behind the plane of a point at `distance` behind the crest; what stands in front of the plane counts from it. */
const behindPlane = (distance: number, crestX: number, planeX: number): number =>
  Math.max(crestX + distance - planeX, 0);
const sum = (a: number, b: number): number => a + b;
const overHeelWidth = (from: number, to: number, crestX: number, planeX: number): number =>
  Math.max(Math.min(to, planeX - crestX) - from, 0);
const overHeelMiddle = (from: number, width: number, crestX: number): number => crestX + from + 0.5 * width;
const zeroOnHeel = (force: number, distance: number, crestX: number, planeX: number): number =>
  crestX + distance > planeX ? force : 0;
const onHeelAlone = (force: number, distance: number, crestX: number, planeX: number): number =>
  crestX + distance > planeX ? 0 : force;
const atX = (crestX: number, distance: number): number => crestX + distance;

/** Strip and line loads: thrust on the plane (elastic, doubled), and weight on the heel where the study asks for it. */
export function prepareSurfaceLoads(
  b: KernelBuilder,
  ledger: Ledger,
  study: Study,
  o: Outline,
  plane: PlaneOfPressure,
): void {
  const onWall = plane.kind === "wall_back";
  const planeX = onWall ? o.crestX : o.width;
  const height = onWall ? o.crestLevel : o.virtualTop;
  const factor = b.input("model.factors.earth_thrust");
  study.loads.strips.forEach((strip, place) => {
    const at = (key: string): Slot => b.input(`loads.strips.${place}.${key}`);
    const [pressure, from] = [at("pressure"), at("from")];
    const to = b.formula("end of the strip", sum, [from, at("width")]);
    const start = b.formula("strip start behind the plane", behindPlane, [from, o.crestX, planeX]);
    const end = b.formula("strip end behind the plane", behindPlane, [to, o.crestX, planeX]);
    pushLoad(
      b,
      ledger,
      `Strip load ${place + 1}`,
      planeX,
      factor,
      b.formula("strip thrust", stripLoadThrust, [pressure, start, end, height]),
      b.formula("strip moment", stripLoadMoment, [pressure, start, end, height]),
      "(2p/π)·∫ [atan(a/s) − a·s/(a² + s²)] ds from a1 to a2",
    );
    b.loadPressure.push((c, depth) => stripLoadPressure(c[pressure][0], c[start][0], c[end][0], depth) * c[factor][0]);
    if (!strip.onHeel || onWall) return;
    const width = b.formula("strip on the heel", overHeelWidth, [from, to, o.crestX, planeX]);
    const weight = b.formula("weight of the strip on the heel", product, [pressure, width]);
    const momentX = b.formula("moment of the strip on the heel", product, [
      weight,
      b.formula("x of the strip on the heel", overHeelMiddle, [from, width, o.crestX]),
    ]);
    addWeight(b, ledger, {
      name: `Strip load ${place + 1} on the heel`,
      group: "surcharge",
      weight,
      momentX,
      z: o.crestLevel,
      shakes: false,
    });
  });
  study.loads.lines.forEach((line, place) => {
    const [force, distance] = [b.input(`loads.lines.${place}.force`), b.input(`loads.lines.${place}.at`)];
    const behind = b.formula("line behind the plane", behindPlane, [distance, o.crestX, planeX]);
    const pushing = onWall
      ? force
      : b.formula("line load that pushes", zeroOnHeel, [force, distance, o.crestX, planeX]);
    pushLoad(
      b,
      ledger,
      `Line load ${place + 1}`,
      planeX,
      factor,
      b.formula("line thrust", lineLoadThrust, [pushing, behind, height]),
      b.formula("line moment", lineLoadMoment, [pushing, behind, height]),
      "(4Q/π)·∫ a²·s/(a² + s²)² ds",
    );
    b.loadPressure.push((c, depth) => lineLoadPressure(c[pushing][0], c[behind][0], depth) * c[factor][0]);
    if (!line.onHeel || onWall) return;
    const weight = b.formula("line load on the heel", onHeelAlone, [force, distance, o.crestX, planeX]);
    const momentX = b.formula("moment of the line load on the heel", product, [
      weight,
      b.formula("x of the line load", atX, [o.crestX, distance]),
    ]);
    addWeight(b, ledger, {
      name: `Line load ${place + 1} on the heel`,
      group: "surcharge",
      weight,
      momentX,
      z: o.crestLevel,
      shakes: false,
    });
  });
}

function pushLoad(
  b: KernelBuilder,
  ledger: Ledger,
  name: string,
  planeX: Slot,
  factor: Slot,
  thrust: Slot,
  moment: Slot,
  formula: string,
): void {
  const force = b.formula("load thrust, factored", product, [thrust, factor]);
  const about = b.formula("load moment, factored", product, [moment, factor]);
  ledger.pushes.push({ name: name.toLowerCase(), force, moment: about, sign: 1 });
  b.forces.push({ name, group: "surcharge", horizontal: force, momentZ: about, x: planeX });
  b.step(
    "Loads",
    force,
    "P_load",
    `thrust of ${name.toLowerCase()}, rigid wall`,
    `${formula} × {f}`,
    { f: factor },
    "kN/m",
    "Boussinesq (1885), doubled for a rigid wall",
  );
  b.step("Loads", about, "P_load·z", "its moment about the underside", "moment of the same diagram", {}, "kNm/m");
}

// Loops written out one by one, so that each is compiled for its own formula.
columnwise(surchargeOnBack, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = surchargeOnBack(a[i], b[i], c[i]);
});
columnwise(runOverHeel, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = runOverHeel(a[i], b[i]);
});
columnwise(product, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = product(a[i], b[i]);
});
columnwise(middle, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = middle(a[i], b[i]);
});
columnwise(sum, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = sum(a[i], b[i]);
});
columnwise(behindPlane, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = behindPlane(a[i], b[i], c[i]);
});
columnwise(overHeelWidth, (y, n, a, b, c, d) => {
  for (let i = 0; i < n; i++) y[i] = overHeelWidth(a[i], b[i], c[i], d[i]);
});
columnwise(overHeelMiddle, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = overHeelMiddle(a[i], b[i], c[i]);
});
columnwise(zeroOnHeel, (y, n, a, b, c, d) => {
  for (let i = 0; i < n; i++) y[i] = zeroOnHeel(a[i], b[i], c[i], d[i]);
});
columnwise(onHeelAlone, (y, n, a, b, c, d) => {
  for (let i = 0; i < n; i++) y[i] = onHeelAlone(a[i], b[i], c[i], d[i]);
});
columnwise(atX, (y, n, a, b) => {
  for (let i = 0; i < n; i++) y[i] = atX(a[i], b[i]);
});
columnwise(stripLoadThrust, (y, n, a, b, c, d) => {
  for (let i = 0; i < n; i++) y[i] = stripLoadThrust(a[i], b[i], c[i], d[i]);
});
columnwise(stripLoadMoment, (y, n, a, b, c, d) => {
  for (let i = 0; i < n; i++) y[i] = stripLoadMoment(a[i], b[i], c[i], d[i]);
});
columnwise(lineLoadThrust, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = lineLoadThrust(a[i], b[i], c[i]);
});
columnwise(lineLoadMoment, (y, n, a, b, c) => {
  for (let i = 0; i < n; i++) y[i] = lineLoadMoment(a[i], b[i], c[i]);
});
