/** The first samples of plain sampling, one by one: values of the unknowns and factors of safety. */
import { buildModel } from "./model.ts";
import { fillNormals, streamBlock } from "./probability/streams.ts";
import type { Study } from "./study/study.ts";

export interface SampleTable {
  /** Paths of the unknowns, then names of the limit states. */
  readonly paths: readonly string[];
  readonly limitStates: readonly string[];
  /** One row per sample: a value for each path (house units, angles in degrees), a factor for each limit state. */
  readonly rows: readonly Float64Array[];
}

/**
 * Samples are those that plain sampling with this seed begins with.
 *
 * @param count how many rows
 */
export function sampleTable(study: Study, seed: string, count: number): SampleTable {
  const { states, space } = buildModel(study);
  const [paths, limitStates] = [space.unknowns.map(({ path }) => path), states.names];
  const z = states.keys.map(() => new Float64Array(streamBlock));
  const factors = states.names.map(() => new Float64Array(states.capacity));
  const marks = new Uint8Array(states.capacity);
  const rows: Float64Array[] = [];
  for (let block = 0; rows.length < count; block++) {
    const size = Math.min(streamBlock, count - rows.length);
    for (let j = 0; j < z.length; j++) fillNormals(seed, "plain sampling", states.keys[j], block, z[j], size);
    for (let start = 0; start < size; start += states.capacity) {
      const n = Math.min(states.capacity, size - start);
      const tile = z.map((column) => column.subarray(start, start + n));
      states.evaluate(tile, n, factors, marks, false);
      for (let i = 0; i < n; i++) {
        const values = space.unknowns.map(({ marginal }, v) => {
          const row = space.rows[v];
          let u = 0;
          for (let j = 0; j < row.length; j++) if (row[j] !== 0) u += row[j] * tile[j][i];
          return marginal.quantileOfNormal(u);
        });
        rows.push(Float64Array.from([...values, ...factors.map((column) => column[i])]));
      }
    }
  }
  return { paths, limitStates, rows };
}
