import { expect, test } from "vitest";
import { normalUpper } from "../../src/numeric/normal.ts";
import { fillFromZiggurat, layerEdges } from "../../src/probability/ziggurat.ts";

test("256 layers of equal area close at the top of the curve", () => {
  const edges = layerEdges();
  const curve = (x: number): number => Math.exp(-0.5 * x * x);
  const area = edges[0] * curve(edges[1]);
  expect(edges[256]).toBe(0);
  expect((edges[255] * (1 - curve(edges[255]))) / area).toBeCloseTo(1, 9);
  for (let i = 1; i < 256; i++) expect((edges[i] * (curve(edges[i + 1]) - curve(edges[i]))) / area).toBeCloseTo(1, 9);
  expect(Math.sqrt(Math.PI / 2) / (256 * area)).toBeCloseTo(0.9933, 4); // the share accepted, as printed by Marsaglia and Tsang
  expect(area).toBeCloseTo(edges[1] * curve(edges[1]) + Math.sqrt(2 * Math.PI) * normalUpper(edges[1]), 15);
});

/** xoshiro128++ once more, in arbitrary precision, and the ziggurat one value at a time, as the comment describes it. */
function* plainZiggurat(seed: readonly bigint[]): Generator<number> {
  const mask = 0xffffffffn;
  const s = [...seed];
  const rotate = (x: bigint, k: bigint): bigint => ((x << k) | (x >> (32n - k))) & mask;
  const word = (): number => {
    const result = (rotate((s[0] + s[3]) & mask, 7n) + s[0]) & mask;
    const t = (s[1] << 9n) & mask;
    s[2] ^= s[0];
    s[3] ^= s[1];
    s[1] ^= s[2];
    s[0] ^= s[3];
    s[2] ^= t;
    s[3] = rotate(s[3], 11n);
    return Number(BigInt.asIntN(32, result));
  };
  const edges = layerEdges();
  const curve = (x: number): number => Math.exp(-0.5 * x * x);
  const uniform = (): number => {
    const high = Math.floor(toUnsigned(word()) / 32);
    const low = Math.floor(toUnsigned(word()) / 64);
    return (high * 2 ** 26 + low + 0.5) / 2 ** 53;
  };
  const place = (w: number, layer: number): number => (w % 2 === 0 ? w + 1 : w) * (edges[layer] / 2 ** 31);
  const settle = (first: number, firstLayer: number): number => {
    let x = place(first, firstLayer);
    for (let layer = firstLayer; ; ) {
      if (Math.abs(x) < edges[layer + 1]) return x;
      if (layer === 0) {
        for (;;) {
          const beyond = -Math.log(uniform()) / edges[1];
          if (-2 * Math.log(uniform()) > beyond ** 2) return Math.sign(x) * (edges[1] + beyond);
        }
      }
      const share = (toUnsigned(word()) + 0.5) / 2 ** 32;
      if (curve(edges[layer]) + share * (curve(edges[layer + 1]) - curve(edges[layer])) < curve(x)) return x;
      layer = toUnsigned(word()) % 256;
      x = place(word(), layer);
    }
  };
  for (;;) {
    const bits = toUnsigned(word());
    const draws = [word(), word(), word(), word()];
    const group = draws.map((w, j) => settle(w, Math.floor(bits / 256 ** j) % 256));
    yield* group;
  }
}

function toUnsigned(w: number): number {
  return w < 0 ? w + 2 ** 32 : w;
}

test("the unrolled loop gives what the method gives one value at a time, tail included", () => {
  const state = Int32Array.of(1, 2, 3, 4);
  const count = 30_002;
  const found = new Float64Array(count);
  fillFromZiggurat(state, found, count);
  const plain = plainZiggurat([1n, 2n, 3n, 4n]);
  let tails = 0;
  for (let i = 0; i < count; i++) {
    expect(found[i]).toBeCloseTo(plain.next().value, 14);
    if (Math.abs(found[i]) > 3.6541528853610088) tails++;
  }
  expect(tails).toBeGreaterThan(2); // 8 are expected: without one the tail would not have been tried
});
