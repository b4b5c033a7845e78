import { describe, expect, it } from "vitest";
import { nodesOf } from "@/benchmarks/grids/grid-nodes";
import { matchCoordinates, type DeclaredAxis } from "@/benchmarks/grids/match-coordinates";
import { DataError } from "@/benchmarks/scoring/data-error";

const periodic: DeclaredAxis = { name: "x", kind: "uniform-periodic", n: 8, a: 0, b: 4, isPeriodic: true };
const chebyshev: DeclaredAxis = {
  name: "x",
  kind: "chebyshev-lobatto",
  n: 9,
  a: -1,
  b: 1,
  isPeriodic: false,
};
const listed: DeclaredAxis = { name: "x", kind: "listed", n: 5, a: 0, b: 1, isPeriodic: false };

const nodes = (axis: DeclaredAxis) => nodesOf(axis.kind, axis.n, axis.a, axis.b);

function refusalOf(axis: DeclaredAxis, coordinates: number[], isSingle = false): DataError {
  try {
    matchCoordinates(Float64Array.from(coordinates), axis, isSingle);
  } catch (error) {
    if (error instanceof DataError) return error;
    throw error;
  }
  throw new Error("the coordinates were accepted");
}

describe("coordinates of a file", () => {
  it("that are the declared nodes match without an offset", () => {
    const got = matchCoordinates(nodes(periodic), periodic, false);
    expect(got).toMatchObject({ isDescending: false, hasRepeatedEnd: false, offset: 0 });
  });

  it("that are off by more than 1e-8 L are refused with index, value and expected value", () => {
    const moved = [...nodes(periodic)];
    moved[3] += 5e-8;
    moved[5] += 5e-8;
    const error = refusalOf(periodic, moved);
    expect(error.code).toBe("grid/coordinates-off");
    expect(error.message).toContain("index 3");
    expect(error.message).toContain(String(moved[3]));
    expect(error.message).toContain("has 1.5");
    expect(error.where).toBe("x, index 3");
  });

  it("that are off by less are accepted, the offset told in units of L, u* staying at the declared nodes", () => {
    const moved = nodes(periodic);
    moved[3] += 2e-8;
    const got = matchCoordinates(moved, periodic, false);
    expect(got.offset).toBeCloseTo(0.5e-8, 12);
    expect(got.nodes[3]).toBe(1.5);
  });

  it("in single precision may be off by 1e-5 L", () => {
    const axis = { ...chebyshev, n: 65 };
    const rounded = nodes(axis).map(Math.fround);
    expect(() => matchCoordinates(rounded, axis, false)).toThrow(DataError);
    expect(matchCoordinates(rounded, axis, true).offset).toBeLessThan(1e-7);
  });

  it("in descending order are reversed", () => {
    const got = matchCoordinates(nodes(chebyshev).reverse(), chebyshev, false);
    expect(got.isDescending).toBe(true);
    expect(got.nodes[0]).toBe(-1);
  });

  it("off the grid in descending order are refused by their index in the file", () => {
    const moved = [...nodes(chebyshev)].reverse();
    moved[2] += 0.01;
    expect(refusalOf(chebyshev, moved).where).toBe("x, index 2");
  });

  it("may repeat the first node at the end of a periodic axis, in either order", () => {
    const repeated = [...nodes(periodic), 4];
    expect(matchCoordinates(Float64Array.from(repeated), periodic, false).hasRepeatedEnd).toBe(true);
    const reversed = matchCoordinates(Float64Array.from(repeated.reverse()), periodic, false);
    expect(reversed).toMatchObject({ hasRepeatedEnd: true, isDescending: true });
  });

  it("are refused where they are not monotone, not finite or of another number than declared", () => {
    expect(refusalOf(listed, [0, 0.2, 0.2, 0.7, 1]).code).toBe("grid/not-monotone");
    expect(refusalOf(listed, [0, 0.2, NaN, 0.7, 1]).code).toBe("values/not-finite");
    const error = refusalOf(listed, [0, 0.2, 0.7, 1]);
    expect(error.code).toBe("grid/wrong-length");
    expect(error.message).toMatch(/4 values.*n = 5/);
  });

  it("decide on a listed grid, within the interval", () => {
    const got = matchCoordinates(Float64Array.of(1, 0.8, 0.5, 0.1, 0), listed, false);
    expect([...got.nodes]).toEqual([0, 0.1, 0.5, 0.8, 1]);
    expect(refusalOf(listed, [0, 0.2, 0.3, 0.7, 1.1]).code).toBe("grid/outside");
  });
});
