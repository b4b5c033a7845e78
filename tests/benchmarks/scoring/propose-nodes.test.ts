import { describe, expect, it } from "vitest";
import type { FieldArray, FieldFile } from "@/benchmarks/formats/field-file";
import { shippedProblem } from "@/benchmarks/problems/catalogue";
import { proposeNodes } from "@/benchmarks/scoring/propose-nodes";

const array = (shape: number[], values?: Float64Array): FieldArray => ({
  shape,
  values: values ?? new Float64Array(shape.reduce((product, length) => product * length, 1)),
  imaginary: null,
  numberType: "float64",
  isFortranOrder: false,
});

const file = (arrays: Record<string, FieldArray>): FieldFile => ({
  format: "npz",
  arrays: new Map(Object.entries(arrays)),
});

const periodic = shippedProblem("advection-exp-sine");
const bounded = shippedProblem("heat-dirichlet");
const plane = shippedProblem("helmholtz-periodic-2d");

const nodes = (count: number, from: number, step: number) =>
  Float64Array.from({ length: count }, (_, j) => from + j * step);

describe("proposing n from a file", () => {
  it("takes the length of a vector, also where it is stored as a column or a row", () => {
    for (const shape of [[64], [64, 1], [1, 64]]) {
      expect(proposeNodes(periodic, file({ u: array(shape) }))).toEqual([64]);
    }
  });

  it("takes both axes of a plane field, x first", () => {
    expect(proposeNodes(plane, file({ u: array([32, 48]) }))).toEqual([32, 48]);
  });

  it("does not count an end node that the coordinates of a periodic axis repeat", () => {
    const { a, b } = periodic.axes[0];
    const x = nodes(65, a, (b - a) / 64);
    expect(proposeNodes(periodic, file({ u: array([65]), x: array([65], x) }))).toEqual([64]);
  });

  it("counts both ends of a bounded axis", () => {
    const { a, b } = bounded.axes[0];
    const x = nodes(65, a, (b - a) / 64);
    expect(proposeNodes(bounded, file({ u: array([65]), x: array([65], x) }))).toEqual([65]);
  });

  it("proposes nothing where the file has no scored field or one of another dimension", () => {
    expect(proposeNodes(periodic, file({ w: array([64]) }))).toBeNull();
    expect(proposeNodes(plane, file({ u: array([64]) }))).toBeNull();
    expect(proposeNodes(periodic, file({ u: array([4, 4]) }))).toBeNull();
  });
});
