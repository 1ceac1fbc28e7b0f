import type { Notice } from "../study/study.ts";
import { type Formula, loopOf } from "./columnwise.ts";
import type {
  Coefficient,
  Columns,
  ForceSlots,
  Kernel,
  KernelInput,
  LimitStateSlots,
  PressurePart,
  Slot,
  Stage,
  Step,
} from "./kernel.ts";

/** A numeric field of the study as the kernel sees it; units of the study (degrees for angles). */
export interface InputField {
  readonly path: string;
  readonly lowest: number;
  readonly highest: number;
  readonly angle: boolean;
  /** Present where the quantity is certain. */
  readonly fixed?: number;
  readonly mean: number;
}

/**
 * Puts a kernel together, one stage after the other, and folds away what does not vary: a stage that reads constants alone is
 * run once, here, and its results become constants; a formula of a single input becomes a coefficient, which the sampler
 * may tabulate.
 */
export class KernelBuilder {
  readonly marks: Slot;
  readonly #fields: ReadonlyMap<string, InputField>;
  readonly #names: string[] = [];
  readonly #inputs: KernelInput[] = [];
  readonly #inputSlots = new Map<string, Slot>();
  readonly #varyingInputs = new Set<Slot>();
  readonly #constants = new Map<Slot, number>();
  /** One entry a slot: what is constant is computed here while the kernel is built. */
  readonly #columns: Float64Array[] = [];
  readonly #coefficients: Coefficient[] = [];
  readonly #stages: Stage[] = [];
  readonly #shared = new Map<string, Slot>();
  readonly #angles = new Set<Slot>();
  readonly steps: Step[] = [];
  readonly forces: ForceSlots[] = [];
  readonly pressure: PressurePart[] = [];
  readonly limitStates: LimitStateSlots[] = [];
  readonly places: Record<string, Slot> = {};
  readonly notes: ((columns: Columns) => readonly Notice[])[] = [];
  readonly loadPressure: ((columns: Columns, depth: number) => number)[] = [];

  constructor(fields: readonly InputField[]) {
    this.#fields = new Map(fields.map((field) => [field.path, field]));
    this.marks = this.slot("marks");
  }

  slot(name: string): Slot {
    this.#columns.push(new Float64Array(1));
    return this.#names.push(name) - 1;
  }

  /** A slot that holds the same number in every sample. */
  constant(value: number, name: string = String(value)): Slot {
    const key = `constant:${value}`;
    const known = this.#shared.get(key);
    if (known !== undefined) return known;
    const slot = this.slot(name);
    this.#fix(slot, value);
    this.#shared.set(key, slot);
    return slot;
  }

  /** The column of a field of the study; asked for twice, it is the same column. */
  input(path: string): Slot {
    const known = this.#inputSlots.get(path);
    if (known !== undefined) return known;
    const field = this.#field(path);
    const slot = this.slot(path);
    const scale = field.angle ? Math.PI / 180 : 1;
    const { lowest, highest, fixed } = field;
    this.#inputs.push({ path, slot, lowest, highest, scale, ...(fixed === undefined ? {} : { fixed }) });
    if (fixed === undefined) this.#varyingInputs.add(slot);
    else this.#fix(slot, fixed * scale);
    if (field.angle) this.#angles.add(slot);
    this.#inputSlots.set(path, slot);
    return slot;
  }

  /** Marks a slot as an angle in radians, which the sheet prints in degrees. */
  asAngle(slot: Slot): Slot {
    this.#angles.add(slot);
    return slot;
  }

  /** Whether the study gives this field, if only by default. */
  has(path: string): boolean {
    return this.#fields.has(path);
  }

  /** True where the field is certain and equal to the value: what is certainly absent costs nothing. */
  isCertainly(path: string, value: number): boolean {
    return this.#field(path).fixed === value;
  }

  meanOf(path: string): number {
    return this.#field(path).mean;
  }

  /** The value of a slot that never varies. */
  constantOf(slot: Slot): number | undefined {
    return this.#constants.get(slot);
  }

  stage(stage: Stage): void {
    if (stage.reads.some((slot) => !this.#constants.has(slot))) {
      this.#stages.push(stage);
      return;
    }
    stage.run(this.#columns, 1);
    for (const slot of stage.writes) if (slot !== this.marks) this.#constants.set(slot, this.#columns[slot][0]);
  }

  /**
   * y = formula(slots): a constant where nothing varies, a coefficient where only one input does, a stage elsewhere.
   *
   * @param kinks values of each argument at which the formula is not smooth, given the others
   */
  formula(
    name: string,
    formula: Formula,
    slots: readonly Slot[],
    kinks: (varying: number) => readonly number[] = () => [],
  ): Slot {
    const key = `formula:${name}:${slots.join(",")}`;
    const known = this.#shared.get(key);
    if (known !== undefined) return known;
    const into = this.slot(name);
    this.#shared.set(key, into);
    const values = slots.map((slot) => this.#constants.get(slot));
    const varying = [...new Set(slots.filter((_, place) => values[place] === undefined))];
    if (varying.length === 1 && this.#varyingInputs.has(varying[0])) {
      const places = slots.flatMap((slot, place) => (slot === varying[0] ? [place] : []));
      const filled = values.map((value) => value ?? 0);
      const value = (x: number): number => {
        for (const place of places) filled[place] = x;
        return formula(...filled);
      };
      this.#coefficients.push({ name, from: varying[0], into, value, kinks: kinks(places[0]) });
      return into;
    }
    this.stage(formulaStage(name, formula, slots, into));
    return into;
  }

  /** The sum of columns with signs, what is constant summed beforehand. */
  sum(name: string, terms: readonly { readonly slot: Slot; readonly sign?: 1 | -1 }[]): Slot {
    const into = this.slot(name);
    let constant = 0;
    const varying: { readonly slot: Slot; readonly sign: 1 | -1 }[] = [];
    for (const { slot, sign = 1 } of terms) {
      const value = this.#constants.get(slot);
      if (value === undefined) varying.push({ slot, sign });
      else constant += sign * value;
    }
    if (varying.length === 0) this.#fix(into, constant);
    else this.stage(sumStage(name, varying, constant, into));
    return into;
  }

  /** Inputs that vary, with their means as their columns have them. */
  varyingInputs(): readonly { readonly slot: Slot; readonly mean: number }[] {
    return this.#inputs
      .filter((input) => input.fixed === undefined)
      .map(({ path, slot, scale, lowest, highest }) => ({
        slot,
        mean: scale * Math.min(Math.max(this.meanOf(path), lowest), highest),
      }));
  }

  /** Computes, in columns of one entry whose inputs are filled, what the given slots rest on. */
  runBefore(wanted: readonly Slot[], columns: Columns): void {
    for (const { from, into, value } of this.#coefficients) columns[into][0] = value(columns[from][0]);
    for (const stage of stagesFor(this.#stages, wanted)) stage.run(columns, 1);
  }

  step(
    heading: string,
    slot: Slot,
    symbol: string,
    text: string,
    formula: string,
    of: Record<string, Slot>,
    unit: string,
    source?: string,
  ): void {
    this.steps.push({ heading, slot, symbol, text, formula, of, unit, ...(source === undefined ? {} : { source }) });
  }

  build(): Kernel {
    return {
      slots: this.#names.length,
      names: this.#names,
      inputs: this.#inputs,
      constants: [...this.#constants].map(([slot, value]) => ({ slot, value })),
      coefficients: this.#coefficients,
      stages: this.#stages,
      limitStates: this.limitStates,
      marks: this.marks,
      constantMarks: this.#columns[this.marks][0],
      steps: this.steps,
      angles: [...this.#angles],
      forces: this.forces,
      pressure: this.pressure,
      places: this.places,
      notes: this.notes,
      loadPressure: this.loadPressure,
    };
  }

  #fix(slot: Slot, value: number): void {
    this.#constants.set(slot, value);
    this.#columns[slot][0] = value;
  }

  #field(path: string): InputField {
    const field = this.#fields.get(path);
    if (field === undefined) throw new RangeError(`the study has no numeric field ${path}`);
    return field;
  }
}

function formulaStage(name: string, formula: Formula, slots: readonly Slot[], into: Slot): Stage {
  if (slots.length > 7) throw new RangeError(`${name}: a formula takes at most 7 columns, not ${slots.length}`);
  const loop = loopOf(formula);
  const [a, b, c, d, e, f, g] = Array.from({ length: 7 }, (_, place) => slots[Math.min(place, slots.length - 1)]);
  return {
    name,
    reads: slots,
    writes: [into],
    run(k, count) {
      loop(k[into], count, k[a], k[b], k[c], k[d], k[e], k[f], k[g]);
    },
  };
}

/** The stages that the wanted slots rest on, in their order. */
export function stagesFor(stages: readonly Stage[], wanted: readonly Slot[]): readonly Stage[] {
  const needed = new Set(wanted);
  const kept: Stage[] = [];
  for (const stage of [...stages].reverse()) {
    if (!stage.writes.some((slot) => needed.has(slot))) continue;
    for (const slot of stage.reads) needed.add(slot);
    kept.push(stage);
  }
  return kept.reverse();
}

/** Adds four columns at a time: one pass over the block for what would be four. */
function sumStage(
  name: string,
  terms: readonly { readonly slot: Slot; readonly sign: 1 | -1 }[],
  constant: number,
  into: Slot,
): Stage {
  const count4 = Math.ceil(terms.length / 4);
  const slots = Array.from({ length: 4 * count4 }, (_, place) => terms[Math.min(place, terms.length - 1)].slot);
  const signs = Array.from({ length: 4 * count4 }, (_, place) => (place < terms.length ? terms[place].sign : 0));
  return {
    name,
    reads: terms.map((term) => term.slot),
    writes: [into],
    run(k, count) {
      const y = k[into];
      for (let t = 0; t < slots.length; t += 4) {
        const [a, b, c, d] = [k[slots[t]], k[slots[t + 1]], k[slots[t + 2]], k[slots[t + 3]]];
        const [p, q, r, s] = [signs[t], signs[t + 1], signs[t + 2], signs[t + 3]];
        if (t === 0) for (let i = 0; i < count; i++) y[i] = constant + p * a[i] + q * b[i] + r * c[i] + s * d[i];
        else for (let i = 0; i < count; i++) y[i] += p * a[i] + q * b[i] + r * c[i] + s * d[i];
      }
    },
  };
}
