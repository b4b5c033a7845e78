import { boundedKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** B-02: heat equation, insulated at one end and convecting at the other. */
export const heatNeumannRobin: ProblemDefinition = {
  slug: "heat-neumann-robin",
  code: "B-02",
  title: "Heat equation with a Neumann and a Robin end",
  statement:
    "A rod is insulated at one end and loses heat by convection at the other. Two eigenfunctions decay side by side. Both boundary conditions contain a derivative, so the closure decides the order: ghost points or elimination keep second order, a one-sided difference of first order does not. The solution is entire, and collocation on Chebyshev nodes converges faster than geometrically.",
  keywords: ["heat equation", "Neumann", "Robin", "boundary closure", "eigenfunctions"],
  classification: {
    domain: "bounded",
    dimension: 1,
    isSteady: false,
    isLinear: true,
    smoothness: { kind: "entire" },
  },
  axes: [{ name: "x", a: 0, b: 1, kind: "bounded" }],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [
    { name: "Bi", value: 1, unit: "dimensionless", meaning: "Biot number" },
    {
      name: "beta1",
      value: 0.86033358901937976,
      unit: "dimensionless",
      meaning: "first positive root of beta tan(beta) = Bi",
    },
    {
      name: "beta2",
      value: 3.4256184594817281,
      unit: "dimensionless",
      meaning: "second positive root of beta tan(beta) = Bi",
    },
  ],
  expressions: [],
  equations: [{ field: "u", identity: "u_t = u_xx" }],
  initialTime: 0,
  initialConditions: [{ field: "u", timeDerivative: 0, expression: "cos(beta1*x) + cos(beta2*x)/2" }],
  boundaryConditions: [
    { field: "u", axis: "x", end: "a", kind: "neumann", alpha: "0", beta: "1", g: "0" },
    { field: "u", axis: "x", end: "b", kind: "robin", alpha: "Bi", beta: "1", g: "0" },
  ],
  kinks: [],
  outputTimes: [0.1],
  exact: {
    kind: "expression",
    fields: { u: "cos(beta1*x)*exp(-beta1^2*t) + cos(beta2*x)*exp(-beta2^2*t)/2" },
  },
  grids: {
    kinds: [boundedKinds],
    suggested: {
      uniform: [9, 17, 33, 65, 129, 257],
      "cell-centred": [8, 16, 32, 64, 128, 256],
      "chebyshev-lobatto": [5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 17, 19, 21, 25],
      "chebyshev-gauss": [5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 16, 20],
      "legendre-lobatto": [5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 16, 20],
      "legendre-gauss": [5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 16, 20],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 0, t: 0.1 }, value: 1.0832989604006564 },
    { field: "u", at: { x: 0.5, t: 0.1 }, value: 0.82216388520671086 },
    { field: "u", at: { x: 1, t: 0.1 }, value: 0.4572072263980111 },
  ],
  notes: [],
  sources: [
    {
      citation:
        "H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., Oxford, 1959, appendix IV (the roots)",
      isFromMemory: true,
    },
  ],
};
