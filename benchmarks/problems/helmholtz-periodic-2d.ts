import { periodicKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** P-10: a definite Helmholtz problem on the doubly periodic square. */
export const helmholtzPeriodic2d: ProblemDefinition = {
  slug: "helmholtz-periodic-2d",
  code: "P-10",
  title: "Two-dimensional periodic Helmholtz problem",
  statement:
    "A steady, linear, definite problem on the doubly periodic square, with a right-hand side made so that the solution is the exponential of a sum of a sine and a cosine. No time stepping and no boundary closure enter: what is left is the second-derivative operator in two dimensions and the linear solver. The solution is entire.",
  keywords: ["Helmholtz", "elliptic", "steady", "two-dimensional", "manufactured solution"],
  classification: {
    domain: "periodic",
    dimension: 2,
    isSteady: true,
    isLinear: true,
    smoothness: { kind: "entire" },
  },
  axes: [
    { name: "x", a: 0, b: 2 * Math.PI, kind: "periodic" },
    { name: "y", a: 0, b: 2 * Math.PI, kind: "periodic" },
  ],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [
    { name: "kappa", value: 1, unit: "dimensionless", meaning: "coefficient of the undifferentiated term" },
  ],
  expressions: [
    {
      name: "f",
      expression: "exp(sin(x) + cos(y))*(kappa - cos(x)^2 + sin(x) - sin(y)^2 + cos(y))",
      meaning: "right-hand side",
    },
  ],
  equations: [{ field: "u", identity: "-u_xx - u_yy + kappa*u = f" }],
  initialTime: 0,
  initialConditions: [],
  boundaryConditions: [],
  kinks: [],
  outputTimes: [],
  exact: { kind: "expression", fields: { u: "exp(sin(x) + cos(y))" } },
  grids: {
    kinds: [periodicKinds, periodicKinds],
    suggested: {
      "uniform-periodic": [8, 10, 12, 14, 16, 18, 20, 22, 24, 28, 32, 48, 64, 96, 128, 256],
      "cell-centred": [16, 24, 32, 48, 64, 96, 128],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 0, y: 0 }, value: 2.7182818284590452 },
    { field: "u", at: { x: 1, y: 1 }, value: 3.981956536842714 },
    { field: "u", at: { x: 3, y: 2 }, value: 0.75955174532728127 },
  ],
  notes: ["The right-hand side is taken at the nodes; a method with cell integrals has to integrate it."],
  sources: [
    {
      citation:
        "P. J. Roache, Code verification by the method of manufactured solutions, J. Fluids Eng. 124 (2002) 4-10 (the method; the solution is our own)",
      doi: "10.1115/1.1436090",
      isFromMemory: true,
    },
    {
      citation:
        "K. Salari and P. Knupp, Code verification by the method of manufactured solutions, SAND2000-1444, Sandia National Laboratories, 2000",
      isFromMemory: true,
    },
  ],
};
