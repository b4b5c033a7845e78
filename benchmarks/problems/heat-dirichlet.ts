import { boundedKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** B-01: heat equation between two ends held at zero. */
export const heatDirichlet: ProblemDefinition = {
  slug: "heat-dirichlet",
  code: "B-01",
  title: "Heat equation with Dirichlet ends",
  statement:
    "The lowest mode of a rod whose ends are held at zero decays exponentially. It is the plainest bounded problem: linear, smooth, with data that fit the boundary, so any loss of order points at the boundary closure or at the time stepping. Second-order central differences have their semi-discrete solution in closed form, against which a code can be checked to round-off.",
  keywords: ["heat equation", "diffusion", "Dirichlet", "parabolic"],
  classification: {
    domain: "bounded",
    dimension: 1,
    isSteady: false,
    isLinear: true,
    smoothness: { kind: "entire" },
  },
  axes: [{ name: "x", a: 0, b: 1, kind: "bounded" }],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [],
  expressions: [],
  equations: [{ field: "u", identity: "u_t = u_xx" }],
  initialTime: 0,
  initialConditions: [{ field: "u", timeDerivative: 0, expression: "sin(pi*x)" }],
  boundaryConditions: [
    { field: "u", axis: "x", end: "a", kind: "dirichlet", alpha: "1", beta: "0", g: "0" },
    { field: "u", axis: "x", end: "b", kind: "dirichlet", alpha: "1", beta: "0", g: "0" },
  ],
  kinks: [],
  outputTimes: [0.1],
  exact: { kind: "expression", fields: { u: "exp(-pi^2*t)*sin(pi*x)" } },
  grids: {
    kinds: [boundedKinds],
    suggested: {
      uniform: [9, 17, 33, 65, 129, 257],
      "cell-centred": [8, 16, 32, 64, 128, 256],
      "chebyshev-lobatto": [5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 17, 21, 25],
      "chebyshev-gauss": [5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 16, 20],
      "legendre-lobatto": [5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 16, 20],
      "legendre-gauss": [5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 16, 20],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 0.5, t: 0.1 }, value: 0.37270783885343791 },
    { field: "u", at: { x: 0.25, t: 0.1 }, value: 0.26354424025464894 },
    { field: "u", at: { x: 0.1, t: 0.1 }, value: 0.11517305614247163 },
  ],
  notes: [
    "Central differences of second order, exact in time, give exp(-(4/h^2) sin^2(pi h/2) t) sin(pi x) at the nodes.",
  ],
  sources: [
    {
      citation:
        "R. J. LeVeque, Finite Difference Methods for Ordinary and Partial Differential Equations, SIAM, 2007, ch. 9",
      doi: "10.1137/1.9780898717839",
      isFromMemory: true,
    },
  ],
};
