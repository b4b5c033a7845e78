import { describe, expect, it } from "vitest";
import { shippedProblem } from "@/benchmarks/problems/catalogue";
import { checkDeclaration } from "@/benchmarks/scoring/check-declaration";
import type { Declaration, RunDeclaration } from "@/benchmarks/scoring/declaration";
import { declare, declareRun } from "./make-run";

const periodic = shippedProblem("advection-exp-sine");
const bounded = shippedProblem("heat-dirichlet");
const plane = shippedProblem("helmholtz-periodic-2d");
const kind = (name: string) => ({ kind: name, descending: false }) as Declaration["grid"]["x"];

const codes = (problem: typeof periodic, declaration: Declaration, runs: RunDeclaration[]) =>
  checkDeclaration(problem, declaration, runs).map((refusal) => refusal.code);

describe("a declaration", () => {
  it("that fits its problem is not refused", () => {
    expect(codes(periodic, declare(), [declareRun([16]), declareRun([32])])).toEqual([]);
    const both = declare({ grid: { x: kind("uniform-periodic"), y: kind("uniform-periodic") } });
    expect(codes(plane, both, [declareRun([16, 24])])).toEqual([]);
  });

  it("is refused where an axis is missing, unknown, or on a grid that the problem does not allow", () => {
    expect(codes(plane, declare(), [declareRun([16, 16])])).toEqual(["grid/missing-axis"]);
    const both = declare({ grid: { x: kind("uniform-periodic"), y: kind("uniform-periodic") } });
    expect(codes(periodic, both, [declareRun([16])])).toEqual(["grid/unknown-axis"]);
    const [refusal] = checkDeclaration(periodic, declare({ grid: { x: kind("uniform") } }), [
      declareRun([16]),
    ]);
    expect(refusal.code).toBe("grid/kind-not-allowed");
    expect(refusal.message).toContain("uniform-periodic, cell-centred, listed");
  });

  it("is refused where n has the wrong length, or a limit is passed, with the limit and the file", () => {
    expect(codes(periodic, declare(), [declareRun([16, 16])])).toEqual(["run/wrong-n"]);
    const [tooFew] = checkDeclaration(periodic, declare(), [declareRun([3])]);
    expect([tooFew.code, tooFew.file]).toEqual(["run/too-few-nodes", "n3.npz"]);
    expect(tooFew.message).toContain("at least 4 nodes");
    const [tooMany] = checkDeclaration(periodic, declare(), [declareRun([2 ** 22 + 1])]);
    expect(tooMany.message).toContain("at most 4194304 nodes");
    expect(codes(periodic, declare(), [declareRun([2 ** 22])])).toEqual([]);
    const both = declare({ grid: { x: kind("uniform-periodic"), y: kind("uniform-periodic") } });
    expect(codes(plane, both, [declareRun([2048, 2048])])).toEqual([]);
    expect(codes(plane, both, [declareRun([2049, 16])])).toEqual(["run/too-many-nodes"]);
  });

  it("is refused above 24 runs, without runs, with the same n twice in the study, and without a study", () => {
    const runs = Array.from({ length: 25 }, (_, k) => declareRun([8 + k]));
    expect(codes(periodic, declare(), runs)).toEqual(["run/too-many"]);
    expect(codes(periodic, declare(), runs.slice(0, 24))).toEqual([]);
    expect(codes(periodic, declare(), [])).toEqual(["run/none"]);
    expect(codes(periodic, declare(), [declareRun([8]), declareRun([8])])).toEqual(["run/same-n"]);
    expect(codes(periodic, declare(), [declareRun([8]), declareRun([8], { role: "timeStep" })])).toEqual([]);
    expect(codes(periodic, declare(), [declareRun([8], { role: "iteration" })])).toEqual(["run/no-study"]);
  });

  it("is refused where the reconstruction does not fit the axes", () => {
    const uniform = { grid: { x: kind("uniform") } };
    const runs = [declareRun([16])];
    expect(codes(bounded, declare({ ...uniform, reconstruction: { kind: "trigonometric" } }), runs)).toEqual([
      "reconstruction/not-on-this-axis",
    ]);
    expect(codes(periodic, declare({ reconstruction: { kind: "polynomial" } }), runs)).toEqual([
      "reconstruction/not-on-this-axis",
    ]);
    const degree = { kind: "piecewise-polynomial" as const, degree: 8 };
    expect(codes(periodic, declare({ reconstruction: degree }), runs)).toEqual(["reconstruction/degree"]);
    const listed = declare({ grid: { x: kind("listed") }, reconstruction: { kind: "trigonometric" } });
    expect(codes(periodic, listed, runs)).toEqual(["reconstruction/needs-equal-spacing"]);
    const global = declare({ ...uniform, reconstruction: { kind: "polynomial" } });
    expect(codes(bounded, global, [declareRun([4097])])).toEqual(["run/too-many-nodes"]);
  });

  it("is refused where cell averages are declared on nodes that are no cells", () => {
    const declaration = declare({ grid: { x: kind("chebyshev-lobatto") }, values: "cellAverage" });
    expect(codes(bounded, declaration, [declareRun([16])])).toEqual(["grid/averages-need-cells"]);
  });
});
