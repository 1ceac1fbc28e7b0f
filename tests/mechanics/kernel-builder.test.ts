import { describe, expect, test } from "vitest";
import { type InputField, KernelBuilder } from "../../src/mechanics/kernel-builder.ts";
import { createWorkspace } from "../../src/mechanics/workspace.ts";

const field = (path: string, fixed?: number, angle = false): InputField => ({
  path,
  lowest: 0,
  highest: 100,
  angle,
  mean: fixed ?? 1,
  ...(fixed === undefined ? {} : { fixed }),
});
const product = (a: number, b: number): number => a * b;

describe("the kernel builder", () => {
  test("folds a formula of constants into a constant", () => {
    const b = new KernelBuilder([field("two", 2), field("three", 3)]);
    const six = b.formula("product", product, [b.input("two"), b.input("three")]);
    expect(b.constantOf(six)).toBe(6);
    expect(b.build().stages).toHaveLength(0);
  });

  test("makes a coefficient of a formula that hangs on a single uncertain input", () => {
    const b = new KernelBuilder([field("two", 2), field("x")]);
    const x = b.input("x");
    b.formula("product", product, [b.input("two"), x]);
    const kernel = b.build();
    expect(kernel.stages).toHaveLength(0);
    expect(kernel.coefficients.map((coefficient) => coefficient.value(21))).toEqual([42]);
  });

  test("makes a stage of a formula of two uncertain inputs, and runs it over a block", () => {
    const b = new KernelBuilder([field("x"), field("y")]);
    const [x, y] = [b.input("x"), b.input("y")];
    const into = b.formula("product", product, [x, y]);
    const workspace = createWorkspace(b.build(), 3);
    workspace.columns[x].set([1, 2, 3]);
    workspace.columns[y].set([4, 5, 6]);
    workspace.run(3);
    expect([...workspace.columns[into]]).toEqual([4, 10, 18]);
  });

  test("sums what is constant beforehand and subtracts where the sign says so", () => {
    const b = new KernelBuilder([field("two", 2), field("x")]);
    const x = b.input("x");
    const into = b.sum("sum", [{ slot: b.input("two") }, { slot: x, sign: -1 }]);
    const workspace = createWorkspace(b.build(), 2);
    workspace.columns[x].set([10, 20]);
    workspace.run(2);
    expect([...workspace.columns[into]]).toEqual([-8, -18]);
  });

  test("turns an angle into radians once and gives the same slot for the same path", () => {
    const b = new KernelBuilder([field("angle", 90, true)]);
    expect(b.input("angle")).toBe(b.input("angle"));
    expect(b.constantOf(b.input("angle"))).toBeCloseTo(Math.PI / 2, 15);
  });

  test("keeps the marks of a stage that never varies as the marks every sample starts from", () => {
    const b = new KernelBuilder([]);
    b.stage({
      name: "marks",
      reads: [b.marks].filter(() => false),
      writes: [b.marks],
      run(c, count) {
        for (let i = 0; i < count; i++) c[b.marks][i] |= 4;
      },
    });
    const workspace = createWorkspace(b.build(), 2);
    workspace.run(2);
    workspace.run(2);
    expect([...workspace.columns[b.marks]]).toEqual([4, 4]);
  });

  test("leaves out the stages that nothing wanted rests on", () => {
    const b = new KernelBuilder([field("x"), field("y")]);
    const [x, y] = [b.input("x"), b.input("y")];
    const wanted = b.formula("wanted", product, [x, y]);
    const idle = b.formula("idle", product, [y, x]);
    const workspace = createWorkspace(b.build(), 1, [wanted]);
    workspace.columns[x][0] = 3;
    workspace.columns[y][0] = 5;
    workspace.run(1);
    expect(workspace.columns[wanted][0]).toBe(15);
    expect(workspace.columns[idle][0]).toBe(0);
  });

  test("names the field that a study does not have", () => {
    expect(() => new KernelBuilder([]).input("wall.nothing")).toThrow("the study has no numeric field wall.nothing");
  });
});
