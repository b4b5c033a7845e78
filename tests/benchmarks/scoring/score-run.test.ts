import { describe, expect, it } from "vitest";
import type { GridKind } from "@/benchmarks/grids/grid-kind";
import { nodesOf } from "@/benchmarks/grids/grid-nodes";
import { shippedProblem } from "@/benchmarks/problems/catalogue";
import { scoreRun } from "@/benchmarks/scoring/score-run";
import {
  arrayOf,
  boundedProblem,
  declare,
  declareRun,
  fileOf,
  steadyProblem,
  unsteadyProblem,
} from "./make-run";

const eps = 2 ** -52;
const problem = steadyProblem();
const exact = (x: number) => Math.exp(Math.sin(x));
const periodicNodes = (n: number) => nodesOf("uniform-periodic", n, 0, 2 * Math.PI);

function scoreOf(u: Float64Array, changes = {}) {
  return scoreRun(problem, declare(changes), declareRun([u.length]), fileOf({ u: arrayOf(u) }));
}

function scoreBounded(
  kind: GridKind,
  n: number,
  solution: string,
  u: (x: number) => number,
  changes = {},
  more = {},
) {
  const grid = { x: { kind, descending: false } };
  const values = nodesOf(kind, n, 0, 1).map(u);
  return scoreRun(
    boundedProblem(solution, more),
    declare({ grid, ...changes }),
    declareRun([n]),
    fileOf({ u: arrayOf(values) }),
  );
}

describe("the score of a run", () => {
  it("of the exact solution is zero to rounding", () => {
    const score = scoreOf(periodicNodes(32).map(exact));
    expect(score.times[0].nodes.max).toBeLessThanOrEqual(4 * eps);
    expect(score).toMatchObject({ n: [32], nodes: 32, unknowns: 32, intervals: 32 });
    expect(score.times[0]).toMatchObject({ t: null, between: null, components: null });
  });

  it("of a constant offset has the norms of a constant, and a mass defect of offset times length", () => {
    const length = 2 * Math.PI;
    const score = scoreOf(periodicNodes(64).map((x) => exact(x) + 1e-3));
    const { l1, l2, max } = score.times[0].nodes;
    expect(l1).toBeCloseTo(1e-3 * length, 15);
    expect(l2).toBeCloseTo(1e-3 * Math.sqrt(length), 15);
    expect(max).toBeCloseTo(1e-3, 15);
    expect(score.massDefect).toBeCloseTo(1e-3 * length, 15);
    // The mean of exp(sin x) is I_0(1).
    expect(score.relMassDefect).toBeCloseTo(1e-3 / 1.2660658777520084, 14);
    expect(score.takacs?.dissipation).toBeCloseTo(1e-6, 15);
  });

  it("does not depend on the direction of the file", () => {
    const x = nodesOf("chebyshev-lobatto", 20, 0, 1);
    const u = x.map((value) => Math.exp(value) + 1e-4 * value);
    const grid = { x: { kind: "chebyshev-lobatto" as const, descending: false } };
    const bounded = boundedProblem("exp(x)");
    const up = scoreRun(
      bounded,
      declare({ grid }),
      declareRun([20]),
      fileOf({ x: arrayOf(x), u: arrayOf(u) }),
    );
    const down = scoreRun(
      bounded,
      declare({ grid }),
      declareRun([20]),
      fileOf({ x: arrayOf(x.slice().reverse()), u: arrayOf(u.slice().reverse()) }),
    );
    expect(down.times).toEqual(up.times);
    expect([up.reading.wasReversed, down.reading.wasReversed]).toEqual([false, true]);
  });

  it("scales with the field: twice the data against twice the solution has twice the norms and equal relative ones", () => {
    const twice = steadyProblem({ exact: { kind: "expression", fields: { u: "2*exp(sin(x))" } } });
    const u = periodicNodes(24).map((x) => exact(x) + 1e-3 * Math.cos(3 * x));
    const one = scoreOf(u).times[0].nodes;
    const two = scoreRun(twice, declare(), declareRun([24]), fileOf({ u: arrayOf(u.map((v) => 2 * v)) }))
      .times[0].nodes;
    expect([two.l1, two.l2, two.max]).toEqual([2 * one.l1, 2 * one.l2, 2 * one.max]);
    expect([two.relL1, two.relL2, two.relMax]).toEqual([one.relL1, one.relL2, one.relMax]);
  });

  it("has u* at the declared nodes, not at the file's coordinates", () => {
    const x = periodicNodes(16);
    const moved = x.map((value) => value + 4e-8);
    const file = fileOf({ x: arrayOf(moved), u: arrayOf(moved.map(exact)) });
    const score = scoreRun(problem, declare(), declareRun([16]), file);
    expect(score.times[0].nodes.max).toBeGreaterThan(1e-8);
    expect(score.reading.coordinateOffset).toBeCloseTo(4e-8 / (2 * Math.PI), 14);
  });

  it("on a listed grid has u* at the file's coordinates", () => {
    const x = Float64Array.from({ length: 20 }, (_, j) => 0.1 + 0.3 * j + 0.05 * Math.sin(j));
    const file = fileOf({ x: arrayOf(x), u: arrayOf(x.map(exact)) });
    const grid = { x: { kind: "listed" as const, descending: false } };
    const score = scoreRun(problem, declare({ grid }), declareRun([20]), file);
    expect(score.times[0].nodes.max).toBeLessThanOrEqual(4 * eps);
    expect(score.reading.largestGap).toBeGreaterThan(1);
  });

  it("gives norms at each output time, the last one being the headline", () => {
    const two = unsteadyProblem([1, 2]);
    const x = periodicNodes(32);
    const u = [
      ...x.map((v) => Math.exp(Math.sin(v - 1)) + 1e-3),
      ...x.map((v) => Math.exp(Math.sin(v - 2)) + 1e-5),
    ];
    const score = scoreRun(two, declare(), declareRun([32]), fileOf({ u: arrayOf(u, [2, 32]) }));
    expect(score.times.map(({ t, nodes }) => [t, Number(nodes.max.toPrecision(6))])).toEqual([
      [1, 1e-3],
      [2, 1e-5],
    ]);
  });

  it("combines several fields and lists each", () => {
    const pair = steadyProblem({
      fields: [
        { name: "u", values: "real", isScored: true },
        { name: "v", values: "real", isScored: true },
      ],
      exact: { kind: "expression", fields: { u: "sin(x)", v: "cos(x)" } },
    });
    const x = periodicNodes(16);
    const file = fileOf({
      u: arrayOf(x.map((v) => Math.sin(v) + 3e-3)),
      v: arrayOf(x.map((v) => Math.cos(v) + 4e-3)),
    });
    const [time] = scoreRun(pair, declare(), declareRun([16]), file).times;
    const root = Math.sqrt(2 * Math.PI);
    expect(time.nodes.l2).toBeCloseTo(5e-3 * root, 12);
    expect(time.nodes.max).toBeCloseTo(4e-3, 12);
    expect(time.components?.map(({ field, nodes }) => [field, Number(nodes.max.toPrecision(9))])).toEqual([
      ["u", 3e-3],
      ["v", 4e-3],
    ]);
  });

  it("of complex fields takes moduli", () => {
    const complex = steadyProblem({
      fields: [{ name: "u", values: "complex", isScored: true }],
      exact: { kind: "expression", fields: { u: "exp(i*x)" } },
    });
    const x = periodicNodes(16);
    const u = arrayOf(
      x.map((v) => Math.cos(v) + 3e-3),
      [16],
      {
        imaginary: x.map((v) => Math.sin(v) + 4e-3),
        numberType: "complex128",
      },
    );
    const score = scoreRun(complex, declare(), declareRun([16]), fileOf({ u }));
    expect(score.times[0].nodes.max).toBeCloseTo(5e-3, 14);
    expect(score.times[0].nodes.relL2).toBeCloseTo(5e-3, 14);
    expect([score.takacs, score.functional]).toEqual([null, null]);
  });

  it("of cell averages compares with averages of u*", () => {
    const n = 20;
    const h = (2 * Math.PI) / n;
    const sine = steadyProblem({ exact: { kind: "expression", fields: { u: "sin(x)" } } });
    for (const kind of ["uniform-periodic", "cell-centred"] as const) {
      const u = nodesOf(kind, n, 0, 2 * Math.PI).map((x) => (Math.cos(x - h / 2) - Math.cos(x + h / 2)) / h);
      const grid = { x: { kind, descending: false } };
      const file = fileOf({ u: arrayOf(u) });
      const averages = scoreRun(sine, declare({ grid, values: "cellAverage" }), declareRun([n]), file);
      expect(averages.times[0].nodes.max).toBeLessThanOrEqual(1e-15);
      const points = scoreRun(sine, declare({ grid }), declareRun([n]), file);
      expect(points.times[0].nodes.relL2).toBeCloseTo(1 - Math.sin(h / 2) / (h / 2), 12);
    }
  });

  it("of cell averages in 2-D averages along both axes", () => {
    const n = [12, 9];
    const axes = [
      { name: "x" as const, a: 0, b: 1, kind: "bounded" as const },
      { name: "y" as const, a: 0, b: 1, kind: "bounded" as const },
    ];
    const plane = boundedProblem("x^2*exp(y)", { axes });
    const kind = { kind: "cell-centred" as const, descending: false };
    const along = (count: number, primitive: (x: number) => number) =>
      Array.from({ length: count }, (_, j) => count * (primitive((j + 1) / count) - primitive(j / count)));
    const u = along(n[0], (x) => x ** 3 / 3).flatMap((p) => along(n[1], Math.exp).map((q) => p * q));
    const declaration = declare({ grid: { x: kind, y: kind }, values: "cellAverage" });
    const score = scoreRun(plane, declaration, declareRun(n), fileOf({ u: arrayOf(u, n) }));
    expect(score.times[0].nodes.max).toBeLessThanOrEqual(16 * eps * Math.E);
    expect(score.intervals).toBeCloseTo(Math.sqrt(108), 12);
  });
});

describe("norms between the nodes", () => {
  it("equal those at the nodes for a resolved error on a periodic grid", () => {
    const u = periodicNodes(48).map((x) => exact(x) + 1e-3 * Math.cos(5 * x));
    const [time] = scoreOf(u, { reconstruction: { kind: "trigonometric" } }).times;
    expect((time.between?.l2 ?? 0) / time.nodes.l2).toBeCloseTo(1, 10);
  });

  it("show the interpolation error of data that are exact at the nodes", () => {
    const degrees = [1, 3, 5];
    for (const degree of degrees) {
      const errors = [32, 64].map((n) => {
        const u = periodicNodes(n).map(exact);
        const [time] = scoreOf(u, { reconstruction: { kind: "piecewise-polynomial", degree } }).times;
        return time.between?.l2 ?? NaN;
      });
      expect(Math.log2(errors[0] / errors[1])).toBeGreaterThan(degree + 0.7);
      expect(Math.log2(errors[0] / errors[1])).toBeLessThan(degree + 1.3);
    }
  });

  it("of a Chebyshev grid follow the global polynomial", () => {
    const score = scoreBounded("chebyshev-lobatto", 24, "exp(x)", Math.exp, {
      reconstruction: { kind: "polynomial" },
    });
    expect(score.times[0].between?.max).toBeLessThanOrEqual(1e-14);
    const runge = scoreBounded(
      "chebyshev-gauss",
      21,
      "1/(1 + 25*(2*x - 1)^2)",
      (x) => 1 / (1 + 25 * (2 * x - 1) ** 2),
      { reconstruction: { kind: "polynomial" } },
    );
    // Source: Trefethen, Approximation Theory and Approximation Practice (from memory), error recomputed: 0.01533373519.
    expect(runge.times[0].between?.max).toBeCloseTo(0.01533373519, 5);
    expect(runge.times[0].nodes.max).toBeLessThanOrEqual(1e-15);
  });
});

describe("boundary defects", () => {
  const conditions = [
    { field: "u", axis: "x", end: "a", kind: "neumann", alpha: "0", beta: "1", g: "-1" },
    { field: "u", axis: "x", end: "b", kind: "robin", alpha: "2", beta: "3", g: "5*exp(1)" },
  ] as const;
  const kinds = ["uniform", "cell-centred", "chebyshev-lobatto", "legendre-gauss"] as const;

  it("vanish for the exact solution, with 6th-order one-sided differences where nothing is declared", () => {
    for (const kind of kinds) {
      const of = (n: number) =>
        scoreBounded(kind, n, "exp(x)", Math.exp, {}, { boundaryConditions: [...conditions] }).boundary[1]
          .residual;
      const coarse = of(16);
      expect(coarse).toBeLessThanOrEqual(1e-4);
      if (kind === "uniform") expect(Math.log2(of(17) / of(33))).toBeCloseTo(6, 0);
    }
  });

  it("follow the global polynomial where it is declared", () => {
    for (const kind of ["chebyshev-lobatto", "chebyshev-gauss", "legendre-gauss"] as const) {
      const { boundary } = scoreBounded(
        kind,
        20,
        "exp(x)",
        Math.exp,
        { reconstruction: { kind: "polynomial" } },
        { boundaryConditions: [...conditions] },
      );
      expect(boundary.map(({ axis, end, kind: of }) => [axis, end, of])).toEqual([
        ["x", "a", "neumann"],
        ["x", "b", "robin"],
      ]);
      for (const { residual } of boundary) expect(residual).toBeLessThanOrEqual(1e-11);
    }
  });

  it("are the residual itself where the data miss the condition", () => {
    const dirichlet = [
      { field: "u", axis: "x", end: "a", kind: "dirichlet", alpha: "1", beta: "0", g: "1" },
    ] as const;
    const { boundary, maxNearEnds, maxInside } = scoreBounded(
      "uniform",
      21,
      "exp(x)",
      (x) => Math.exp(x) + (x === 0 ? 1e-3 : 0),
      {},
      { boundaryConditions: [...dirichlet] },
    );
    expect(boundary[0].residual).toBeCloseTo(1e-3, 12);
    expect(maxNearEnds).toBeCloseTo(1e-3, 12);
    expect(maxInside).toBeLessThanOrEqual(8 * eps);
  });

  it("of a side in 2-D are the largest along it", () => {
    const poisson = shippedProblem("poisson-mixed-2d");
    const kind = { kind: "uniform" as const, descending: false };
    const x = nodesOf("uniform", 17, 0, 1);
    const u = [...x].flatMap((p) =>
      [...x].map((q) => Math.cos(Math.PI * p) * Math.sin(Math.PI * q) + (q === 0 ? p / 100 : 0)),
    );
    const declaration = declare({ grid: { x: kind, y: kind } });
    const score = scoreRun(poisson, declaration, declareRun([17, 17]), fileOf({ u: arrayOf(u, [17, 17]) }));
    const bottom = score.boundary.find(({ axis, end }) => axis === "y" && end === "a");
    expect(bottom?.residual).toBeCloseTo(0.01, 12);
    const left = score.boundary.find(({ axis, end }) => axis === "x" && end === "a");
    expect(left?.residual).toBeCloseTo(0.01, 4);
  });
});

describe("scores of the shipped problems", () => {
  it("agree with the closed form of the semi-discrete heat equation", () => {
    const heat = shippedProblem("heat-dirichlet");
    const grid = { x: { kind: "uniform" as const, descending: false } };
    for (const n of [17, 33, 65]) {
      const h = 1 / (n - 1);
      const factor = Math.exp((-4 / h ** 2) * Math.sin((Math.PI * h) / 2) ** 2 * 0.1);
      const u = nodesOf("uniform", n, 0, 1).map((x) => factor * Math.sin(Math.PI * x));
      const score = scoreRun(heat, declare({ grid }), declareRun([n]), fileOf({ u: arrayOf(u) }));
      expect(score.times[0].nodes.relL2).toBeCloseTo(factor / Math.exp(-(Math.PI ** 2) * 0.1) - 1, 13);
    }
  });
});
