import { describe, expect, it } from "vitest";
import { nodesOf } from "@/benchmarks/grids/grid-nodes";
import { readRun } from "@/benchmarks/scoring/read-run";
import { refusalOf } from "@/tests/support/refusals";
import {
  arrayOf,
  boundedProblem,
  declare,
  declareRun,
  fileOf,
  steadyProblem,
  unsteadyProblem,
} from "./make-run";

const problem = steadyProblem();
const ramp = (n: number) => Float64Array.from({ length: n }, (_, j) => j + 0.5);

function read(values: Float64Array, shape?: number[], changes = {}) {
  return readRun(problem, declare(changes), declareRun([8]), fileOf({ u: arrayOf(values, shape) }));
}

describe("a run's arrays", () => {
  it("count as 1-D in the shapes (N,), (N, 1) and (1, N)", () => {
    for (const shape of [[8], [8, 1], [1, 8]]) {
      expect([...read(ramp(8), shape).fields[0].times[0].values]).toEqual([...ramp(8)]);
    }
  });

  it("of another length are refused with both shapes", () => {
    const error = refusalOf(() => read(ramp(7)));
    expect(error.code).toBe("values/wrong-shape");
    expect(error.message).toContain("(7,)");
    expect(error.message).toContain("(8,)");
    expect(refusalOf(() => read(ramp(8), [2, 4])).message).toContain("(2, 4)");
  });

  it("that hold NaN or infinity are refused with the first index and the count", () => {
    const values = ramp(8);
    values[3] = NaN;
    values[6] = Infinity;
    const error = refusalOf(() => read(values));
    expect(error.code).toBe("values/not-finite");
    expect(error.message).toContain("2 values");
    expect(error.where).toBe("u, index 3");
  });

  it("that are complex are refused where the solution is real", () => {
    const complex = arrayOf(ramp(8), [8], { imaginary: new Float64Array(8), numberType: "complex128" });
    const error = refusalOf(() => readRun(problem, declare(), declareRun([8]), fileOf({ u: complex })));
    expect(error.code).toBe("values/complex");
  });

  it("that are missing are refused with the names that were found", () => {
    const error = refusalOf(() =>
      readRun(problem, declare(), declareRun([8]), fileOf({ w: arrayOf(ramp(8)) })),
    );
    expect(error.code).toBe("format/no-array");
    expect(error.message).toContain("it holds w");
  });

  it("without coordinates are reversed where the submission says so", () => {
    const grid = { x: { kind: "uniform-periodic" as const, descending: true } };
    expect([...read(ramp(8), [8], { grid }).fields[0].times[0].values]).toEqual([...ramp(8)].reverse());
  });

  it("with descending coordinates are reversed, whatever the submission says", () => {
    const x = nodesOf("chebyshev-lobatto", 8, 0, 1).reverse();
    const got = readRun(
      boundedProblem("x"),
      declare({ grid: { x: { kind: "chebyshev-lobatto", descending: false } } }),
      declareRun([8]),
      fileOf({ x: arrayOf(x), u: arrayOf(x) }),
    );
    expect(got.axes[0].isDescending).toBe(true);
    expect(got.fields[0].times[0].values[0]).toBe(0);
  });

  it("may repeat the end node of a periodic axis, with coordinates or without", () => {
    const u = Float64Array.of(...ramp(8), 0.5);
    const x = Float64Array.of(...nodesOf("uniform-periodic", 8, 0, 2 * Math.PI), 2 * Math.PI);
    for (const file of [fileOf({ u: arrayOf(u) }), fileOf({ u: arrayOf(u), x: arrayOf(x) })]) {
      const got = readRun(problem, declare(), declareRun([8]), file);
      expect(got.axes[0].hasRepeatedEnd).toBe(true);
      expect([...got.fields[0].times[0].values]).toEqual([...ramp(8)]);
    }
    expect(refusalOf(() => read(ramp(9))).message).toContain("does not repeat the first");
  });

  it("of a listed grid need coordinates", () => {
    const grid = { x: { kind: "listed" as const, descending: false } };
    expect(refusalOf(() => read(ramp(8), [8], { grid })).code).toBe("grid/no-coordinates");
  });

  it("with several output times have a leading time axis, and t must be the problem's", () => {
    const twoTimes = unsteadyProblem([1, 2]);
    const u = arrayOf([...ramp(8), ...ramp(8).map((v) => -v)], [2, 8]);
    const got = readRun(twoTimes, declare(), declareRun([8]), fileOf({ u, t: arrayOf([1, 2]) }));
    expect(got.times).toEqual([1, 2]);
    expect(got.fields[0].times[1].values[3]).toBe(-3.5);
    const wrong = () => readRun(twoTimes, declare(), declareRun([8]), fileOf({ u, t: arrayOf([1, 2.5]) }));
    expect(refusalOf(wrong).message).toContain("t = 2.5 at index 1");
    const flat = () => readRun(twoTimes, declare(), declareRun([8]), fileOf({ u: arrayOf(ramp(8)) }));
    expect(refusalOf(flat).message).toContain("(2, 8)");
  });

  it("of a 2-D run are row-major with x first, and reversed along each axis on its own", () => {
    const plane = boundedProblem("x + 10*y", {
      axes: [
        { name: "x", a: 0, b: 1, kind: "bounded" },
        { name: "y", a: 0, b: 1, kind: "bounded" },
      ],
    });
    const kind = { kind: "uniform" as const, descending: false };
    const x = nodesOf("uniform", 5, 0, 1);
    const y = nodesOf("uniform", 4, 0, 1).reverse();
    const u = [...x].flatMap((p) => [...y].map((q) => p + 10 * q));
    const file = fileOf({ x: arrayOf(x), y: arrayOf(y), u: arrayOf(u, [5, 4]) });
    const got = readRun(plane, declare({ grid: { x: kind, y: kind } }), declareRun([5, 4]), file);
    expect(got.axes.map((axis) => axis.isDescending)).toEqual([false, true]);
    const { values } = got.fields[0].times[0];
    expect([values[0], values[3], values[16]]).toEqual([0, 10, 1]);
    const exchanged = fileOf({ u: arrayOf(u, [4, 5]) });
    const error = refusalOf(() =>
      readRun(plane, declare({ grid: { x: kind, y: kind } }), declareRun([5, 4]), exchanged),
    );
    expect(error.message).toMatch(/\(4, 5\).*\(5, 4\)/);
  });
});
